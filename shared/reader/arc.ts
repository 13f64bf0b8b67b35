import type { Point3 } from '../geometry/point';
import { type Units, byUnits } from '../measure/units';
import type { ReadErrorCode } from './errors';
import type { ArcPath } from './motion';
import type { Plane } from './planes';

/** +1 counterclockwise (G3), -1 clockwise (G2). */
export type Turn = ArcPath['turn'];

/** How far an arc's start and end radius may differ: 0.0002 inch or 0.002 millimetre (3.5.3.2). */
export const radiusTolerance = (units: Units): number => byUnits(units, 0.0002, 0.002);

/** Double rounding of written decimals, far below the tolerance it is added to. */
const ROUNDING = 1e-9;

/** 3.5.3.1: a negative radius turns through 359.999 degrees at most. */
const MOST_RADIUS_SWEEP = (359.999 / 180) * Math.PI;

const FULL_TURN = 2 * Math.PI;

/**
 * Centre format (3.5.3.2): the centre lies (`u`, `v`) from the start, along the plane's first and second axis.
 * End = start is a full circle. The radius is the start's.
 */
export function centreArc(plane: Plane, from: Point3, to: Point3, u: number, v: number, turn: Turn, units: Units): ArcPath | ReadErrorCode {
  const radius = Math.sqrt(u * u + v * v);
  if (radius === 0) return 'arcNoRadius';
  const centreU = from[plane.first] + u;
  const centreV = from[plane.second] + v;
  const endU = to[plane.first] - centreU;
  const endV = to[plane.second] - centreV;
  const difference = Math.abs(Math.sqrt(endU * endU + endV * endV) - radius);
  if (!(difference <= radiusTolerance(units) + ROUNDING)) return 'arcRadiiDiffer'; // NaN, from overflow, differs too
  const closed = to[plane.first] === from[plane.first] && to[plane.second] === from[plane.second];
  // Start vector is (-u, -v): angle from it to the end vector, by cross and dot product.
  const angle = turn * Math.atan2(v * endU - u * endV, -u * endU - v * endV);
  const sweep = closed || angle === 0 ? FULL_TURN : angle < 0 ? angle + FULL_TURN : angle;
  return { centre: pointOn(plane, centreU, centreV, from[plane.normal]), radius, sweep, turn };
}

/**
 * Radius format (3.5.3.1): a positive `r` turns through 180 degrees or less, a negative one through more.
 * Where rounding leaves the end farther off than the diameter, within the tolerance of 3.5.3.2, the arc is the half circle.
 */
export function radiusArc(plane: Plane, from: Point3, to: Point3, r: number, turn: Turn, units: Units): ArcPath | ReadErrorCode {
  const chordU = to[plane.first] - from[plane.first];
  const chordV = to[plane.second] - from[plane.second];
  if (chordU === 0 && chordV === 0) return 'arcEndIsStart';
  if (r === 0) return 'arcNoRadius';
  const half = Math.sqrt(chordU * chordU + chordV * chordV) / 2;
  if (!(half - Math.abs(r) <= radiusTolerance(units) + ROUNDING)) return 'arcOutOfReach';
  const radius = Math.max(half, Math.abs(r));
  // Height of the centre over the chord, to its left for a counterclockwise minor arc.
  const height = Math.sqrt((radius - half) * (radius + half));
  const minor = 2 * Math.atan2(half, height);
  const sweep = r > 0 ? minor : FULL_TURN - minor;
  if (!(sweep <= MOST_RADIUS_SWEEP)) return 'arcNearlyFull';
  const left = (turn * Math.sign(r) * height) / (2 * half);
  const centreU = from[plane.first] + chordU / 2 - left * chordV;
  const centreV = from[plane.second] + chordV / 2 + left * chordU;
  return { centre: pointOn(plane, centreU, centreV, from[plane.normal]), radius, sweep, turn };
}

/** Length along an arc that rises by `rise` along its plane's normal: a helix unrolls to a right triangle (2.1.2.6). */
export function arcLength(arc: ArcPath, rise: number): number {
  return Math.hypot(arc.radius * arc.sweep, rise);
}

function pointOn(plane: Plane, first: number, second: number, normal: number): Point3 {
  if (plane.normal === 'z') return { x: first, y: second, z: normal };
  return plane.normal === 'y' ? { x: second, y: normal, z: first } : { x: normal, y: first, z: second };
}
