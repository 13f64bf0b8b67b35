import { and, asc, desc, eq, isNull } from 'drizzle-orm';
import type { CommissionPatch, NewCommission } from '#shared/commission/commission';
import { movedTo } from '#shared/commission/stages';
import { withoutPrices } from '#shared/commission/work';
import type { ListQuery } from '#shared/shop/list';
import type { Role } from '#shared/types/people';
import { allOrNothing } from '../db/client';
import { benchTicks, commissions, people, pieceRevisions } from '../db/schema';
import { useDatabase } from '../db/shop';
import { newId } from '../utils/newId';
import { type Actor, deed } from './deeds';
import { type ListShape, pageOf } from './lists';

const SHAPE: ListShape = {
  id: commissions.id, shopId: commissions.shopId, sorts: { name: commissions.name, updated: commissions.updatedAt }, first: ['updated', 'desc'], search: commissions.name, status: commissions.stage,
};
/** What everyone in the shop may know of a commission; the contact comes on top for the owner. */
const open = {
  id: commissions.id, name: commissions.name, occasion: commissions.occasion, stage: commissions.stage, due: commissions.due, units: commissions.units, updatedAt: commissions.updatedAt,
};
const whole = { ...open, wall: commissions.wall, wishes: commissions.wishes, stageDays: commissions.stageDays };
const own = (shopId: string, id: string) => and(eq(commissions.shopId, shopId), eq(commissions.id, id), isNull(commissions.archivedAt));

/** Commissions as a role may see them: the columns of contacts are not asked for where they may not be seen. */
export const listCommissions = (role: Role) => async (shopId: string, query: ListQuery) => {
  const page = pageOf(SHAPE, shopId, query);
  const columns = role === 'owner' ? { ...open, contact: commissions.contact } : open;
  const rows = await useDatabase().select(columns).from(commissions).where(and(page.where, isNull(commissions.archivedAt))).orderBy(...page.orderBy).limit(page.limit);
  return page.cut(rows, (row, sort) => (sort === 'name' ? row.name : row.updatedAt));
};

/** The newest revision of a commission's work, or null where none is saved. */
export async function newestWork(shopId: string, commissionId: string) {
  const [row] = await useDatabase().select({ number: pieceRevisions.number, work: pieceRevisions.work, savedBy: people.name, savedAt: pieceRevisions.savedAt })
    .from(pieceRevisions).innerJoin(people, eq(people.id, pieceRevisions.savedBy))
    .where(and(eq(pieceRevisions.shopId, shopId), eq(pieceRevisions.commissionId, commissionId))).orderBy(desc(pieceRevisions.number)).limit(1);
  return row ?? null;
}

/** One commission as the owner sees it, or null. */
export async function findCommission(shopId: string, id: string) {
  const [row] = await useDatabase().select({ ...whole, contact: commissions.contact }).from(commissions).where(own(shopId, id));
  return row ?? null;
}

/** One commission with its newest work as a role may see it: no contact and no price for the shop hand. */
export const commissionFor = (role: Role) => async (shopId: string, id: string) => {
  const row = await findCommission(shopId, id);
  if (!row) return null;
  const { contact, ...rest } = row;
  const newest = await newestWork(shopId, id);
  const owns = role === 'owner';
  return {
    ...rest, ...(owns && { contact }), revision: newest?.number ?? 0, savedBy: newest?.savedBy ?? null, savedAt: newest?.savedAt ?? null,
    work: newest === null ? null : owns ? newest.work : withoutPrices(newest.work), ticks: await ticksOf(shopId, id),
  };
};

export async function createCommission(by: Actor, asked: NewCommission, today: string): Promise<string> {
  const database = useDatabase();
  const [id, now] = [newId(), new Date()];
  await allOrNothing(database, [
    database.insert(commissions).values({ id, shopId: by.shopId, ...asked, stage: 'enquiry', stageDays: { enquiry: today }, createdAt: now, updatedAt: now }),
    deed(by, 'took in commission', asked.name),
  ]);
  return id;
}

/** Changes what is said of a commission, or moves it to another stage, today. */
export async function changeCommission(by: Actor, commission: NonNullable<Awaited<ReturnType<typeof findCommission>>>, change: CommissionPatch, today: string): Promise<void> {
  const database = useDatabase();
  const { stage } = change;
  const days = stage !== undefined && stage !== commission.stage ? { stageDays: movedTo(commission.stageDays, stage, today) } : {};
  await allOrNothing(database, [
    database.update(commissions).set({ ...change, ...days, updatedAt: new Date() }).where(own(by.shopId, commission.id)),
    deed(by, stage !== undefined && stage !== commission.stage ? `moved to ${stage} commission` : 'changed commission', change.name ?? commission.name),
  ]);
}

/** Puts a commission away: its revisions and rails stay. */
export async function archiveCommission(by: Actor, commission: { readonly id: string; readonly name: string }): Promise<void> {
  const database = useDatabase();
  await allOrNothing(database, [database.update(commissions).set({ archivedAt: new Date() }).where(own(by.shopId, commission.id)), deed(by, 'put commission away', commission.name)]);
}

/** How each bench step stands: the newest tick or taking back of it. */
export async function ticksOf(shopId: string, commissionId: string) {
  const rows = await useDatabase().select({ step: benchTicks.step, done: benchTicks.done, by: people.name, at: benchTicks.tickedAt })
    .from(benchTicks).innerJoin(people, eq(people.id, benchTicks.tickedBy))
    .where(and(eq(benchTicks.shopId, shopId), eq(benchTicks.commissionId, commissionId))).orderBy(asc(benchTicks.id));
  return [...new Map(rows.map((row) => [row.step, row])).values()];
}

export async function tickStep(by: Actor, commission: { readonly id: string; readonly name: string }, { step, done }: { readonly step: string; readonly done: boolean }): Promise<void> {
  const database = useDatabase();
  await allOrNothing(database, [
    database.insert(benchTicks).values({ shopId: by.shopId, commissionId: commission.id, step, done, tickedBy: by.id, tickedAt: new Date() }),
    deed(by, done ? `ticked "${step}" of commission` : `took back the tick of "${step}" of commission`, commission.name),
  ]);
}
