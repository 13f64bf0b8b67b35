import { foundIn } from '#server/access/found';
import { findBit } from '#server/services/bits';

/** One bit of the shop, with what it was found to cut and how long it has cut. */
export default defineEventHandler((event) => foundIn(event, findBit));
