import { and, desc, eq, gt, sum } from 'drizzle-orm';
import type { KeptBit } from '#shared/shop/bit';
import { convertLength } from '#shared/measure/units';
import { bitCorrections, bitReplacements, cuts } from '../db/schema';
import { allOrNothing } from '../db/client';
import { useDatabase } from '../db/shop';
import { newId } from '../utils/newId';
import { type Actor, deed } from './deeds';
import { shopBits } from './records';

/** Since when the bit in the collet is this one; the beginning where it was never replaced. */
async function since(shopId: string, bitId: string): Promise<Date> {
  const [last] = await useDatabase().select({ at: bitReplacements.at }).from(bitReplacements)
    .where(and(eq(bitReplacements.shopId, shopId), eq(bitReplacements.bitId, bitId))).orderBy(desc(bitReplacements.at)).limit(1);
  return last?.at ?? new Date(0);
}

/** A bit with what it was found to cut and how long it has cut, or null. */
export async function findBit(shopId: string, id: string) {
  const row = await shopBits.find(shopId, id);
  if (!row) return null;
  const start = await since(shopId, id);
  const [correction] = await useDatabase().select().from(bitCorrections)
    .where(and(eq(bitCorrections.shopId, shopId), eq(bitCorrections.bitId, id), gt(bitCorrections.acceptedAt, start))).orderBy(desc(bitCorrections.acceptedAt)).limit(1);
  const [cutting] = await useDatabase().select({ seconds: sum(cuts.seconds).mapWith(Number) }).from(cuts)
    .where(and(eq(cuts.shopId, shopId), eq(cuts.bitId, id), gt(cuts.cutAt, start)));
  const acceptedDiameter = correction ? convertLength(correction.diameter, correction.units, row.spec.units) : null;
  const spec: KeptBit = { ...row.spec, acceptedDiameter };
  return { ...row, spec, correction: correction ?? null, minutes: (cutting?.seconds ?? 0) / 60, replacedAt: start.getTime() > 0 ? start : null };
}

/** Notes that a new bit of the same kind is in use: minutes and corrections begin again. */
export async function replaceBit(by: Actor, bit: { readonly id: string; readonly name: string }): Promise<void> {
  const database = useDatabase();
  await allOrNothing(database, [
    database.insert(bitReplacements).values({ id: newId(), shopId: by.shopId, bitId: bit.id, replacedBy: by.id, at: new Date() }),
    deed(by, 'replaced bit', bit.name),
  ]);
}
