import { and, desc, eq } from 'drizzle-orm';
import type { MadeProgram } from '#shared/makeProgram';
import type { CutWith } from '#shared/shop/forMachine';
import type { ListQuery } from '#shared/shop/list';
import type { CutWithInput } from '#shared/shop/rail';
import { type RailStatus, moveRail } from '#shared/shop/railStatus';
import { allOrNothing } from '../db/client';
import { people, railPrograms, rails } from '../db/schema';
import { useDatabase } from '../db/shop';
import { newId } from '../utils/newId';
import { findBit } from './bits';
import { type Actor, deed } from './deeds';
import { type ListShape, pageOf } from './lists';
import { shopMachines, shopWoods } from './records';

type GoodProgram = Extract<MadeProgram, { readonly ok: true }>;

/** The shop's records that a program is to be made with, or the name of the field that names none of them. */
export async function recordsFor(shopId: string, { machineId, bitId, holding, woodId }: CutWithInput): Promise<CutWith | { readonly missing: keyof CutWithInput }> {
  const machine = await shopMachines.find(shopId, machineId);
  if (!machine) return { missing: 'machineId' };
  const bit = await findBit(shopId, bitId);
  if (!bit) return { missing: 'bitId' };
  const held = machine.spec.holdings[holding];
  if (!held) return { missing: 'holding' };
  const wood = woodId === null ? null : await shopWoods.find(shopId, woodId);
  if (woodId !== null && !wood) return { missing: 'woodId' };
  return { machine: machine.spec, bit: bit.spec, holding: held, wood: wood?.spec ?? null };
}

/** Keeps a rail's program with everything it was made from; the rail is ready to be cut. The same text again is the same program. */
export async function keepRailProgram(
  by: Actor, rail: { readonly id: string; readonly name: string; readonly revision: number; readonly status: RailStatus }, made: GoodProgram, chosen: CutWithInput, { machine, bit }: CutWith,
): Promise<string> {
  const database = useDatabase();
  const [before] = await database.select({ id: railPrograms.id }).from(railPrograms)
    .where(and(eq(railPrograms.railId, rail.id), eq(railPrograms.revision, rail.revision), eq(railPrograms.sha256, made.sha256), eq(railPrograms.machineId, chosen.machineId), eq(railPrograms.bitId, chosen.bitId)));
  if (before) return before.id;
  const id = newId();
  const moved = moveRail(rail.status, 'programMade');
  const { mark, sha256, fileName, program, spec, readback, summary } = made;
  await allOrNothing(database, [
    database.insert(railPrograms).values({
      id, shopId: by.shopId, railId: rail.id, revision: rail.revision, machineId: chosen.machineId, bitId: chosen.bitId, mark, sha256, fileName, text: program,
      spec, machine, bit, holding: chosen.holding, readback, summary, madeBy: by.id, madeAt: new Date(),
    }),
    database.update(rails).set({ status: moved.ok ? moved.status : rail.status, updatedAt: new Date() }).where(and(eq(rails.shopId, by.shopId), eq(rails.id, rail.id))),
    deed(by, `made program ${mark} for rail`, rail.name),
  ]);
  return id;
}

const SHAPE: ListShape = {
  id: railPrograms.id, shopId: railPrograms.shopId, sorts: { made: railPrograms.madeAt, mark: railPrograms.mark }, first: ['made', 'desc'], search: railPrograms.mark,
};
const columns = {
  id: railPrograms.id, mark: railPrograms.mark, fileName: railPrograms.fileName, rail: rails.name, railId: railPrograms.railId, revision: railPrograms.revision,
  newest: rails.revision, madeBy: people.name, madeAt: railPrograms.madeAt,
};

const selectBrief = () => useDatabase().select(columns).from(railPrograms)
  .innerJoin(rails, eq(rails.id, railPrograms.railId)).innerJoin(people, eq(people.id, railPrograms.madeBy));

/** A mark's beginning as typed (`k74q`, `k74 q`) in the form that marks are kept in: `K74-Q`. */
function markBeginning(typed: string): string {
  const letters = typed.toUpperCase().replace(/[\s-]/g, '');
  return letters.length > 3 ? `${letters.slice(0, 3)}-${letters.slice(3)}` : letters;
}

/** The shop's programs; `newest` above `revision` means that the rail was changed since. */
export async function listRailPrograms(shopId: string, query: ListQuery) {
  const page = pageOf(SHAPE, shopId, { ...query, q: markBeginning(query.q) });
  const rows = await selectBrief().where(page.where).orderBy(...page.orderBy).limit(page.limit);
  return page.cut(rows, (row, sort) => (sort === 'mark' ? row.mark : row.madeAt));
}

/** A rail's programs, the newest first. */
export async function programsOfRail(shopId: string, railId: string) {
  return await selectBrief().where(and(eq(railPrograms.shopId, shopId), eq(railPrograms.railId, railId))).orderBy(desc(railPrograms.madeAt)).limit(50);
}

/** One program with its text and all it was made from, or null. */
export async function findRailProgram(shopId: string, id: string) {
  const [found] = await useDatabase().select({ program: railPrograms, rail: { name: rails.name, newest: rails.revision }, madeBy: people.name })
    .from(railPrograms).innerJoin(rails, eq(rails.id, railPrograms.railId)).innerJoin(people, eq(people.id, railPrograms.madeBy))
    .where(and(eq(railPrograms.shopId, shopId), eq(railPrograms.id, id)));
  return found ? { ...found.program, rail: found.rail.name, newest: found.rail.newest, madeBy: found.madeBy } : null;
}
