import { callerOf } from '#server/access/person';
import { endSessions } from '#server/services/accounts';

/** Ends every session of the caller, this one too. */
export default defineEventHandler(async (event) => {
  await endSessions(callerOf(event));
  await clearUserSession(event);
  return { signedOut: true };
});
