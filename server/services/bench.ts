import { type SQL, and, desc, eq, gte, isNull, sql } from 'drizzle-orm';
import type { BenchDay, BenchProgram, BenchRail } from '#shared/shop/bench';
import { queueOrder } from '#shared/shop/queue';
import { cuts, railPrograms, rails } from '../db/schema';
import { useDatabase } from '../db/shop';

/** What was cut is shown this long: the bench itself says which of it was today, by its own clock. */
const SHOWN = 24 * 60 * 60_000; // ms
/** Rails of one day: above what any machine cuts in one. */
const MOST = 100;

type ProgramRow = typeof railPrograms.$inferSelect;

/** The program that a rail is cut by: of its newest revision that has one, the newest. */
const newestOf = (shopId: SQL | string, railId: SQL | typeof rails.id | string): SQL =>
  sql`(select id from ${railPrograms} as newest where newest.shop_id = ${shopId} and newest.rail_id = ${railId} order by newest.revision desc, newest.made_at desc limit 1)`;

/** A kept program without what the bench does not need; none is kept that disagreed with its drawing. */
function benchProgram({ id, mark, fileName, text, sha256, revision, spec, summary, readback, machine, bit, holding }: ProgramRow): BenchProgram {
  const cautions = readback.findings.filter(({ severity }) => severity === 'caution');
  return { id, mark, fileName, text, sha256, revision, spec, summary, cautions, machine, bit, holding: machine.holdings[holding] ?? null };
}

/** A rail's newest program, or null. */
export async function newestProgram(shopId: string, railId: string): Promise<BenchProgram | null> {
  const [row] = await useDatabase().select().from(railPrograms).where(and(eq(railPrograms.shopId, shopId), sql`${railPrograms.id} = ${newestOf(shopId, railId)}`));
  return row ? benchProgram(row) : null;
}

/** A shop's day at the bench: what is ready and still to cut, what was cut, and what waits for a new program. */
export async function benchToday(shopId: string, now: Date): Promise<BenchDay> {
  const database = useDatabase();
  const waiting = (status: 'ready' | 'draft') => and(eq(rails.shopId, shopId), eq(rails.status, status), isNull(rails.archivedAt));
  const newest = sql`${railPrograms.id} = ${newestOf(sql`${rails.shopId}`, rails.id)}`;
  const counted = (outcome: string) => sql<number>`(select count(*) from ${cuts} as done where done.rail_id = ${rails.id} and done.outcome = ${outcome})`.mapWith(Number);

  const rows = await database.select({ rail: rails, program: railPrograms, cutWell: counted('well'), spoiled: counted('spoiled') })
    .from(rails).innerJoin(railPrograms, newest).where(waiting('ready')).limit(MOST);
  const changed = await database.select({ id: rails.id, name: rails.name, programId: railPrograms.id, mark: railPrograms.mark })
    .from(rails).innerJoin(railPrograms, newest).where(waiting('draft')).limit(MOST);
  const done = await database.select({ cut: cuts, rail: rails.name, mark: railPrograms.mark, spec: railPrograms.spec })
    .from(cuts).innerJoin(rails, eq(rails.id, cuts.railId)).innerJoin(railPrograms, eq(railPrograms.id, cuts.programId))
    .where(and(eq(cuts.shopId, shopId), gte(cuts.cutAt, new Date(now.getTime() - SHOWN)))).orderBy(desc(cuts.cutAt)).limit(MOST);
  const last = done[0];

  const queue = rows.map(({ rail, program }) => ({ id: rail.id, name: rail.name, bit: program.bitId, wood: program.spec.wood, due: rail.due }));
  const order = queueOrder(queue, last ? { bit: last.cut.bitId, wood: last.spec.wood } : null);
  return {
    rails: order.flatMap(({ id }) => rows.filter(({ rail }) => rail.id === id).map(({ rail, program, cutWell, spoiled }): BenchRail => (
      { id, name: rail.name, due: rail.due, quantity: rail.quantity, cutWell, spoiled, revision: rail.revision, program: benchProgram(program) }
    ))),
    cuts: done.map(({ cut, rail, mark, spec }) => (
      { id: cut.id, railId: cut.railId, rail, mark, outcome: cut.outcome, reason: cut.reason, cutAt: cut.cutAt.toISOString(), spec }
    )).reverse(),
    changed,
  };
}
