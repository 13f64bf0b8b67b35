import type { ArcPath, Motion } from '../reader/motion';
import { type Timeline, isMotion, newMoment, pointAlong } from '../time/index';

/**
 * A program's path as straight pieces, arcs as chords, packed for the graphics card. Motions from an unknown place are
 * left out: nobody knows where they run.
 */
export interface Segments {
  readonly count: number;
  /** Six numbers each: from x y z, to x y z. */
  readonly ends: Float64Array;
  /** Two numbers each: length travelled by the whole program at its ends. */
  readonly travel: Float64Array;
  /** 1 for a rapid, 0 for a cut. */
  readonly rapid: Uint8Array;
  /** 1 for a piece of a finish lap, where that was asked. */
  readonly finish?: Uint8Array;
}

/**
 * @param tolerance how far a chord may run inside its arc.
 * @param finishing which steps are a finish lap (`finishSteps`).
 */
export function pathSegments(timeline: Timeline, tolerance: number, finishing?: Uint8Array): Segments {
  const pieces = timeline.steps.map((step, i) => (isMotion(step) && (timeline.length[i] ?? 0) > 0 ? chords(step, tolerance) : 0));
  const count = pieces.reduce((sum, n) => sum + n, 0);
  const ends = new Float64Array(count * 6);
  const travel = new Float64Array(count * 2);
  const rapid = new Uint8Array(count);
  const finish = new Uint8Array(count);
  const point = newMoment();
  let at = 0;
  timeline.steps.forEach((step, i) => {
    const n = pieces[i] ?? 0;
    if (!isMotion(step)) return;
    const before = timeline.before[i] ?? 0;
    const length = timeline.length[i] ?? 0;
    for (let k = 0; k < n; k++, at++) {
      for (const end of [0, 1] as const) {
        pointAlong(step, (k + end) / n, point);
        ends[at * 6 + end * 3] = stated(point.x);
        ends[at * 6 + end * 3 + 1] = stated(point.y);
        ends[at * 6 + end * 3 + 2] = stated(point.z);
        travel[at * 2 + end] = before + (length * (k + end)) / n;
      }
      rapid[at] = step.kind === 'rapid' ? 1 : 0;
      finish[at] = finishing?.[i] ?? 0;
    }
  });
  return { count, ends, travel, rapid, finish };
}

/** An axis the program never states does not move; the drawing has it at zero. */
const stated = (value: number): number => (value === value ? value : 0);

function chords(motion: Motion, tolerance: number): number {
  return motion.arc ? chordCount(motion.arc, tolerance) : 1;
}

/** Chords whose height over the arc is at most `tolerance`: sagitta r (1 − cos ½θ). */
function chordCount({ radius, sweep }: ArcPath, tolerance: number): number {
  const widest = 2 * Math.acos(Math.max(-1, 1 - tolerance / radius));
  return Math.max(1, Math.min(720, Math.ceil(sweep / Math.max(widest, 1e-3)))); // 720: half a degree each, whatever the radius
}
