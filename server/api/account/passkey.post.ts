import { storeChallenge, takeChallenge } from '#server/access/challenges';
import { beginSessionOf, signInKey } from '#server/access/signInKey';
import { countPasskey } from '#server/services/passkeys';
import { limitRate } from '#server/utils/limitRate';

/** Signs in with a passkey: it says itself whose it is. */
const authenticate = defineWebAuthnAuthenticateEventHandler({
  storeChallenge: async (...of) => storeChallenge(...of),
  getChallenge: async (...of) => takeChallenge(...of),
  getCredential: signInKey,
  onSuccess: async (event, { credential, authenticationInfo }) => {
    await countPasskey(credential.id, authenticationInfo.newCounter);
    await beginSessionOf(event, credential.id);
  },
});
export default defineEventHandler(async (event) => {
  await limitRate(event, 'signIn');
  return await authenticate(event);
});
