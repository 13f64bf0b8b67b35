import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { eq } from 'drizzle-orm';
import { assert } from '#shared/assert';
import { workRevisionSchema } from '#shared/commission/work';
import { makeProgram } from '#shared/makeProgram';
import { bitSchema } from '#shared/shop/bit';
import { prepareRail } from '#shared/shop/forMachine';
import { machineSchema } from '#shared/shop/machine';
import { railSchema } from '#shared/shop/rail';
import { allOrNothing } from '../db/client';
import { people, shops } from '../db/schema';
import { useDatabase } from '../db/shop';
import { changeCommission, createCommission, findCommission } from '../services/commissions';
import type { Actor } from '../services/deeds';
import { made, saveWork } from '../services/pieceRevisions';
import { keepRailProgram, recordsFor } from '../services/railPrograms';
import { findRail, newRail } from '../services/rails';
import { shopBits, shopMachines } from '../services/records';
import { newId } from '../utils/newId';
import { DEMO_BITS, DEMO_COMMISSIONS, DEMO_MACHINE, DEMO_PEOPLE, DEMO_RAILS, DEMO_SHOP } from './scenario';

/** Passwords made for this installation, for `npm start` to print; readable by its owner alone. */
export const SIGN_INS = 'demo-sign-ins.json';

const DAY = 24 * 60 * 60_000; // ms

/** Fills an empty installation with the invented shop, once. */
export async function seedDemo(folder: string): Promise<void> {
  const file = join(folder, SIGN_INS);
  const database = useDatabase();
  if (existsSync(file) && (await database.select({ id: shops.id }).from(shops).limit(1)).length > 0) return;
  const before: unknown = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null;
  assert(before === null, `${SIGN_INS} stands in the data folder without its shop: take it away to begin again`);

  const [shopId, now] = [newId(), new Date()];
  const signIns = DEMO_PEOPLE.map((person) => ({ ...person, id: newId(), password: `${randomBytes(6).toString('base64url')}-demo` }));
  const rows = await Promise.all(signIns.map(async ({ password, ...person }) => ({ ...person, shopId, passwordHash: await hashPassword(password), createdAt: now })));
  await allOrNothing(database, [database.insert(shops).values({ id: shopId, name: DEMO_SHOP, demo: true, createdAt: now }), database.insert(people).values(rows)]);
  writeFileSync(file, JSON.stringify(signIns.map(({ role, email, password }) => ({ role, email, password }))), { mode: 0o600 });
  const owner = { id: signIns[0]?.id ?? '', shopId };

  const machineId = await shopMachines.create(owner, machineSchema.parse(DEMO_MACHINE));
  const bitIds: string[] = [];
  for (const bit of DEMO_BITS) bitIds.push(await shopBits.create(owner, bitSchema.parse(bit)));
  const chosen = { machineId, bitId: bitIds[0] ?? '', holding: 2, woodId: null };
  const records = await recordsFor(shopId, chosen);
  assert(!('missing' in records), 'the demo has its machine and its bits');
  const commissionIds = await seedCommissions(owner, now);
  for (const { request, quantity, dueIn, program, of: [place, label] } of DEMO_RAILS) {
    const drawn = newRail(owner, railSchema.parse({ request, quantity, due: dayFrom(now, dueIn) }), { commissionId: commissionIds[place] ?? '', label });
    await allOrNothing(database, drawn.writes);
    const rail = await findRail(shopId, drawn.id);
    if (!program || !rail) continue;
    const prepared = prepareRail(request, records);
    assert(prepared.ok, `the demo's rails can be cut: ${prepared.ok ? '' : JSON.stringify(prepared.problems)}`);
    const made = makeProgram(prepared.request);
    assert(made.ok, "the demo's programs agree with their drawings");
    await keepRailProgram(owner, rail, made, chosen, records);
  }
}

const dayFrom = (now: Date, days: number) => new Date(now.getTime() + days * DAY).toISOString().slice(0, 10);

/** The demo's commissions with their pieces, moved to where they stand; their rails count as made. */
async function seedCommissions(owner: Actor, now: Date): Promise<string[]> {
  const ids: string[] = [];
  for (const { asked, dueIn, stages: [first, ...later], work } of DEMO_COMMISSIONS) {
    const id = await createCommission(owner, { ...asked, due: dayFrom(now, dueIn) }, dayFrom(now, first?.[1] ?? 0));
    for (const [stage, day] of later) {
      const commission = await findCommission(owner.shopId, id);
      assert(commission, 'the demo has its commissions');
      await changeCommission(owner, commission, { stage }, dayFrom(now, day));
    }
    assert(await saveWork(owner, { id, name: asked.name }, workRevisionSchema.parse({ work, basedOn: 0 })) === 1, "the demo's pieces are saved once");
    await allOrNothing(useDatabase(), [made(owner, id, 'rails', 1)]);
    ids.push(id);
  }
  return ids;
}

/** Live mode takes no folder that a demo has filled: its people's passwords were printed. */
export async function refuseDemoData(folder: string): Promise<void> {
  const demo = existsSync(join(folder, SIGN_INS)) || (await useDatabase().select({ id: shops.id }).from(shops).where(eq(shops.demo, true)).limit(1)).length > 0;
  assert(!demo, 'this data folder was filled by the demo, whose passwords were printed; give TALLYRAIL_DATA another one, or set TALLYRAIL_DEMO=1');
}
