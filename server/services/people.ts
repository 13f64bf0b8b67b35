import { and, asc, eq, ne, sql } from 'drizzle-orm';
import type { PersonStatus, Role } from '#shared/types/people';
import { allOrNothing } from '../db/client';
import { passkeys, people, shops, tokens } from '../db/schema';
import { useDatabase } from '../db/shop';
import { type Actor, deed } from './deeds';

/** A person who may act: not suspended, not removed. */
export async function findActive(id: string) {
  const [person] = await active().where(and(eq(people.id, id), eq(people.status, 'active')));
  return asPerson(person);
}

export async function findByEmail(email: string) {
  const [person] = await active().where(and(eq(people.email, email), eq(people.status, 'active')));
  return asPerson(person);
}

const active = () => useDatabase().select({
  id: people.id, shopId: people.shopId, role: people.role, name: people.name, email: people.email, epoch: people.epoch, passwordHash: people.passwordHash,
}).from(people);

/** Whoever is active has an address; it goes when they are removed. */
function asPerson<Row extends { readonly email: string | null }>(row: Row | undefined) {
  return row && row.email !== null ? { ...row, email: row.email } : null;
}

export async function shopOf(shopId: string) {
  const [shop] = await useDatabase().select().from(shops).where(eq(shops.id, shopId));
  return shop ?? null;
}

/** Everyone of a shop who was not removed, the owner first. */
export async function peopleOf(shopId: string) {
  const rows = await useDatabase().select({ id: people.id, name: people.name, email: people.email, role: people.role, status: people.status, createdAt: people.createdAt })
    .from(people).where(and(eq(people.shopId, shopId), ne(people.status, 'removed'))).orderBy(asc(people.createdAt));
  return rows.sort((a, b) => Number(b.role === 'owner') - Number(a.role === 'owner'));
}

/** One person of a shop, or null: also for another shop's. */
export async function personIn(shopId: string, id: string) {
  const [person] = await useDatabase().select({ id: people.id, name: people.name, email: people.email, role: people.role, status: people.status })
    .from(people).where(and(eq(people.shopId, shopId), eq(people.id, id), ne(people.status, 'removed')));
  return person ?? null;
}

/** Suspends a person, or lets them back in; their sessions end either way. */
export async function setStatus(by: Actor, person: { readonly id: string; readonly name: string }, status: Exclude<PersonStatus, 'removed'>): Promise<void> {
  const database = useDatabase();
  await allOrNothing(database, [
    database.update(people).set({ status, epoch: nextEpoch() }).where(and(eq(people.shopId, by.shopId), eq(people.id, person.id))),
    deed(by, status === 'suspended' ? 'suspended' : 'let back in', person.name),
  ]);
}

/** Removes a person: address, password and passkeys go, the name stays with what they did. */
export async function removePerson(by: Actor, person: { readonly id: string; readonly name: string }): Promise<void> {
  const database = useDatabase();
  await allOrNothing(database, [
    database.delete(passkeys).where(and(eq(passkeys.shopId, by.shopId), eq(passkeys.personId, person.id))),
    database.delete(tokens).where(and(eq(tokens.shopId, by.shopId), eq(tokens.personId, person.id))),
    database.update(people).set({ status: 'removed', email: null, passwordHash: null, epoch: nextEpoch() }).where(and(eq(people.shopId, by.shopId), eq(people.id, person.id))),
    deed(by, 'removed', person.name),
  ]);
}

/** Makes another person the owner, and the owner a shop hand. */
export async function transferOwnership(by: Actor, person: { readonly id: string; readonly name: string }): Promise<void> {
  const database = useDatabase();
  const setRole = (id: string, role: Role) => database.update(people).set({ role }).where(and(eq(people.shopId, by.shopId), eq(people.id, id)));
  await allOrNothing(database, [setRole(person.id, 'owner'), setRole(by.id, 'hand'), deed(by, 'made owner', person.name)]);
}

/** One more than it was: sessions of before are over. */
export const nextEpoch = () => sql`${people.epoch} + 1`;
