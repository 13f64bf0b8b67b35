import type { Point3 } from '../geometry/point';
import { PLANES } from '../reader/planes';
import type { ArcPath, Motion } from '../reader/motion';

/** A point that is written into again and again, so that a frame of playback allocates nothing. */
export interface MutablePoint {
  x: number;
  y: number;
  z: number;
}

/** The axes of an arc; a program that has not named a plane is in XY, as NISTIR 6556 starts (3.5.6). */
const planeOf = (motion: Motion) => PLANES[motion.modes.plane ?? 17];

/**
 * How far the motion goes; 0 where it cannot be known, because an axis moves from a place the program has not stated.
 * An axis that is nowhere stated does not move.
 */
export function motionLength(motion: Motion): number {
  const { from, to, arc } = motion;
  if (arc) {
    const rise = riseOf(motion);
    const round = arc.radius * arc.sweep;
    return Math.sqrt(round * round + known(rise) ** 2);
  }
  const x = Number.isNaN(to.x) ? 0 : to.x - from.x;
  const y = Number.isNaN(to.y) ? 0 : to.y - from.y;
  const z = Number.isNaN(to.z) ? 0 : to.z - from.z;
  const length = Math.sqrt(x * x + y * y + z * z);
  return length === length ? length : 0; // NaN: the start is not known
}

/** True where `motionLength` had to answer 0 for want of a known start. */
export function startsUnknown({ from, to }: Motion): boolean {
  return (Number.isNaN(from.x) && !Number.isNaN(to.x)) || (Number.isNaN(from.y) && !Number.isNaN(to.y)) || (Number.isNaN(from.z) && !Number.isNaN(to.z));
}

/** Writes the point at `fraction` of the motion's length; 0 and 1 give its ends to the last bit. */
export function pointAlong(motion: Motion, fraction: number, out: MutablePoint): void {
  const { from, to, arc } = motion;
  if (fraction >= 1) return copyPoint(to, out);
  if (fraction <= 0 && !startsUnknown(motion)) return copyPoint(from, out);
  out.x = between(from.x, to.x, fraction);
  out.y = between(from.y, to.y, fraction);
  out.z = between(from.z, to.z, fraction);
  if (!arc) return;
  const { first, second } = planeOf(motion);
  const u = from[first] - arc.centre[first];
  const v = from[second] - arc.centre[second];
  // The end may lie off the circle by the reader's tolerance: the radius goes over evenly, so that the arc ends on it.
  const reach = Math.sqrt((to[first] - arc.centre[first]) ** 2 + (to[second] - arc.centre[second]) ** 2);
  const grow = 1 + (reach / arc.radius - 1) * fraction;
  const angle = arc.turn * arc.sweep * fraction;
  const cos = Math.cos(angle) * grow;
  const sin = Math.sin(angle) * grow;
  out[first] = arc.centre[first] + u * cos - v * sin;
  out[second] = arc.centre[second] + u * sin + v * cos;
}

/** Writes the unit direction of travel at the motion's start or end. The motion must have length. */
export function directionAt(motion: Motion, end: 'start' | 'end', length: number, out: MutablePoint): void {
  const { from, to, arc } = motion;
  if (!arc) {
    out.x = known(to.x - from.x) / length;
    out.y = known(to.y - from.y) / length;
    out.z = known(to.z - from.z) / length;
    return;
  }
  // The tangent stands square on the radius; the share of the length that goes round is the helix's cosine.
  const angle = arc.turn * arc.sweep;
  const cos = end === 'end' ? Math.cos(angle) : 1;
  const sin = end === 'end' ? Math.sin(angle) : 0;
  const level = (arc.turn * roundShare(arc, length)) / arc.radius;
  const rise = known(riseOf(motion)) / length;
  if (inXY(motion)) {
    const u = from.x - arc.centre.x;
    const v = from.y - arc.centre.y;
    out.x = -(u * sin + v * cos) * level;
    out.y = (u * cos - v * sin) * level;
    out.z = rise;
    return;
  }
  const { first, second, normal } = planeOf(motion);
  const u = from[first] - arc.centre[first];
  const v = from[second] - arc.centre[second];
  out[first] = -(u * sin + v * cos) * level;
  out[second] = (u * cos - v * sin) * level;
  out[normal] = rise;
}

/** Almost every arc is; named axes are several times slower than written ones, and a long program has many arcs. */
const inXY = (motion: Motion): boolean => (motion.modes.plane ?? 17) === 17;

/** How far an arc moves along its plane's normal. */
function riseOf(motion: Motion): number {
  if (inXY(motion)) return motion.to.z - motion.from.z;
  const { normal } = planeOf(motion);
  return motion.to[normal] - motion.from[normal];
}

/** The share of an arc's length that lies in its plane: 1 for a flat one, less for a helix. */
export function roundShare(arc: ArcPath, length: number): number {
  return (arc.radius * arc.sweep) / length;
}

const known = (value: number): number => (value === value ? value : 0);

function between(from: number, to: number, fraction: number): number {
  const value = from + (to - from) * fraction;
  return value === value ? value : to;
}

/** Writes one point into another. */
export function copyPoint(from: Point3, out: MutablePoint): void {
  out.x = from.x;
  out.y = from.y;
  out.z = from.z;
}
