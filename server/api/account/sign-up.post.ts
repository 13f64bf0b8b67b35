import { signUp } from '#server/services/accounts';
import { limitRate } from '#server/utils/limitRate';
import { readBodyAs } from '#server/utils/readBodyAs';
import { siteOf } from '#server/utils/siteOf';
import { signUpSchema } from '#shared/account/schemas';

/** Asks for a shop: the answer is the same whether or not the address has an account, and the rest comes by mail. */
export default defineEventHandler(async (event) => {
  await limitRate(event, 'mail');
  const request = await readBodyAs(event, signUpSchema);
  await signUp(request, siteOf(event));
  return { sent: request.email };
});
