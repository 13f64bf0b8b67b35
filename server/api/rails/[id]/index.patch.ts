import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { changeRail, findRail } from '#server/services/rails';
import { readBodyAs } from '#server/utils/readBodyAs';
import { railPatchSchema } from '#shared/shop/rail';

/** Changes how many are to be cut, or by when. */
export default defineEventHandler(async (event) => {
  const rail = await foundIn(event, findRail);
  await changeRail(callerOf(event), rail, await readBodyAs(event, railPatchSchema));
  return { id: rail.id };
});
