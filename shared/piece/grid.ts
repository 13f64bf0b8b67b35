import { type Units, byUnits } from '../measure/units';
import type { Load } from './packing';

/** A rail as coins are told of it: how long its groove is, and which kinds stand in it (null: any). */
export interface RailRoom {
  readonly name: string;
  readonly length: number;
  readonly takes: readonly string[] | null;
}

/** A kind to be placed: the coins that are here, and places kept for coins to come. */
export interface KindToPlace {
  readonly name: string;
  readonly diameter: number;
  readonly count: number;
  readonly toCome: number;
}

/** Whole steps in one unit of length: a ten-thousandth of an inch, a thousandth of a millimetre; finer is not measured. */
const STEPS: Readonly<Record<Units, number>> = { in: 10_000, mm: 1000 };
/** Decimals that miss their step by a few binary places are that step. */
const HAIR = 1e-6;

/** A length in whole steps: coins and gaps upwards, grooves downwards, so that what fits in steps fits. */
export const stepsUp = (length: number, units: Units) => Math.ceil(length * STEPS[units] - HAIR);
export const stepsDown = (length: number, units: Units) => Math.floor(length * STEPS[units] + HAIR);
export const inLength = (steps: number, units: Units) => steps / STEPS[units];

/**
 * Rails and kinds as rooms and costs. n coins want Σ D + (n + 1) g: a gap between neighbours and at both groove ends.
 * So each coin costs D + g, and a groove of length L holds L − g.
 */
export function loadOf(rails: readonly RailRoom[], kinds: readonly KindToPlace[], gap: number, units: Units): Load {
  const step = stepsUp(gap, units);
  return {
    rooms: rails.map(({ length }) => stepsDown(length, units) - step),
    costs: kinds.map(({ diameter }) => stepsUp(diameter, units) + step),
    counts: kinds.map(({ count, toCome }) => count + toCome),
    takes: rails.map(({ takes }) => kinds.map(({ name }) => takes === null || takes.includes(name))),
  };
}

/** The mark by which a shop changes a gap or a margin. */
export const markOf = (units: Units): number => byUnits(units, 1 / 16, 1);
