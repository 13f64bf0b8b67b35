import { callerOf } from '#server/access/person';
import { passkeysOf } from '#server/services/passkeys';

/** The caller's passkeys. */
export default defineEventHandler(async (event) => ({ passkeys: await passkeysOf(callerOf(event).id) }));
