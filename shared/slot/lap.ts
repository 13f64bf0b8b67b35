import { type Point2, norm } from '../geometry/point';
import type { SlotSpec } from './spec';

/** +1 counterclockwise, -1 clockwise, seen from above. */
export type Turn = 1 | -1;

/** One straight side of a lap, or a quarter of a round end. `slopes` where an entry ramp may descend along it. */
export interface Side {
  readonly from: Point2;
  readonly to: Point2;
  readonly centre: Point2 | null;
  /** Of a round end's quarter its chord's: a ramp along it stays gentle enough also where the text has chords. */
  readonly length: number;
  readonly slopes: boolean;
}

/** Once round the slot at one distance from its walls. */
export interface Lap {
  readonly sides: readonly Side[];
  readonly turn: Turn;
}

/** The slot's middle, and the half sizes of the area that the bit's centre may move in. */
export interface CentreArea {
  readonly middle: Point2;
  readonly halfLength: number;
  readonly halfWidth: number;
  readonly round: boolean;
}

/** A side shorter than this share of the longest stays level in a ramp: rounding its few thousandths would make it steep. */
const LEVEL_SHARE = 1 / 4;

/**
 * Where the bit's centre may go, in the frame of the rail's front left corner or its middle.
 *
 * All on whole steps of the last decimal, so that every quarter circle has its ends and its centre exactly where the
 * text says they are; no wall moves by more than one step for it.
 */
export function centreArea(spec: SlotSpec, grid: number): CentreArea {
  const snap = (value: number) => onGrid(Math.max(0, value), grid);
  const corner = { x: snap(spec.stopMargin + spec.length / 2), y: snap(spec.railWidth / 2) };
  return {
    middle: spec.workZero === 'corner' ? corner : { x: 0, y: 0 },
    halfLength: snap((spec.length - spec.bitDiameter) / 2),
    halfWidth: snap((spec.width - spec.bitDiameter) / 2),
    round: spec.ends === 'round',
  };
}

/** The nearest whole step of the last decimal. */
export function onGrid(value: number, grid: number): number {
  return Math.round(value / grid) * grid;
}

/** The lap `inset` inside the area's edge, started at its front left (seen from the climbing side). */
export function lapAt(area: CentreArea, inset: number, turn: Turn): Lap {
  const { x: cx, y: cy } = area.middle;
  const b = area.halfWidth - inset;
  const a = area.halfLength - inset;
  // Half of the straight part: a round end takes a half circle of radius b off each end, a cornered one nothing.
  const s = area.round ? a - b : a;
  const at = (x: number, y: number): Point2 => ({ x: cx + x, y: cy + turn * y });

  const [right, left] = [at(s, 0), at(-s, 0)];
  const corners: readonly { readonly to: Point2; readonly centre: Point2 | null }[] = area.round
    ? [
        { to: at(s, -b), centre: null }, { to: at(s + b, 0), centre: right }, { to: at(s, b), centre: right },
        { to: at(-s, b), centre: null }, { to: at(-s - b, 0), centre: left }, { to: at(-s, -b), centre: left },
      ]
    : [
        { to: at(s, -b), centre: null }, { to: at(s, b), centre: null },
        { to: at(-s, b), centre: null }, { to: at(-s, -b), centre: null },
      ];

  let from = at(-s, -b);
  const sides = corners.map(({ to, centre }) => {
    const side = { from, to, centre, length: norm(to.x - from.x, to.y - from.y) };
    from = to;
    return side;
  }).filter((side) => side.length > 0);
  const longest = Math.max(...sides.map((side) => side.length));
  return { turn, sides: sides.map((side) => ({ ...side, slopes: side.length >= longest * LEVEL_SHARE })) };
}

/** The point `distance` along a side. */
export function pointAlong(side: Side, distance: number): Point2 {
  const t = distance / side.length;
  const { from, to, centre } = side;
  if (!centre) return { x: from.x + t * (to.x - from.x), y: from.y + t * (to.y - from.y) };
  // Of a quarter circle from `from` to `to`: both radii are perpendicular, so they span the arc.
  const [c, s] = [Math.cos((t * Math.PI) / 2), Math.sin((t * Math.PI) / 2)];
  return {
    x: centre.x + c * (from.x - centre.x) + s * (to.x - centre.x),
    y: centre.y + c * (from.y - centre.y) + s * (to.y - centre.y),
  };
}

/** How far along a side the foot of a point is, held to the side's ends. */
export function distanceAlong(side: Side, point: Point2): number {
  const { from, to, centre, length } = side;
  const foot = centre
    ? (Math.atan2(
        (point.x - centre.x) * (to.x - centre.x) + (point.y - centre.y) * (to.y - centre.y),
        (point.x - centre.x) * (from.x - centre.x) + (point.y - centre.y) * (from.y - centre.y),
      ) / (Math.PI / 2)) * length
    : ((point.x - from.x) * (to.x - from.x) + (point.y - from.y) * (to.y - from.y)) / length;
  return Math.min(Math.max(foot, 0), length);
}

/** The distance over which a ramp may descend in one lap. */
export function slopeLength(lap: Lap): number {
  return lap.sides.reduce((sum, side) => sum + (side.slopes ? side.length : 0), 0);
}
