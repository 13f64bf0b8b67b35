import { type H3Event, getRequestProtocol } from 'h3';
import type { Role } from '#shared/types/people';
import { assert } from '#shared/assert';
import { findActive } from '../services/people';
import { settings } from '../utils/settings';

/** Who calls, as the database knows them at this moment. */
export interface Person {
  readonly id: string;
  readonly shopId: string;
  readonly role: Role;
  readonly name: string;
  readonly email: string;
  readonly epoch: number;
}

declare module 'h3' {
  interface H3EventContext {
    route?: { readonly name: string; readonly who: readonly string[] } | undefined;
    person?: Person;
  }
}

/** The person of the session, or null: also where the session is over, or they were suspended or removed. */
export async function personOf(event: H3Event): Promise<Person | null> {
  const { user } = await getUserSession(event);
  if (!user) return null;
  const person = await findActive(user.id);
  return person && person.epoch === user.epoch ? person : null;
}

/** The caller of a route that only people with an account may call. */
export function callerOf(event: H3Event): Person {
  const { person } = event.context;
  assert(person !== undefined, 'the table lets nobody without an account come here');
  return person;
}

/** Where there is https the cookie travels by it alone; a shop's own network may have none. */
const COOKIE = { sameSite: 'lax', httpOnly: true } as const;

/** Begins a session, under a new id: nothing of an earlier one is carried over. */
export async function beginSession(event: H3Event, person: Pick<Person, 'id' | 'epoch'>): Promise<void> {
  await clearUserSession(event);
  delete event.node.req.headers.cookie; // else the session that is begun would be the one that came
  const secure = getRequestProtocol(event, { xForwardedProto: settings.TALLYRAIL_TRUST_PROXY }) === 'https';
  await setUserSession(event, { user: { id: person.id, epoch: person.epoch } }, { cookie: { ...COOKIE, secure } });
}
