import { beginSession } from '#server/access/person';
import { join } from '#server/services/accounts';
import { limitRate } from '#server/utils/limitRate';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';
import { joinSchema } from '#shared/account/schemas';

/** Takes an invitation by its mailed link, and signs the shop hand in. */
export default defineEventHandler(async (event) => {
  await limitRate(event, 'signIn');
  const hand = await join(await readBodyAs(event, joinSchema));
  if (!hand) throw problem(410, 'This invitation has been used, or is more than a week old. Ask for another.');
  await beginSession(event, hand);
  return { joined: true };
});
