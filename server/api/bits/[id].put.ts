import { gone, idOf } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { shopBits } from '#server/services/records';
import { readBodyAs } from '#server/utils/readBodyAs';
import { bitSchema } from '#shared/shop/bit';

/** Changes a bit; programs made with it keep it as it was. */
export default defineEventHandler(async (event) => {
  const changed = await shopBits.change(callerOf(event), idOf(event), await readBodyAs(event, bitSchema));
  if (!changed) throw gone();
  return { id: idOf(event) };
});
