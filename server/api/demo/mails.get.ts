import { callerOf } from '#server/access/person';
import { receivedMails } from '#server/demo/postbox';
import { shopOf } from '#server/services/people';
import { problem } from '#server/utils/problem';
import { settings } from '#server/utils/settings';

/** What the demo's mail server received: for the owner of the demo shop, and in the demo alone. */
export default defineEventHandler(async (event) => {
  const shop = settings.TALLYRAIL_DEMO ? await shopOf(callerOf(event).shopId) : null;
  if (!shop?.demo) throw problem(404, 'There is nothing at this address.');
  return { mails: receivedMails() };
});
