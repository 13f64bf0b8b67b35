import { callerOf } from '#server/access/person';
import { peopleOf } from '#server/services/people';

/** Everyone in the shop. */
export default defineEventHandler(async (event) => ({ people: await peopleOf(callerOf(event).shopId) }));
