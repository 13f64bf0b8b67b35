import { foundIn } from '#server/access/found';
import { shopWoods } from '#server/services/records';

/** One wood of the shop. */
export default defineEventHandler((event) => foundIn(event, shopWoods.find));
