import { foundIn } from '#server/access/found';
import { shopMachines } from '#server/services/records';

/** One machine of the shop. */
export default defineEventHandler((event) => foundIn(event, shopMachines.find));
