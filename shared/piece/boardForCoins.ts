import type { CoinKind } from '../coin/tally';
import { type KindToPlace, loadOf, markOf } from './grid';
import { factsOf } from './kinds';
import { fillSomehow } from './leave';
import { grooveOf, kindsForRail, placeRails } from './rails';
import type { PieceSpec } from './spec';

const LIMIT = 20_000; // steps of one search
const MOST_MARKS = 4096; // 256 in by sixteenths: no board is wider

/** What the rails of a piece are to the assignment: groove lengths, and the kinds that have room there. */
export function railRooms(piece: PieceSpec, kinds: readonly CoinKind[]) {
  const groove = grooveOf(piece);
  return placeRails(piece).map((rail) => ({ name: rail.name, length: rail.grooveLength, takes: kindsForRail(kinds, rail, groove) }));
}

/**
 * The smallest board, by the shop's marks, whose rails take all the coins: a flag board grows in its own proportion,
 * another in width alone. Widths are tried by halving, since a wider board holds what a narrower one does; null where
 * no board does.
 */
export function boardForCoins(piece: PieceSpec, kinds: readonly (CoinKind & Pick<KindToPlace, 'toCome'>)[]): { readonly width: number; readonly height: number } | null {
  const mark = markOf(piece.units);
  const keepsShape = factsOf(piece.kind).proportion !== null;
  const sized = (n: number): PieceSpec => {
    const width = n * mark;
    const scale = width / piece.width;
    return { ...piece, width, height: keepsShape ? piece.height * scale : piece.height, unionWidth: piece.unionWidth * scale };
  };
  const fits = (n: number) => {
    const rooms = railRooms(sized(n), kinds);
    return rooms.every(({ length }) => length > 0) && fillSomehow(loadOf(rooms, kinds, piece.gap, piece.units), LIMIT).found !== null;
  };
  if (!fits(MOST_MARKS)) return null;
  let [low, high] = [0, MOST_MARKS];
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (fits(middle)) high = middle;
    else low = middle;
  }
  const { width, height } = sized(high);
  return { width, height };
}
