import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { cutsOfRail, cutWell } from '#server/services/cuts';
import { programsOfRail } from '#server/services/railPrograms';
import { findRail } from '#server/services/rails';

/** A rail with its newest drawing, its programs and its cuts. */
export default defineEventHandler(async (event) => {
  const rail = await foundIn(event, findRail);
  const { shopId } = callerOf(event);
  return { ...rail, programs: await programsOfRail(shopId, rail.id), cuts: await cutsOfRail(shopId, rail.id), cutWell: await cutWell(shopId, rail.id) };
});
