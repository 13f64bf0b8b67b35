import { readProgram } from '#shared/reader/index';
import { stepsIn } from '#shared/reader/inUnits';
import type { BenchProgram } from '#shared/shop/bench';
import { type Happening, type StopwatchMark, happeningAt, makeStopwatch } from '#shared/shop/stopwatch';
import { defaultDynamics, timeOf } from '#shared/time/index';

/** What should be happening from a second on, until the next one. */
export interface CourseStep extends Omit<Happening, 'next'> {
  readonly seconds: number;
}

/** A program's course by the second, small enough to be handed over from a worker. */
export interface Course {
  readonly seconds: number;
  readonly steps: readonly CourseStep[];
  readonly marks: readonly StopwatchMark[];
}

/** To the worker: what a course is read from. */
export type CourseOrder = Pick<BenchProgram, 'text' | 'spec'> & { readonly dwellIn: 'seconds' | 'milliseconds' };

/** Reads the course off the program's text, as the reader sees it; null where it refuses the text. */
export function courseOf({ text, spec, dwellIn }: CourseOrder): Course | null {
  const read = readProgram(text, { dwellIn });
  if (!read.ok) return null;
  const timeline = timeOf(stepsIn(spec.units, read.program), defaultDynamics(spec.units, spec.machine));
  const watch = makeStopwatch(timeline, spec.finishAllowance);
  const steps: CourseStep[] = [];
  const starts = [...new Set([0, ...timeline.start, timeline.seconds])].sort((a, b) => a - b);
  for (const seconds of starts) {
    const { next, ...now } = happeningAt(watch, seconds);
    const last = steps.at(-1);
    if (last && last.pass === now.pass && last.role === now.role && last.depth === now.depth) continue;
    steps.push({ seconds, ...now });
  }
  return { seconds: timeline.seconds, steps, marks: watch.marks };
}

/** The step of a course that a second falls into. */
export function stepOf({ steps }: Course, seconds: number): CourseStep | null {
  return steps.findLast((step) => step.seconds <= seconds) ?? steps[0] ?? null;
}

/** The next mark after a second; null when all is done. */
export function nextMark({ marks }: Course, seconds: number): StopwatchMark | null {
  return marks.find((mark) => mark.seconds > seconds) ?? null;
}
