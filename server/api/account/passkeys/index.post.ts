import { storeChallenge, takeChallenge } from '#server/access/challenges';
import { callerOf } from '#server/access/person';
import { addPasskey, passkeysOf } from '#server/services/passkeys';
import { keyNameSchema } from '#shared/account/schemas';

/** Adds a passkey to the caller's account: whose it is comes from the session alone, its name from the form. */
export default defineWebAuthnRegisterEventHandler({
  storeChallenge: async (...of) => storeChallenge(...of),
  getChallenge: async (...of) => takeChallenge(...of),
  validateUser: (user, event) => ({ userName: callerOf(event).email, displayName: keyNameSchema.parse(user.displayName) }),
  getOptions: () => ({ rpName: 'Tallyrail', authenticatorSelection: { residentKey: 'required', userVerification: 'preferred' } }),
  excludeCredentials: async (event) => (await passkeysOf(callerOf(event).id)).map(({ id }) => ({ id })),
  onSuccess: async (event, { credential, user }) => {
    const { id, publicKey, counter, backedUp, transports = [] } = credential;
    await addPasskey(callerOf(event), { id, publicKey, counter, backedUp, transports: [...transports], name: user.displayName ?? 'Passkey' });
  },
});
