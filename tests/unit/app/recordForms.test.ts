import { describe, expect, it } from 'vitest';
import { bitSchema } from '#shared/shop/bit';
import { machineSchema } from '#shared/shop/machine';
import { ownWoodSchema } from '#shared/shop/wood';
import { DEMO_BITS, DEMO_MACHINE } from '#server/demo/scenario';
import { bitForm, bitInUnits, bitRequest, newBit } from '../../../app/utils/bitForm';
import { figureIn, rateAfter, sizeAfter, sizeText } from '../../../app/utils/formText';
import { machineForm, machineInUnits, machineRequest, newMachine } from '../../../app/utils/machineForm';
import { newWood, woodForm, woodInUnits, woodRequest } from '../../../app/utils/woodForm';

const MACHINE = machineSchema.parse({ ...DEMO_MACHINE, parking: { x: -1, y: -20.5, z: 0 }, holdings: [...DEMO_MACHINE.holdings, { kind: 'side vise', widest: '90 mm', height: '9 mm', reach: 0 }] });
const BIT = bitSchema.parse({ ...DEMO_BITS[1], kind: 'compression', upcutLength: '5 mm', measuredDiameter: 0.2485, topSpeed: 18000 });
const WOOD = ownWoodSchema.parse({ units: 'in', name: 'Hornbeam', kind: 'hardwood', movesSeasonally: true, chipLoads: [{ diameter: '1/4', least: 0.003, most: 0.005 }, { diameter: '6 mm', least: 0.002, most: 0.004 }] });
const paths = (result: { readonly error?: { readonly issues: readonly { readonly path: readonly PropertyKey[] }[] } | undefined }) => (result.error?.issues ?? []).map(({ path }) => path.join('.'));

describe('a kept record in its form', () => {
  it('asks for exactly itself when nothing was typed', () => {
    expect(machineSchema.parse(machineRequest(machineForm(MACHINE)))).toEqual(MACHINE);
    expect(bitSchema.parse(bitRequest(bitForm(BIT)))).toEqual(BIT);
    expect(ownWoodSchema.parse(woodRequest(woodForm(WOOD)))).toEqual(WOOD);
  });

  it('keeps every size when its units change', () => {
    const machine = machineSchema.parse(machineRequest(machineInUnits(machineForm(MACHINE), 'mm')));
    expect(machine.units).toBe('mm');
    expect(machine.workArea.x).toBeCloseTo(32 * 25.4, 9);
    expect(machine.topFeed.z).toBeCloseTo(60 * 25.4, 6);
    expect(machine.parking?.y).toBeCloseTo(-20.5 * 25.4, 6);
    expect(machine.holdings[3]?.widest).toBe(90); // named its own unit, and is untouched by two conversions
    const bit = bitSchema.parse(bitRequest(bitInUnits(bitForm(BIT), 'mm')));
    expect(bit.diameter).toBeCloseTo(6.35, 9);
    expect(bit.chipLoadRange?.[0]).toBeCloseTo(0.0508, 9);
    const wood = ownWoodSchema.parse(woodRequest(woodInUnits(woodForm(WOOD), 'mm')));
    expect(wood.chipLoads.map(({ diameter }) => Number(diameter.toFixed(9)))).toEqual([6, 6.35]);
  });
});

describe('a form', () => {
  it('names every field that is still blank, and no other', () => {
    expect(paths(machineSchema.safeParse(machineRequest(newMachine()))).sort()).toEqual([
      'name', 'spindleRange.0', 'spindleRange.1', 'topFeed.x', 'topFeed.y', 'topFeed.z', 'workArea.x', 'workArea.y', 'workArea.z',
    ]);
    expect(paths(bitSchema.safeParse(bitRequest(newBit()))).sort()).toEqual(['colletDiameter', 'cuttingLength', 'diameter', 'name', 'stickout']);
    expect(paths(ownWoodSchema.safeParse(woodRequest(newWood())))).toEqual(['name']);
  });

  it('leaves what cannot be read to the schema, which quotes it', () => {
    const judged = bitSchema.safeParse(bitRequest({ ...bitForm(BIT), flutes: 'two', diameter: '1/4 furlong' }));
    expect(judged.error?.issues.map(({ message }) => message)).toEqual([
      'Bit diameter is "1/4 furlong". That is not a size we can read. Try 26 1/4, 0.375 or 9 mm.', 'Flute count is "two". Use 1 to 8 flutes.',
    ]);
  });

  it('sends no up-cut length of a bit that is no compression bit any more', () => {
    expect(bitSchema.safeParse(bitRequest({ ...bitForm(BIT), kind: 'straight' })).success).toBe(true);
  });

  it('takes half a chip load for a missing one', () => {
    expect(paths(bitSchema.safeParse(bitRequest({ ...bitForm(BIT), mostChip: '' })))).toEqual(['chipLoadRange.1']);
  });
});

describe('text of a kept size', () => {
  it.each([
    [26.25, 'in', '26 1/4'], [0.2485, 'in', '0.2485'], [9 / 25.4, 'in', '9 mm'], [0, 'in', '0'], [6, 'mm', '6'], [0.1234567891, 'in', '0.123456789'], [6.35, 'mm', '6.35'], [25.4 / 64, 'mm', '0.396875'],
  ] as const)('%f %s is %s', (value, units, text) => {
    expect(sizeText(value, units)).toBe(text);
  });

  it('a bare figure names the unit it was typed in once the form has another', () => {
    expect(sizeAfter('26 1/4', 'in', 'mm')).toBe('26 1/4 in');
    expect(sizeAfter('9 mm', 'in', 'mm')).toBe('9 mm');
    expect(sizeAfter('abc', 'in', 'mm')).toBe('abc');
    expect(sizeAfter('', 'in', 'mm')).toBe('');
    expect(rateAfter('200', 'in', 'mm')).toBe('5080');
    expect(rateAfter('fast', 'in', 'mm')).toBe('fast');
  });

  it('a figure is a number, nothing, or what was typed', () => {
    expect(['-1.5', ' 8 ', '', ' ', '1e3', '1,5'].map(figureIn)).toEqual([-1.5, 8, undefined, undefined, '1e3', '1,5']);
  });
});
