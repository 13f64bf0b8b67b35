import fc from 'fast-check';
import type { JudgedSpec } from './soundCut/types';

/**
 * Random slots that a shop could ask for, as the JSON a person posts. Every bound is the issue's; where it gives none
 * ("walls too thin", "too thin a floor") a comfortable one is taken, since refusals have their own tests.
 */
export type RawSpec = JudgedSpec & {
  readonly railThickness?: number;
  readonly name?: string;
  readonly flutes?: number;
  readonly stickout?: number;
};

type Units = RawSpec['units'];

const BITS = { in: [0.125, 0.1875, 0.25, 0.3125, 0.375, 0.5], mm: [3, 3.175, 4, 6, 6.35, 8, 10, 12, 12.7] };
/** Same wood in both units: 2 to 36 in long, margins from 1/4 in, at least 1/8 in of floor, no size under 0.01 in. */
const SIZES = {
  in: { shortest: 2, longest: 36, leastMargin: 0.25, mostMargin: 3, floor: 0.125, thickness: 0.75, near: 0.005, decimals: 4, least: 0.01 },
  mm: { shortest: 50, longest: 914, leastMargin: 6.5, mostMargin: 76, floor: 3.2, thickness: 19, near: 0.12, decimals: 4, least: 0.26 },
};

/** A number as a person writes it: a round one (1/16 in, whole mm) or an awkward one with all its decimals. */
function written(value: number, units: Units, round: boolean): number {
  if (round) return units === 'in' ? Math.round(value * 16) / 16 : Math.round(value);
  return Number(value.toFixed(SIZES[units].decimals));
}

/** `written`, but never less or never more than the value. */
function atLeast(value: number, units: Units, round: boolean): number {
  const near = written(value, units, round);
  const step = round ? (units === 'in' ? 1 / 16 : 1) : 10 ** -SIZES[units].decimals;
  return near >= value ? near : Number((near + step).toFixed(SIZES[units].decimals));
}

/** Evenly spread: fast-check's doubles crowd at 0 and 1. */
function share(): fc.Arbitrary<number> {
  return fc.integer({ min: 0, max: 10_000 }).map(part => part / 10_000);
}

/** The numbers a slot is made of, as shares of the room each has; a spec follows from them by plain arithmetic. */
const drawn = fc.record({
  bit: fc.nat(),
  /** Bits across: one in four a one-bit slot, one in three up to two bits, the rest up to six. */
  across: fc.oneof(
    { weight: 3, arbitrary: fc.constant('one' as const) },
    { weight: 4, arbitrary: fc.constant('two' as const) },
    { weight: 5, arbitrary: fc.constant('more' as const) },
  ),
  acrossShare: share(),
  length: share(),
  passes: fc.integer({ min: 1, max: 6 }),
  stepdown: share(),
  lastPass: share(),
  margin: share(),
  wall: share(),
  round: fc.boolean(),
});

type Drawn = typeof drawn extends fc.Arbitrary<infer T> ? T : never;

function required(units: Units, of: Drawn): RawSpec {
  const sizes = SIZES[units];
  const round = of.round;
  const bitDiameter = BITS[units][of.bit % BITS[units].length] ?? 6;
  const width = widthOf(units, of, bitDiameter);
  const shortest = Math.max(sizes.shortest, width + bitDiameter);
  const length = Math.min(sizes.longest, atLeast(shortest + of.length * (sizes.longest - shortest), units, round));
  // Half the bit's diameter at most (FACTS B2, light machines), a tenth of it at least.
  const stepdown = Math.floor(bitDiameter * (0.1 + 0.4 * of.stepdown) * 1000 + 1e-6) / 1000; // 1e-6: 0.3 × 1000 in binary
  const depth = Number(Math.max(sizes.least, stepdown * (of.passes - 0.95 * of.lastPass)).toFixed(round ? 3 : sizes.decimals));
  const stopMargin = atLeast(sizes.leastMargin + of.margin * (sizes.mostMargin - sizes.leastMargin), units, round);
  // Walls at least as thick as the slot is deep, or 1/4 in.
  const wall = Math.max(sizes.leastMargin, depth) * (1 + 2 * of.wall);
  const railWidth = atLeast(width + 2 * wall, units, round);
  const thin = sizes.thickness - sizes.floor;
  const railThickness = depth > thin ? { railThickness: atLeast(depth + 2 * sizes.floor, units, true) } : {};
  // The bit has to reach the floor and the nut has to pass the clamps, whatever the defaults are.
  const reach = atLeast(Math.max(depth + sizes.floor, 2 * bitDiameter), units, true);
  const clampHeight = units === 'in' ? 0.5 : 12; // the default
  const long = { cuttingLength: reach, stickout: atLeast(reach + clampHeight + sizes.floor, units, true) };
  return { units, length, width, depth, stopMargin, bitDiameter, stepdown, railWidth, ...railThickness, ...long };
}

function widthOf(units: Units, of: Drawn, bit: number): number {
  const { near, decimals } = SIZES[units];
  const grid = 10 ** -decimals;
  if (of.across === 'one') {
    const off = of.round ? 0 : (2 * of.acrossShare - 1) * near;
    return Number((bit + off).toFixed(decimals));
  }
  const least = bit + near + 2 * grid;
  const most = of.across === 'two' ? 2 * bit : 6 * bit;
  const from = of.across === 'two' ? least : 2 * bit;
  const width = written(from + of.acrossShare * (most - from), units, of.round);
  return width <= least || width > most ? Number((from + of.acrossShare * (most - from)).toFixed(decimals)) : width;
}

/** The JSON a person would post: every required field, and some of the optional ones. */
export function rawSpecArbitrary(units: Units): fc.Arbitrary<RawSpec> {
  const optional = fc.record({
    ends: fc.constantFrom('cornered' as const, 'round' as const),
    workZero: fc.constantFrom('corner' as const, 'centre' as const),
    spindle: fc.constantFrom('program' as const, 'hand' as const),
    direction: fc.constantFrom('climb' as const, 'conventional' as const),
    rampAngle: fc.constantFrom(1.5, 2, 3, 5),
    stepover: fc.constantFrom(0.25, 0.4, 0.45, 0.5),
    flutes: fc.constantFrom(1, 2, 3),
    name: fc.constantFrom('A', 'Rail B, Founders', 'Squad (front) 100% ; N10 G0'),
  }, { requiredKeys: [] });
  const finish = fc.option(share(), { nil: null });
  return fc.tuple(drawn, optional, finish).map(([of, chosen, part]) => {
    const spec = required(units, of);
    const room = (spec.width - spec.bitDiameter) / 2;
    if (part === null || of.across === 'one') return { ...spec, ...chosen };
    // 0.1 to 0.5 mm is common (FACTS B3); a narrow slot has less room.
    const most = Math.min(room, units === 'in' ? 0.02 : 0.5);
    const finishAllowance = Math.floor(most * (0.2 + 0.8 * part) * 1e4) / 1e4;
    return finishAllowance > 0 ? { ...spec, ...chosen, finishAllowance } : { ...spec, ...chosen };
  });
}

/**
 * The cut-length table's distribution (issue, "The plan"): between one and two bits wide, no finish lap, length
 * 2 to 36 in, bit 1/8 to 1/2 in, 1 to 6 passes.
 */
export const benchSpecArbitrary: fc.Arbitrary<RawSpec> = fc.noBias(fc.tuple(drawn, fc.constantFrom('cornered' as const, 'round' as const)))
  .map(([of, ends]) => ({ ...required('in', { ...of, across: 'two', round: false }), ends }));
