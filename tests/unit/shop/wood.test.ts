import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SHEET_FACTS, kindOf, ownChipLoad, ownWoodSchema } from '#shared/shop/wood';
import { WOODS } from '#shared/wood/woods';
import { type Refusal, said } from './asking';

const SAPELE = { units: 'in', name: 'Sapele', kind: 'hardwood', movesSeasonally: true, chipLoads: [{ diameter: '1/4', least: 0.004, most: 0.006 }, { diameter: '1/8', least: 0.002, most: 0.003 }] } as const;

/** Issue 4, "Woods"; each message names field, value and what would work. */
const REFUSALS: readonly Refusal[] = [
  { rule: 'no name', path: 'name', bad: { name: '' }, names: ['name', 'empty'], good: { name: 'Ash' } },
  { rule: 'an unknown kind', path: 'kind', bad: { kind: 'stone' }, names: ['kind of wood', '"stone"', 'sheet'], good: { kind: 'sheet' } },
  { rule: 'chip loads the wrong way round', path: 'chipLoads.0.most', bad: { chipLoads: [{ diameter: 0.25, least: 0.006, most: 0.004 }] }, names: ['least, then greatest'], good: { chipLoads: [{ diameter: 0.25, least: 0.004, most: 0.0041 }] } },
  { rule: 'a feed in place of a chip load', path: 'chipLoads.0.most', bad: { chipLoads: [{ diameter: 0.25, least: 0.006, most: 100 }] }, names: ['greatest chip load', '100', 'in per tooth'], good: { chipLoads: [] } },
  { rule: 'a diameter twice', path: 'chipLoads.1.diameter', bad: { chipLoads: [{ diameter: 0.25, least: 0.004, most: 0.006 }, { diameter: '1/4', least: 0.004, most: 0.006 }] }, names: ['0.25 in', 'twice'], good: {} },
  { rule: 'movement left out', path: 'movesSeasonally', bad: { movesSeasonally: undefined }, names: ['moves with the seasons', 'missing', 'true or false'], good: { movesSeasonally: false } },
  { rule: 'a caution of many pages', path: 'dustCaution', bad: { dustCaution: 'a'.repeat(201) }, names: ['dust caution', '200 characters'], good: { dustCaution: 'a'.repeat(200) } },
  { rule: 'another unit', path: 'units', bad: { units: 'ft' }, names: ['unit of length', '"ft"'], good: {} },
];

describe.each(REFUSALS)('$rule', ({ path, bad, names, good }) => {
  it('is refused by name, value and what would work', () => {
    const here = said(ownWoodSchema, { ...SAPELE, ...bad }).filter((problem) => problem.path === path).map(({ message }) => message).join(' ');
    for (const name of names) expect(here.toLowerCase()).toContain(name.toLowerCase());
  });

  it('has a neighbour that is fine', () => {
    expect(said(ownWoodSchema, { ...SAPELE, ...good })).toEqual([]);
  });
});

describe('a wood of the shop', () => {
  const wood = ownWoodSchema.parse(SAPELE);

  it('has its chip loads smallest bit first, and no caution where none was written', () => {
    expect(wood.chipLoads.map(({ diameter }) => diameter)).toEqual([0.125, 0.25]);
    expect(wood.dustCaution).toBeNull();
    expect(ownWoodSchema.parse({ ...SAPELE, dustCaution: ' ' }).dustCaution).toBeNull();
    expect(ownWoodSchema.parse(wood)).toEqual(wood);
  });

  it.each([
    [0.125, 0.002, 0.003], [0.25, 0.004, 0.006], // as given
    [0.1875, 0.003, 0.0045], // halfway
    [0.0625, 0.001, 0.0015], // half the smallest bit, half its load
    [0.5, 0.004, 0.006], // above the largest
  ])('gives a %d in bit %d to %d', (diameter, least, most) => {
    const load = ownChipLoad(wood, diameter);
    expect(load?.[0]).toBeCloseTo(least, 12);
    expect(load?.[1]).toBeCloseTo(most, 12);
  });

  it('gives nothing where the shop gave nothing', () => {
    expect(ownChipLoad({ chipLoads: [] }, 0.25)).toBeNull();
  });

  it('never gives a band whose least is more than its most', () => {
    const row = fc.record({ diameter: fc.double({ min: 0.01, max: 1, noNaN: true }), least: fc.double({ min: 0.0001, max: 0.01, noNaN: true }), more: fc.double({ min: 0.0001, max: 0.01, noNaN: true }) })
      .map(({ diameter, least, more }) => ({ diameter, least, most: least + more }));
    fc.assert(fc.property(fc.uniqueArray(row, { minLength: 1, maxLength: 6, selector: ({ diameter }) => diameter }), fc.double({ min: 0.005, max: 2, noNaN: true }), (rows, diameter) => {
      const load = ownChipLoad(ownWoodSchema.parse({ ...SAPELE, chipLoads: rows }), diameter);
      expect(load).not.toBeNull();
      expect((load?.[1] ?? 0) - (load?.[0] ?? 0)).toBeGreaterThanOrEqual(-1e-15);
    }), { seed: 4 });
  });

  it('cuts as a wood that a slot may name', () => {
    expect(['hardwood', 'softwood', 'sheet'].map((kind) => kindOf(ownWoodSchema.parse({ ...SAPELE, kind })))).toEqual(['hardwood', 'softwood', 'plywood']);
    expect(WOODS).toContain(kindOf(wood));
  });
});

/** Issue 4, "Woods": MDF and plywood (no seasonal movement, dust caution). */
describe.each(['mdf', 'plywood'] as const)('%s', (kind) => {
  it('does not move with the seasons and has a dust caution', () => {
    expect(SHEET_FACTS[kind].movesSeasonally).toBe(false);
    expect(SHEET_FACTS[kind].dustCaution).toMatch(/dust.*respirator/);
  });
});
