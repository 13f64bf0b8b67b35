import { callerOf } from '#server/access/person';
import { invite } from '#server/services/accounts';
import { limitRate } from '#server/utils/limitRate';
import { readBodyAs } from '#server/utils/readBodyAs';
import { siteOf } from '#server/utils/siteOf';
import { inviteSchema } from '#shared/account/schemas';

/** Invites a shop hand by mail. */
export default defineEventHandler(async (event) => {
  const person = callerOf(event);
  await limitRate(event, 'mail', person.shopId);
  const request = await readBodyAs(event, inviteSchema);
  await invite(person, request, siteOf(event));
  return { sent: request.email };
});
