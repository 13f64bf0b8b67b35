import { foundIn } from '#server/access/found';
import { shopBits } from '#server/services/records';

/** One bit of the shop. */
export default defineEventHandler((event) => foundIn(event, shopBits.find));
