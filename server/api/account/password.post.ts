import { callerOf } from '#server/access/person';
import { changePassword } from '#server/services/accounts';
import { limitRate } from '#server/utils/limitRate';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';
import { passwordSchema } from '#shared/account/schemas';

/** Changes the caller's password; every session ends, this one too. */
export default defineEventHandler(async (event) => {
  const person = callerOf(event);
  await limitRate(event, 'signIn', person.email);
  const { old, password } = await readBodyAs(event, passwordSchema);
  if (!(await changePassword(person, old, password))) throw problem(422, 'One thing needs changing.', { errors: [{ path: 'old', message: 'That is not your password of now.' }] });
  await clearUserSession(event);
  return { changed: true };
});
