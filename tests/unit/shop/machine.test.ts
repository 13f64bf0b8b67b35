import { describe, expect, it } from 'vitest';
import { DEFAULT_OPTIONS } from '#shared/program/options';
import { machineSchema } from '#shared/shop/machine';
import { type Refusal, TABLE, said } from './asking';

const CLAMPS = TABLE.holdings[0];

/** Issue 4, "Machines"; each message names field, value and what would work (PRODUCT, "Voice"). */
const REFUSALS: readonly Refusal[] = [
  { rule: 'no name', path: 'name', bad: { name: '  ' }, names: ['name', 'empty'], good: { name: 'Table' } },
  { rule: 'a name on two lines', path: 'name', bad: { name: 'Rail\nG0' }, names: ['control character'], good: { name: 'Rail G0' } },
  { rule: 'a long name', path: 'name', bad: { name: 'A'.repeat(61) }, names: ['60 characters'], good: { name: 'A'.repeat(60) } },
  { rule: 'an axis of nothing', path: 'workArea.z', bad: { workArea: { x: 32, y: 32, z: 0 } }, names: ['work area along z', '0 in', '1/2 in to 240 in'], good: { workArea: { x: 32, y: 32, z: 0.5 } } },
  { rule: 'an axis that nobody can read', path: 'workArea.x', bad: { workArea: { x: 'long', y: 32, z: 4 } }, names: ['work area along x', '"long"', 'Try'], good: { workArea: { x: '32 in', y: 32, z: 4 } } },
  { rule: 'an axis left out', path: 'workArea.y', bad: { workArea: { x: 32, z: 4 } }, names: ['work area along y', 'missing'], good: {} },
  { rule: 'no feed', path: 'topFeed.z', bad: { topFeed: { x: 200, y: 200, z: 0 } }, names: ['feed along z', '0', '1 to 5000 in a minute'], good: { topFeed: { x: 200, y: 200, z: 1 } } },
  { rule: 'speeds the wrong way round', path: 'spindleRange', bad: { spindleRange: [24000, 8000] }, names: ['least, then greatest'], good: { spindleRange: [24000, 24000] } },
  { rule: 'a speed in place of a range', path: 'spindleRange', bad: { spindleRange: 16000 }, names: ['16000', 'two numbers'], good: { spindleRange: [16000, 16000] } },
  { rule: 'an unknown switch', path: 'spindle', bad: { spindle: 'foot' }, names: ['"foot"', 'program or hand'], good: { spindle: 'hand' } },
  { rule: 'a negative acceleration', path: 'acceleration', bad: { acceleration: -1 }, names: ['acceleration', '-1', 'in/s²'], good: { acceleration: null } },
  { rule: 'no way of holding', path: 'holdings', bad: { holdings: [] }, names: ['way of holding', 'at least one'], good: { holdings: [CLAMPS] } },
  { rule: 'an unknown way of holding', path: 'holdings.0.kind', bad: { holdings: [{ ...CLAMPS, kind: 'glue' }] }, names: ['"glue"', 'side vise'], good: { holdings: [{ ...CLAMPS, kind: 'end clamps' }] } },
  { rule: 'a vise without its opening', path: 'holdings.0.widest', bad: { holdings: [{ kind: 'side vise', height: 0, reach: 0 }] }, names: ['missing', "vise's opening"], good: { holdings: [{ kind: 'side vise', height: 0, reach: 0, widest: 4 }] } },
  { rule: 'jaws that reach in from the ends', path: 'holdings.0.reach', bad: { holdings: [{ kind: 'side vise', height: 0, reach: 1, widest: 4 }] }, names: ['Use 0'], good: { holdings: [{ kind: 'end clamps', height: 0, reach: 1 }] } },
  { rule: 'a height below the rail', path: 'holdings.0.height', bad: { holdings: [{ ...CLAMPS, height: -1 }] }, names: ['height above the rail', '-1 in', '0 in to 12 in'], good: { holdings: [{ ...CLAMPS, height: 0 }] } },
  { rule: 'programs in the other unit', path: 'options.programUnits', bad: { options: { programUnits: 'mm' } }, names: ['program units', 'mm', 'use in'], good: { options: { programUnits: 'in' } } },
  { rule: 'coarse chords', path: 'options.chordTolerance', bad: { options: { chordTolerance: 0.001 } }, names: ['0.001', '0.0005 in or less'], good: { options: { chordTolerance: 0.0005 } } },
  { rule: 'half a parking place', path: 'parking.z', bad: { parking: { x: 0, y: -10 } }, names: ['parking place along z', 'missing'], good: { parking: { x: 0, y: -10, z: -0.5 } } },
  { rule: 'an unknown key', path: '', bad: { travel: 3 }, names: ['"travel"', 'spelling'], good: {} },
  { rule: 'another unit', path: 'units', bad: { units: 'cm' }, names: ['unit of length', '"cm"', 'in or mm'], good: {} },
];

describe.each(REFUSALS)('$rule', ({ path, bad, names, good }) => {
  it('is refused by name, value and what would work', () => {
    const here = said(machineSchema, { ...TABLE, ...bad }).filter((problem) => problem.path === path).map(({ message }) => message).join(' ');
    for (const name of names) expect(here.toLowerCase()).toContain(name.toLowerCase());
  });

  it('has a neighbour that is fine', () => {
    expect(said(machineSchema, { ...TABLE, ...good })).toEqual([]);
  });
});

describe('a machine', () => {
  it('keeps its sizes as numbers in its own units', () => {
    const machine = machineSchema.parse({ ...TABLE, workArea: { x: '32 1/2', y: '800 mm', z: '4"' } });
    expect(machine.workArea).toEqual({ x: 32.5, y: 800 / 25.4, z: 4 });
    expect(machine.holdings[0]).toEqual({ kind: 'end clamps', widest: null, height: 0.5, reach: 0.5 });
  });

  it('fills what was left open', () => {
    expect(machineSchema.parse(TABLE)).toMatchObject({ heavy: false, parking: null, options: DEFAULT_OPTIONS });
  });

  it('in millimetres has its limits in millimetres', () => {
    const metric = { ...TABLE, units: 'mm', workArea: { x: 800, y: 800, z: 100 }, topFeed: { x: 5000, y: 5000, z: 2000 }, acceleration: 500 };
    expect(machineSchema.parse({ ...metric, holdings: [{ kind: 'fence and tape', height: '1/8 in', reach: 0 }] }).holdings[0]?.height).toBeCloseTo(3.175, 12);
    expect(said(machineSchema, { ...metric, workArea: { x: 6097, y: 800, z: 100 } })[0]?.message).toBe('Work area along X is 6097 mm. Use 12 mm to 6096 mm.');
  });

  it('takes what it made', () => {
    const machine = machineSchema.parse(TABLE);
    expect(machineSchema.parse(machine)).toEqual(machine);
  });

  it('has everything wrong said at once', () => {
    const wrong = said(machineSchema, { ...TABLE, name: '', workArea: { x: 0, y: 'wide', z: 4 }, spindle: 'foot', holdings: [{ ...CLAMPS, kind: 'glue', height: -1 }] });
    expect(new Set(wrong.map(({ path }) => path))).toEqual(new Set(['name', 'workArea.x', 'workArea.y', 'spindle', 'holdings.0.kind', 'holdings.0.height']));
  });

  it.each([[null], [[]], ['table'], [undefined]])('is not %j', (raw) => {
    expect(said(machineSchema, raw)).toHaveLength(1);
    expect(said(machineSchema, raw)[0]?.message).toMatch(/the machine as one object/);
  });
});
