import { callerOf } from '#server/access/person';
import { shopWoods } from '#server/services/records';
import { readBodyAs } from '#server/utils/readBodyAs';
import { ownWoodSchema } from '#shared/shop/wood';

/** Adds a wood to the shop. */
export default defineEventHandler(async (event) => ({ id: await shopWoods.create(callerOf(event), await readBodyAs(event, ownWoodSchema)) }));
