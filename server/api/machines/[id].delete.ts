import { gone, idOf } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { shopMachines } from '#server/services/records';

/** Puts a machine away: it is offered no more, and stays with what was made with it. */
export default defineEventHandler(async (event) => {
  if (!(await shopMachines.archive(callerOf(event), idOf(event)))) throw gone();
  return { id: idOf(event) };
});
