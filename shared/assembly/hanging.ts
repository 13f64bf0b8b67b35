import { type Tally, massOf } from '../coin/tally';
import { type Units, byUnits } from '../measure/units';
import { densityOf } from '../wood/species';
import type { Part } from '../wood/cutList';

/** Exact by definition: the international pound in grams (1959 agreement). */
const GRAMS_PER_POUND = 453.59237;

/** Common practice, no source. */
export const HANGING_PRACTICE = {
  /** Hardware is rated for four times what hangs. */
  margin: 4,
  /** Two hangers beat one. */
  hangers: 2,
  /** Above so many pounds a French cleat into two studs rather than D-rings. */
  cleat: 20,
  /** Studs stand 16 in (406 mm) apart. */
  studs: { in: 16, mm: 406 },
  /** D-rings a quarter of the height down. */
  ringsDown: 1 / 4,
} as const;

/** Grams of wood in parts: volume by density. */
export function woodMass(parts: readonly Part[], units: Units): number {
  const centimetres = byUnits(units, 2.54, 0.1);
  return parts.reduce((sum, { quantity, length, width, thickness, wood }) => sum + quantity * length * width * thickness * centimetres ** 3 * densityOf(wood), 0);
}

/** Grams of a tally's coins, those to come among them where they are counted. */
export function coinMass(tally: Tally): number {
  return tally.kinds.reduce((sum, kind) => sum + kind.count * massOf(kind, tally.units), 0);
}

export interface Hanging {
  readonly grams: number;
  readonly pounds: number;
  readonly by: 'rings' | 'cleat';
  /** What each of the two hangers or screws is to be rated for, pounds: half of four times the weight. */
  readonly rating: number;
  /** From the board's top to the rings or the cleat's top edge. */
  readonly down: number;
  /** Between rings, or studs. */
  readonly apart: number;
}

/** How a piece hangs. The wall and its fixings are the installer's to judge. */
export function hangingFor(grams: number, board: { readonly width: number; readonly height: number }, units: Units): Hanging {
  const pounds = grams / GRAMS_PER_POUND;
  const by = pounds > HANGING_PRACTICE.cleat ? 'cleat' : 'rings';
  const rating = Math.ceil((pounds * HANGING_PRACTICE.margin) / HANGING_PRACTICE.hangers);
  return { grams, pounds, by, rating, down: board.height * HANGING_PRACTICE.ringsDown, apart: by === 'cleat' ? HANGING_PRACTICE.studs[units] : board.width / 2 };
}

/** A French cleat's section: both halves from one board, ripped at one angle. */
export interface Cleat {
  readonly angle: number;
  readonly thickness: number;
  /** Height of each half at its taller face. */
  readonly tall: number;
  /** Height at its shorter face: a board's thickness less at 45 degrees. */
  readonly short: number;
}

/** Both halves of a cleat ripped from a board of a width: at 45 degrees the cut loses the thickness once, kerf aside. */
export function cleatFrom(width: number, thickness: number, kerf: number): Cleat {
  const angle = 45;
  const lean = thickness * Math.tan((angle * Math.PI) / 180);
  const tall = (width + lean - kerf / Math.cos((angle * Math.PI) / 180)) / 2;
  return { angle, thickness, tall, short: tall - lean };
}
