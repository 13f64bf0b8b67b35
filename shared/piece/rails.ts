import { type Fit, type Groove, fitOf } from '../coin/fit';
import type { CoinKind } from '../coin/tally';
import { type Lane, factsOf, lanesOf } from './kinds';
import type { PieceSpec } from './spec';

/** A rail where it stands on the piece, from the piece's top left corner, in the piece's units. */
export interface PlacedRail {
  /** A, B, C from the top. */
  readonly name: string;
  readonly lane: Lane;
  readonly left: number;
  readonly top: number;
  readonly length: number;
  readonly grooveLength: number;
  /** From this rail's top to what is above it: the next rail's underside, or the board's top edge. Infinity on a shelf. */
  readonly clearAbove: number;
  /** Another rail stands above it. */
  readonly underRail: boolean;
}

/** Name of the nth rail. */
export const railName = (index: number) => String.fromCharCode(65 + index);

/**
 * The rails of a piece: each in the middle of its lane's height, shorter than the lane by the margin at each end. The
 * groove ends its stop margin short of either end. Lengths that come out below zero are left so: the findings say it.
 */
export function placeRails(piece: PieceSpec): PlacedRail[] {
  const { section, kind } = piece;
  const lanes = lanesOf(kind, piece);
  const { behind } = factsOf(kind);
  let under = 0; // where the last rail's underside is
  return piece.railLanes.flatMap((number, index) => {
    const lane = lanes[number - 1];
    if (!lane) return [];
    const top = lane.top + (lane.height - section.thickness) / 2;
    const length = lane.right - lane.left - 2 * section.laneMargin;
    const rail = { name: railName(index), lane, left: lane.left + section.laneMargin, top, length, grooveLength: length - 2 * section.stopMargin, clearAbove: behind ? Infinity : top - under, underRail: !behind && index > 0 };
    under = top + section.thickness;
    return [rail];
  });
}

/** The piece's groove as its coins meet it: in the middle of the rail, the board behind the rail's back face. */
export function grooveOf({ units, style, section, kind }: PieceSpec): Groove {
  const boardDistance = factsOf(kind).backed ? (section.width - section.grooveWidth) / 2 : null;
  return { units, style, width: section.grooveWidth, depth: section.grooveDepth, boardDistance };
}

/** How much room above a rail a coin wants: to stand, and to be lifted over the front lip. NaN where it does not stand. */
export function roomFor(fit: Fit): { readonly stand: number; readonly lift: number } {
  return { stand: fit.rise, lift: fit.rise + fit.lip };
}

/** Names of the kinds that stand in a rail with nothing above in their way. */
export function kindsForRail(kinds: readonly CoinKind[], rail: PlacedRail, groove: Groove): string[] {
  return kinds.filter((kind) => roomFor(fitOf(kind, groove)).stand <= rail.clearAbove).map(({ name }) => name);
}
