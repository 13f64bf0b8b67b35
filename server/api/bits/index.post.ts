import { callerOf } from '#server/access/person';
import { shopBits } from '#server/services/records';
import { readBodyAs } from '#server/utils/readBodyAs';
import { bitSchema } from '#shared/shop/bit';

/** Adds a bit to the shop. */
export default defineEventHandler(async (event) => ({ id: await shopBits.create(callerOf(event), await readBodyAs(event, bitSchema)) }));
