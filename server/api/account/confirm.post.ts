import { beginSession } from '#server/access/person';
import { confirmSignUp } from '#server/services/accounts';
import { limitRate } from '#server/utils/limitRate';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';
import { secretSchema } from '#shared/account/schemas';

/** Opens the shop that a mailed link stands for, and signs its owner in. */
export default defineEventHandler(async (event) => {
  await limitRate(event, 'signIn');
  const { secret } = await readBodyAs(event, secretSchema);
  const opened = await confirmSignUp(secret);
  if (!opened) throw problem(410, 'This link has been used, or is more than a day old. Sign in, or sign up again.');
  await beginSession(event, opened.person);
  return { drawing: opened.drawing };
});
