import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { advisedChipLoad } from '#shared/slot/chipLoad';
import type { Wood } from '#shared/wood/woods';

/** FACTS B2: shop chart in inch per tooth on industrial machines (common practice, no source). */
const CHART: readonly (readonly [number, Wood, number, number])[] = [
  [1 / 8, 'hardwood', 0.003, 0.005], [1 / 8, 'softwood', 0.004, 0.006], [1 / 8, 'plywood', 0.004, 0.006], [1 / 8, 'mdf', 0.004, 0.007],
  [1 / 4, 'hardwood', 0.009, 0.011], [1 / 4, 'softwood', 0.011, 0.013], [1 / 4, 'plywood', 0.011, 0.013], [1 / 4, 'mdf', 0.013, 0.016],
  [3 / 8, 'hardwood', 0.015, 0.017], [3 / 8, 'softwood', 0.017, 0.02], [3 / 8, 'plywood', 0.017, 0.02], [3 / 8, 'mdf', 0.02, 0.023],
  [1 / 2, 'hardwood', 0.019, 0.021], [1 / 2, 'softwood', 0.021, 0.023], [1 / 2, 'plywood', 0.021, 0.023], [1 / 2, 'mdf', 0.025, 0.027],
  // "1/2 in and up"
  [3 / 4, 'hardwood', 0.019, 0.021], [1, 'mdf', 0.025, 0.027],
  // Between rows along a straight line: 5/16 is halfway from 1/4 to 3/8, 3/16 halfway from 1/8 to 1/4.
  [5 / 16, 'hardwood', 0.012, 0.014], [3 / 16, 'softwood', 0.0075, 0.0095],
  // Below the chart in proportion to the diameter.
  [1 / 16, 'hardwood', 0.0015, 0.0025],
  // Species stand with their kind.
  [1 / 4, 'white-oak', 0.009, 0.011], [1 / 4, 'walnut', 0.009, 0.011], [1 / 4, 'pine', 0.011, 0.013],
];

const heavy = { heavy: true };
const advised = (units: 'in' | 'mm', bitDiameter: number, wood: Wood, machine: { heavy?: boolean } | null) =>
  advisedChipLoad({ units, bitDiameter, wood, chipLoadRange: null, machine });

describe('advised chip load', () => {
  it.each(CHART)('of a %d in bit in %s is %d to %d on a heavy machine', (bit, wood, least, most) => {
    const band = advised('in', bit, wood, heavy);
    expect(band.least).toBeCloseTo(least, 9);
    expect(band.most).toBeCloseTo(most, 9);
    expect(band.source).toBe('common practice');
  });

  it.each(CHART)('of a %d in bit in %s is a third to a half of that on a light one', (bit, wood, least, most) => {
    for (const machine of [null, {}, { heavy: false }]) {
      const band = advised('in', bit, wood, machine);
      expect(band.least).toBeCloseTo(least / 3, 9);
      expect(band.most).toBeCloseTo(most / 2, 9);
    }
  });

  it('is the same load in millimetres', () => {
    fc.assert(fc.property(fc.double({ min: 0.02, max: 1.5, noNaN: true }), (bit) => {
      const inch = advised('in', bit, 'hardwood', null);
      const metric = advised('mm', bit * 25.4, 'hardwood', null);
      expect(metric.least).toBeCloseTo(inch.least * 25.4, 9);
      expect(metric.most).toBeCloseTo(inch.most * 25.4, 9);
    }), { seed: 2 });
  });

  it('never falls as the bit grows', () => {
    fc.assert(fc.property(fc.double({ min: 0.02, max: 1, noNaN: true }), fc.double({ min: 0, max: 0.5, noNaN: true }), (bit, more) => {
      expect(advised('in', bit + more, 'mdf', heavy).most).toBeGreaterThanOrEqual(advised('in', bit, 'mdf', heavy).most - 1e-12);
    }), { seed: 2 });
  });

  it("is the bit maker's own where given", () => {
    expect(advisedChipLoad({ units: 'in', bitDiameter: 0.25, wood: 'hardwood', chipLoadRange: [0.004, 0.006], machine: heavy }))
      .toEqual({ least: 0.004, most: 0.006, source: "the bit's maker" });
  });
});
