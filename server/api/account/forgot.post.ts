import { forgotPassword } from '#server/services/accounts';
import { limitRate } from '#server/utils/limitRate';
import { readBodyAs } from '#server/utils/readBodyAs';
import { siteOf } from '#server/utils/siteOf';
import { forgotSchema } from '#shared/account/schemas';

/** Mails a link for a new password: the answer is the same whether or not the address has an account. */
export default defineEventHandler(async (event) => {
  await limitRate(event, 'mail');
  const { email } = await readBodyAs(event, forgotSchema);
  await limitRate(event, 'mail', email);
  await forgotPassword(email, siteOf(event));
  return { sent: email };
});
