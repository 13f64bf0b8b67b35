import { expect } from 'vitest';
import { readProgram } from '#shared/reader/program';
import type { Motion, ReadError, ReadOptions, ReadProgram, Step } from '#shared/reader/motion';

/** Where the report's sample session starts (Table 10). */
export const ORIGIN = { x: 0, y: 0, z: 0 };

/** Reads a text that must be accepted; the failure shows why it was not. */
export function accepted(text: string, options: ReadOptions = { start: ORIGIN }): ReadProgram {
  const result = readProgram(text, options);
  if (!result.ok) expect.fail(`${result.error.code} ${result.error.at.line}:${result.error.at.column} ${result.error.reason}`);
  return result.program;
}

/** Reads a text that must be refused. */
export function refused(text: string, options: ReadOptions = { start: ORIGIN }): ReadError {
  const result = readProgram(text, options);
  if (result.ok) expect.fail(`accepted: ${text.slice(0, 80)}`);
  return result.error;
}

/** A refusal as the case files write it: `modalGroup 1:4`. */
export const refusal = (text: string, options?: ReadOptions) => {
  const { code, at } = refused(text, options);
  return `${code} ${at.line}:${at.column}`;
};

export const isMotion = (step: Step): step is Motion => step.kind === 'rapid' || step.kind === 'line' || step.kind === 'arc';

export const motions = ({ steps }: ReadProgram): Motion[] => steps.filter(isMotion);

/** Length of a motion's path, reckoned here and not by the reader: straight by Pythagoras, arc unrolled to a right triangle. */
export function lengthOf({ from, to, arc, modes }: Motion): number {
  if (arc === null) return Math.sqrt((to.x - from.x) ** 2 + (to.y - from.y) ** 2 + (to.z - from.z) ** 2);
  const rise = modes.plane === 18 ? to.y - from.y : modes.plane === 19 ? to.x - from.x : to.z - from.z;
  return Math.sqrt((arc.radius * arc.sweep) ** 2 + rise ** 2);
}

export const total = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0);

export const degrees = (radians: number) => (radians * 180) / Math.PI;
