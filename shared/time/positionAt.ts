import { type MutablePoint, copyPoint, pointAlong } from './along';
import { travelled } from './profile';
import { isMotion } from '../reader/motion';
import type { Timeline } from './timeline';

/** Where the program stands at a moment. Coordinates are NaN where the program has not stated them yet. */
export interface Moment extends MutablePoint {
  /** Index of the step under way; -1 in a program without steps. */
  step: number;
  /** Share of the step's length that is behind, or of an event's seconds. */
  fraction: number;
  /** Length travelled since the start of the program. */
  travel: number;
}

export const newMoment = (): Moment => ({ x: NaN, y: NaN, z: NaN, step: -1, fraction: 0, travel: 0 });

/** The last step that has begun at `seconds`: steps that take no time are behind as soon as they are reached. */
export function stepAt(timeline: Timeline, seconds: number): number {
  const { start } = timeline;
  let low = 0;
  let high = start.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if ((start[middle] ?? 0) <= seconds) low = middle;
    else high = middle - 1;
  }
  return start.length === 0 ? -1 : low;
}

/**
 * The point, step and travel at `seconds` from the start, exact where a step ends, in the time of a binary search.
 * Writes into `out`, so that a caller that asks every frame allocates nothing.
 */
export function positionAt(timeline: Timeline, seconds: number, out: Moment = newMoment()): Moment {
  const i = stepAt(timeline, seconds);
  out.step = i;
  out.fraction = 0;
  out.travel = 0;
  out.x = out.y = out.z = NaN;
  const step = timeline.steps[i];
  if (!step) return out;
  const begun = timeline.start[i] ?? 0;
  const total = (timeline.end[i] ?? 0) - begun;
  const since = seconds - begun;
  const before = timeline.before[i] ?? 0;
  if (isMotion(step)) {
    const length = timeline.length[i] ?? 0;
    const done = travelled(since, total, length, timeline.entry[i] ?? 0, timeline.peak[i] ?? 0, timeline.exit[i] ?? 0, timeline.acceleration);
    out.fraction = length > 0 ? done / length : 1;
    out.travel = before + done;
    pointAlong(step, out.fraction, out);
    return out;
  }
  out.fraction = total > 0 ? Math.min(1, Math.max(0, since / total)) : 1;
  out.travel = before;
  const last = timeline.motion[i] ?? -1;
  const beside = timeline.steps[last < 0 ? timeline.first : last];
  if (beside && isMotion(beside)) copyPoint(last < 0 ? beside.from : beside.to, out);
  return out;
}
