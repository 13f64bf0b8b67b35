import { type Point3, norm } from '../geometry/point';
import type { Piece } from './cut';
import { PieceIndex, boxAround } from './pieceIndex';

/** Lengths nearer than this are equal: far above float noise, far below any last decimal. */
const NOISE = 1e-9;

/** A depth of cut and the first place where it was met. */
export interface Deepest {
  readonly depth: number;
  readonly piece: Piece | null;
  readonly point: Point3 | null;
}

/** Places nearer along a piece than this share of the radius see the same wood: no fin so thin stands in a slot. */
const SAME_PLACE = 1 / 8;

/**
 * The greatest depth of cut of a program: how far the wood that earlier pieces left stands above the cutter.
 *
 * At places along each piece, in time order, the line across the cutter is compared with what every earlier piece
 * left there (its height at the nearest point of its way).
 *
 * @param narrow wood taken over at most this much of the line does not count.
 * @param within where wood counts, a convex area that holds the cutter's middle: all but the skin that was left for a
 *   finish lap; null for everywhere.
 */
export function deepestCut(
  pieces: readonly Piece[], radius: number, narrow: number, within: ((x: number, y: number) => boolean) | null = null,
): Deepest {
  const index = new PieceIndex(pieces, radius);
  let deepest: Deepest = { depth: 0, piece: null, point: null };
  pieces.forEach((piece, order) => {
    // No cut is deeper than the piece is below the top, so most pieces of a first pass need no second look.
    if (-Math.min(piece.z0, piece.z1) <= deepest.depth + NOISE) return;
    for (const t of places(piece, order, index, radius, deepest.depth + NOISE)) {
      const at = along(piece, t);
      for (const [nx, ny] of across(piece)) {
        const line = { at, nx, ny, radius, ...span(at, nx, ny, radius, within) };
        const covers = coversAbove(line, order, index, deepest.depth + NOISE, narrow);
        const depth = covers ? sustainedDepth(line, covers, narrow) : 0;
        if (depth > deepest.depth) deepest = { depth, piece, point: at };
      }
    }
  });
  return deepest;
}

function along(piece: Piece, t: number): Point3 {
  return {
    x: piece.x0 + t * (piece.x1 - piece.x0),
    y: piece.y0 + t * (piece.y1 - piece.y0),
    z: piece.z0 + t * (piece.z1 - piece.z0),
  };
}

/** Directions across a piece; a plunge has none of its own, so it is looked at both ways. */
function across({ x0, y0, x1, y1 }: Piece): readonly (readonly [number, number])[] {
  const length = norm(x1 - x0, y1 - y0);
  return length === 0 ? [[1, 0], [0, 1]] : [[-(y1 - y0) / length, (x1 - x0) / length]];
}

/**
 * Fractions along a piece where it may cut deeper than `depth`.
 *
 * Stretches that an earlier piece ran along, no more than that above, are left out: in a cut that goes down pass by
 * pass that is nearly all. On the rest, what earlier pieces left changes only where the sweep of one begins or ends,
 * so these places are looked at, and the middle between each two.
 */
function places(piece: Piece, order: number, index: PieceIndex, radius: number, depth: number): number[] {
  const [dx, dy] = [piece.x1 - piece.x0, piece.y1 - piece.y0];
  const length = norm(dx, dy);
  if (length === 0) return [1];
  const project = (x: number, y: number) => ((x - piece.x0) * dx + (y - piece.y0) * dy) / (length * length);
  // Height runs evenly along both, so its ends bound what stands above this piece.
  const above = (other: Piece, t: number) => heightNear(other, piece.x0 + t * dx, piece.y0 + t * dy) - (piece.z0 + t * (piece.z1 - piece.z0));
  const same = index.sameWayBefore(order);
  if (same && Math.max(above(same, 0), above(same, 1)) <= depth) return [];
  let open: (readonly [number, number])[] = [[0, 1]];
  const bends: number[] = [];
  index.newestFirst(boxAround(piece, 2 * radius), order, (other) => {
    const [a, b] = [project(other.x0, other.y0), project(other.x1, other.y1)];
    bends.push(a, b, a - radius / length, a + radius / length, b - radius / length, b + radius / length);
    if (Math.abs(offLine(piece, other.x0, other.y0)) > NOISE || Math.abs(offLine(piece, other.x1, other.y1)) > NOISE) return false;
    const [from, to] = [Math.min(a, b), Math.max(a, b)];
    if (Math.max(above(other, Math.max(0, from)), above(other, Math.min(1, to))) > depth) return false;
    open = without(open, from, to);
    return open.length === 0;
  });
  if (open.length === 0) return [];
  const apart = (SAME_PLACE * radius) / length;
  return open.flatMap(([from, to]) => {
    const inside = [from, ...bends.filter((t) => t > from && t < to).sort((a, b) => a - b), to];
    // Thinned by the last one kept: many close bends in a row must still be looked at every so often.
    const kept: number[] = [];
    for (const t of inside) if (t === to || t - (kept[kept.length - 1] ?? -Infinity) > apart) kept.push(t);
    return kept.flatMap((t, i) => (i === 0 ? [t] : [(t + (kept[i - 1] ?? t)) / 2, t]));
  });
}

/** How far a point lies beside the line of a piece. */
function offLine({ x0, y0, x1, y1 }: Piece, x: number, y: number): number {
  return ((x1 - x0) * (y - y0) - (y1 - y0) * (x - x0)) / norm(x1 - x0, y1 - y0);
}

/** Stretches less one. */
function without(open: readonly (readonly [number, number])[], from: number, to: number): (readonly [number, number])[] {
  return open.flatMap(([low, high]) =>
    to <= low || from >= high ? [[low, high] as const] : [...(from > low ? [[low, from] as const] : []), ...(to < high ? [[to, high] as const] : [])],
  );
}

/** The line across the cutter at a place: points `at` + u (nx, ny), of which those from `low` to `high` count. */
interface Line {
  readonly at: Point3;
  readonly nx: number;
  readonly ny: number;
  readonly radius: number;
  readonly low: number;
  readonly high: number;
}

/** How much of the line across the cutter counts: out from its middle as far as the area reaches. */
function span(at: Point3, nx: number, ny: number, radius: number, within: ((x: number, y: number) => boolean) | null) {
  const reach = (way: 1 | -1): number => {
    const counts = (u: number) => within === null || within(at.x + way * u * nx, at.y + way * u * ny);
    if (counts(radius)) return radius;
    let [inside, out] = [0, radius];
    while (out - inside > radius * 1e-6) { // a millionth of the bit: below any last decimal
      const u = (inside + out) / 2;
      if (counts(u)) inside = u;
      else out = u;
    }
    return inside;
  };
  return { low: -reach(-1), high: reach(1) };
}

/** Where a piece crosses the line. */
interface Cover {
  readonly from: number;
  readonly to: number;
  readonly piece: Piece;
}

/** Height that a piece left at a place on the line. */
function heightAt({ at, nx, ny }: Line, u: number, piece: Piece): number {
  return heightNear(piece, at.x + u * nx, at.y + u * ny);
}

/**
 * All earlier pieces across the line; null as soon as too little of it is left open for a cut deeper than `depth`.
 * Newest first: in a cut that goes down pass by pass the last pass before settles it at once.
 */
function coversAbove(line: Line, order: number, index: PieceIndex, depth: number, narrow: number): Cover[] | null {
  if (-line.at.z <= depth) return null;
  const covers: Cover[] = [];
  let open: (readonly [number, number])[] = [[line.low, line.high]];
  let closed = false;
  const { at: { x, y }, radius } = line;
  index.newestFirst({ left: x - 2 * radius, right: x + 2 * radius, front: y - 2 * radius, back: y + 2 * radius }, order, (piece) => {
    const stretch = stretchAcross(piece, line);
    if (!stretch) return false;
    const [from, to] = [Math.max(stretch[0], line.low), Math.min(stretch[1], line.high)];
    if (from >= to) return false;
    covers.push({ from, to, piece });
    // Heights run evenly along the stretch, so its two ends bound them.
    if (Math.max(heightAt(line, from, piece), heightAt(line, to, piece)) - line.at.z > depth) return false;
    open = without(open, from, to);
    closed = open.reduce((sum, [low, high]) => sum + high - low, 0) <= narrow;
    return closed;
  });
  return closed ? null : covers;
}

/** The greatest depth that is taken over more than `narrow` of the line. */
function sustainedDepth(line: Line, covers: readonly Cover[], narrow: number): number {
  const bounds = [line.low, line.high, ...covers.flatMap(({ from, to }) => [from, to])].sort((a, b) => a - b);
  const cut: { depth: number; width: number }[] = [];
  for (let i = 1; i < bounds.length; i++) {
    const [from, to] = [bounds[i - 1] ?? 0, bounds[i] ?? 0];
    if (to - from < NOISE) continue;
    const u = (from + to) / 2;
    const surface = covers.reduce(
      (height, cover) => (cover.from < u && u < cover.to ? Math.min(height, heightAt(line, u, cover.piece)) : height), 0,
    );
    cut.push({ depth: surface - line.at.z, width: to - from });
  }
  let sum = 0;
  for (const { depth, width } of cut.sort((a, b) => b.depth - a.depth)) {
    sum += width;
    if (sum > narrow) return Math.max(0, depth);
  }
  return 0;
}

/** Height of a piece at the point of its way nearest to a place. */
function heightNear(piece: Piece, x: number, y: number): number {
  const [dx, dy] = [piece.x1 - piece.x0, piece.y1 - piece.y0];
  const square = dx * dx + dy * dy;
  const t = square === 0 ? 1 : Math.min(1, Math.max(0, ((x - piece.x0) * dx + (y - piece.y0) * dy) / square));
  return piece.z0 + t * (piece.z1 - piece.z0);
}

/** Where the line lies inside a piece's sweep: the sweep is convex, so one stretch. */
function stretchAcross(piece: Piece, { at, nx, ny, radius }: Line): [number, number] | null {
  let from = Infinity;
  let to = -Infinity;
  const disc = (cx: number, cy: number) => {
    const u = (cx - at.x) * nx + (cy - at.y) * ny;
    const away = (cx - at.x) * ny - (cy - at.y) * nx;
    const half = radius * radius - away * away;
    if (half <= 0) return;
    from = Math.min(from, u - Math.sqrt(half));
    to = Math.max(to, u + Math.sqrt(half));
  };
  disc(piece.x0, piece.y0);
  disc(piece.x1, piece.y1);
  const [dx, dy] = [piece.x1 - piece.x0, piece.y1 - piece.y0];
  const length = norm(dx, dy);
  const turn = dx * ny - dy * nx;
  if (Math.abs(turn) > 1e-12 * length) {
    for (const side of [1, -1]) {
      const [ox, oy] = [piece.x0 - (side * dy * radius) / length - at.x, piece.y0 + (side * dx * radius) / length - at.y];
      // The piece's edge (ox, oy) + t (dx, dy) meets the line u (nx, ny).
      const t = (ox * ny - oy * nx) / -turn;
      if (t < 0 || t > 1) continue;
      const u = (ox + t * dx) * nx + (oy + t * dy) * ny;
      from = Math.min(from, u);
      to = Math.max(to, u);
    }
  }
  return from < to ? [from, to] : null;
}
