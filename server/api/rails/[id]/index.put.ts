import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { findRail, saveRevision } from '#server/services/rails';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';
import { revisionSchema } from '#shared/shop/rail';

/** Saves a rail's next revision; one drawn from an older revision than the newest is refused, and nothing is lost. */
export default defineEventHandler(async (event) => {
  const rail = await foundIn(event, findRail);
  const revision = await saveRevision(callerOf(event), rail, await readBodyAs(event, revisionSchema));
  if (revision === null) throw problem(409, 'Somebody saved this rail since you opened it. Compare with their revision, then save yours on top of it.', { newest: (await foundIn(event, findRail)).revision });
  return { id: rail.id, revision };
});
