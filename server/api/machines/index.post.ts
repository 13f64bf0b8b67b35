import { callerOf } from '#server/access/person';
import { shopMachines } from '#server/services/records';
import { readBodyAs } from '#server/utils/readBodyAs';
import { machineSchema } from '#shared/shop/machine';

/** Adds a machine to the shop. */
export default defineEventHandler(async (event) => ({ id: await shopMachines.create(callerOf(event), await readBodyAs(event, machineSchema)) }));
