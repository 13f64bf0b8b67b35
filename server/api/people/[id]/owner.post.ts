import { otherPersonOf } from '#server/access/other';
import { transferOwnership } from '#server/services/people';
import { problem } from '#server/utils/problem';

/** Makes a shop hand the owner, and the owner a shop hand. */
export default defineEventHandler(async (event) => {
  const { by, person } = await otherPersonOf(event);
  if (person.role !== 'hand' || person.status !== 'active') throw problem(409, `${person.name} cannot own the shop: only a shop hand who may sign in can.`);
  await transferOwnership(by, person);
  return { owner: person.id };
});
