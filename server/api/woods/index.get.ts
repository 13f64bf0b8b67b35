import { callerOf } from '#server/access/person';
import { shopWoods } from '#server/services/records';
import { answerList } from '#server/utils/answerList';
import { readQueryAs } from '#server/utils/readQueryAs';
import { listQuerySchema } from '#shared/shop/list';

/** The shop's woods, a page at a time or as CSV. */
export default defineEventHandler((event) => answerList(event, 'woods', readQueryAs(event, listQuerySchema), (query) => shopWoods.list(callerOf(event).shopId, query)));
