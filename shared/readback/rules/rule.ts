import type { Point3 } from '../../geometry/point';
import type { Place } from '../../reader/motion';
import type { Cut, Piece } from '../cut';
import type { Finding, Quantity, RuleName, Severity } from '../finding';

/** One look at a cut. A rule that has nothing to say of a cut (a finish lap that was not asked) answers nothing. */
export type Rule = (cut: Cut) => Finding | null;

type Rest = Partial<Pick<Finding, 'point' | 'reason'>> & Pick<Finding, 'wanted' | 'measured'>;

export function finding(rule: RuleName, severity: Severity, quantity: Quantity, at: Place, rest: Rest): Finding {
  return { rule, severity, at, quantity, point: null, reason: null, ...rest };
}

/** Figures that agree within the cut's tolerance, or the severity given. */
export function agree(cut: Cut, wanted: number, measured: number, otherwise: Severity = 'disagrees'): Severity {
  // The last digits are for float noise of sums.
  return Math.abs(wanted - measured) <= cut.tolerance * 1.0001 ? 'agrees' : otherwise;
}

/** Where a piece was written and where on the rail it ends; the program's first line where there is none. */
export function placeOf(cut: Cut, piece: Piece | null | undefined): { at: Place; point: Point3 | null } {
  if (!piece) return { at: cut.whole, point: null };
  return { at: piece.motion.at, point: { x: piece.x1, y: piece.y1, z: piece.z1 } };
}

/** The piece with the greatest figure, and the figure; -Infinity and null of none. */
export function greatest(pieces: readonly Piece[], figure: (piece: Piece) => number): { value: number; piece: Piece | null } {
  let value = -Infinity;
  let found: Piece | null = null;
  for (const piece of pieces) {
    const next = figure(piece);
    if (next > value) [value, found] = [next, piece];
  }
  return { value, piece: found };
}
