import { gone, idOf } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { shopWoods } from '#server/services/records';

/** Puts a wood away: it is offered no more, and stays with what was made with it. */
export default defineEventHandler(async (event) => {
  if (!(await shopWoods.archive(callerOf(event), idOf(event)))) throw gone();
  return { id: idOf(event) };
});
