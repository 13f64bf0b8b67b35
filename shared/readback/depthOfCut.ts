import type { Point3 } from '../geometry/point';
import type { Piece } from './cut';
import { PieceIndex } from './pieceIndex';

/** Lengths nearer than this are equal: far above float noise, far below any last decimal. */
const NOISE = 1e-9;

/** A depth of cut and the first place where it was met. */
export interface Deepest {
  readonly depth: number;
  readonly piece: Piece | null;
  readonly point: Point3 | null;
}

/** Most places looked at along one piece; the depth of cut changes only where an earlier piece begins or ends. */
const MOST_PLACES = 12;

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
    for (const t of places(piece, order, index, radius)) {
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
  const length = Math.hypot(x1 - x0, y1 - y0);
  return length === 0 ? [[1, 0], [0, 1]] : [[-(y1 - y0) / length, (x1 - x0) / length]];
}

/** Fractions along a piece where what earlier pieces left may change: their ends, and its own. */
function places(piece: Piece, order: number, index: PieceIndex, radius: number): number[] {
  const [dx, dy] = [piece.x1 - piece.x0, piece.y1 - piece.y0];
  const square = dx * dx + dy * dy;
  if (square < radius * radius / 16) return [0.5, 1]; // shorter than an eighth of the bit: the wood cannot change much
  const found = [0, 0.5, 1];
  const same = radius / Math.sqrt(square) / 8; // an eighth of the radius: nearer places see the same wood
  for (const other of index.newestFirst(along(piece, 0.5), order, Math.sqrt(square) / 2 + radius)) {
    if (found.length >= MOST_PLACES) break;
    for (const [x, y] of [[other.x0, other.y0], [other.x1, other.y1]] as const) {
      const t = ((x - piece.x0) * dx + (y - piece.y0) * dy) / square;
      if (t > 0 && t < 1 && found.every((known) => Math.abs(known - t) > same)) found.push(t);
    }
  }
  return found;
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
  for (const piece of index.newestFirst(line.at, order, line.radius)) {
    const stretch = stretchAcross(piece, line);
    if (!stretch) continue;
    const [from, to] = [Math.max(stretch[0], line.low), Math.min(stretch[1], line.high)];
    if (from >= to) continue;
    covers.push({ from, to, piece });
    // Heights run evenly along the stretch, so its two ends bound them.
    if (Math.max(heightAt(line, from, piece), heightAt(line, to, piece)) - line.at.z > depth) continue;
    open = open.flatMap(([low, high]) =>
      to <= low || from >= high ? [[low, high] as const] : [...(from > low ? [[low, from] as const] : []), ...(to < high ? [[to, high] as const] : [])],
    );
    if (open.reduce((sum, [low, high]) => sum + high - low, 0) <= narrow) return null;
  }
  return covers;
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
  const length = Math.hypot(dx, dy);
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
