import { type Point2, norm } from '../geometry/point';
import type { Piece } from './cut';

/** The area that must be cleared, given by its ends and by the two edges above each X. */
export interface Outline {
  readonly left: number;
  readonly right: number;
  /** Lowest and highest Y of the area at an X; lowest above highest where there is none. Convex. */
  readonly edges: (x: number) => readonly [number, number];
}

/** Slabs are halved down to this share of the cutter's radius; a gap as narrow as the last slab is still found. */
const NARROWEST = 1e-4;

/**
 * Finds a place of an area that a round cutter running along some pieces never reached, or null.
 *
 * The area is cut into slabs across X, each proved by a chain of pieces that reaches from its lower to its upper edge,
 * or else halved. The sweep of a piece is convex: across a slab its upper edge lies above the chord between its two
 * sides and its lower edge below, so a chain that holds at both sides holds all across.
 */
export function firstUncovered(outline: Outline, pieces: readonly Piece[], radius: number): Point2 | null {
  const narrowest = radius * NARROWEST;

  const search = (left: Side, right: Side, near: readonly Piece[]): Point2 | null => {
    const reaching = near.filter((piece) => Math.min(piece.x0, piece.x1) - radius < right.x && Math.max(piece.x0, piece.x1) + radius > left.x);
    const middle = sideAt((left.x + right.x) / 2);
    // How far the area may bulge past the chord of its own edge: twice the bulge in the middle, as it is convex.
    const bulge = {
      low: Math.max(0, left.low + right.low - 2 * middle.low),
      high: Math.max(0, 2 * middle.high - left.high - right.high),
    };
    if (chainHolds(reaching, left, right, bulge, radius)) return null;
    if (right.x - left.x <= narrowest) {
      const y = gapAt(reaching, middle, radius);
      return y === null ? null : { x: middle.x, y };
    }
    return search(left, middle, reaching) ?? search(middle, right, reaching);
  };
  const sideAt = (x: number): Side => {
    const [low, high] = outline.edges(x);
    return { x, low, high };
  };
  return search(sideAt(outline.left), sideAt(outline.right), pieces);
}

/** One side of a slab, and where the area lies on it. */
interface Side {
  readonly x: number;
  readonly low: number;
  readonly high: number;
}

/** True where one piece after another reaches across the slab at both its sides, from below the area to above it. */
function chainHolds(
  pieces: readonly Piece[], left: Side, right: Side, bulge: { readonly low: number; readonly high: number }, radius: number,
): boolean {
  const stretches: { readonly left: readonly [number, number]; readonly right: readonly [number, number] }[] = [];
  for (const piece of pieces) {
    const atLeft = sweepAt(piece, left.x, radius);
    const atRight = atLeft && sweepAt(piece, right.x, radius);
    if (atLeft && atRight) stretches.push({ left: atLeft, right: atRight });
  }
  let [reachedLeft, reachedRight] = [left.low - bulge.low, right.low - bulge.low];
  for (;;) {
    if (reachedLeft >= left.high + bulge.high && reachedRight >= right.high + bulge.high) return true;
    let best: (typeof stretches)[number] | null = null;
    for (const stretch of stretches) {
      if (stretch.left[0] > reachedLeft || stretch.right[0] > reachedRight) continue;
      if (!best || stretch.left[1] + stretch.right[1] > best.left[1] + best.right[1]) best = stretch;
    }
    if (!best || best.left[1] + best.right[1] <= reachedLeft + reachedRight) return false;
    [reachedLeft, reachedRight] = [best.left[1], best.right[1]];
  }
}

/** A Y of the area on one line across it that no piece reached, or null. */
function gapAt(pieces: readonly Piece[], { x, low, high }: Side, radius: number): number | null {
  const stretches = pieces.flatMap((piece) => {
    const stretch = sweepAt(piece, x, radius);
    return stretch ? [stretch] : [];
  }).sort((a, b) => a[0] - b[0]);
  let reached = low;
  for (const [from, to] of stretches) {
    if (reached >= high) return null;
    if (from > reached) return (reached + Math.min(from, high)) / 2;
    reached = Math.max(reached, to);
  }
  return reached >= high ? null : (reached + high) / 2;
}

/** The stretch of Y that the sweep of a piece covers at an X: of its two end discs and the strip between them. */
function sweepAt({ x0, y0, x1, y1 }: Piece, x: number, radius: number): [number, number] | null {
  let low = Infinity;
  let high = -Infinity;
  const disc = (cx: number, cy: number) => {
    const half = radius * radius - (x - cx) * (x - cx);
    if (half < 0) return;
    low = Math.min(low, cy - Math.sqrt(half));
    high = Math.max(high, cy + Math.sqrt(half));
  };
  disc(x0, y0);
  disc(x1, y1);
  const [dx, dy] = [x1 - x0, y1 - y0];
  const length = norm(dx, dy);
  if (dx !== 0) {
    // The strip's two long edges are the piece moved sideways by the radius; each spans its own stretch of X.
    for (const side of [1, -1]) {
      const [ox, oy] = [(-side * dy * radius) / length, (side * dx * radius) / length];
      const t = (x - x0 - ox) / dx;
      if (t < 0 || t > 1) continue;
      low = Math.min(low, y0 + oy + t * dy);
      high = Math.max(high, y0 + oy + t * dy);
    }
  }
  return low <= high ? [low, high] : null;
}
