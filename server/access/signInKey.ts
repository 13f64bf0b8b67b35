import type { H3Event } from 'h3';
import { findPasskey } from '../services/passkeys';
import { problem } from '../utils/problem';
import { beginSession } from './person';

/** The passkey that answers; one that is unknown, or whose person is shut out, reads the same. */
export async function signInKey(_event: H3Event, id: string) {
  const { key } = await expectPasskey(id);
  return { id: key.id, publicKey: key.publicKey, counter: key.counter, backedUp: key.backedUp, transports: key.transports };
}

/** Begins the session of the person that a passkey belongs to. */
export async function beginSessionOf(event: H3Event, passkeyId: string): Promise<void> {
  const { person } = await expectPasskey(passkeyId);
  await beginSession(event, person);
}

async function expectPasskey(id: string) {
  const found = await findPasskey(id);
  if (!found) throw problem(401, 'This passkey does not belong to an account here. Sign in with the password.');
  return found;
}
