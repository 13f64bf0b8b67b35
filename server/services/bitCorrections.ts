import { and, desc, eq } from 'drizzle-orm';
import { z } from 'zod';
import { formatDecimal } from '#shared/measure/length';
import { objectError } from '#shared/measure/messages';
import { type BitCorrection, type WidthMeasured, bitCorrection } from '#shared/shop/bitCorrection';
import { wrong } from '#shared/shop/fields';
import { allOrNothing } from '../db/client';
import { bitCorrections, people } from '../db/schema';
import { useDatabase } from '../db/shop';
import { newId } from '../utils/newId';
import { findBit } from './bits';
import { firstOffsOf } from './cuts';
import { type Actor, deed } from './deeds';

type FoundBit = NonNullable<Awaited<ReturnType<typeof findBit>>>;

/** One width of a first-off, to be told apart from the others of its cut: `key` is the cut's id and the place on the slot. */
export interface KeptWidth extends WidthMeasured {
  readonly key: string;
  readonly mark: string;
  /** 1 is the slot's left end. */
  readonly place: number;
  readonly cutAt: Date;
}

/** What an owner accepts: which measurements the diameter stands on, so that it is worked out from what they saw. */
export const acceptSchema = z.strictObject({
  measurements: z.array(z.string(), { error: wrong('measurements', 'Say which ones the correction stands on.') }).max(2000, { error: 'There are more than 2000 measurements. Use 2000 or fewer.' }),
}, { error: objectError('measurements') });

/** Every width measured with a bit since it was put in, and what was accepted so far, the newest first. */
export async function correctionOf(shopId: string, id: string) {
  const bit = await findBit(shopId, id);
  if (!bit) return null;
  const cuts = await firstOffsOf(shopId, id, bit.replacedAt);
  const widths = cuts.flatMap(({ id: cut, mark, cutAt, widths: measured, spec }) => measured.map((measuredWidth, i): KeptWidth => ({
    key: `${cut}:${i + 1}`, mark, place: i + 1, cutAt, units: spec.units, drawnWidth: spec.width, programmedDiameter: spec.bitDiameter, measuredWidth,
  })));
  const history = await useDatabase()
    .select({ id: bitCorrections.id, units: bitCorrections.units, diameter: bitCorrections.diameter, spread: bitCorrections.spread, count: bitCorrections.count, acceptedBy: people.name, acceptedAt: bitCorrections.acceptedAt })
    .from(bitCorrections).innerJoin(people, eq(people.id, bitCorrections.acceptedBy))
    .where(and(eq(bitCorrections.shopId, shopId), eq(bitCorrections.bitId, id))).orderBy(desc(bitCorrections.acceptedAt));
  return { bit, widths, history, inUse: bit.correction?.id ?? null };
}

/**
 * Takes what some measurements say a bit cuts for its diameter: later programs are made for it.
 *
 * @returns what they say where that is no offer, or null where one of them is not there any more.
 */
export async function acceptCorrection(
  by: Actor, { bit, widths }: { readonly bit: FoundBit; readonly widths: readonly KeptWidth[] }, keys: readonly string[],
): Promise<BitCorrection | null> {
  const used = widths.filter(({ key }) => keys.includes(key));
  if (used.length !== new Set(keys).size) return null;
  const found = bitCorrection(bit.spec, used);
  const { result, diameter, spread, count } = found;
  if (result !== 'offer' || diameter === null) return found;
  const database = useDatabase();
  const { units } = bit.spec;
  await allOrNothing(database, [
    database.insert(bitCorrections).values({ id: newId(), shopId: by.shopId, bitId: bit.id, units, diameter, spread, count, acceptedBy: by.id, acceptedAt: new Date() }),
    deed(by, `took ${formatDecimal(diameter, units)} ${units} as what it cuts: bit`, bit.name),
  ]);
  return found;
}
