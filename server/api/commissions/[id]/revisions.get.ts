import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { findCommission } from '#server/services/commissions';
import { workRevisions } from '#server/services/pieceRevisions';

/** Every revision of a commission's work, the newest first. */
export default defineEventHandler(async (event) => {
  const { id } = await foundIn(event, findCommission);
  return { revisions: await workRevisions(callerOf(event).shopId, id) };
});
