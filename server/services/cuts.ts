import { and, asc, count, desc, eq, gt, ne } from 'drizzle-orm';
import type { z } from 'zod';
import type { cutSchema } from '#shared/shop/cut';
import { assert } from '#shared/assert';
import type { ListQuery } from '#shared/shop/list';
import { cutEvent, moveRail } from '#shared/shop/railStatus';
import { allOrNothing } from '../db/client';
import { bits, cuts, machines, people, railPrograms, rails } from '../db/schema';
import { useDatabase } from '../db/shop';
import { type Actor, deed } from './deeds';
import { type ListShape, pageOf } from './lists';
import { findRailProgram } from './railPrograms';

/** A clock at the bench may be a little fast. */
const LATEST = 10 * 60_000; // ms ahead of ours

/**
 * Logs a cut: once, however often it is sent. The rail counts as cut when as many went well as were wanted.
 *
 * @returns `unknown` where the shop has no such program, `taken` where the id is another shop's or another person's cut.
 */
export async function logCut(by: Actor, cut: z.output<typeof cutSchema>): Promise<'logged' | 'unknown' | 'taken'> {
  const database = useDatabase();
  const [before] = await database.select({ shopId: cuts.shopId, personId: cuts.personId }).from(cuts).where(eq(cuts.id, cut.id));
  if (before) return before.shopId === by.shopId && before.personId === by.id ? 'logged' : 'taken';
  const program = await findRailProgram(by.shopId, cut.programId);
  if (!program) return 'unknown';
  const now = new Date();
  const cutAt = new Date(Math.min(Date.parse(cut.cutAt), now.getTime() + LATEST));
  const { id, outcome, reason, seconds, widths, depths } = cut;
  const [rail] = await database.select({ quantity: rails.quantity, status: rails.status }).from(rails).where(eq(rails.id, program.railId));
  assert(rail !== undefined, 'a program has its rail');
  const event = outcome === 'spoiled' ? 'spoiled' : cutEvent((await cutWell(by.shopId, program.railId)) + 1, rail.quantity);
  // A cut of an older drawing happened and is logged; it does not move the rail.
  const moved = program.revision === program.newest ? moveRail(rail.status, event) : null;
  await allOrNothing(database, [
    database.insert(cuts).values({
      id, shopId: by.shopId, railId: program.railId, programId: program.id, machineId: program.machineId, bitId: program.bitId, personId: by.id,
      outcome, reason, seconds, widths, depths, cutAt, loggedAt: now,
    }),
    ...(moved?.ok ? [database.update(rails).set({ status: moved.status, updatedAt: now }).where(eq(rails.id, program.railId))] : []),
    deed(by, outcome === 'well' ? 'cut rail' : 'spoiled rail', program.rail),
  ]);
  return 'logged';
}

/** How many of a rail were cut well, to its drawing of now. */
export async function cutWell(shopId: string, railId: string): Promise<number> {
  const [row] = await useDatabase().select({ count: count() }).from(cuts)
    .innerJoin(railPrograms, eq(railPrograms.id, cuts.programId)).innerJoin(rails, and(eq(rails.id, cuts.railId), eq(rails.revision, railPrograms.revision)))
    .where(and(eq(cuts.shopId, shopId), eq(cuts.railId, railId), eq(cuts.outcome, 'well')));
  return row?.count ?? 0;
}

const SHAPE: ListShape = { id: cuts.id, shopId: cuts.shopId, sorts: { cut: cuts.cutAt }, first: ['cut', 'desc'], status: cuts.outcome };
const columns = {
  id: cuts.id, rail: rails.name, railId: cuts.railId, mark: railPrograms.mark, programId: cuts.programId, machine: machines.name, bit: bits.name, by: people.name,
  outcome: cuts.outcome, reason: cuts.reason, seconds: cuts.seconds, widths: cuts.widths, depths: cuts.depths, cutAt: cuts.cutAt,
};
const selectCuts = () => useDatabase().select(columns).from(cuts).innerJoin(rails, eq(rails.id, cuts.railId)).innerJoin(railPrograms, eq(railPrograms.id, cuts.programId))
  .innerJoin(machines, eq(machines.id, cuts.machineId)).innerJoin(bits, eq(bits.id, cuts.bitId)).innerJoin(people, eq(people.id, cuts.personId));

export async function listCuts(shopId: string, query: ListQuery) {
  const page = pageOf(SHAPE, shopId, query);
  const rows = await selectCuts().where(page.where).orderBy(...page.orderBy).limit(page.limit);
  return page.cut(rows, (row) => row.cutAt);
}

/** A rail's cuts, the newest first. */
export async function cutsOfRail(shopId: string, railId: string) {
  return await selectCuts().where(and(eq(cuts.shopId, shopId), eq(cuts.railId, railId))).orderBy(desc(cuts.cutAt)).limit(50);
}

/** First-off measurements made with a bit since it was put in (null: ever), with what each was drawn and programmed as: what a correction is worked out from. */
export async function firstOffsOf(shopId: string, bitId: string, since: Date | null) {
  return await useDatabase().select({ id: cuts.id, cutAt: cuts.cutAt, widths: cuts.widths, spec: railPrograms.spec, mark: railPrograms.mark })
    .from(cuts).innerJoin(railPrograms, eq(railPrograms.id, cuts.programId))
    .where(and(eq(cuts.shopId, shopId), eq(cuts.bitId, bitId), ne(cuts.widths, []), since ? gt(cuts.cutAt, since) : undefined)).orderBy(asc(cuts.cutAt));
}
