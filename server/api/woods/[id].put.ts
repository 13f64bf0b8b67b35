import { gone, idOf } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { shopWoods } from '#server/services/records';
import { readBodyAs } from '#server/utils/readBodyAs';
import { ownWoodSchema } from '#shared/shop/wood';

/** Changes a wood; programs made with it keep it as it was. */
export default defineEventHandler(async (event) => {
  const changed = await shopWoods.change(callerOf(event), idOf(event), await readBodyAs(event, ownWoodSchema));
  if (!changed) throw gone();
  return { id: idOf(event) };
});
