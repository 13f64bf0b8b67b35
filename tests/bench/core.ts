import { assert } from '#shared/assert';
import { makeProgram } from '#shared/makeProgram';
import { slotRequestSchema } from '#shared/slot/request';

/** Slots of the kinds a shop cuts; sizes of the demo scenario and plain ones beside it. */
const SLOTS = {
  'rail A, one lap a pass': { width: 0.375, bitDiameter: 0.25 },
  'one bit wide': { width: 0.25, bitDiameter: 0.25 },
  'round ends, finish lap': { width: 0.375, bitDiameter: 0.25, ends: 'round', finishAllowance: 0.01 },
  'four bits wide': { width: 0.5, bitDiameter: 0.125, stepdown: 1 / 16 },
} as const;

const BASE = { units: 'in', length: 24.5, depth: 0.1875, stopMargin: 0.875, stepdown: 3 / 32, railWidth: 1.25 } as const;

/** Milliseconds per kind of slot: enough to average, short enough for a coffee. */
const SPAN = 1500;

/** Programs made per second, spec to program that has been read back, and how that compares to the first row. */
export function benchCore(): Record<string, Record<string, number>> {
  let first = 0;
  return Object.fromEntries(Object.entries(SLOTS).map(([name, slot]) => {
    const request = slotRequestSchema.parse({ ...BASE, ...slot });
    const made = makeProgram(request);
    assert(made.ok, `the slot "${name}" reads back`);
    perSecond(() => makeProgram(request), SPAN / 5); // warm-up
    const rate = perSecond(() => makeProgram(request), SPAN);
    first ||= rate;
    return [name, { 'programs per second': Math.round(rate), 'against the first': Math.round((rate / first) * 100) / 100, 'lines': made.summary.lines }];
  }));
}

function perSecond(job: () => unknown, span: number): number {
  const start = performance.now();
  let count = 0;
  while (performance.now() - start < span) {
    job();
    count += 1;
  }
  return (count * 1000) / (performance.now() - start);
}
