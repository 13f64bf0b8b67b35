import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { findRail, revisionsOf } from '#server/services/rails';

/** Every revision of a rail, the newest first. */
export default defineEventHandler(async (event) => {
  const rail = await foundIn(event, findRail);
  return { revisions: await revisionsOf(callerOf(event).shopId, rail.id) };
});
