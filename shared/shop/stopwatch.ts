import { type Pass, findPasses, finishSteps, passAt } from '../playback/index';
import { type Timeline, isMotion, stepAt } from '../time/index';

/** What the machine is doing: in words of the bench. */
export const ROLES = ['spinning up', 'waiting', 'moving clear', 'entering', 'cutting', 'finish lap', 'raising', 'done'] as const;
export type Role = (typeof ROLES)[number];

/** Something to be seen at the machine at a known second. */
export interface StopwatchMark {
  readonly seconds: number;
  /** At a stop the program waits for a hand: the watch is held there, since nobody knows how long that takes. */
  readonly kind: 'pass' | 'finish lap' | 'stop' | 'end';
  /** The pass that begins, or is under way; 0 before the first. */
  readonly pass: number;
}

/** A program's course, found once, to be asked at every tick. */
export interface Stopwatch {
  readonly timeline: Timeline;
  readonly passes: readonly Pass[];
  /** 1 for each step of a finish lap. */
  readonly finish: Uint8Array;
  /** In order of time. */
  readonly marks: readonly StopwatchMark[];
}

/** What should be happening. */
export interface Happening {
  /** Counted from 1; 0 before the first. */
  readonly pass: number;
  readonly of: number;
  /** Depth of that pass below the rail's top, positive; null before the first. */
  readonly depth: number | null;
  readonly role: Role;
  /** What comes next; null when all is done. */
  readonly next: StopwatchMark | null;
}

/** @param finishAllowance what earlier laps leave on the walls, in the timeline's units; 0 where no finish lap is asked. */
export function makeStopwatch(timeline: Timeline, finishAllowance: number): Stopwatch {
  const passes = findPasses(timeline);
  const finish = finishSteps(timeline, finishAllowance);
  const marks: StopwatchMark[] = passes.map(({ start }, i) => ({ seconds: start, kind: 'pass', pass: i + 1 }));
  timeline.steps.forEach((step, i) => {
    const seconds = timeline.start[i] ?? 0;
    const pass = passAt(passes, seconds);
    if (step.kind === 'stop' && !step.optional) marks.push({ seconds, kind: 'stop', pass });
    if (finish[i] === 1 && finish[i - 1] !== 1) marks.push({ seconds, kind: 'finish lap', pass });
  });
  marks.push({ seconds: timeline.seconds, kind: 'end', pass: passes.length });
  marks.sort((a, b) => a.seconds - b.seconds);
  return { timeline, passes, finish, marks };
}

/** What should be happening at `seconds` from the start, stops not counted. */
export function happeningAt({ timeline, passes, finish, marks }: Stopwatch, seconds: number): Happening {
  const pass = passAt(passes, seconds);
  const depth = passes[pass - 1]?.depth;
  const next = marks.find((mark) => mark.seconds > seconds) ?? null;
  return { pass, of: passes.length, depth: depth === undefined ? null : -depth, role: roleAt(timeline, finish, seconds), next };
}

function roleAt(timeline: Timeline, finish: Uint8Array, seconds: number): Role {
  if (seconds >= timeline.seconds) return 'done';
  const i = stepAt(timeline, Math.max(0, seconds));
  const step = timeline.steps[i];
  if (!step) return 'done';
  if (!isMotion(step)) return step.kind === 'spindle' ? 'spinning up' : 'waiting';
  if (finish[i] === 1) return 'finish lap';
  if (step.to.z > step.from.z) return 'raising';
  if (step.kind === 'rapid' || (step.to.z === step.from.z && step.to.z >= 0)) return 'moving clear';
  return step.to.z < step.from.z ? 'entering' : 'cutting';
}
