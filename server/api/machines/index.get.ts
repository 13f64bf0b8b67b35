import { callerOf } from '#server/access/person';
import { shopMachines } from '#server/services/records';
import { answerList } from '#server/utils/answerList';
import { readQueryAs } from '#server/utils/readQueryAs';
import { listQuerySchema } from '#shared/shop/list';

/** The shop's machines, a page at a time or as CSV. */
export default defineEventHandler((event) => answerList(event, 'machines', readQueryAs(event, listQuerySchema), (query) => shopMachines.list(callerOf(event).shopId, query)));
