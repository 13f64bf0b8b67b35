import { gone, idOf } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { shopBits } from '#server/services/records';

/** Puts a bit away: it is offered no more, and stays with what was made with it. */
export default defineEventHandler(async (event) => {
  if (!(await shopBits.archive(callerOf(event), idOf(event)))) throw gone();
  return { id: idOf(event) };
});
