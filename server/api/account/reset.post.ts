import { resetPassword } from '#server/services/accounts';
import { limitRate } from '#server/utils/limitRate';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';
import { resetSchema } from '#shared/account/schemas';

/** Sets a new password by a mailed link; every session of before ends. */
export default defineEventHandler(async (event) => {
  await limitRate(event, 'signIn');
  const { secret, password } = await readBodyAs(event, resetSchema);
  if (!(await resetPassword(secret, password))) throw problem(410, 'This link has been used, or is more than an hour old. Ask for another.');
  await clearUserSession(event);
  return { changed: true };
});
