import { callerOf } from '#server/access/person';
import { deedsOf } from '#server/services/deeds';
import { answerList } from '#server/utils/answerList';
import { readQueryAs } from '#server/utils/readQueryAs';
import { listQuerySchema } from '#shared/shop/list';

/** Who did what in the shop, the newest first; as CSV too. */
export default defineEventHandler((event) => answerList(event, 'log', readQueryAs(event, listQuerySchema), (query) => deedsOf(callerOf(event).shopId, query)));
