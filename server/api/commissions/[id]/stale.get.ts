import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { findCommission } from '#server/services/commissions';
import { staleness } from '#server/services/pieceRevisions';

/** What was made of a commission, and what of it is stale and why. */
export default defineEventHandler(async (event) => {
  const { id } = await foundIn(event, findCommission);
  return await staleness(callerOf(event).shopId, id);
});
