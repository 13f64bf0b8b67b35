import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { type JudgedSpec, cutLength, cutLengthBound, expectSoundCut } from '../support/soundCut/index';
import { measureSlot } from '../unit/measureSlot';
import { asked } from '../unit/slot/asking';

/**
 * A check value of common practice, no source (issue, "Tests and checks"): rail 23.3125 × 1.0625 in, slot
 * 21.9062 × 0.35 × 0.150 centred in it, 0.7031 left at each end, quarter-inch end mill, 18 000 rev/min, X and Y zero at the
 * corner, Z zero on the top; stepdown 0.075. Measured by the independent judge's own interpreter.
 */
const raw: JudgedSpec = JSON.parse(readFileSync(new URL('../../fixtures/slots/common-practice-rail.json', import.meta.url), 'utf8'));
const made = makeProgram(asked(raw));
const program = made.ok ? made.program : '';
const slot = measureSlot(program, raw);

describe('the common-practice rail', () => {
  it('is made, and sound to the judge', () => {
    expect(made.ok).toBe(true);
    expectSoundCut(program, raw);
  });

  it('is 23.3125 × 1.0625 in', () => {
    expect(made.summary.railLength).toBeCloseTo(23.3125, 9);
    expect(program).toContain('(RAIL 23.3125 LONG 1.0625 WIDE 0.7500 THICK)');
  });

  it.each([
    ['length', slot.length, 21.9062, 0.0005], ['width', slot.width, 0.35, 0.0005], ['depth', slot.depth, 0.15, 0.00005],
    ['left end', slot.left, 0.7031, 0.0001], ['right end', 23.3125 - slot.right, 0.7031, 0.0001],
    ['front wall', slot.front, (1.0625 - 0.35) / 2, 0.0001], ['back wall', 1.0625 - slot.back, (1.0625 - 0.35) / 2, 0.0001],
  ])('%s', (_what, measured, wanted, within) => {
    expect(Math.abs(measured - wanted)).toBeLessThanOrEqual(within + 1e-9);
  });

  it('is cut in two equal passes of 0.075', () => {
    expect(slot.levels.map((level) => level.toFixed(4))).toEqual(['0.0750', '0.1500']);
  });

  it('turns at 18 000 rev/min, with X and Y zero at the corner and Z zero on the top', () => {
    expect(program).toContain('\nS18000 M3\n');
    expect(program).toContain('(X AND Y ZERO AT FRONT LEFT CORNER OF RAIL)');
    expect(program).toContain('(Z ZERO ON TOP OF RAIL)');
  });

  it('has a cut at most 1.03 times its bound', () => {
    const { bound, passes } = cutLengthBound(raw);
    expect(passes).toBe(2);
    expect(bound).toBeCloseTo(2 * 2 * (21.6562 + 0.1), 9);
    expect(cutLength(program) / bound).toBeLessThanOrEqual(1.03);
  });
});
