import type { Pass } from '#shared/playback/index';
import type { SlotSpec } from '#shared/slot/spec';
import { type Timeline, isMotion, newMoment, positionAt, stepAt } from '#shared/time/index';
import { onceOver } from './onceOver';

/** The bit's way through one pass, seen from above: moments and places on the rail, from its front left corner. */
export interface Way {
  readonly seconds: readonly number[];
  readonly x: readonly number[];
  readonly y: readonly number[];
}

/** One pass as a track to scrub along. */
export interface Lane {
  /** Counted from 1. */
  readonly pass: number;
  readonly start: number;
  readonly end: number;
  readonly depth: number;
  readonly way: Way;
}

export interface LaneMarks {
  /** Moments of the first way into the wood, of the finish lap (null without one) and of leaving the wood. */
  readonly entry: number;
  readonly finish: number | null;
  readonly end: number;
}

/** More passes than this share one lane. */
export const MOST_LANES = 8;
/** More points than this change nothing that can be seen or pointed at. */
const MOST_POINTS = 4000;
const ARC_PARTS = 6;

type Placed = Pick<SlotSpec, 'workZero' | 'length' | 'stopMargin' | 'railWidth' | 'width' | 'bitDiameter' | 'finishAllowance'>;

const shiftOf = (spec: Placed) =>
  spec.workZero === 'centre' ? [spec.length / 2 + spec.stopMargin, spec.railWidth / 2] as const : [0, 0] as const;

/** Where the bit stands on the rail at a moment; null before the program has said. */
export function placeAt(timeline: Timeline, spec: Placed, seconds: number): { readonly x: number; readonly y: number } | null {
  const { x, y } = positionAt(timeline, seconds, newMoment());
  if (Number.isNaN(x + y)) return null;
  const [dx, dy] = shiftOf(spec);
  return { x: x + dx, y: y + dy };
}

function wayOf(timeline: Timeline, spec: Placed, start: number, end: number): Way {
  const way = { seconds: [] as number[], x: [] as number[], y: [] as number[] };
  const put = (at: number) => {
    const place = placeAt(timeline, spec, at);
    if (!place) return;
    way.seconds.push(at);
    way.x.push(place.x);
    way.y.push(place.y);
  };
  const inside: number[] = [];
  for (let i = stepAt(timeline, start); i < timeline.steps.length && (timeline.start[i] ?? 0) <= end; i++) {
    const within = (timeline.start[i] ?? 0) >= start - 1e-9 && (timeline.end[i] ?? 0) <= end + 1e-9;
    if (within && (timeline.length[i] ?? 0) > 0) inside.push(i);
  }
  const stride = Math.max(1, Math.ceil(inside.length / MOST_POINTS));
  put(start);
  for (let n = 0; n < inside.length; n += stride) {
    const i = inside[n] ?? 0;
    const step = timeline.steps[i];
    const [from, to] = [timeline.start[i] ?? 0, timeline.end[i] ?? 0];
    const parts = step && isMotion(step) && step.arc && stride === 1 ? ARC_PARTS : 1;
    for (let k = 1; k <= parts; k++) put(from + ((to - from) * k) / parts);
  }
  if ((way.seconds.at(-1) ?? -1) < end - 1e-9) put(end);
  return way;
}

/** When the bit last leaves the wood. */
function lastCut(timeline: Timeline): number {
  const i = timeline.steps.findLastIndex((step) => isMotion(step) && step.kind !== 'rapid' && step.to.z < 0);
  return i < 0 ? timeline.seconds : timeline.end[i] ?? timeline.seconds;
}

/** One pass, counted from 1, with its way; the last ends where the bit leaves the wood. */
export function laneOf(timeline: Timeline, passes: readonly Pass[], number: number, spec: Placed): Lane | null {
  const pass = passes[number - 1];
  if (!pass) return null;
  const end = Math.max(pass.start, passes[number]?.start ?? lastCut(timeline));
  return { pass: number, start: pass.start, end, depth: pass.depth, way: wayOf(timeline, spec, pass.start, end) };
}

/** The finish lap begins where the last pass first runs level along the wall it was kept away from. */
export function marksOf(timeline: Timeline, passes: readonly Pass[], spec: Placed): LaneMarks | null {
  const [first, last] = [passes[0], passes.at(-1)];
  if (!first || !last) return null;
  let finish: number | null = null;
  if (spec.finishAllowance > 0) {
    const [, dy] = shiftOf(spec);
    const wall = (spec.width - spec.bitDiameter) / 2 - spec.finishAllowance / 2;
    const atWall = (y: number) => Math.abs(y + dy - spec.railWidth / 2) > wall;
    const i = timeline.steps.findIndex((step, n) => n >= last.step && isMotion(step) && step.kind === 'line' && step.from.z === step.to.z && atWall(step.from.y) && atWall(step.to.y));
    finish = i < 0 ? null : timeline.start[i] ?? null;
  }
  return { entry: first.start, finish, end: lastCut(timeline) };
}

/** Where a lane is drawn: the rail's scale along, a few pixels across. */
export interface TrackBox {
  readonly at: (along: number) => number;
  readonly top: number;
  readonly bottom: number;
}

/** A lane on the screen: the bit's way squeezed into a track, and how far along it each point lies. */
export interface Track {
  readonly lane: Lane;
  readonly px: readonly number[];
  readonly py: readonly number[];
  readonly far: readonly number[];
  readonly path: string;
  /** The same with every stretch once: dashes of a way gone twice would fill each other's gaps. */
  readonly once: string;
}

/** Draws every lane's way to the same width across, front edge below, so that going out and coming back lie apart. */
export function trackOf(lane: Lane, box: TrackBox): Track {
  const { x, y } = lane.way;
  const [low, high] = [Math.min(...y), Math.max(...y)];
  const across = high - low;
  const py = y.map((one) => (across > 1e-6 ? box.bottom - ((one - low) / across) * (box.bottom - box.top) : (box.top + box.bottom) / 2));
  const px = x.map(box.at);
  const far = [0];
  for (let i = 1; i < px.length; i++) far.push((far[i - 1] ?? 0) + Math.hypot((px[i] ?? 0) - (px[i - 1] ?? 0), (py[i] ?? 0) - (py[i - 1] ?? 0)));
  const path = px.map((one, i) => `${i === 0 ? 'M' : 'L'}${one.toFixed(1)} ${(py[i] ?? 0).toFixed(1)}`).join('');
  return { lane, px, py, far, path, once: onceOver(px, py) };
}

/** Which point of the way was last reached at a moment. */
function indexAt(seconds: readonly number[], at: number): number {
  let [low, high] = [0, seconds.length - 1];
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if ((seconds[middle] ?? 0) <= at) low = middle;
    else high = middle - 1;
  }
  return low;
}

/** How much of a track is behind at a moment, in pixels; `x` is where the bit then stands along the rod. */
export function doneOf({ lane, px, far }: Track, seconds: number, x: number | null): number {
  const whole = far.at(-1) ?? 0;
  if (seconds <= lane.start) return 0;
  if (seconds >= lane.end) return whole;
  const i = indexAt(lane.way.seconds, seconds);
  const [from, to] = [px[i] ?? 0, px[i + 1] ?? px[i] ?? 0];
  const [begun, ends] = [lane.way.seconds[i] ?? 0, lane.way.seconds[i + 1] ?? 0];
  const byTime = ends > begun ? (seconds - begun) / (ends - begun) : 0;
  const share = x !== null && Math.abs(to - from) > 1 ? Math.min(1, Math.max(0, (x - from) / (to - from))) : byTime;
  return (far[i] ?? 0) + share * ((far[i + 1] ?? far[i] ?? 0) - (far[i] ?? 0));
}

/** Pixels that the whole of a lane's time weighs against distance: of two equally near moments the nearer in time is meant. */
const PATIENCE = 12;

/** The moment of a lane that is meant by a place on its track: the nearest point, and the nearest in time to now. */
export function momentAt(track: Track, place: { readonly x: number; readonly y: number }, now: number): number {
  const { lane, px, py } = track;
  const { seconds } = lane.way;
  let [best, least] = [lane.start, Infinity];
  for (let i = 0; i + 1 < px.length; i++) {
    const [x0, y0] = [px[i] ?? 0, py[i] ?? 0];
    const [dx, dy] = [(px[i + 1] ?? 0) - x0, (py[i + 1] ?? 0) - y0];
    const square = dx * dx + dy * dy;
    const share = square > 0 ? Math.min(1, Math.max(0, ((place.x - x0) * dx + (place.y - y0) * dy) / square)) : 0;
    const at = (seconds[i] ?? 0) + share * ((seconds[i + 1] ?? 0) - (seconds[i] ?? 0));
    const cost = Math.hypot(place.x - x0 - share * dx, place.y - y0 - share * dy) + (PATIENCE * Math.abs(at - now)) / Math.max(1e-9, lane.end - lane.start);
    if (cost < least) [best, least] = [at, cost];
  }
  return best;
}


/** The passes that have a lane: all of a few, and of many only the one under way. */
export function shownPasses(count: number, now: number): readonly number[] {
  if (count <= MOST_LANES) return Array.from({ length: count }, (_, i) => i + 1);
  return [Math.min(count, Math.max(1, now))];
}

export interface LanePlace {
  readonly top: number;
  readonly bottom: number;
  readonly middle: number;
}

const TARGET = 44; // px: all lanes together are at least a finger high
const PITCH = [22, 18, 15] as const; // px from lane to lane, of up to 3, 5 and 8

/** Where the lanes lie under the rod, from 0 down. */
export function lanePlaces(count: number): { readonly height: number; readonly places: readonly LanePlace[] } {
  const pitch = count <= 3 ? PITCH[0] : count <= 5 ? PITCH[1] : PITCH[2];
  const height = Math.max(TARGET, count * pitch);
  const start = (height - count * pitch) / 2;
  const half = Math.min(6, pitch / 2 - 3.5);
  return {
    height,
    places: Array.from({ length: count }, (_, i) => {
      const middle = start + (i + 0.5) * pitch;
      return { middle, top: middle - half, bottom: middle + half };
    }),
  };
}
