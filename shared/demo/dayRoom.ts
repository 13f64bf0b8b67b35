import type { Build } from '../wood/cutList';
import type { CoinKind } from '../coin/tally';
import type { PieceInput } from '../piece/spec';

/** The demo commission, invented: a squad's coins for its day room. It shows the product and checks nothing. */
export const DAY_ROOM_KINDS: readonly (CoinKind & { readonly toCome: number })[] = [
  { name: 'Founders\'', diameter: 2, thickness: 0.157, count: 2, mass: null, toCome: 0 },
  { name: 'Squad', diameter: 1.75, thickness: 0.125, count: 8, mass: null, toCome: 0 },
  { name: 'Mutual-aid', diameter: 1.5, thickness: 0.118, count: 21, mass: null, toCome: 0 },
  { name: 'Cadet', diameter: 1.25, thickness: 0.118, count: 11, mass: null, toCome: 0 },
];

/** Its board: thirteen stripes in the shop's own proportion, three rails as long as the board less a margin, so all below the union. */
export const DAY_ROOM_PIECE: PieceInput = {
  units: 'in', kind: 'striped-flag', style: 'leaning', width: 28, height: '16 1/4', railLanes: [8, 10, 12], gap: '1/4',
  railWidth: '1 1/4', railThickness: '3/4', grooveWidth: '3/8', grooveDepth: '3/16', stopMargin: '7/8', laneMargin: '7/8',
};

export const DAY_ROOM_BUILD: Build = {
  boardThickness: 0.75, odd: 'walnut', even: 'cherry', union: 'walnut', rails: 'white-oak', battens: 'poplar',
  batten: { count: 4, width: 1.5, thickness: 0.75, inset: 1 },
};
