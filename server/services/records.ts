import { and, eq, isNull } from 'drizzle-orm';
import type { ListQuery } from '#shared/shop/list';
import { allOrNothing } from '../db/client';
import { type RecordTable, bits, machines, woods } from '../db/schema';
import { useDatabase } from '../db/shop';
import { newId } from '../utils/newId';
import { type Actor, deed } from './deeds';
import { type ListShape, pageOf } from './lists';

interface Named {
  readonly name: string;
}

/** What a shop can do with one kind of thing it owns. `word` is what the log calls one. */
function recordsIn<Spec extends Named>(table: RecordTable<Spec>, word: string) {
  const shape: ListShape = { id: table.id, shopId: table.shopId, sorts: { name: table.name, updated: table.updatedAt }, first: ['name', 'asc'], search: table.name };
  const own = (shopId: string, id: string) => and(eq(table.shopId, shopId), eq(table.id, id), isNull(table.archivedAt));
  const columns = { id: table.id, name: table.name, spec: table.spec, createdAt: table.createdAt, updatedAt: table.updatedAt };

  return {
    word,
    /** A page of them, without those put away. */
    async list(shopId: string, query: ListQuery) {
      const page = pageOf(shape, shopId, query);
      const rows = await useDatabase().select(columns).from(table).where(and(page.where, isNull(table.archivedAt))).orderBy(...page.orderBy).limit(page.limit);
      return page.cut(rows, (row, sort) => (sort === 'name' ? row.name : row.updatedAt));
    },
    /** One of the shop's, or null: also where it is another shop's, or put away. */
    async find(shopId: string, id: string) {
      const [row] = await useDatabase().select(columns).from(table).where(own(shopId, id));
      return row ?? null;
    },
    async create(by: Actor, spec: Spec): Promise<string> {
      const database = useDatabase();
      const now = new Date();
      const row = { id: newId(), shopId: by.shopId, name: spec.name, spec, createdAt: now, updatedAt: now };
      await allOrNothing(database, [database.insert(table).values(row as typeof table.$inferInsert), deed(by, `added ${word}`, spec.name)]);
      return row.id;
    },
    /** False where the shop has none by that id. */
    async change(by: Actor, id: string, spec: Spec): Promise<boolean> {
      const database = useDatabase();
      const row = await this.find(by.shopId, id);
      if (!row) return false;
      const change = { name: spec.name, spec, updatedAt: new Date() };
      await allOrNothing(database, [database.update(table).set(change as Partial<typeof table.$inferInsert>).where(own(by.shopId, id)), deed(by, `changed ${word}`, spec.name)]);
      return true;
    },
    /** Puts one away: it is offered no more, and stays with what was made with it. */
    async archive(by: Actor, id: string): Promise<boolean> {
      const database = useDatabase();
      const row = await this.find(by.shopId, id);
      if (!row) return false;
      await allOrNothing(database, [database.update(table).set({ archivedAt: new Date() } as Partial<typeof table.$inferInsert>).where(own(by.shopId, id)), deed(by, `put ${word} away`, row.name)]);
      return true;
    },
  };
}

export const shopMachines = recordsIn(machines, 'machine');
export const shopBits = recordsIn(bits, 'bit');
export const shopWoods = recordsIn(woods, 'wood');
