import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changeOfSize, equilibriumMoisture, seasonalMovement } from '#shared/wood/movement';
import { HARDWOOD_S2S, PS20, boardFeet, nominalFor } from '#shared/wood/sizes';
import { SPECIES } from '#shared/wood/species';
import { WOODS } from '#shared/wood/woods';

/**
 * Wood Handbook (FPL-GTR-190), Table 13-5 follows from Table 4-3: C = S / (100 F − S (F − 10)), F = 30 (FACTS.md C1,
 * worked out there; it reproduces both coefficients of 26 of 28 species to 5 decimals). White and red oak's printed
 * coefficients are averages of a group ("commercial") and stand apart from it.
 */
const GROUPS = new Set(['white-oak', 'red-oak']);

/** Wood Handbook, Table 4-2 (FACTS.md C3): °F, % relative humidity, % moisture content. */
const EMC = [
  [30, 20, 4.6], [30, 50, 9.5], [50, 35, 7.1], [70, 20, 4.5], [70, 25, 5.4], [70, 30, 6.2], [70, 35, 6.9], [70, 40, 7.7], [70, 45, 8.5], [70, 50, 9.2],
  [70, 55, 10.1], [70, 60, 11], [70, 65, 12], [70, 70, 13.1], [70, 80, 16], [70, 90, 20.5], [80, 60, 10.8], [90, 65, 11.5], [140, 55, 8.4],
] as const;

const figures = (tangential: number, radial = tangential, shrinkageTangential = 8) => ({ species: 'made up', shrinkageRadial: shrinkageTangential, shrinkageTangential, radial, tangential, specificGravity: 0.5 });

describe('wood on the move', () => {
  it.each(Object.entries(SPECIES).filter(([name]) => !GROUPS.has(name)))('%s has the coefficients that its shrinkage makes', (_name, wood) => {
    const coefficient = (shrinkage: number) => shrinkage / (3000 - shrinkage * 20);
    expect(wood.tangential).toBeCloseTo(coefficient(wood.shrinkageTangential), 5);
    expect(wood.radial).toBeCloseTo(coefficient(wood.shrinkageRadial), 5);
  });

  it('changes as the handbook\'s example: white fir, 232 mm, 8 to 11 %, by 1.7052 mm', () => {
    // Wood Handbook, p. 13-18; the exact product from FACTS.md C2.
    expect(changeOfSize(232, figures(0.00245), 'flat', 8, 11)).toBeCloseTo(1.7052, 6);
  });

  it('changes as the flooring trade\'s example: white oak, 5 in, 6 to 9 %, by 0.055 in', () => {
    expect(changeOfSize(5, SPECIES['white-oak'], 'flat', 6, 9)).toBeCloseTo(0.055, 3);
  });

  it.each([[100, 10.5, 12, 6 - 1e-9, -2.2412], [88.9, 7.8, 6 - 1e-9, 14, 1.9722]])('by the equation for beyond 6 to 14 %%: %d mm, S %d, %d to %d %%: %d mm', (size, shrinkage, from, to, change) => {
    expect(changeOfSize(size, figures(0, 0, shrinkage), 'flat', from, to)).toBeCloseTo(change, 3); // FACTS.md C2
  });

  it('keeps its size above fibre saturation, and comes back to it', () => {
    expect(changeOfSize(100, SPECIES.walnut, 'flat', 30, 60)).toBe(0);
    fc.assert(fc.property(fc.double({ min: 6, max: 14, noNaN: true }), fc.double({ min: 6, max: 14, noNaN: true }), (a, b) => {
      expect(changeOfSize(100, SPECIES.beech, 'quarter', a, b) + changeOfSize(100, SPECIES.beech, 'quarter', b, a)).toBeCloseTo(0, 9);
    }));
  });

  it.each(EMC)('at %d °F and %d %% humidity holds %d %%', (fahrenheit, humidity, moisture) => {
    expect(Math.abs(equilibriumMoisture(fahrenheit, humidity) - moisture)).toBeLessThanOrEqual(0.1);
  });

  it('shrinks in winter and swells in summer, more flat sawn than quarter sawn', () => {
    for (const wood of WOODS) {
      const flat = seasonalMovement(10, wood, 'flat', { fahrenheit: 70, winter: 30, summer: 65, shop: 45 });
      const quarter = seasonalMovement(10, wood, 'quarter', { fahrenheit: 70, winter: 30, summer: 65, shop: 45 });
      expect(flat === null).toBe(wood === 'plywood' || wood === 'mdf');
      if (!flat || !quarter) continue;
      expect(flat.winter).toBeLessThan(quarter.winter);
      expect(quarter.winter).toBeLessThan(0);
      expect(flat.summer).toBeGreaterThan(quarter.summer);
    }
  });
});

describe('sizes on sale', () => {
  // PS 20, dry, in millimetres as converted in FACTS.md C4.
  it.each([[1, 2, 19.05, 38.1], [1, 3, 19.05, 63.5], [1, 4, 19.05, 88.9], [1, 6, 19.05, 139.7], [1, 8, 19.05, 184.15], [2, 4, 38.1, 88.9]])('a %d × %d is %d × %d mm', (thick, wide, t, w) => {
    expect(nominalFor(t / 25.4, PS20.thickness)?.nominal).toBe(thick);
    expect(nominalFor(w / 25.4, PS20.width)?.nominal).toBe(wide);
    expect(nominalFor(w / 25.4 + 0.01, PS20.width)?.nominal).not.toBe(wide);
  });

  it('has no board wider than 12 nominal, and hardwood thicker by the sixteenth', () => {
    expect(nominalFor(11.5, PS20.width)).toBeNull();
    expect(nominalFor(0.75, HARDWOOD_S2S)).toEqual({ nominal: 1, dressed: 13 / 16 });
  });

  // FACTS.md C4: bf = T W L / 12 with L in feet.
  it.each([[1, 4, 8, 2.6667], [1, 6, 10, 5], [2, 4, 8, 5.3333]])('%d × %d × %d ft is %d board feet', (t, w, feet, expected) => {
    expect(boardFeet(t, w, feet * 12)).toBeCloseTo(expected, 4);
  });
});
