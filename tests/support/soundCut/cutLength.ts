import { wayLength } from './geometry';
import { interpret } from './interpret';
import { statedUnits } from './lintWords';
import { partBelow } from './sizes';
import { isOneBitSlot } from './slotShape';
import { finestStep, type JudgedSpec } from './types';
import { readText } from './words';

/** Length of all feed moves at or below the top plane, in the program's units. */
export function cutLength(program: string): number {
  const text = readText(program);
  const run = interpret(text, statedUnits(text) ?? 'in');
  return run.moves.filter(move => !move.rapid).reduce((sum, move) => {
    const part = partBelow(move, 1e-9); // 1e-9: on the top plane counts
    return part === null ? sum : sum + wayLength(move) * part.share;
  }, 0);
}

export interface CutLengthBound {
  readonly regime: 'one bit' | 'up to two bits' | 'wider';
  readonly passes: number;
  /** The least that a plain cut would take, in the spec's units. */
  readonly bound: number;
  /** Cut length ÷ bound is at most this; in the middle regime the median of many specs, not each. */
  readonly limit: number;
}

/** Issue, "The plan", cut length against its bound. */
export function cutLengthBound(spec: JudgedSpec): CutLengthBound {
  const { length, width, depth, stepdown, bitDiameter: bit, units } = spec;
  const step = finestStep(units, units);
  // A pass may exceed the stepdown by half the last decimal, as any cut may.
  const passes = Math.max(1, Math.ceil((depth - step / 2) / (stepdown + step / 2) - 1e-6));
  const along = length - bit;
  if (isOneBitSlot(spec)) {
    const ramp = depth / passes / Math.tan((spec.rampAngle ?? 3) * Math.PI / 180);
    return { regime: 'one bit', passes, bound: passes * along, limit: 1 + 2 * ramp / along + 0.02 };
  }
  const allowance = spec.finishAllowance ?? 0;
  const lap = 2 * (along + (width - bit));
  if (width <= 2 * bit) {
    const finish = allowance > 0 ? lap : 0;
    return { regime: 'up to two bits', passes, bound: passes * lap + finish, limit: 1.06 };
  }
  const area = spec.ends === 'round'
    ? (length - width) * width + Math.PI * width * width / 4 // FACTS H1, stadium
    : length * width - (4 - Math.PI) * bit * bit / 4; // FACTS H1, rounded rectangle
  return { regime: 'wider', passes, bound: passes * area / ((spec.stepover ?? 0.4) * bit) + (allowance > 0 ? lap : 0), limit: 1.25 };
}
