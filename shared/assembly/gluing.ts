import { convertLength } from '../measure/units';
import { factsOf, lanesOf } from '../piece/kinds';
import type { PieceSpec } from '../piece/spec';
import type { FinishStep } from './finish';

/** PVA glue: common practice, no source; the label overrides. */
export const GLUE = {
  /** Minutes from the first spread to the last clamp. */
  openMinutes: 5,
  clampMinutes: 60,
  /** Full strength. */
  cureHours: 24,
  leastCelsius: 10,
  moisture: { least: 6, most: 14 },
  /** Minutes to spread and lay one strip. */
  stripMinutes: 1,
} as const;

/** Clamps along a joint stand no further apart than this: common practice, no source. */
const CLAMPS_APART = { in: 8, mm: 200 } as const;
/** Clamp pressure, MPa, on wood of low and of high density (Wood Handbook, ch. 10). */
export const CLAMP_PRESSURE = { low: 0.7, high: 1.7 } as const;
/** Megapascals in a pound-force per square inch (NIST SP 811, Appendix B.8), for a shop whose clamps are rated in pounds. */
const MPA_PER_PSI = 0.006_894_757;

export interface GluePlan {
  /** Strips glued to each other at one time, so that the glue is still open when the clamps close; then these panels to each other. */
  readonly panels: readonly number[];
  readonly clamps: number;
  /** Pounds on each clamp for the low and high pressure. */
  readonly poundsEach: { readonly low: number; readonly high: number };
  readonly steps: readonly FinishStep[];
}

/** Strips split into panels as even as can be, none with more than `most`. */
function panelsOf(strips: number, most: number): number[] {
  const panels = Math.ceil(strips / most);
  return Array.from({ length: panels }, (_, n) => Math.floor(strips / panels) + (n < strips % panels ? 1 : 0));
}

/**
 * How a board's strips are glued edge to edge: in panels small enough for the glue's open time, with clamps along the
 * joint. A clamp presses its share of the joint: pressure × thickness × length between clamps.
 */
export function gluePlan(piece: PieceSpec, boardThickness: number): GluePlan {
  const { units, width } = piece;
  const strips = lanesOf(piece.kind, piece).length;
  const panels = panelsOf(strips, GLUE.openMinutes / GLUE.stripMinutes);
  const clamps = Math.max(2, Math.ceil(width / CLAMPS_APART[units]) + 1);
  const inch = (length: number) => convertLength(length, units, 'in');
  const share = (inch(width) * inch(boardThickness)) / clamps;
  const pounds = (mpa: number) => (mpa / MPA_PER_PSI) * share;
  const clampHours = GLUE.clampMinutes / 60;
  const step = (name: string, dryHours: number): FinishStep => ({ name, workHours: 0.5, dryHours, recoatWithin: null, from: 'common practice' });
  const facts = factsOf(piece.kind);
  const strip = facts.behind ? 'strip' : facts.lane; // a shelf's lanes are its grooves, cut later
  const glued = strips < 2 ? [] : panels.map((count, n) => step(`glue ${count} ${strip}s to panel ${n + 1}`, clampHours));
  const joined = panels.length > 1 ? [step('glue the panels to each other', GLUE.cureHours)] : [];
  const last = glued.at(-1);
  const steps = joined.length > 0 || !last ? [...glued, ...joined] : [...glued.slice(0, -1), { ...last, dryHours: GLUE.cureHours }];
  return { panels, clamps, poundsEach: { low: pounds(CLAMP_PRESSURE.low), high: pounds(CLAMP_PRESSURE.high) }, steps };
}
