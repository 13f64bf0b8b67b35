import { distanceToBox, distanceToSegment, distanceToTrack, FULL, onCircle, shareOfTurn, type Track, trackOf, turnAngle } from './geometry';
import { type Edge, edgesOf, outsideHome, shrink, type Slot } from './slotShape';
import type { JudgedOptions, Move, Point, Turn, Violation } from './types';

/**
 * Is every point of the slot within the bit's radius of a move on the floor? Proved, not sampled, in two steps.
 *
 * Walls: if every point e of the home's edge is within the tolerance of the path, then every point within the bit's
 * radius of e is covered to the tolerance; that is the whole band along the walls. Walked with steps no longer than
 * the distance function (it never changes faster than the walker moves) allows.
 *
 * Middle: what lies farther than the bit's radius inside that edge is divided into cells until each is inside the bit's
 * sweep along one move, or has a point that is not.
 */
export function judgeCoverage(floor: readonly Move[], slot: Slot, options: JudgedOptions): Violation[] {
  const tracks = floor.map(trackOf);
  if (tracks.length === 0) return [];
  const wall = slot.tolerance + 1e-9;
  const bent = wall + (options.chordTolerance ?? 0);
  const found = edgesOf(slot.home).flatMap(edge => edge.kind === 'side'
    ? walkSide(edge, tracks, wall, slot)
    : walkBend(edge, tracks, bent, slot));
  const middle = shrink(slot.home, slot.bitRadius);
  if (middle === null) return found;
  // Between two laps a sliver shows from both sides, so each may miss by half the tolerance.
  const reach = slot.bitRadius + slot.tolerance / 2;
  const hole = findHole(tracks, {
    x0: middle.centre.x - middle.halfX - middle.round, x1: middle.centre.x + middle.halfX + middle.round,
    y0: middle.centre.y - middle.halfY - middle.round, y1: middle.centre.y + middle.halfY + middle.round,
  }, reach, (x, y) => outsideHome(middle, x, y), slot.tolerance / 8);
  if (hole !== null) found.push({ rule: 'uncut-floor', line: 0, message: `nothing cuts the floor at X ${hole.x.toFixed(4)} Y ${hole.y.toFixed(4)}` });
  return found;
}

/** The nearest distance of a point to the path, and which move has it. */
function nearest(x: number, y: number, tracks: readonly Track[]): { readonly distance: number; readonly track: Track | undefined } {
  let distance = Infinity;
  let nearestTrack: Track | undefined;
  for (const track of tracks) {
    if (distanceToBox(x, y, track.box) >= distance) continue;
    const d = distanceToTrack(x, y, track);
    if (d < distance) {
      distance = d;
      nearestTrack = track;
    }
  }
  return { distance, track: nearestTrack };
}

function wallViolation(at: Point, distance: number): Violation {
  return { rule: 'uncut-wall', line: 0, message: `the path stays ${distance.toFixed(6)} off the wall's line at X ${at.x.toFixed(4)} Y ${at.y.toFixed(4)}` };
}

function walkSide(edge: Extract<Edge, { kind: 'side' }>, tracks: readonly Track[], tolerance: number, slot: Slot): Violation[] {
  const { from, to } = edge;
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const at = (s: number): Point => length === 0 ? from : { x: from.x + (to.x - from.x) * s / length, y: from.y + (to.y - from.y) * s / length };
  for (let s = 0; ;) {
    const point = at(s);
    const { distance, track } = nearest(point.x, point.y, tracks);
    if (distance > tolerance) return [wallViolation(point, distance)];
    if (s >= length) return [];
    const step = Math.max(tolerance - distance, slot.tolerance / 16); // 1/16: never stand still where the margin is thin
    s = Math.min(length, s + step);
    if (track === undefined || track.turn !== null) continue;
    // Points near one straight move form a convex region: whatever part of the side it reaches, it holds all between.
    const reaches = (end: number): boolean => distanceToSegment(at(end).x, at(end).y, track.from, track.to) <= tolerance;
    if (reaches(length)) return [];
    let good = s;
    let bad = length;
    if (!reaches(good)) continue;
    while (bad - good > slot.tolerance / 16) {
      const half = (good + bad) / 2;
      if (reaches(half)) good = half;
      else bad = half;
    }
    s = good;
  }
}

function walkBend(edge: Extract<Edge, { kind: 'bend' }>, tracks: readonly Track[], tolerance: number, slot: Slot): Violation[] {
  const { turn } = edge;
  // A move that stays nearer to the bend's middle, as inner laps do, is never at the bend.
  const close = tracks.filter(track => farthestFrom(turn.centre, track) >= turn.radius - tolerance);
  const length = turn.radius * turn.sweep;
  for (let s = 0; ;) {
    const point = onCircle(turn.centre, turn.radius, turnAngle(turn, s / length));
    const { distance, track } = nearest(point.x, point.y, close);
    if (distance > tolerance) return [wallViolation(point, nearest(point.x, point.y, tracks).distance)];
    if (s >= length) return [];
    const step = Math.max(tolerance - distance, slot.tolerance / 16);
    s = Math.min(length, s + Math.max(step, sharedWay(turn, turnAngle(turn, s / length), track?.turn ?? null, tolerance)));
  }
}

/**
 * How far on a bend runs along a turn of nearly its own circle: while both go on, they are never farther apart than
 * their middles and radii together. Twice that is held back at the end, where the two middles see different angles.
 */
function sharedWay(bend: Turn, angle: number, turn: Turn | null, tolerance: number): number {
  if (turn === null || shareOfTurn(turn, angle) < 0) return 0;
  const apart = Math.hypot(bend.centre.x - turn.centre.x, bend.centre.y - turn.centre.y) + Math.abs(bend.radius - turn.radius);
  if (apart > tolerance) return 0;
  const ahead = Math.max(turn.start, turn.start + turn.sweep) - angle;
  return (ahead - FULL * Math.floor(ahead / FULL)) * bend.radius - 2 * apart;
}

function farthestFrom({ x, y }: Point, { from, to, turn }: Track): number {
  if (turn !== null) return Math.hypot(turn.centre.x - x, turn.centre.y - y) + turn.radius;
  return Math.max(Math.hypot(from.x - x, from.y - y), Math.hypot(to.x - x, to.y - y));
}

interface Cell {
  readonly x0: number;
  readonly x1: number;
  readonly y0: number;
  readonly y1: number;
}

/** A point of the region farther than `reach` from every move, or null when there is none. */
export function findHole(tracks: readonly Track[], cell: Cell, reach: number, outside: (x: number, y: number) => number, finest: number): Point | null {
  const x = (cell.x0 + cell.x1) / 2;
  const y = (cell.y0 + cell.y1) / 2;
  const width = cell.x1 - cell.x0;
  const height = cell.y1 - cell.y0;
  const half = Math.hypot(width, height) / 2;
  if (outside(x, y) > half) return null;
  const near = tracks.filter(({ box }) => box.x0 - reach <= cell.x1 && box.x1 + reach >= cell.x0 && box.y0 - reach <= cell.y1 && box.y1 + reach >= cell.y0);
  const held = near.some((track) => {
    if (track.turn !== null) return distanceToTrack(x, y, track) <= reach - half;
    // The sweep along a straight move is convex: it holds the cell when it holds the corners.
    return [cell.x0, cell.x1].every(cx => [cell.y0, cell.y1].every(cy => distanceToSegment(cx, cy, track.from, track.to) <= reach));
  });
  if (held) return null;
  const inside = outside(x, y) === 0;
  if (inside && near.every(track => distanceToTrack(x, y, track) > reach)) return { x, y };
  if (half < finest) return null; // smaller than any tolerance here: within reach + finest
  // Strips along the slot first, since its moves are long; then shorter ones.
  if (height > reach / 4 || height >= width) {
    return findHole(near, { ...cell, y1: y }, reach, outside, finest) ?? findHole(near, { ...cell, y0: y }, reach, outside, finest);
  }
  return findHole(near, { ...cell, x1: x }, reach, outside, finest) ?? findHole(near, { ...cell, x0: x }, reach, outside, finest);
}
