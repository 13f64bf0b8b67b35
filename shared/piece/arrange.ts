import type { FitFinding } from '../coin/fitFindings';
import { fitFindings } from '../coin/fitFindings';
import { type SpacingFinding, leastGap, spacingFindings } from '../coin/spacing';
import type { CoinKind } from '../coin/tally';
import { byUnits } from '../measure/units';
import { type AssignProblem, type Assignment, type Pin, assignCoins } from './assign';
import { railRooms } from './boardForCoins';
import { type PieceFinding, pieceFindings } from './findings';
import { type CoinPlace, coinPlaces } from './places';
import { type PlacedRail, grooveOf, placeRails } from './rails';
import type { PieceSpec } from './spec';
import { type WayToFit, waysToFit } from './waysToFit';

/** A rail with its coins where they stand; `gap` is what stands between them. */
export interface FilledRail extends PlacedRail {
  readonly gap: number;
  readonly places: readonly CoinPlace[];
}

/** A piece with its coins: what the drawing shows and what is said beside it. */
export interface Arrangement {
  readonly rails: readonly FilledRail[];
  readonly assignment: Assignment;
  readonly ways: readonly WayToFit[];
  readonly fit: readonly FitFinding[];
  readonly spacing: readonly SpacingFinding[];
  readonly piece: readonly PieceFinding[];
}

/** Least stop margin: end grain that a coin may roll against; common practice, no source. */
const LEAST_STOP = { in: 1 / 4, mm: 6 } as const;

/** Rails fuller than the evenest by half a coin look alike, and kinds are kept together for it: common practice, no source. */
const ALIKE = 1 / 2;

/**
 * Coins on a piece: each kind against the groove, coins into rails round what is pinned, every coin at its place, and
 * the changes that would place those left over. Kinds and piece are in the same units.
 */
export function arrange(piece: PieceSpec, kinds: readonly (CoinKind & { readonly toCome: number })[], pins: readonly Pin[]): { readonly ok: true; readonly arrangement: Arrangement } | { readonly ok: false; readonly problems: readonly AssignProblem[] } {
  const { units, gap, section } = piece;
  const groove = grooveOf(piece);
  const placed = placeRails(piece);
  const evenWithin = kinds.length > 0 ? Math.min(...kinds.map(({ diameter }) => diameter)) * ALIKE : 0;
  const request = { units, rails: railRooms(piece, kinds), kinds, gap, pins, evenWithin };
  const answer = assignCoins(request);
  if (!answer.ok) return answer;
  const { assignment } = answer;
  const rails = placed.map((rail, index) => {
    const contents = assignment.rails[index] ?? { name: rail.name, kinds: [], spare: 0 };
    return { ...rail, ...coinPlaces(rail.grooveLength, contents, kinds) };
  });
  const standing = Object.fromEntries(assignment.rails.map((rail) => [rail.name, rail.kinds.map(({ name }) => name)]));
  const leeway = { leastGap: Math.min(gap, leastGap(units)), stopMargin: section.stopMargin, leastStopMargin: byUnits(units, LEAST_STOP.in, LEAST_STOP.mm) };
  return {
    ok: true,
    arrangement: {
      rails, assignment,
      ways: assignment.unplaced.length > 0 ? waysToFit(request, leeway) : [],
      fit: kinds.flatMap((kind) => fitFindings(kind, groove)),
      spacing: spacingFindings(kinds, gap, units),
      piece: pieceFindings(piece, kinds, standing),
    },
  };
}

/** How a rail of a piece is asked for as a program: a slot request without bit and machine, which the shop adds. */
export function slotOfRail({ units, section }: PieceSpec, rail: Pick<PlacedRail, 'grooveLength'>) {
  return { units, length: rail.grooveLength, width: section.grooveWidth, depth: section.grooveDepth, stopMargin: section.stopMargin, railWidth: section.width, railThickness: section.thickness } as const;
}
