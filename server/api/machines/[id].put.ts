import { gone, idOf } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { shopMachines } from '#server/services/records';
import { readBodyAs } from '#server/utils/readBodyAs';
import { machineSchema } from '#shared/shop/machine';

/** Changes a machine; programs made with it keep it as it was. */
export default defineEventHandler(async (event) => {
  const changed = await shopMachines.change(callerOf(event), idOf(event), await readBodyAs(event, machineSchema));
  if (!changed) throw gone();
  return { id: idOf(event) };
});
