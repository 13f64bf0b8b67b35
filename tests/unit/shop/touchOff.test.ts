import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { type TouchOff, paperField, touchOff, usualPaper } from '#shared/shop/touchOff';
import type { Units } from '#shared/measure/units';
import { measureSlot } from '../measureSlot';
import { RAIL_A, RAIL_MM, asked } from '../slot/asking';

const spec = (more: object = {}) => asked({ ...RAIL_A, ...more }).spec;

/**
 * A machine whose own coordinates have the rail's front left corner at (7, 5) and its top at −3: the bit is brought to
 * an edge, its axis set to what is said, and every later position read through that.
 */
const CORNER = { x: 7, y: 5, z: -3 };
function zeroed(figures: TouchOff, bit: number, z: 'paper' | 'airRun' = 'paper') {
  const [x, y] = figures.edges;
  const set = figures[z].set;
  const zero = { x: CORNER.x - bit / 2 - x.value, y: CORNER.y - bit / 2 - y.value, z: CORNER.z + figures.paper.thickness - set.value };
  /** Where on the rail, from its front left corner and its top, the bit's tip stands when the display reads this. */
  return (reads: { x: number; y: number; z: number }) => ({ x: zero.x + reads.x - CORNER.x, y: zero.y + reads.y - CORNER.y, z: zero.z + reads.z - CORNER.z });
}

describe('touching off', () => {
  // Issue 4, "The bench": left and front edges, −bit/2; Z the paper's thickness (0.004 in / 0.1 mm unless measured), not 0
  it('sets X and Y to minus half the bit and Z to the paper', () => {
    const { edges, paper, centre } = touchOff(spec(), 'in');
    expect(edges).toEqual([
      { axis: 'x', touch: 'left edge', value: -0.125, text: '-0.1250' },
      { axis: 'y', touch: 'front edge', value: -0.125, text: '-0.1250' },
    ]);
    expect(paper).toEqual({ thickness: 0.004, feel: 'held', set: { axis: 'z', touch: 'paper on the top', value: 0.004, text: '0.0040' } });
    expect(centre).toBeNull();
    expect([usualPaper('in'), usualPaper('mm')]).toEqual([0.004, 0.1]);
  });

  it('puts the display\'s zero on the rail\'s front left corner and top', () => {
    fc.assert(fc.property(fc.double({ min: 0.05, max: 0.375, noNaN: true }), fc.double({ min: 0.001, max: 0.02, noNaN: true }), (bit, paper) => {
      const at = zeroed(touchOff({ ...spec(), bitDiameter: bit }, 'in', paper), bit)({ x: 0, y: 0, z: 0 });
      for (const axis of ['x', 'y', 'z'] as const) expect(at[axis]).toBeCloseTo(0, 12);
    }), { seed: 6 });
  });

  it('puts it in the middle of the rail where the drawing has it there', () => {
    const middle = spec({ workZero: 'centre' });
    const figures = touchOff(middle, 'in');
    const at = zeroed(figures, 0.25)({ x: 0, y: 0, z: 0 });
    expect(at.x).toBeCloseTo(13.125, 12); // 26 1/4 long
    expect(at.y).toBeCloseTo(0.625, 12); // 1 1/4 wide
    expect(figures.centre?.map(({ value }) => value)).toEqual([0, 0]);
  });

  it.each(['corner', 'centre'])('puts the slot in the middle of the rail: zero at the %s', (workZero) => {
    const drawn = spec({ workZero });
    const made = makeProgram(asked({ ...RAIL_A, workZero }));
    expect(made.ok).toBe(true);
    if (!made.ok) return;
    // From the judge's interpreter (tests/support), with the work zero where the program takes it for.
    const slot = measureSlot(made.program, drawn);
    const at = zeroed(touchOff(drawn, 'in'), 0.25);
    const zero = workZero === 'centre' ? { x: 13.125, y: 0.625 } : { x: 0, y: 0 };
    const left = at({ x: slot.left - zero.x, y: slot.front - zero.y, z: 0 });
    expect(left.x).toBeCloseTo(0.875, 3); // stop margin
    expect(left.y).toBeCloseTo((1.25 - 0.375) / 2, 3);
  });
});

describe('the check move', () => {
  it('stands over the front right corner at the safe height', () => {
    for (const workZero of ['corner', 'centre']) {
      const drawn = spec({ workZero });
      const figures = touchOff(drawn, 'in');
      const [x, y, z] = figures.check;
      const at = zeroed(figures, 0.25)({ x: x.value, y: y.value, z: z.value });
      expect([at.x, at.y, at.z].map((value) => Number(value.toFixed(9)))).toEqual([26.25, 0, drawn.safeHeight]);
    }
  });

  it("is read in the program's units, and says which", () => {
    expect(touchOff(spec(), 'in')).toMatchObject({ unitsLine: 'program in INCHES: the display must read', check: [{ text: '26.2500' }, { text: '0.0000' }, { text: '0.7500' }] });
    expect(touchOff(spec(), 'mm')).toMatchObject({ unitsLine: 'program in MILLIMETRES: the display must read', check: [{ text: '666.750' }, { text: '0.000' }, { text: '19.050' }], edges: [{ text: '-3.175' }, { text: '-3.175' }] });
  });
});

describe('the air run', () => {
  it('has Z zero one inch high', () => {
    const { airRun } = touchOff(spec(), 'in');
    expect(airRun).toMatchObject({ lift: 1, set: { value: 0.004 - 1, text: '-0.9960' }, problem: null });
    const at = zeroed(touchOff(spec(), 'in'), 0.25, 'airRun')({ x: 0, y: 0, z: -0.1875 });
    expect(at.z).toBeCloseTo(1 - 0.1875, 12);
    expect(airRun.clear).toBeCloseTo(at.z, 12);
  });

  it('goes 25 mm high on a metric machine', () => {
    expect(touchOff(asked(RAIL_MM).spec, 'mm').airRun.set).toMatchObject({ value: 0.1 - 25, text: '-24.900' });
  });

  it('stays above the clamps whatever the slot and the clamps are', () => {
    const sizes = fc.record({ depth: fc.double({ min: 0.05, max: 2, noNaN: true }), clampHeight: fc.double({ min: 0, max: 3, noNaN: true }), units: fc.constantFrom<Units>('in', 'mm') });
    fc.assert(fc.property(sizes, ({ depth, clampHeight, units }) => {
      const { airRun } = touchOff({ ...spec(), depth, clampHeight }, units);
      const clamps = units === 'in' ? clampHeight : clampHeight * 25.4;
      expect(airRun.clear).toBeGreaterThan(clamps);
      expect(airRun.lift).toBeGreaterThanOrEqual(units === 'in' ? 1 : 25);
    }), { seed: 7 });
  });

  it('says where the machine has no room for it', () => {
    // Rail 3/4, lift 1, safe height 3/4
    const tall = (z: number) => touchOff({ ...spec(), machine: { travel: { x: 32, y: 32, z } } }, 'in').airRun.problem;
    expect(tall(2.5)).toBeNull();
    expect(tall(2.4)?.message).toMatch(/2 1\/2 in above the table.*2.4 in high.*Take rail and clamps off/);
  });
});

describe("the paper's thickness", () => {
  it('is a size within what paper has', () => {
    expect(paperField('in').parse('0.1 mm')).toBeCloseTo(0.1 / 25.4, 12);
    expect(paperField('mm').safeParse(0.1).success).toBe(true);
    const refused = paperField('in').safeParse(0.1);
    expect(refused.error?.issues[0]?.message).toBe('Paper thickness is 0.1 in. Use 0.001 in to 0.02 in.');
    expect(paperField('in').safeParse(0).success).toBe(false);
  });
});
