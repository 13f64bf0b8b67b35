import { type Units, byUnits } from '../measure/units';
import { type JobFinding, type Wanted, isWithin } from './finding';
import type { CoinKind } from './tally';

export const SPACING_RULES = ['gap', 'reach'] as const;
export type SpacingFinding = JobFinding<(typeof SPACING_RULES)[number]>;

/** Common practice, no source. */
export const SPACING_PRACTICE = {
  /** How far a knock rolls a coin along its groove: two neighbours may each come this far. */
  knock: { in: 1 / 16, mm: 1.5 },
  /** A fingertip from pad to nail: what comes between two coins when one is taken by its rim. */
  finger: { in: 1 / 2, mm: 12 },
  /** How far down beside a coin a fingertip has to come to lift it. */
  grip: { in: 1 / 4, mm: 6 },
} as const;

/** The least gap at which two coins knocked towards each other do not meet. */
export function leastGap(units: Units): number {
  return 2 * SPACING_PRACTICE.knock[units];
}

/**
 * Daylight between the rims of two discs that stand on one floor with `gap` between their sides: centres
 * R₁ + R₂ + gap apart along the groove and R₁ − R₂ in height. Leaning differently only parts them further.
 */
export function daylight(first: number, second: number, gap: number): number {
  return Math.hypot((first + second) / 2 + gap, (first - second) / 2) - (first + second) / 2;
}

/** How far a disc's rim has drawn in at a height above the floor; nothing below its middle, where the rim comes nearest. */
function drawnIn(diameter: number, height: number): number {
  const r = diameter / 2;
  const up = Math.min(Math.max(height - r, 0), r);
  return r - Math.sqrt(r * r - up * up);
}

/** Halvings that reach the last binary place of any length. */
const HALVINGS = 60;

/**
 * How far down from a coin's top a finger comes between it and its neighbour, along the face. The room at height z is
 * the gap and what both rims have drawn in there; it widens upwards, so the height where the finger sticks is found
 * by halving. The coin's middle is as far as it counts.
 */
export function reachBeside(diameter: number, neighbour: number, gap: number, finger: number): number {
  let [low, high] = [diameter / 2, diameter];
  const room = (z: number) => gap + drawnIn(diameter, z) + drawnIn(neighbour, z);
  if (room(low) >= finger) return diameter / 2;
  if (room(high) < finger) return 0;
  for (let n = 0; n < HALVINGS; n++) {
    const middle = (low + high) / 2;
    if (room(middle) >= finger) high = middle;
    else low = middle;
  }
  return diameter - high;
}

/** Whether coins of these kinds, in any order, keep apart and can be lifted out. */
export function spacingFindings(kinds: readonly Pick<CoinKind, 'name' | 'diameter'>[], gap: number, units: Units): SpacingFinding[] {
  const finding = (rule: SpacingFinding['rule'], about: string, measured: number, wanted: Wanted): SpacingFinding => {
    const within = isWithin(wanted, measured);
    const touching = rule === 'gap' && measured <= 0;
    return { rule, severity: within ? 'agrees' : touching ? 'disagrees' : 'caution', about, quantity: 'length', wanted, measured, reason: within ? null : touching ? 'touch' : 'below', source: touching ? 'geometry' : 'common practice' };
  };
  const between = finding('gap', '', gap, { least: leastGap(units), most: null });
  const reaches = kinds.map(({ name, diameter }) => {
    const least = Math.min(...kinds.map((other) => reachBeside(diameter, other.diameter, gap, SPACING_PRACTICE.finger[units])));
    return finding('reach', name, least, { least: byUnits(units, SPACING_PRACTICE.grip.in, SPACING_PRACTICE.grip.mm), most: null });
  });
  return [between, ...reaches];
}
