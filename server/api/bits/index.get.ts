import { callerOf } from '#server/access/person';
import { shopBits } from '#server/services/records';
import { answerList } from '#server/utils/answerList';
import { readQueryAs } from '#server/utils/readQueryAs';
import { listQuerySchema } from '#shared/shop/list';

/** The shop's bits, a page at a time or as CSV. */
export default defineEventHandler((event) => answerList(event, 'bits', readQueryAs(event, listQuerySchema), (query) => shopBits.list(callerOf(event).shopId, query)));
