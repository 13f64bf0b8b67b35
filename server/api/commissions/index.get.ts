import { callerOf } from '#server/access/person';
import { listCommissions } from '#server/services/commissions';
import { answerList } from '#server/utils/answerList';
import { readQueryAs } from '#server/utils/readQueryAs';
import { listQuerySchema } from '#shared/shop/list';

/** The shop's commissions, a page at a time or as CSV; contacts for the owner alone. */
export default defineEventHandler((event) => {
  const { role, shopId } = callerOf(event);
  return answerList(event, 'commissions', readQueryAs(event, listQuerySchema), (query) => listCommissions(role)(shopId, query));
});
