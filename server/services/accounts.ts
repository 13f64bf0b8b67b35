import { eq } from 'drizzle-orm';
import type { z } from 'zod';
import type { joinSchema, signUpSchema } from '#shared/account/schemas';
import { allOrNothing, isTaken } from '../db/client';
import { people, shops } from '../db/schema';
import { useDatabase } from '../db/shop';
import { letters } from '../mail/letters';
import { queued } from '../mail/queue';
import { newId } from '../utils/newId';
import { deed } from './deeds';
import { findByEmail, nextEpoch, shopOf } from './people';
import { dropTokens, findToken, newToken, useToken } from './tokens';

/** Where links in mails lead. */
interface Site {
  readonly origin: string;
}

/**
 * Begins a sign-up: nothing but a mail comes of it. To an address that has an account goes another mail, so that
 * whoever asks sees the same either way; hashing the password comes first for the same reason.
 */
export async function signUp({ shop, name, email, password, drawing }: z.output<typeof signUpSchema>, { origin }: Site): Promise<void> {
  const passwordHash = await hashPassword(password);
  if (await findByEmail(email)) {
    await queued(null, email, letters.alreadyHere({ name, origin })).run();
    return;
  }
  const { secret, writes } = newToken('sign-up', { payload: { shop, name, email, passwordHash, ...(drawing && { drawing }) } });
  await allOrNothing(useDatabase(), [...writes, queued(null, email, letters.confirm({ name, shop, link: `${origin}/welcome#${secret}` }))]);
}

/** Ends a sign-up: makes the shop and its owner. Null where the link is used up. */
export async function confirmSignUp(secret: string) {
  const token = await findToken('sign-up', secret);
  if (!token || !(await useToken('sign-up', secret))) return null;
  const { shop = '', name = '', email = '', passwordHash = '', drawing } = token.payload;
  const database = useDatabase();
  const owner = { id: newId(), shopId: newId(), epoch: 0 };
  const now = new Date();
  try {
    await allOrNothing(database, [
      database.insert(shops).values({ id: owner.shopId, name: shop, createdAt: now }),
      database.insert(people).values({ ...owner, role: 'owner', name, email, passwordHash, createdAt: now }),
      deed(owner, 'opened the shop', shop),
    ]);
  } catch (error) {
    if (isTaken(error)) return null; // the address got its account by another link meanwhile
    throw error;
  }
  return { person: owner, drawing: drawing ?? null };
}

/** A hash that nobody's password has: comparing with it takes as long as with a real one. */
let nobodysHash: string | undefined;

/** The person that address and password belong to, or null; it takes as long for an address without an account. */
export async function signIn(email: string, password: string) {
  const person = await findByEmail(email);
  nobodysHash ??= await hashPassword(newId());
  const right = await verifyPassword(person?.passwordHash ?? nobodysHash, password);
  return person?.passwordHash && right ? person : null;
}

/** Sends a link for a new password, if the address has an account. */
export async function forgotPassword(email: string, { origin }: Site): Promise<void> {
  const person = await findByEmail(email);
  if (!person) return;
  const { secret, writes } = newToken('reset', { shopId: person.shopId, personId: person.id });
  await allOrNothing(useDatabase(), [dropTokens('reset', person.id), ...writes, queued(person.shopId, email, letters.reset({ name: person.name, link: `${origin}/new-password#${secret}` }))]);
}

/** Sets a password by the link from a mail; false where the link is used up. */
export async function resetPassword(secret: string, password: string): Promise<boolean> {
  const token = await findToken('reset', secret);
  if (!token?.personId || !token.shopId) return false;
  const passwordHash = await hashPassword(password);
  if (!(await useToken('reset', secret))) return false;
  await setPassword({ id: token.personId, shopId: token.shopId }, passwordHash);
  return true;
}

/** Changes a password; false where the old one is wrong. All sessions end. */
export async function changePassword(person: { readonly id: string; readonly shopId: string; readonly email: string }, old: string, password: string): Promise<boolean> {
  if (!(await signIn(person.email, old))) return false;
  await setPassword(person, await hashPassword(password));
  return true;
}

async function setPassword(person: { readonly id: string; readonly shopId: string }, passwordHash: string): Promise<void> {
  const database = useDatabase();
  await allOrNothing(database, [
    database.update(people).set({ passwordHash, epoch: nextEpoch() }).where(eq(people.id, person.id)),
    dropTokens('reset', person.id),
    deed(person, 'changed their password', ''),
  ]);
}

/** Ends every session of a person. */
export async function endSessions(person: { readonly id: string; readonly shopId: string }): Promise<void> {
  const database = useDatabase();
  await allOrNothing(database, [database.update(people).set({ epoch: nextEpoch() }).where(eq(people.id, person.id)), deed(person, 'signed out everywhere', '')]);
}

/** Invites a shop hand. An address that has an account gets a mail that says so; the owner sees the same either way. */
export async function invite(by: { readonly id: string; readonly shopId: string; readonly name: string }, { name, email }: { readonly name: string; readonly email: string }, { origin }: Site): Promise<void> {
  const shop = (await shopOf(by.shopId))?.name ?? '';
  if (await findByEmail(email)) {
    await allOrNothing(useDatabase(), [queued(by.shopId, email, letters.alreadyElsewhere({ name, shop })), deed(by, 'invited', name)]);
    return;
  }
  const { secret, writes } = newToken('invite', { shopId: by.shopId, payload: { name, email } });
  await allOrNothing(useDatabase(), [...writes, queued(by.shopId, email, letters.invite({ name, shop, from: by.name, link: `${origin}/join#${secret}` })), deed(by, 'invited', name)]);
}

/** Takes an invitation: makes the shop hand. Null where the link is used up. */
export async function join({ secret, name, password }: z.output<typeof joinSchema>) {
  const token = await findToken('invite', secret);
  if (!token?.shopId) return null;
  const passwordHash = await hashPassword(password);
  if (!(await useToken('invite', secret))) return null;
  const database = useDatabase();
  const hand = { id: newId(), shopId: token.shopId, epoch: 0 };
  try {
    await allOrNothing(database, [
      database.insert(people).values({ ...hand, role: 'hand', name, email: token.payload.email ?? '', passwordHash, createdAt: new Date() }),
      deed(hand, 'joined', name),
    ]);
  } catch (error) {
    if (isTaken(error)) return null;
    throw error;
  }
  return hand;
}
