import { z } from 'zod';
import { assert } from '../assert';
import { objectError } from '../measure/messages';
import { type Units, byUnits } from '../measure/units';
import type { SlotSpec } from '../slot/spec';
import { recordError, sizeField } from './fields';

/** Measured at the slot's left end, in its middle and at its right end. */
export type ThreePlaces = readonly [number, number, number];

/** A slot this near its drawing is carried on with: 0.005 in, 0.12 mm, what a bit is ground to (common practice, no source). */
export const firstOffTolerance = (units: Units): number => byUnits(units, 0.005, 0.12);

/** From an engraved line to the largest slot anyone routes; zero is no measure. */
const MEASURE = { least: { in: 0.005, mm: 0.1 }, most: { in: 120, mm: 3050 } } as const;

function firstOffIn<const U extends Units>(units: U) {
  const three = (words: string) => z.tuple([
    sizeField(units, `${words} at the left end`, MEASURE), sizeField(units, `${words} in the middle`, MEASURE), sizeField(units, `${words} at the right end`, MEASURE),
  ], { error: objectError(`the ${words} at three places, from left to right`) });
  return z.strictObject({ units: z.literal(units), widths: three('measured width'), depths: three('measured depth') }, { error: recordError('the first-off as an object') });
}

/** First-off measurements as they are keyed in: numbers in `units`, or the trade's notation; from left to right. */
export const firstOffSchema = z.discriminatedUnion('units', [firstOffIn('in'), firstOffIn('mm')], { error: recordError('the first-off as one object') });
export type FirstOff = z.output<typeof firstOffSchema>;

export const FIRST_OFF_CODES = ['within', 'tooWide', 'tooNarrow', 'tooDeep', 'tooShallow'] as const;
export type FirstOffCode = (typeof FIRST_OFF_CODES)[number];

/** One size, measured against the drawing; lengths in the drawing's units. */
export interface FirstOffReading {
  readonly code: FirstOffCode;
  readonly drawn: number;
  readonly measured: ThreePlaces;
  /** Measured less drawn at the place furthest off. */
  readonly worst: number;
  /** Greatest less least. */
  readonly spread: number;
  readonly sentence: string;
  /** What to look at first; null where nothing is wrong. */
  readonly cure: string | null;
}

export interface FirstOffVerdict {
  readonly within: boolean;
  /** One line for the bench: the verdict of both sizes, the width first. */
  readonly sentence: string;
  readonly width: FirstOffReading;
  readonly depth: FirstOffReading;
}

/** Thousandths of an inch are read bare at the bench; millimetres carry their unit. */
const spoken = (value: number, units: Units) => (units === 'in' ? value.toFixed(3) : `${Number(value.toFixed(2))} mm`);

type Fault = Exclude<FirstOffCode, 'within'>;
const WORDS: Readonly<Record<Fault, string>> = { tooWide: 'too wide', tooNarrow: 'too narrow', tooDeep: 'too deep', tooShallow: 'too shallow' };
const CURES: Readonly<Record<Fault, string>> = {
  tooWide: 'The bit cuts wider than the program takes it for. Take the figures over as a correction, or fit the right bit.',
  tooNarrow: 'The bit cuts narrower than the program takes it for. Take the figures over as a correction, or fit the right bit.',
  tooDeep: "Zero Z again on the rail's top, with the paper's thickness set.",
  tooShallow: "Zero Z again on the rail's top, with the paper's thickness set, and run the program again.",
};

function read(drawn: number, measured: ThreePlaces, units: Units, over: Fault, under: Fault, why: string): FirstOffReading {
  assert(measured.every(Number.isFinite), 'three places measured');
  const worst = measured.reduce((most, value) => (Math.abs(value - drawn) > Math.abs(most) ? value - drawn : most), 0);
  const spread = Math.max(...measured) - Math.min(...measured);
  const tolerance = firstOffTolerance(units);
  const slack = byUnits(units, 1e-9, 1e-8); // 0.38 - 0.375 is 0.0050000000000000044
  if (Math.abs(worst) <= tolerance + slack) {
    return { code: 'within', drawn, measured, worst, spread, sentence: `Within ${spoken(tolerance, units)}. Carry on.`, cure: null };
  }
  const code = worst > 0 ? over : under;
  // Places that differ by more than the tolerance among themselves are no matter of bit or zero.
  const uneven = spread > tolerance + slack;
  const cure = uneven ? `The places differ by ${spoken(spread, units)}. ${unevenCure(over)}` : CURES[code];
  return { code, drawn, measured, worst, spread, sentence: `Stop. ${spoken(Math.abs(worst), units)} ${WORDS[code]}${why}.`, cure };
}

const unevenCure = (over: Fault) =>
  over === 'tooWide' ? 'See that the rail cannot shift and the bit sits tight in its collet.' : 'See that the rail lies flat, with support under its middle.';

/** What the first-off says: carry on, or stop and by how much. Spec and measurements in the spec's units. */
export function firstOffVerdict(spec: Pick<SlotSpec, 'units' | 'width' | 'depth'>, widths: ThreePlaces, depths: ThreePlaces): FirstOffVerdict {
  const width = read(spec.width, widths, spec.units, 'tooWide', 'tooNarrow', ' for these coins');
  const depth = read(spec.depth, depths, spec.units, 'tooDeep', 'tooShallow', '');
  const wrong = [width, depth].filter(({ code }) => code !== 'within');
  const sentence = wrong.length === 0 ? width.sentence : wrong.map((reading) => reading.sentence).join(' ');
  return { within: wrong.length === 0, sentence, width, depth };
}
