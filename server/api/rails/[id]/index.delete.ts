import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { archiveRail, findRail } from '#server/services/rails';

/** Puts a rail away; its revisions, programs and cuts stay. */
export default defineEventHandler(async (event) => {
  const rail = await foundIn(event, findRail);
  await archiveRail(callerOf(event), rail);
  return { id: rail.id };
});
