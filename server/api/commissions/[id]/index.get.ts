import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { commissionFor } from '#server/services/commissions';
import { railsOf, staleness } from '#server/services/pieceRevisions';

/** A commission with its newest work, its rails, what is ticked off and what is stale. */
export default defineEventHandler(async (event) => {
  const { role, shopId } = callerOf(event);
  const commission = await foundIn(event, commissionFor(role));
  return { ...commission, rails: await railsOf(shopId, commission.id), ...(await staleness(shopId, commission.id)) };
});
