import { and, asc, desc, eq, isNull } from 'drizzle-orm';
import type { z } from 'zod';
import { staleOf } from '#shared/commission/inputs';
import { type Work, type workRevisionSchema, workSchema } from '#shared/commission/work';
import type { Stale, Step } from '#shared/piece/stale';
import { allOrNothing, isTaken } from '../db/client';
import { commissions, cuts, madeSteps, people, pieceRevisions, railPrograms, rails } from '../db/schema';
import { useDatabase } from '../db/shop';
import { newId } from '../utils/newId';
import { newestWork } from './commissions';
import { type Actor, deed } from './deeds';

/** Every revision of a commission's work, the newest first: who saved it and when. */
export async function workRevisions(shopId: string, commissionId: string) {
  return await useDatabase().select({ number: pieceRevisions.number, savedBy: people.name, savedAt: pieceRevisions.savedAt })
    .from(pieceRevisions).innerJoin(people, eq(people.id, pieceRevisions.savedBy))
    .where(and(eq(pieceRevisions.shopId, shopId), eq(pieceRevisions.commissionId, commissionId))).orderBy(desc(pieceRevisions.number));
}

/** Saves the work's next revision; null where somebody saved one meanwhile: nothing is overwritten. */
export async function saveWork(by: Actor, commission: { readonly id: string; readonly name: string }, { work, basedOn }: z.output<typeof workRevisionSchema>): Promise<number | null> {
  const database = useDatabase();
  const newest = await newestWork(by.shopId, commission.id);
  if (basedOn !== (newest?.number ?? 0)) return null;
  const [number, now] = [basedOn + 1, new Date()];
  try {
    await allOrNothing(database, [
      database.insert(pieceRevisions).values({ id: newId(), shopId: by.shopId, commissionId: commission.id, number, work: work.input, savedBy: by.id, savedAt: now }),
      database.update(commissions).set({ updatedAt: now }).where(and(eq(commissions.shopId, by.shopId), eq(commissions.id, commission.id))),
      deed(by, `saved revision ${number} of commission`, commission.name),
    ]);
  } catch (error) {
    if (isTaken(error)) return null;
    throw error;
  }
  return number;
}

/** The write that notes that a step was made from a revision. */
export const made = (by: Actor, commissionId: string, step: Step, revision: number) =>
  useDatabase().insert(madeSteps).values({ shopId: by.shopId, commissionId, step, revision, madeBy: by.id, madeAt: new Date() });

/** Notes that somebody worked from a step as it stands. */
export async function makeStep(by: Actor, commission: { readonly id: string; readonly name: string; readonly revision: number }, step: Step): Promise<void> {
  await allOrNothing(useDatabase(), [made(by, commission.id, step, commission.revision), deed(by, `took the ${step === 'cutList' ? 'cut list' : 'assembly sheet'} of commission`, commission.name)]);
}

/** The newest making of each step. */
async function madeOf(shopId: string, commissionId: string) {
  const rows = await useDatabase().select({ step: madeSteps.step, revision: madeSteps.revision, by: people.name, at: madeSteps.madeAt })
    .from(madeSteps).innerJoin(people, eq(people.id, madeSteps.madeBy))
    .where(and(eq(madeSteps.shopId, shopId), eq(madeSteps.commissionId, commissionId))).orderBy(asc(madeSteps.id));
  return [...new Map(rows.map((row) => [row.step, row])).values()];
}

/** A piece's rails in order, each with its newest program and how many are cut well. */
export async function railsOf(shopId: string, commissionId: string) {
  const database = useDatabase();
  const mine = and(eq(rails.shopId, shopId), eq(rails.commissionId, commissionId), isNull(rails.archivedAt));
  const rows = await database.select({ id: rails.id, label: rails.label, name: rails.name, status: rails.status, revision: rails.revision, quantity: rails.quantity }).from(rails).where(mine).orderBy(asc(rails.label));
  const programs = await database.select({ railId: railPrograms.railId, mark: railPrograms.mark, revision: railPrograms.revision }).from(railPrograms)
    .innerJoin(rails, eq(rails.id, railPrograms.railId)).where(mine).orderBy(asc(railPrograms.madeAt), asc(railPrograms.id));
  const newest = new Map(programs.map((program) => [program.railId, program]));
  const well = await database.select({ railId: cuts.railId, revision: railPrograms.revision }).from(cuts).innerJoin(railPrograms, eq(railPrograms.id, cuts.programId))
    .innerJoin(rails, eq(rails.id, cuts.railId)).where(and(mine, eq(cuts.outcome, 'well')));
  return rows.map((rail) => {
    const program = newest.get(rail.id);
    return { ...rail, program: program ? { mark: program.mark, revision: program.revision } : null, cutWell: well.filter(({ railId, revision }) => railId === rail.id && revision === rail.revision).length };
  });
}

/** What was made of a commission, when and by whom, and what of it is stale and why. */
export async function staleness(shopId: string, commissionId: string): Promise<{ readonly made: Awaited<ReturnType<typeof madeOf>>; readonly stale: readonly Stale[] }> {
  const [steps, revisions, programmed] = [await madeOf(shopId, commissionId), await worksOf(shopId, commissionId), await railsOf(shopId, commissionId)];
  const now = revisions.get(Math.max(0, ...revisions.keys()));
  if (!now) return { made: steps, stale: [] };
  const from: Partial<Record<Step, Work>> = {};
  for (const { step, revision } of steps) {
    const work = revisions.get(revision);
    if (work) from[step] = work;
  }
  if (from.rails && programmed.some(({ program }) => program !== null)) from.programs = from.rails;
  const stale = staleOf(from, now);
  // A rail may be newer than its program though the piece is the same.
  const older = programmed.some(({ program, revision }) => program !== null && program.revision < revision);
  return { made: steps, stale: older && stale.every(({ step }) => step !== 'programs') ? [...stale, { step: 'programs', because: ['rails'] }] : stale };
}

/** The works that something was made from, and the newest, by their numbers. One that no longer reads is left out. */
async function worksOf(shopId: string, commissionId: string): Promise<Map<number, Work>> {
  const rows = await useDatabase().select({ number: pieceRevisions.number, work: pieceRevisions.work }).from(pieceRevisions)
    .where(and(eq(pieceRevisions.shopId, shopId), eq(pieceRevisions.commissionId, commissionId)));
  return new Map(rows.flatMap(({ number, work }) => {
    const judged = workSchema.safeParse(work);
    return judged.success ? [[number, judged.data] as const] : [];
  }));
}
