import { and, asc, eq } from 'drizzle-orm';
import { allOrNothing } from '../db/client';
import { passkeys } from '../db/schema';
import { useDatabase } from '../db/shop';
import { deed } from './deeds';
import { findActive } from './people';

interface Owner {
  readonly id: string;
  readonly shopId: string;
}
type NewPasskey = Pick<typeof passkeys.$inferInsert, 'id' | 'name' | 'publicKey' | 'counter' | 'transports' | 'backedUp'>;

/** A person's passkeys, the oldest first. */
export async function passkeysOf(personId: string) {
  return await useDatabase().select({ id: passkeys.id, name: passkeys.name, createdAt: passkeys.createdAt, transports: passkeys.transports })
    .from(passkeys).where(eq(passkeys.personId, personId)).orderBy(asc(passkeys.createdAt));
}

export async function addPasskey(person: Owner, key: NewPasskey): Promise<void> {
  const database = useDatabase();
  await allOrNothing(database, [
    database.insert(passkeys).values({ ...key, shopId: person.shopId, personId: person.id, createdAt: new Date() }),
    deed(person, 'added a passkey', key.name),
  ]);
}

/** Takes a passkey away; false where the person has none by that id. */
export async function removePasskey(person: Owner, id: string): Promise<boolean> {
  const gone = await useDatabase().delete(passkeys).where(and(eq(passkeys.personId, person.id), eq(passkeys.id, id))).returning({ name: passkeys.name });
  const [key] = gone;
  if (key) await deed(person, 'took a passkey away', key.name).run();
  return key !== undefined;
}

/** A passkey and who it belongs to, or null where it is gone or its person may not act. */
export async function findPasskey(id: string) {
  const [key] = await useDatabase().select().from(passkeys).where(eq(passkeys.id, id));
  const person = key ? await findActive(key.personId) : null;
  return key && person ? { key, person } : null;
}

/** Notes how often a passkey was used, by its own count: one that falls back was copied. */
export async function countPasskey(id: string, counter: number): Promise<void> {
  await useDatabase().update(passkeys).set({ counter }).where(eq(passkeys.id, id));
}
