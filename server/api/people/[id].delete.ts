import { otherPersonOf } from '#server/access/other';
import { removePerson } from '#server/services/people';

/** Removes a person: their sessions end, what they did stays. */
export default defineEventHandler(async (event) => {
  const { by, person } = await otherPersonOf(event);
  await removePerson(by, person);
  return { removed: person.id };
});
