import { beginSession } from '#server/access/person';
import { signIn } from '#server/services/accounts';
import { limitRate } from '#server/utils/limitRate';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';
import { signInSchema } from '#shared/account/schemas';

/** Signs in by address and password; tries are counted by who asks and by the address asked for. */
export default defineEventHandler(async (event) => {
  await limitRate(event, 'signIn');
  const { email, password } = await readBodyAs(event, signInSchema);
  await limitRate(event, 'signIn', email);
  const person = await signIn(email, password);
  if (!person) throw problem(401, 'Address and password do not go together. Try again, or ask for a new password.');
  await beginSession(event, person);
  return { role: person.role };
});
