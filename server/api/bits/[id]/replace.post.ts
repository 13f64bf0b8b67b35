import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { findBit, replaceBit } from '#server/services/bits';

/** Notes that a new bit of the same kind is in use: its minutes and corrections begin again. */
export default defineEventHandler(async (event) => {
  const bit = await foundIn(event, findBit);
  await replaceBit(callerOf(event), bit);
  return { id: bit.id };
});
