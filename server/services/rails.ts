import { and, desc, eq, isNull } from 'drizzle-orm';
import type { z } from 'zod';
import type { ListQuery } from '#shared/shop/list';
import type { railPatchSchema, railSchema, revisionSchema } from '#shared/shop/rail';
import { type Write, allOrNothing, isTaken } from '../db/client';
import { people, railRevisions, rails } from '../db/schema';
import { useDatabase } from '../db/shop';
import { newId } from '../utils/newId';
import { type Actor, deed } from './deeds';
import { type ListShape, pageOf } from './lists';

const SHAPE: ListShape = {
  id: rails.id, shopId: rails.shopId, sorts: { name: rails.name, updated: rails.updatedAt }, first: ['updated', 'desc'], search: rails.name, status: rails.status,
};
const columns = {
  id: rails.id, name: rails.name, status: rails.status, revision: rails.revision, wood: rails.wood, quantity: rails.quantity, due: rails.due,
  commissionId: rails.commissionId, label: rails.label, updatedAt: rails.updatedAt,
};
const own = (shopId: string, id: string) => and(eq(rails.shopId, shopId), eq(rails.id, id), isNull(rails.archivedAt));

export async function listRails(shopId: string, query: ListQuery) {
  const page = pageOf(SHAPE, shopId, query);
  const rows = await useDatabase().select(columns).from(rails).where(and(page.where, isNull(rails.archivedAt))).orderBy(...page.orderBy).limit(page.limit);
  return page.cut(rows, (row, sort) => (sort === 'name' ? row.name : row.updatedAt));
}

/** A rail with its newest revision, or null. */
export async function findRail(shopId: string, id: string) {
  const [rail] = await useDatabase().select({ ...columns, draft: railRevisions.draft, request: railRevisions.request })
    .from(rails).innerJoin(railRevisions, and(eq(railRevisions.railId, rails.id), eq(railRevisions.number, rails.revision))).where(own(shopId, id));
  return rail ?? null;
}

/** Every revision of a rail, the newest first. */
export async function revisionsOf(shopId: string, railId: string) {
  return await useDatabase()
    .select({ number: railRevisions.number, draft: railRevisions.draft, request: railRevisions.request, note: railRevisions.note, savedBy: people.name, savedAt: railRevisions.savedAt })
    .from(railRevisions).innerJoin(people, eq(people.id, railRevisions.savedBy))
    .where(and(eq(railRevisions.shopId, shopId), eq(railRevisions.railId, railId))).orderBy(desc(railRevisions.number));
}

/** What a list calls a rail whose drawing has no name. */
const nameOf = (name: string) => name.trim() || 'Rail without a name';

type NewRail = z.output<typeof railSchema>;
/** The piece that a rail belongs to, and which of its rails it is. */
interface OfPiece {
  readonly commissionId: string;
  readonly label: string;
}

/** The writes that make a new rail, for who has more to write with them. */
export function newRail(by: Actor, { draft, request, quantity, due, note }: NewRail, of: OfPiece | null = null): { readonly id: string; readonly writes: readonly Write[] } {
  const database = useDatabase();
  const [id, now] = [newId(), new Date()];
  const name = nameOf(request.slot.spec.name);
  return {
    id,
    writes: [
      database.insert(rails).values({ id, shopId: by.shopId, name, status: 'draft', revision: 1, wood: request.slot.spec.wood, quantity, due, ...of, createdAt: now, updatedAt: now }),
      database.insert(railRevisions).values({ id: newId(), shopId: by.shopId, railId: id, number: 1, draft, request: request.input, note, savedBy: by.id, savedAt: now }),
      deed(by, 'drew rail', name),
    ],
  };
}

export async function createRail(by: Actor, rail: NewRail): Promise<string> {
  const { id, writes } = newRail(by, rail);
  await allOrNothing(useDatabase(), writes);
  return id;
}

/** The writes that make a rail's next revision; a rail that was ready is a draft again, since its program is of an older one. */
export function newRevision(by: Actor, railId: string, number: number, { draft, request, note }: Pick<NewRail, 'draft' | 'request' | 'note'>): readonly Write[] {
  const database = useDatabase();
  const now = new Date();
  const name = nameOf(request.slot.spec.name);
  return [
    database.insert(railRevisions).values({ id: newId(), shopId: by.shopId, railId, number, draft, request: request.input, note, savedBy: by.id, savedAt: now }),
    database.update(rails).set({ name, status: 'draft', revision: number, wood: request.slot.spec.wood, updatedAt: now }).where(own(by.shopId, railId)),
    deed(by, `saved revision ${number} of rail`, name),
  ];
}

/**
 * Saves a rail's next revision.
 *
 * @returns its number, or null where somebody saved one meanwhile: nothing is overwritten.
 */
export async function saveRevision(by: Actor, rail: { readonly id: string; readonly revision: number }, { basedOn, ...drawn }: z.output<typeof revisionSchema>): Promise<number | null> {
  if (basedOn !== rail.revision) return null;
  try {
    await allOrNothing(useDatabase(), newRevision(by, rail.id, basedOn + 1, drawn));
  } catch (error) {
    if (isTaken(error)) return null;
    throw error;
  }
  return basedOn + 1;
}

/** Changes what is no part of the drawing. */
export async function changeRail(by: Actor, rail: { readonly id: string; readonly name: string }, { quantity, due }: z.output<typeof railPatchSchema>): Promise<void> {
  const database = useDatabase();
  await allOrNothing(database, [
    database.update(rails).set({ ...(quantity !== undefined && { quantity }), ...(due !== undefined && { due }), updatedAt: new Date() }).where(own(by.shopId, rail.id)),
    deed(by, 'changed count or date of rail', rail.name),
  ]);
}

/** The writes that put a rail away: its revisions, programs and cuts stay. */
export const railAway = (by: Actor, rail: { readonly id: string; readonly name: string }): readonly Write[] => [
  useDatabase().update(rails).set({ archivedAt: new Date() }).where(own(by.shopId, rail.id)), deed(by, 'put rail away', rail.name),
];

export async function archiveRail(by: Actor, rail: { readonly id: string; readonly name: string }): Promise<void> {
  await allOrNothing(useDatabase(), railAway(by, rail));
}
