import { WITHOUT_SESSION } from '#server/access/table';
import { personOf } from '#server/access/person';
import { expectSameSite } from '#server/access/sameSite';
import { problem } from '#server/utils/problem';

/** Who may call what: the table's word, held here and nowhere else. */
export default defineEventHandler(async (event) => {
  const { route } = event.context;
  if (!route || WITHOUT_SESSION.has(route.name)) return;
  expectSameSite(event);
  const person = await personOf(event);
  if (person) event.context.person = person;
  if (route.who.includes(person?.role ?? 'visitor')) return;
  if (!person) throw problem(401, 'Sign in first.');
  throw problem(403, 'This is not yours to do. Ask the shop\'s owner.');
});
