import { expectOnlyShop } from '#server/access/onlyShop';
import { restoreFrom } from '#server/services/restore';
import { problem } from '#server/utils/problem';

/** Puts a backup in the database's place. Sessions end: whoever was signed in signs in as the backup knows them. */
export default defineEventHandler(async (event) => {
  await expectOnlyShop();
  const fault = await restoreFrom(event.node.req);
  if (fault !== null) throw problem(422, `${fault} Nothing was changed.`);
  await clearUserSession(event);
  return { restored: true };
});
