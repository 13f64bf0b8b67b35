import type { Point2 } from '../../geometry/point';
import { isOneBit } from '../../slot/spec';
import type { Cut, Piece } from '../cut';
import { type Outline, firstUncovered } from '../coverage';
import { edgeParts, follows } from '../edge';
import type { Finding } from '../finding';
import { type Rule, agree, finding, greatest, placeOf } from './rule';
import { cutWidth, pastSlot, slotShape } from './slotShape';

/** What the cutter takes off the rail's top: how far its sweep reaches each way, and the piece that reaches there. */
function extents({ pieces, spec }: Cut) {
  const radius = spec.bitDiameter / 2;
  const right = greatest(pieces, (p) => Math.max(p.x0, p.x1));
  const left = greatest(pieces, (p) => -Math.min(p.x0, p.x1));
  const back = greatest(pieces, (p) => Math.max(p.y0, p.y1));
  const front = greatest(pieces, (p) => -Math.min(p.y0, p.y1));
  return {
    left: { at: -left.value - radius, piece: left.piece },
    right: { at: right.value + radius, piece: right.piece },
    front: { at: -front.value - radius, piece: front.piece },
    back: { at: back.value + radius, piece: back.piece },
  };
}

/** Finished length, end to end. */
export const length: Rule = (cut) => {
  const { left, right } = extents(cut);
  const measured = right.at - left.at;
  return finding('length', agree(cut, cut.spec.length, measured), 'length', placeOf(cut, right.piece).at, {
    wanted: cut.spec.length, measured, point: placeOf(cut, right.piece).point,
  });
};

/** Finished width; where one bit cuts the whole width it is the bit's, a caution when that is not the one asked for. */
export const width: Rule = (cut) => {
  const { front, back } = extents(cut);
  const measured = back.at - front.at;
  const asked = agree(cut, cut.spec.width, measured);
  const byBit = asked !== 'agrees' && isOneBit(cut.spec) && agree(cut, cutWidth(cut.spec), measured) === 'agrees';
  return finding('width', byBit ? 'caution' : asked, 'length', placeOf(cut, back.piece).at, {
    wanted: cut.spec.width, measured, point: placeOf(cut, back.piece).point, reason: byBit ? 'oneBit' : null,
  });
};

/** Greatest depth. */
export const depth: Rule = (cut) => {
  const lowest = greatest(cut.pieces, (p) => -Math.min(p.z0, p.z1));
  const measured = Math.max(0, lowest.value);
  return finding('depth', agree(cut, cut.spec.depth, measured), 'length', placeOf(cut, lowest.piece).at, {
    wanted: cut.spec.depth, measured, point: placeOf(cut, lowest.piece).point,
  });
};

/** Solid wood left at each end. */
export const stopMargin: Rule = (cut) => {
  const { left, right } = extents(cut);
  const measured = [left.at, cut.railLength - right.at];
  const wanted = cut.spec.stopMargin;
  const off = measured.map((margin) => Math.abs(margin - wanted));
  const piece = (off[0] ?? 0) > (off[1] ?? 0) ? left.piece : right.piece;
  const severity = measured.every((margin) => agree(cut, wanted, margin) === 'agrees') ? 'agrees' : 'disagrees';
  return finding('stopMargin', severity, 'length', placeOf(cut, piece).at, { wanted, measured, point: placeOf(cut, piece).point });
};

/** Solid wood left beside the slot, front and back. */
export const beside: Rule = (cut) => {
  const { front, back } = extents(cut);
  const measured = [front.at, cut.spec.railWidth - back.at];
  const wanted = (cut.spec.railWidth - cutWidth(cut.spec)) / 2;
  const severity = measured.every((wall) => agree(cut, wanted, wall) === 'agrees') ? 'agrees' : 'disagrees';
  return finding('beside', severity, 'length', placeOf(cut, back.piece).at, { wanted, measured, point: placeOf(cut, back.piece).point });
};

/** Wood left under the slot. */
export const under: Rule = (cut) => {
  const lowest = greatest(cut.pieces, (p) => -Math.min(p.z0, p.z1));
  const wanted = cut.spec.railThickness - cut.spec.depth;
  const measured = cut.spec.railThickness - Math.max(0, lowest.value);
  return finding('under', agree(cut, wanted, measured), 'length', placeOf(cut, lowest.piece).at, {
    wanted, measured, point: placeOf(cut, lowest.piece).point,
  });
};

/** Y is counted from the rail's edge, so a width that nobody measured moves the slot off the rail's middle. */
export function railWidthAssumed(cut: Cut): Finding {
  return finding('railWidth', 'caution', 'length', cut.whole, { wanted: null, measured: cut.spec.railWidth, reason: 'assumed' });
}

/** Nothing cut outside the slot: how far the cutter's edge ever passes the slot's. */
export const outside: Rule = (cut) => {
  // The slot is what a bit's radius grows from the area that its centre may be in.
  const past = (px: number, py: number) => pastSlot(cut, px, py) + cut.spec.bitDiameter / 2;
  const worst = greatest(cut.pieces, (p) => Math.max(past(p.x0, p.y0), past(p.x1, p.y1)));
  const measured = Math.max(0, worst.value);
  return finding('outside', agree(cut, 0, measured), 'length', placeOf(cut, worst.piece).at, {
    wanted: 0, measured, point: measured > 0 ? placeOf(cut, worst.piece).point : null,
  });
};

/** A rounded rectangle about the slot's middle, its edge `inset` inside the slot's. */
function outlineOf(cut: Cut, inset: number): Outline {
  const shape = slotShape(cut);
  const [a, b] = [shape.halfLength - inset, shape.halfWidth - inset];
  const corner = Math.min(Math.max(0, shape.corner - inset), b);
  return {
    left: shape.x - a,
    right: shape.x + a,
    edges: (x) => {
      const into = Math.min(Math.max(0, Math.abs(x - shape.x) - (a - corner)), corner);
      const half = b - corner + Math.sqrt(Math.max(0, corner * corner - into * into));
      return [shape.y - half, shape.y + half];
    },
  };
}

/**
 * A place of the slot that the cutter never reached at the floor, or null.
 *
 * Where the bit's centre follows the whole edge of the area it may be in, everything within a radius of that edge is
 * cut, and only what is left in the middle of a wide slot is searched. A program that makes its walls in another way
 * (by scallops, say) is searched all over, less the tolerance.
 */
function unreached(cut: Cut): Point2 | null {
  const { x, y, halfLength, halfWidth, corner } = slotShape(cut);
  const radius = cut.spec.bitDiameter / 2;
  const pieces = floorPieces(cut);
  const edge = edgeParts({ x, y }, halfLength - radius, halfWidth - radius, corner - radius);
  if (!edge.every((part) => follows(part, pieces, cut.tolerance))) return firstUncovered(outlineOf(cut, cut.tolerance), pieces, radius);
  return halfWidth > 2 * radius ? firstUncovered(outlineOf(cut, 2 * radius - cut.tolerance), pieces, radius) : null;
}

/** The parts of the way that run along the floor: a ramp's or a plunge's last bit counts too. */
function floorPieces(cut: Cut): Piece[] {
  const floor = -cut.spec.depth + cut.tolerance;
  return cut.pieces.flatMap((piece) => {
    if (piece.z0 <= floor && piece.z1 <= floor) return [piece];
    if (piece.z0 > floor && piece.z1 > floor) return [];
    const t = (floor - piece.z0) / (piece.z1 - piece.z0);
    const [x, y] = [piece.x0 + t * (piece.x1 - piece.x0), piece.y0 + t * (piece.y1 - piece.y0)];
    return [piece.z0 > floor ? { ...piece, x0: x, y0: y, z0: floor } : { ...piece, x1: x, y1: y, z1: floor }];
  });
}

/** Every point of the slot reached, all the way down. */
export const cleared: Rule = (cut) => {
  const open = unreached(cut);
  return finding('cleared', open ? 'disagrees' : 'agrees', 'words', cut.pieces[cut.pieces.length - 1]?.motion.at ?? cut.whole, {
    wanted: 'all', measured: open ? 'not all' : 'all', point: open && { ...open, z: -cut.spec.depth },
  });
};

/** How much the floor rises and falls. */
export const floor: Rule = (cut) => {
  const pieces = floorPieces(cut);
  const low = greatest(pieces, (p) => -Math.min(p.z0, p.z1));
  // A ramp's last bit is gone over again; what stays of it is its lower end.
  const high = greatest(pieces, (p) => Math.min(p.z0, p.z1));
  const measured = pieces.length > 0 ? Math.max(0, high.value + low.value) : cut.spec.depth;
  return finding('floor', agree(cut, 0, measured), 'length', placeOf(cut, low.piece).at, {
    wanted: 0, measured, point: placeOf(cut, low.piece).point,
  });
};
