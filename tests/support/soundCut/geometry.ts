import type { Move, Place, Point, Turn } from './types';

/** Plain plane geometry of the judge's own; angles in radians, counterclockwise positive. */
export const FULL = 2 * Math.PI;

/** A move seen in plan, with its box for quick refusals. */
export interface Track {
  readonly from: Point;
  readonly to: Point;
  readonly turn: Turn | null;
  readonly box: Box;
}

export interface Box {
  readonly x0: number;
  readonly y0: number;
  readonly x1: number;
  readonly y1: number;
}

export function turnAngle(turn: Turn, t: number): number {
  return turn.start + turn.sweep * t;
}

export function onCircle(centre: Point, radius: number, angle: number): Point {
  return { x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) };
}

/** Where the move is after the share `t` of its way; Z keeps pace with the way in plan. */
export function placeAt(move: Move, t: number): Place {
  const z = move.from.z + (move.to.z - move.from.z) * t;
  if (move.turn !== null) return { ...onCircle(move.turn.centre, move.turn.radius, turnAngle(move.turn, t)), z };
  return { x: move.from.x + (move.to.x - move.from.x) * t, y: move.from.y + (move.to.y - move.from.y) * t, z };
}

export function planLength(move: Move): number {
  if (move.turn !== null) return Math.abs(move.turn.sweep) * move.turn.radius;
  const length = Math.hypot(move.to.x - move.from.x, move.to.y - move.from.y);
  return Number.isNaN(length) ? 0 : length; // X or Y not said yet: only Z moves
}

/** Helix: hypot(R × sweep, dz) (FACTS B1). */
export function wayLength(move: Move): number {
  return Math.hypot(planLength(move), move.to.z - move.from.z);
}

/** Share of the turn at which it has this angle, or -1 where it never has. */
export function shareOfTurn(turn: Turn, angle: number): number {
  const ahead = turn.sweep >= 0 ? angle - turn.start : turn.start - angle;
  const wrapped = ahead - FULL * Math.floor(ahead / FULL);
  const sweep = Math.abs(turn.sweep);
  if (wrapped <= sweep) return wrapped / sweep;
  return FULL - wrapped < 1e-9 ? 0 : -1; // 1e-9 rad: the start itself, reached from below by rounding
}

/** A turn's places of largest and least X and Y, and its ends: its box and its farthest points follow from them. */
export function turnCandidates(turn: Turn, angles: readonly number[]): Point[] {
  const all = [0, Math.PI / 2, Math.PI, -Math.PI / 2, ...angles].filter(angle => shareOfTurn(turn, angle) >= 0);
  return [turn.start, turn.start + turn.sweep, ...all].map(angle => onCircle(turn.centre, turn.radius, angle));
}

export function boxOf(points: readonly Point[]): Box {
  const box = { x0: Infinity, y0: Infinity, x1: -Infinity, y1: -Infinity };
  for (const { x, y } of points) {
    box.x0 = Math.min(box.x0, x);
    box.y0 = Math.min(box.y0, y);
    box.x1 = Math.max(box.x1, x);
    box.y1 = Math.max(box.y1, y);
  }
  return box;
}

export function trackOf(move: Move): Track {
  const points = [move.from, move.to, ...(move.turn === null ? [] : turnCandidates(move.turn, []))];
  return { from: move.from, to: move.to, turn: move.turn, box: boxOf(points) };
}

export function distanceToSegment(px: number, py: number, a: Point, b: Point): number {
  const dx = b.x - a.x;
  const dy = b.y - a.y;
  const square = dx * dx + dy * dy;
  const t = square === 0 ? 0 : Math.min(1, Math.max(0, ((px - a.x) * dx + (py - a.y) * dy) / square));
  const fx = px - a.x - t * dx;
  const fy = py - a.y - t * dy;
  return Math.sqrt(fx * fx + fy * fy); // Math.hypot takes several times as long, and nothing here can overflow
}

/** True distance to a line or to part of a circle, no chords. */
export function distanceToTrack(px: number, py: number, track: Track): number {
  const { turn } = track;
  if (turn === null) return distanceToSegment(px, py, track.from, track.to);
  const dx = px - turn.centre.x;
  const dy = py - turn.centre.y;
  if (shareOfTurn(turn, Math.atan2(dy, dx)) >= 0) return Math.abs(Math.hypot(dx, dy) - turn.radius);
  return Math.min(Math.hypot(px - track.from.x, py - track.from.y), Math.hypot(px - track.to.x, py - track.to.y));
}

export function distanceToBox(px: number, py: number, box: Box): number {
  const dx = Math.max(box.x0 - px, 0, px - box.x1);
  const dy = Math.max(box.y0 - py, 0, py - box.y1);
  return Math.sqrt(dx * dx + dy * dy);
}

/**
 * First and last share of the move at which a disc of this radius, centred on the tool, holds the point; null if never.
 * A line: roots of |p + t d - q| = R. A turn: |c + r e^(ia) - q| <= R where cos(a - f) >= (r² + D² - R²) / 2 r D.
 */
export function underTool(track: Track, px: number, py: number, radius: number): readonly [number, number] | null {
  const { box, turn, from, to } = track;
  if (px < box.x0 - radius || px > box.x1 + radius || py < box.y0 - radius || py > box.y1 + radius) return null;
  if (turn === null) {
    const dx = to.x - from.x;
    const dy = to.y - from.y;
    const fx = from.x - px;
    const fy = from.y - py;
    const a = dx * dx + dy * dy;
    const c = fx * fx + fy * fy - radius * radius;
    if (a === 0) return c <= 0 ? [0, 1] : null;
    const b = fx * dx + fy * dy;
    const under = b * b - a * c;
    if (under < 0) return null;
    const root = Math.sqrt(under);
    const first = Math.max(0, (-b - root) / a);
    const last = Math.min(1, (-b + root) / a);
    return first <= last ? [first, last] : null;
  }
  const dx = px - turn.centre.x;
  const dy = py - turn.centre.y;
  const far = Math.hypot(dx, dy);
  const r = turn.radius;
  if (far + r <= radius) return [0, 1];
  const cosine = (r * r + far * far - radius * radius) / (2 * r * far);
  if (cosine > 1) return null;
  const half = Math.acos(Math.max(-1, cosine));
  const middle = Math.atan2(dy, dx);
  const low = Math.min(turn.start, turn.start + turn.sweep);
  const high = Math.max(turn.start, turn.start + turn.sweep);
  let first = Infinity;
  let last = -Infinity;
  for (let round = Math.ceil((low - half - middle) / FULL) * FULL; middle + round - half <= high; round += FULL) {
    first = Math.min(first, Math.max(low, middle + round - half));
    last = Math.max(last, Math.min(high, middle + round + half));
  }
  if (first > last) return null;
  const shares = [(first - turn.start) / turn.sweep, (last - turn.start) / turn.sweep] as const;
  return shares[0] <= shares[1] ? shares : [shares[1], shares[0]];
}
