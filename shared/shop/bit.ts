import { z } from 'zod';
import { formatSize } from '../measure/length';
import { type Units, byUnits, convertLength } from '../measure/units';
import { BIT_KINDS, type SlotSpec } from '../slot/spec';
import { choiceField, chipLoadField, figureField, nameField, recordError, sizeField, yesNoField } from './fields';

/** Limits of what a bit's record takes, to catch a slip of units. */
const LIMITS = {
  /** From an engraving bit to the largest surfacing bit a router turns. */
  diameter: { least: { in: 0.01, mm: 0.25 }, most: { in: 4, mm: 100 } },
  length: { least: { in: 0.02, mm: 0.5 }, most: { in: 8, mm: 200 } },
  collet: { least: { in: 0.25, mm: 6 }, most: { in: 6, mm: 150 } },
} as const;

/** A bit this far off what is written on it is another bit: 0.03 in, 0.8 mm (common practice, no source). */
export const sameBit = (units: Units): number => byUnits(units, 0.03, 0.8);

const hair = (units: Units) => byUnits(units, 1e-9, 1e-8); // sums of decimals miss by a few units in the last binary place

function bitIn<const U extends Units>(units: U) {
  const size = (value: number) => formatSize(value, units);
  const diameter = (words: string) => sizeField(units, words, LIMITS.diameter);
  return z.strictObject({
    units: z.literal(units),
    name: nameField("the bit's name"),
    /** As written on it. */
    diameter: diameter('bit diameter'),
    /** By caliper or micrometer across the cutting edges; null: not measured. */
    measuredDiameter: diameter('measured diameter').nullable().default(null),
    flutes: figureField('flute count', 1, 8, 'flutes').int({ error: 'The flute count is no whole number. Use 1 to 8.' }),
    cuttingLength: sizeField(units, 'cutting length', LIMITS.length),
    kind: choiceField('bit kind', BIT_KINDS),
    /** Of a compression bit: from its tip to where the flutes turn and cut downward. Null on every other kind. */
    upcutLength: sizeField(units, 'up-cut length', LIMITS.length).nullable().default(null),
    /** Of the nut, the widest thing that comes down beside a clamp. */
    colletDiameter: sizeField(units, 'collet nut diameter', LIMITS.collet),
    /** Showing below the nut. */
    stickout: sizeField(units, 'stickout', LIMITS.length),
    centreCutting: yesNoField('centre cutting').default(false),
    /** The maker's own, least and most per tooth. */
    chipLoadRange: chipLoadField(units, 'chip load').nullable().default(null),
    /** The maker's own, rev/min. */
    topSpeed: figureField('top speed', 1000, 100_000, 'rev/min').nullable().default(null),
  }, { error: recordError('the bit as an object') })
    .superRefine((bit, context) => {
      const refuse = (when: boolean, field: string, message: () => string) => {
        if (when) context.addIssue({ code: 'custom', path: [field], message: message() });
      };
      const off = bit.measuredDiameter === null ? 0 : Math.abs(bit.measuredDiameter - bit.diameter);
      refuse(off > sameBit(units) + hair(units), 'measuredDiameter',
        () => `The measured diameter is ${size(bit.measuredDiameter ?? 0)} and the bit is a ${size(bit.diameter)}. Is it the right bit? Use a measure within ${size(sameBit(units))} of it.`);
      refuse(bit.stickout < bit.cuttingLength - hair(units), 'stickout',
        () => `With ${size(bit.stickout)} showing, the collet grips the flutes. Let ${size(bit.cuttingLength)} or more show.`); // common practice, no source
      refuse(bit.kind === 'compression' && bit.upcutLength === null, 'upcutLength',
        () => 'The up-cut length is missing. Measure from the tip to where the flutes turn.');
      refuse(bit.kind !== 'compression' && bit.upcutLength !== null, 'upcutLength',
        () => `The up-cut length is ${size(bit.upcutLength ?? 0)}. Only a compression bit has one: leave it out.`);
      refuse(bit.upcutLength !== null && bit.upcutLength >= bit.cuttingLength, 'upcutLength',
        () => `The up-cut length is ${size(bit.upcutLength ?? 0)}, all of the cutting length. Use less than ${size(bit.cuttingLength)}.`);
    });
}

/** A bit as it is entered or changed. Sizes are numbers in its units or the trade's notation. */
export const bitSchema = z.discriminatedUnion('units', [bitIn('in'), bitIn('mm')], { error: recordError('the bit as one object') });

export type Bit = z.output<typeof bitSchema>;
export type BitInput = z.input<typeof bitSchema>;

/** A bit that the shop keeps: with the effective diameter that its owner accepted from first-off measurements, if any. */
export type KeptBit = Bit & { readonly acceptedDiameter: number | null };

/** The diameter to program, in the bit's units: what it was found to cut, else what it measures, else what is written on it. */
export function diameterToUse(bit: Pick<KeptBit, 'diameter' | 'measuredDiameter' | 'acceptedDiameter'>): number {
  return bit.acceptedDiameter ?? bit.measuredDiameter ?? bit.diameter;
}

export const ADVICE_CODES = ['upcutFrays', 'downcutPacks', 'compressionFirstPass', 'compressionTooShallow'] as const;

/** One thing to know about a kind of bit in a slot. */
export interface BitAdvice {
  readonly code: (typeof ADVICE_CODES)[number];
  readonly message: string;
}

/**
 * What the bit's type means for a slot (common practice, no source): an up-cut bit lifts chips out and frays the lip,
 * a down-cut one leaves the lip clean and packs chips; of a compression bit only what stands above its up-cut part
 * presses the lip down, so that its first pass has to go deeper than that part.
 */
export function bitAdvice(bit: Pick<Bit, 'units' | 'kind' | 'upcutLength'>, slot: Pick<SlotSpec, 'units' | 'depth' | 'stepdown'>): BitAdvice[] {
  const size = (value: number) => formatSize(value, slot.units);
  if (bit.kind === 'upcut') {
    return [{ code: 'upcutFrays', message: 'An up-cut bit clears the chips and may fray the lip. Use a down-cut bit where the lip shows most, or sand it.' }];
  }
  if (bit.kind === 'downcut') {
    return [{ code: 'downcutPacks', message: 'A down-cut bit leaves a clean lip and packs chips in the slot. Keep the dust extraction close and the passes shallow.' }];
  }
  if (bit.kind !== 'compression' || bit.upcutLength === null) return [];
  const upcut = convertLength(bit.upcutLength, bit.units, slot.units);
  if (slot.depth <= upcut) {
    return [{ code: 'compressionTooShallow', message: `The slot is ${size(slot.depth)} deep and this compression bit cuts upward for ${size(upcut)}: its lip will fray. Use a down-cut bit.` }];
  }
  const first = slot.depth / Math.ceil(slot.depth / slot.stepdown - 1e-6); // passes are equal; 1e-6: 3 × 0.1 is not 0.3
  if (first > upcut) return [];
  return [{ code: 'compressionFirstPass', message: `The first pass is ${size(first)} deep and this compression bit cuts upward for ${size(upcut)}. Make the first pass deeper than that, or use a down-cut bit.` }];
}
