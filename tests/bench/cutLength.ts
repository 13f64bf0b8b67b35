import fc from 'fast-check';
import { assert } from '#shared/assert';
import { makeProgram } from '#shared/makeProgram';
import { slotRequestSchema } from '#shared/slot/request';
import commonPractice from '../../fixtures/slots/common-practice-rail.json';
import { benchSpecArbitrary, rawSpecArbitrary } from '../support/randomSpecs';
import { cutLength, cutLengthBound, type JudgedSpec } from '../support/soundCut';

/** Printed with the table, so that a run can be had again. */
const SEED = 20_261_201;
const RUNS = 500;

interface Row {
  readonly specs: number;
  readonly median: number;
  readonly 'greatest': number;
  readonly 'greatest over its limit': number;
  readonly limit: string;
}

/**
 * Cut length ÷ bound. The random specs of the middle row: 2 to 36 in long, bit 1/8 to 1/2 in, 1 to 6 passes, between one
 * and two bits wide (`benchSpecArbitrary`); the others are those rows' share of `rawSpecArbitrary` in inches.
 */
export function benchCutLength(): Record<string, Row> {
  const middle = fc.sample(benchSpecArbitrary, { seed: SEED, numRuns: RUNS });
  const all = fc.sample(rawSpecArbitrary('in'), { seed: SEED, numRuns: 2 * RUNS });
  const regime = (spec: unknown) => cutLengthBound(judged(spec)).regime;
  console.log(`seed ${SEED}`);
  return {
    'common-practice rail': row([commonPractice], 'each ≤ 1.03', () => 1.03),
    'one to two bits wide': row(middle, 'median ≤ 1.06', () => Infinity),
    'one bit wide': row(all.filter((spec) => regime(spec) === 'one bit'), 'each ≤ 1 + 2 ramps ÷ run + 0.02', (spec) => cutLengthBound(spec).limit),
    'wider': row(all.filter((spec) => regime(spec) === 'wider'), 'each ≤ 1.25', (spec) => cutLengthBound(spec).limit),
  };
}

function row(specs: readonly unknown[], limit: string, limitOf: (spec: JudgedSpec) => number): Row {
  const ratios = specs.map((raw) => {
    const made = makeProgram(slotRequestSchema.parse(raw));
    assert(made.ok, `the spec reads back: ${JSON.stringify(raw)}`);
    const spec = judged(raw);
    const ratio = cutLength(made.program) / cutLengthBound(spec).bound;
    return { ratio, over: ratio / limitOf(spec) };
  });
  const sorted = ratios.map(({ ratio }) => ratio).sort((a, b) => a - b);
  const round = (value: number) => Math.round(value * 1e4) / 1e4;
  return {
    'specs': specs.length,
    'median': round(sorted[Math.floor(sorted.length / 2)] ?? NaN),
    'greatest': round(sorted[sorted.length - 1] ?? NaN),
    'greatest over its limit': round(Math.max(...ratios.map(({ over }) => over))),
    limit,
  };
}

/** The judge takes a raw request body as it is. */
function judged(raw: unknown): JudgedSpec {
  return raw as JudgedSpec;
}
