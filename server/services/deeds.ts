import { eq } from 'drizzle-orm';
import type { ListQuery } from '#shared/shop/list';
import { deeds, people } from '../db/schema';
import { useDatabase } from '../db/shop';
import { type ListShape, pageOf } from './lists';

/** Whoever does something in a shop. */
export interface Actor {
  readonly id: string;
  readonly shopId: string;
}

/** The write that notes who did what; it goes with the deed itself, all or nothing. */
export function deed(by: Actor, what: string, subject: string) {
  return useDatabase().insert(deeds).values({ shopId: by.shopId, personId: by.id, what, subject, at: new Date() });
}

const SHAPE: ListShape = { id: deeds.id, shopId: deeds.shopId, sorts: { at: deeds.at }, first: ['at', 'desc'], search: deeds.subject };

/** What was done in a shop, the newest first. */
export async function deedsOf(shopId: string, query: ListQuery) {
  const page = pageOf(SHAPE, shopId, query);
  const rows = await useDatabase()
    .select({ id: deeds.id, who: people.name, what: deeds.what, subject: deeds.subject, at: deeds.at })
    .from(deeds).leftJoin(people, eq(people.id, deeds.personId))
    .where(page.where).orderBy(...page.orderBy).limit(page.limit);
  return page.cut(rows, (row) => row.at);
}
