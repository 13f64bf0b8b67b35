import { AssertionError } from 'node:assert';
import { judgeCoverage } from './coverage';
import { interpret } from './interpret';
import { judgeLaps } from './laps';
import { lintText } from './lint';
import { judgeRemoval } from './removal';
import { judgeSafety } from './safety';
import { cutsOf, floorOf, judgeSizes } from './sizes';
import { slotOf } from './slotShape';
import type { JudgedOptions, JudgedSpec, Violation } from './types';
import { readText } from './words';

/** Everything wrong with a program for this slot, by the text first and then by what its motion leaves of the wood. */
export function judgeCut(program: string, spec: JudgedSpec, options: JudgedOptions = {}): Violation[] {
  const text = readText(program);
  const run = interpret(text, spec.units);
  const slot = slotOf(spec);
  const cuts = cutsOf(run.moves);
  return [
    ...lintText(text, options, spec),
    ...run.violations,
    ...judgeSafety(run, text, spec, options),
    ...judgeSizes(run, cuts, spec, slot, options),
    ...judgeCoverage(floorOf(cuts), slot, options),
    ...judgeRemoval(run, cuts, spec, slot, options),
    ...judgeLaps(run, cuts, spec, slot, options),
  ];
}

const SHOWN = 40; // of one failing program; the count says how many there are

/** Throws one AssertionError that lists every violation. */
export function expectSoundCut(program: string, spec: JudgedSpec, options: JudgedOptions = {}): void {
  const violations = judgeCut(program, spec, options);
  if (violations.length === 0) return;
  const list = violations.slice(0, SHOWN).map(({ rule, line, message }) => `  ${rule}, ${line === 0 ? 'whole program' : `line ${line}`}: ${message}`);
  throw new AssertionError({ message: `${violations.length} violations\n${list.join('\n')}\nspec ${JSON.stringify(spec)}`, stackStartFn: expectSoundCut });
}
