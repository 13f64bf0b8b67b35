import { type Motion, type Step, isMotion } from '../reader/motion';
import { type MutablePoint, directionAt, motionLength, roundShare, startsUnknown } from './along';
import type { Dynamics } from './dynamics';
import { moveSeconds, peakSpeed } from './profile';

/** When each step of a program happens, and how fast: seconds, and the program's units. Made by `timeOf`. */
export interface Timeline {
  readonly steps: readonly Step[];
  readonly acceleration: number;
  /** Seconds of the whole program. */
  readonly seconds: number;
  /** Seconds at which each step starts and ends. */
  readonly start: Float64Array;
  readonly end: Float64Array;
  /** Length of each step, 0 for an event. */
  readonly length: Float64Array;
  /** Length travelled before each step. */
  readonly before: Float64Array;
  /** Speeds of each motion, units per second. */
  readonly entry: Float64Array;
  readonly peak: Float64Array;
  readonly exit: Float64Array;
  /** The motion that each step is, or stands at the end of; -1 before the first. */
  readonly motion: Int32Array;
  /** The first motion; -1 without one. */
  readonly first: number;
  /** Length of all motions at feed, and of all rapids. */
  readonly cutLength: number;
  readonly rapidLength: number;
  /** M0, M1 and M60: how long a person takes is not counted. */
  readonly stops: number;
  /** Motions that count as nothing: from a place the program has not stated, or before any feed. */
  readonly unmeasured: number;
}

/** Where two directions differ less than this, there is no corner: rounding of doubles, far below any real one. */
const STRAIGHT = 1e-12;

/**
 * How long a program takes on a machine that cannot jump from speed to speed.
 *
 * Each motion runs as fast as its feed allows, and an arc no faster than √(acceleration × radius), where the pull
 * towards its centre takes the whole acceleration. Where two motions meet, the velocity may jump by at most
 * acceleration × cornerTime: straight on that is no limit, at a corner it is (common practice, no source). A pass from
 * the back and one from the front then lower each meeting speed to what the lengths between leave room for.
 *
 * Dwells, spindle switches, stops and tool changes are reached standing. A motion from a place that the program has not
 * stated counts as nothing, so the way to the first point is left out; so does a person at an M0.
 */
export function timeOf(steps: readonly Step[], dynamics: Dynamics): Timeline {
  const count = steps.length;
  const acceleration = dynamics.acceleration;
  const make = () => new Float64Array(count);
  const [start, end, length, before, entry, peak, exit] = [make(), make(), make(), make(), make(), make(), make()];
  const motion = new Int32Array(count);
  const moves = new Int32Array(count); // the motions that have length, in order
  const caps = new Float64Array(count);
  const meet = new Float64Array(count + 1); // speed at the start of the nth of them
  const arriving = { x: 0, y: 0, z: 0 };
  const leaving = { x: 0, y: 0, z: 0 };

  let moving = 0;
  let first = -1;
  let last = -1;
  let [standing, stops, unmeasured, travel, cutLength, rapidLength] = [true, 0, 0, 0, 0, 0];
  for (let i = 0; i < count; i++) {
    const step = steps[i];
    if (!step) continue;
    before[i] = travel;
    motion[i] = last;
    if (!isMotion(step)) {
      if (step.kind !== 'coolant') standing = true;
      if (step.kind === 'stop') stops++;
      continue;
    }
    motion[i] = last = i;
    if (first < 0) first = i;
    const far = motionLength(step);
    const cap = far > 0 ? topSpeed(step, far, dynamics) : 0;
    if (cap === 0 && (far > 0 || startsUnknown(step))) unmeasured++;
    length[i] = far;
    travel += far;
    if (step.kind === 'rapid') rapidLength += far;
    else cutLength += far;
    if (cap === 0) continue; // no length or no feed: takes no time and makes no corner
    directionAt(step, 'start', far, leaving);
    if (!standing) meet[moving] = Math.min(cap, caps[moving - 1] ?? 0, cornerSpeed(arriving, leaving, acceleration * dynamics.cornerTime));
    directionAt(step, 'end', far, arriving);
    caps[moving] = cap;
    moves[moving++] = i;
    standing = step.modes.pathControl === 61.1; // exact stop (NISTIR 6556 2.1.2.16)
  }

  shareRoom(moves, moving, length, meet, acceleration);
  for (let n = 0; n < moving; n++) {
    const i = moves[n] ?? 0;
    const a = acceleration === Infinity ? (caps[n] ?? 0) : (meet[n] ?? 0);
    const b = acceleration === Infinity ? (caps[n] ?? 0) : (meet[n + 1] ?? 0);
    entry[i] = a;
    exit[i] = b;
    peak[i] = peakSpeed(length[i] ?? 0, a, b, caps[n] ?? 0, acceleration);
  }

  const seconds = layOut(steps, { start, end, length, entry, peak, exit }, dynamics);
  return { steps, acceleration, seconds, start, end, length, before, entry, peak, exit, motion, first, cutLength, rapidLength, stops, unmeasured };
}


/** Units per second the motion may reach; 0 where it has no feed. */
function topSpeed(move: Motion, length: number, { acceleration, rapidFeed, topFeed }: Dynamics): number {
  const feed = move.kind === 'rapid' ? rapidFeed : Math.min(move.feed ?? 0, topFeed);
  const speed = Math.max(0, feed) / 60;
  if (!move.arc) return speed;
  // On a helix only the part of the velocity that goes round is pulled to the centre.
  return Math.min(speed, Math.sqrt(acceleration * move.arc.radius) / roundShare(move.arc, length));
}

/** The speed at which turning from one unit direction into another changes the velocity by `jump`. */
function cornerSpeed(from: MutablePoint, to: MutablePoint, jump: number): number {
  const x = to.x - from.x;
  const y = to.y - from.y;
  const z = to.z - from.z;
  const turn = Math.sqrt(x * x + y * y + z * z);
  return turn <= STRAIGHT ? Infinity : jump / turn;
}

/** Lowers each meeting speed until every motion can get from its first to its last within its length: v² = v₀² + 2 a s. */
function shareRoom(moves: Int32Array, moving: number, length: Float64Array, meet: Float64Array, acceleration: number): void {
  if (acceleration === Infinity) return;
  const reach = (speed: number, n: number) => Math.sqrt(speed * speed + 2 * acceleration * (length[moves[n] ?? 0] ?? 0));
  for (let n = moving - 1; n >= 0; n--) meet[n] = Math.min(meet[n] ?? 0, reach(meet[n + 1] ?? 0, n));
  for (let n = 0; n < moving; n++) meet[n + 1] = Math.min(meet[n + 1] ?? 0, reach(meet[n] ?? 0, n));
}

type Profiles = Pick<Timeline, 'start' | 'end' | 'length' | 'entry' | 'peak' | 'exit'>;

/** Sets each step on the clock, one after the other; answers the seconds in all. */
function layOut(steps: readonly Step[], of: Profiles, dynamics: Dynamics): number {
  let clock = 0;
  let spindle: string = 'stopped';
  let spinning = 0; // seconds of spin-up that a dwell right behind the start covers
  for (let i = 0; i < steps.length; i++) {
    const step = steps[i];
    if (!step) continue;
    of.start[i] = clock;
    if (isMotion(step)) {
      if ((of.peak[i] ?? 0) > 0) clock += moveSeconds(of.length[i] ?? 0, of.entry[i] ?? 0, of.peak[i] ?? 0, of.exit[i] ?? 0, dynamics.acceleration);
    } else if (step.kind === 'dwell') {
      clock += Math.max(0, step.seconds - spinning);
    } else {
      const now = step.modes.spindle ?? 'stopped';
      spinning = now !== 'stopped' && now !== spindle ? dynamics.spinUp : 0;
      spindle = now;
      clock += spinning;
      of.end[i] = clock;
      continue;
    }
    spinning = 0;
    of.end[i] = clock;
  }
  return clock;
}
