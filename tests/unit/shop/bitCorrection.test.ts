import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { bitCorrection, effectiveDiameter } from '#shared/shop/bitCorrection';
import { slotRequestSchema } from '#shared/slot/request';
import { measureSlot } from '../measureSlot';
import { RAIL_A } from '../slot/asking';
import type { JudgedSpec } from '../../support/soundCut/types';

const QUARTER = { units: 'in', diameter: 0.25 } as const;
/** A slot 3/8 wide whose program took the bit for 1/4 in. */
const measured = (measuredWidth: number) => ({ units: 'in', drawnWidth: 0.375, programmedDiameter: 0.25, measuredWidth }) as const;

describe('the effective diameter', () => {
  // By hand: the centre is led over 3/8 − 1/4 = 1/8; a bit that cuts 0.254 leaves 0.379.
  it('is the programmed one and all of what the slot is too wide', () => {
    expect(effectiveDiameter(measured(0.379))).toBeCloseTo(0.254, 12);
    expect(effectiveDiameter(measured(0.371))).toBeCloseTo(0.246, 12);
  });

  it('of a slot one bit wide is the measured width: the centre runs on a line', () => {
    // Drawn 0.252 and programmed 0.25 are cut as a line (within 0.005): whatever is measured, the bit cut it.
    expect(effectiveDiameter({ units: 'in', drawnWidth: 0.252, programmedDiameter: 0.25, measuredWidth: 0.253 })).toBe(0.253);
  });

  /**
   * The program of a slot is cut with a bit of another diameter: the judge's interpreter (tests/support, without
   * shared/) says where the centre goes, and the walls stand half that bit beyond.
   */
  it.each<[string, Partial<JudgedSpec>]>([
    ['two walls', { width: 0.375 }], ['two walls, far apart', { width: 0.75, railWidth: 2.25 }], ['one bit', { width: 0.252 }],
    ['a finish lap', { width: 0.375, finishAllowance: 0.02 }], ['round ends', { width: 0.5, railWidth: 1.5, ends: 'round' }],
  ])('is found again from what a real program cuts: %s', (_, more) => {
    const raw = { ...RAIL_A, ...more };
    const made = makeProgram(slotRequestSchema.parse(raw));
    expect(made.ok).toBe(true);
    if (!made.ok) return;
    for (const cuts of [0.244, 0.25, 0.2535]) {
      const centre = measureSlot(made.program, raw).width - raw.bitDiameter; // where the centre was led
      const measuredWidth = centre + cuts;
      const found = effectiveDiameter({ units: 'in', drawnWidth: raw.width, programmedDiameter: raw.bitDiameter, measuredWidth });
      expect(Math.abs(found - cuts)).toBeLessThan(1.1e-4 * 2); // each wall is written to 0.0001 in
    }
  });

  it('used for the next program gives the drawn width, and shows no further correction', () => {
    const width = fc.double({ min: 0.3, max: 2, noNaN: true });
    const off = fc.double({ min: -0.03, max: 0.03, noNaN: true });
    fc.assert(fc.property(width, off, (drawnWidth, error) => {
      const cuts = 0.25 + error; // what the bit really cuts, unknown to the program
      const first = effectiveDiameter({ units: 'in', drawnWidth, programmedDiameter: 0.25, measuredWidth: drawnWidth - 0.25 + cuts });
      expect(first).toBeCloseTo(cuts, 12);
      const next = drawnWidth - first + cuts;
      expect(next).toBeCloseTo(drawnWidth, 12);
      expect(effectiveDiameter({ units: 'in', drawnWidth, programmedDiameter: first, measuredWidth: next })).toBeCloseTo(cuts, 12);
    }), { seed: 3 });
  });
});

/** Issue 4, "First-off correction": three measurements within 0.003 in; beyond 0.03 in ask for the bit; runout and scale as other causes. */
describe('the correction of a bit', () => {
  const of = (...widths: number[]) => bitCorrection(QUARTER, widths.map(measured));

  it('is offered for three that agree, with spread, count and the sums', () => {
    const answer = of(0.379, 0.38, 0.378);
    expect(answer).toMatchObject({ result: 'offer', count: 3 });
    expect(answer.diameter).toBeCloseTo(0.254, 12);
    expect(answer.correction).toBeCloseTo(0.004, 12);
    expect(answer.spread).toBeCloseTo(0.002, 12);
    expect(answer.sentence).toBe('It cuts 0.2540 in: 3 measurements within 0.0020 in. Use that for its next programs?');
    for (const step of answer.steps) expect(step.measured - step.path).toBeCloseTo(step.effective, 12);
    expect(answer.steps[0]).toMatchObject({ drawn: 0.375, programmed: 0.25, measured: 0.379, path: 0.125 });
  });

  it.each([
    [[], 'measureMore', /0 of 3 measurements. Take 3 more/],
    [[0.379, 0.379], 'measureMore', /2 of 3 measurements. Take 1 more/],
    [[0.375, 0.378, 0.376], 'offer', /within 0.0030/],
    [[0.375, 0.3781, 0.376], 'measureAgain', /differ by 0.0031 in/],
    [[0.405, 0.405, 0.405], 'offer', /0.2800/],
    [[0.4051, 0.4051, 0.4051], 'askBit', /Is the right bit in/],
    [[0.3449, 0.3449, 0.3449], 'askBit', /cuts 0.2199 in and the bit is a 1\/4 in/],
    [[0.5], 'askBit', /right bit/], // a single one is enough to ask
  ] as const)('of widths %j answers %s', (widths, result, sentence) => {
    const answer = of(...widths);
    expect(answer.result).toBe(result);
    expect(answer.sentence).toMatch(sentence);
  });

  it('names runout and machine scale, and how much of each it would take', () => {
    const causes = of(0.379, 0.379, 0.379).otherCauses;
    expect(causes.map(({ cause }) => cause)).toEqual(['runout', 'machineScale']);
    expect(causes[0]?.amount).toBeCloseTo(0.004, 12);
    // 0.004 over a path of 0.125 is 3.2 %
    expect(causes[1]?.amount).toBeCloseTo(0.032, 9);
    expect(causes[1]?.sentence).toMatch(/3.2 % too far/);
  });

  it('names wear in place of runout where the slot is narrow', () => {
    expect(of(0.372, 0.372, 0.372).otherCauses.map(({ cause }) => cause)).toEqual(['wear', 'machineScale']);
  });

  it('names no scale where the centre ran on a line, and nothing where nothing is off', () => {
    const line = [0.254, 0.254, 0.254].map((measuredWidth) => ({ units: 'in', drawnWidth: 0.25, programmedDiameter: 0.25, measuredWidth }) as const);
    expect(bitCorrection(QUARTER, line).otherCauses.map(({ cause }) => cause)).toEqual(['runout']);
    expect(of(0.375, 0.375, 0.375).otherCauses).toEqual([]);
  });

  it('holds across slots drawn for different diameters and in different units', () => {
    const answer = bitCorrection(QUARTER, [
      measured(0.379),
      { units: 'in', drawnWidth: 0.5, programmedDiameter: 0.252, measuredWidth: 0.502 }, // led over 0.248
      { units: 'mm', drawnWidth: 9, programmedDiameter: 6.35, measuredWidth: 9.1016 }, // 0.004 in more
    ]);
    expect(answer.result).toBe('offer');
    expect(answer.diameter).toBeCloseTo(0.254, 9);
    expect(answer.spread).toBeCloseTo(0, 9);
  });

  it('in millimetres has its limits in millimetres', () => {
    const six = { units: 'mm', diameter: 6 } as const;
    const widths = (...all: number[]) => bitCorrection(six, all.map((measuredWidth) => ({ units: 'mm', drawnWidth: 9, programmedDiameter: 6, measuredWidth }))).result;
    expect(widths(9.05, 9.13, 9.1)).toBe('offer'); // 0.08
    expect(widths(9.05, 9.131, 9.1)).toBe('measureAgain');
    expect(widths(9.8, 9.8, 9.8)).toBe('offer'); // 0.8
    expect(widths(9.81, 9.81, 9.81)).toBe('askBit');
  });

  it('does not depend on the order of measuring', () => {
    fc.assert(fc.property(fc.array(fc.double({ min: 0.37, max: 0.385, noNaN: true }), { minLength: 1, maxLength: 8 }), (widths) => {
      const there = of(...widths);
      const back = of(...[...widths].reverse());
      expect(back.result).toBe(there.result);
      expect(back.diameter).toBeCloseTo(there.diameter ?? NaN, 12);
    }), { seed: 8 });
  });
});
