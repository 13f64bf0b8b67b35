import { turnCandidates } from './geometry';
import { type JudgedSpec, type Move, type Point, sizeTolerance, type Turn } from './types';

/**
 * Where the middle of the bit may be: a rectangle `halfX` × `halfY` about the slot's middle, grown by `round`.
 * The finished slot is exactly this region grown by the bit's radius: the cornered slot is a rectangle opened by a disc,
 * the round one a stadium. One of halfY and round is always 0.
 */
export interface Home {
  readonly centre: Point;
  readonly halfX: number;
  readonly halfY: number;
  readonly round: number;
}

export interface Slot {
  readonly home: Home;
  readonly oneBit: boolean;
  readonly bitRadius: number;
  /** The width the bit leaves: its own in a one-bit slot. */
  readonly width: number;
  readonly tolerance: number;
}

/** |width − bit| ≤ 0.005 in / 0.12 mm is a one-bit slot (issue, "The slot spec"). 1e-9: 0.255 − 0.25 in binary. */
export function isOneBitSlot(spec: JudgedSpec): boolean {
  return Math.abs(spec.width - spec.bitDiameter) <= (spec.units === 'in' ? 0.005 : 0.12) + 1e-9;
}

export function slotOf(spec: JudgedSpec): Slot {
  const oneBit = isOneBitSlot(spec);
  const bitRadius = spec.bitDiameter / 2;
  const width = oneBit ? spec.bitDiameter : spec.width;
  const railWidth = spec.railWidth ?? 3 * spec.width; // issue: the joiner's rule of thirds
  // Work zero is the rail's front left corner or its middle; the slot's middle is the rail's middle.
  const centre = spec.workZero === 'centre' ? { x: 0, y: 0 } : { x: spec.stopMargin + spec.length / 2, y: railWidth / 2 };
  const across = width / 2 - bitRadius;
  const home = spec.ends === 'round' && !oneBit
    ? { centre, halfX: (spec.length - width) / 2, halfY: 0, round: across }
    : { centre, halfX: spec.length / 2 - bitRadius, halfY: across, round: 0 };
  return { home, oneBit, bitRadius, width, tolerance: sizeTolerance(spec.units) };
}

/** The home shrunk by a distance on every side, or null where nothing is left. */
export function shrink(home: Home, by: number): Home | null {
  const smaller = home.round > 0
    ? { ...home, round: home.round - by }
    : { ...home, halfX: home.halfX - by, halfY: home.halfY - by };
  const least = -1e-9; // a line or a point is still a home
  return smaller.halfX < least || smaller.halfY < least || smaller.round < least ? null
    : { ...smaller, halfX: Math.max(0, smaller.halfX), halfY: Math.max(0, smaller.halfY), round: Math.max(0, smaller.round) };
}

/** Distance outside the home, 0 inside it. */
export function outsideHome(home: Home, x: number, y: number): number {
  const dx = Math.max(0, Math.abs(x - home.centre.x) - home.halfX);
  const dy = Math.max(0, Math.abs(y - home.centre.y) - home.halfY);
  return Math.max(0, Math.sqrt(dx * dx + dy * dy) - home.round);
}

/** How far inside the home's edge a point is; meaningful inside it. */
export function insetOf(home: Home, x: number, y: number): number {
  const ax = Math.abs(x - home.centre.x);
  const ay = Math.abs(y - home.centre.y);
  if (home.round > 0) return home.round - Math.hypot(Math.max(0, ax - home.halfX), ay);
  return Math.min(home.halfX - ax, home.halfY - ay);
}

export function cornersOf(home: Home): Point[] {
  const { centre: { x, y }, halfX, halfY } = home;
  return [{ x: x + halfX, y: y - halfY }, { x: x + halfX, y: y + halfY }, { x: x - halfX, y: y + halfY }, { x: x - halfX, y: y - halfY }];
}

/** Farthest that a move leaves the home, exactly: the home is convex, so on a line the ends decide. */
export function farthestOutside(home: Home, move: Move): number {
  const points: Point[] = [move.from, move.to];
  if (move.turn !== null) points.push(...farPoints(home, move.turn));
  return Math.max(...points.map(({ x, y }) => outsideHome(home, x, y)));
}

/** On a turn the distance can also peak across a side or straight away from a corner. */
function farPoints(home: Home, turn: Turn): Point[] {
  const away = cornersOf(home).flatMap((corner) => {
    const angle = Math.atan2(turn.centre.y - corner.y, turn.centre.x - corner.x);
    return [angle, angle + Math.PI];
  });
  return turnCandidates(turn, away);
}

/** The home's edge, counterclockwise: straight sides and half circles. A line has one side, a point has one of no length. */
export type Edge =
  | { readonly kind: 'side'; readonly from: Point; readonly to: Point; readonly outward: Point }
  | { readonly kind: 'bend'; readonly turn: Turn };

export function edgesOf(home: Home): Edge[] {
  const { centre: { x, y }, halfX, halfY, round } = home;
  const side = (from: Point, to: Point, nx: number, ny: number): Edge => ({ kind: 'side', from, to, outward: { x: nx, y: ny } });
  if (round > 0) {
    const bend = (middle: Point, start: number): Edge => ({ kind: 'bend', turn: { centre: middle, radius: round, start, sweep: Math.PI } });
    return [
      side({ x: x - halfX, y: y - round }, { x: x + halfX, y: y - round }, 0, -1),
      bend({ x: x + halfX, y }, -Math.PI / 2),
      side({ x: x + halfX, y: y + round }, { x: x - halfX, y: y + round }, 0, 1),
      bend({ x: x - halfX, y }, Math.PI / 2),
    ];
  }
  const [a, b, c, d] = cornersOf(home);
  if (a === undefined || b === undefined || c === undefined || d === undefined) return [];
  if (halfY === 0) return [side(c, b, 0, 1)];
  return [side(d, a, 0, -1), side(a, b, 1, 0), side(b, c, 0, 1), side(c, d, -1, 0)];
}

/** Once round the home. */
export function perimeterOf(home: Home): number {
  return 4 * (home.halfX + home.halfY) + 2 * Math.PI * home.round;
}
