import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { bitSchema } from '#shared/shop/bit';
import { type CutWith, onMachine, prepareRail } from '#shared/shop/forMachine';
import { machineSchema } from '#shared/shop/machine';
import { ownWoodSchema } from '#shared/shop/wood';
import { type SlotRequestInput, slotRequestSchema } from '#shared/slot/request';
import { expectSoundCut } from '../../support/soundCut/index';
import { QUARTER, TABLE } from './asking';

/** PRODUCT, demo scenario, as a drawing: what machine and bit say is not in it. */
const RAIL: SlotRequestInput = { units: 'in', name: 'Rail A', length: '24 1/2', width: '3/8', depth: '3/16', stopMargin: '7/8', bitDiameter: 0.25, stepdown: '3/32', railWidth: '1 1/4', wood: 'white-oak' };
/** The same table in a metric shop: 32 in, 4 in, 200 and 100 in/min. */
const METRIC_TABLE = {
  ...TABLE, units: 'mm', workArea: { x: 812.8, y: 812.8, z: 101.6 }, topFeed: { x: 5080, y: 5080, z: 2540 }, acceleration: 508,
  holdings: [{ kind: 'end clamps', height: 12.7, reach: 12.7 }],
} as const;
const METRIC_BIT = { ...QUARTER, units: 'mm', diameter: 6.35, cuttingLength: 19.05, colletDiameter: 31.75, stickout: 31.75 } as const;

function shop({ machine = TABLE, bit = QUARTER, wood = null, holding = 0, accepted = null }: { machine?: object; bit?: object; wood?: object | null; holding?: number; accepted?: number | null } = {}): CutWith {
  const kept = machineSchema.parse(machine);
  const held = kept.holdings[holding];
  if (!held) throw new Error('no such way of holding');
  return { machine: kept, holding: held, bit: { ...bitSchema.parse(bit), acceptedDiameter: accepted }, wood: wood && ownWoodSchema.parse(wood) };
}

function refusals(rail: object, cutWith: CutWith) {
  const prepared = prepareRail({ ...RAIL, ...rail }, cutWith);
  return prepared.ok ? [] : prepared.problems;
}

describe('a rail on a machine', () => {
  it('takes holding, bit, limits and options from the records', () => {
    const request = onMachine(RAIL, shop({ bit: { ...QUARTER, chipLoadRange: [0.004, 0.006] }, accepted: 0.252 }));
    expect(request).toMatchObject({
      units: 'in', length: '24 1/2', bitDiameter: 0.252, flutes: 2, cuttingLength: 0.75, bitKind: 'upcut', centreCutting: true, colletDiameter: 1.25, stickout: 1.25,
      clampHeight: 0.5, clampReach: 0.5, wood: 'white-oak', spindle: 'program', chipLoadRange: [0.004, 0.006],
      machine: { travel: { x: 32, y: 32, z: 4 }, topFeed: 200, acceleration: 20, spindleRange: [8000, 24000], heavy: false },
      options: { programUnits: 'in' },
    });
    expect(slotRequestSchema.safeParse(request).success).toBe(true);
  });

  it("replaces what the drawing said of another shop's machine", () => {
    const rail = { ...RAIL, flutes: 3, stickout: 9, machine: { topFeed: 1 }, options: { lineNumbers: true }, spindle: 'hand' } as const;
    expect(onMachine(rail, shop())).toEqual(onMachine(RAIL, shop()));
  });

  it('keeps what the drawing decides: speed, feeds, entry, direction', () => {
    const rail = { ...RAIL, spindleSpeed: 12000, feed: 90, plungeFeed: 20, rampAngle: 2, direction: 'conventional', finishAllowance: 0.01 } as const;
    expect(onMachine(rail, shop())).toMatchObject({ spindleSpeed: 12000, feed: 90, plungeFeed: 20, rampAngle: 2, direction: 'conventional', finishAllowance: 0.01 });
  });

  it.each([
    ["the machine's slowest", { machine: { ...TABLE, spindleRange: [18000, 24000] } }, 18000],
    ["the machine's fastest", { machine: { ...TABLE, spindleRange: [5000, 10000] } }, 10000],
    ["the bit maker's", { bit: { ...QUARTER, topSpeed: 12000 } }, 12000],
    ['the usual', {}, 16000], // FIELDS.spindleSpeed: 16 000 rev/min (common practice, no source)
  ])('takes %s speed where nobody asks for one', (_, records, speed) => {
    expect(onMachine(RAIL, shop(records)).spindleSpeed).toBe(speed);
  });

  it('goes through to a program that is sound, in the machine\'s units', () => {
    for (const records of [{}, { machine: METRIC_TABLE }, { machine: METRIC_TABLE, bit: METRIC_BIT }]) {
      const prepared = prepareRail(RAIL, shop(records));
      expect(prepared).toMatchObject({ ok: true });
      if (!prepared.ok) continue;
      const made = makeProgram(prepared.request);
      expect(made.readback.findings.filter(({ severity }) => severity === 'disagrees')).toEqual([]);
      expect(made.ok && made.program.includes('machine' in records ? 'G21' : 'G20')).toBe(true);
      if (made.ok) expectSoundCut(made.program, prepared.request.spec, prepared.request.options);
    }
  });
});

describe('records in other units', () => {
  it('are converted once, by the inch of 25.4 mm', () => {
    const request = onMachine(RAIL, shop({ machine: METRIC_TABLE, bit: { ...METRIC_BIT, chipLoadRange: [0.1, 0.15] } }));
    expect(request).toMatchObject({
      units: 'in', bitDiameter: 6.35 / 25.4, stickout: 31.75 / 25.4, clampHeight: 12.7 / 25.4, chipLoadRange: [0.1 / 25.4, 0.15 / 25.4],
      machine: { travel: { x: 32, z: 4 }, topFeed: 200, acceleration: 508 / 25.4 }, options: { programUnits: 'mm' },
    });
  });

  it('say so in a note', () => {
    const prepared = prepareRail(RAIL, shop({ machine: METRIC_TABLE }));
    expect(prepared.ok && prepared.request.notes).toEqual(['The drawing is in in and the program in mm: 1 in is 25.400 mm.']);
  });

  it('give the same cut as the same records in inches', () => {
    const inch = prepareRail(RAIL, shop());
    const metric = prepareRail(RAIL, shop({ machine: METRIC_TABLE, bit: METRIC_BIT }));
    if (!inch.ok || !metric.ok) return expect([inch.ok, metric.ok]).toEqual([true, true]);
    const numbers = (spec: object) => Object.entries(spec).filter(([, value]) => typeof value === 'number');
    for (const [field, value] of numbers(inch.request.spec)) {
      expect(Object.entries(metric.request.spec).find(([name]) => name === field)?.[1], field).toBeCloseTo(value, 9);
    }
  });

  it('leave a size of the same units to the last bit', () => {
    fc.assert(fc.property(fc.double({ min: 0.2, max: 0.3, noNaN: true }), (diameter) => {
      expect(onMachine(RAIL, shop({ bit: { ...QUARTER, diameter } })).bitDiameter).toBe(diameter);
    }), { seed: 9 });
  });

  it('let through what fits to the last hair, and no feed beyond the machine', () => {
    fc.assert(fc.property(fc.integer({ min: 40, max: 4000 }), fc.integer({ min: 400, max: 20000 }), (tenths, feed) => {
      const inches = tenths / 100;
      const x = Number((inches * 25.4).toFixed(4));
      const limits = onMachine(RAIL, shop({ machine: { ...METRIC_TABLE, workArea: { x: Math.max(x, 12), y: 800, z: 100 }, topFeed: { x: feed, y: feed, z: 1000 } } })).machine;
      if (x >= 12) expect(limits?.travel?.x).toBe(inches);
      expect((limits?.topFeed ?? Infinity) * 25.4).toBeLessThanOrEqual(feed + 1e-4);
      expect((limits?.topFeed ?? 0) * 25.4).toBeGreaterThan(feed - 2.54 - 1e-9);
    }), { seed: 10 });
  });

  it('never ask for a chord that the drawing is too fine for', () => {
    const coarse = shop({ machine: { ...TABLE, options: { chordTolerance: 0.0005 } } });
    const rail = { units: 'mm', length: 600, width: 9, depth: 5, stopMargin: 22, bitDiameter: 6, stepdown: 2.5, railWidth: 30 } as const;
    const prepared = prepareRail(rail, coarse);
    expect(prepared.ok && prepared.request.options.chordTolerance).toBe(0.01); // 0.0127 mm would be refused
  });
});

describe("the shop's own wood", () => {
  const wood = { units: 'mm', name: 'Birch ply', kind: 'sheet', movesSeasonally: false, chipLoads: [{ diameter: 6.35, least: 0.1, most: 0.15 }] };

  it('names its kind and gives its chip load', () => {
    const request = onMachine(RAIL, shop({ wood }));
    expect(request.wood).toBe('plywood');
    expect(request.chipLoadRange?.[0]).toBeCloseTo(0.1 / 25.4, 12);
  });

  it("gives way to the bit maker's own figures", () => {
    expect(onMachine(RAIL, shop({ wood, bit: { ...QUARTER, chipLoadRange: [0.004, 0.006] } })).chipLoadRange).toEqual([0.004, 0.006]);
  });

  it('leaves the chart where the shop gave no figures', () => {
    expect(onMachine(RAIL, shop({ wood: { ...wood, chipLoads: [] } })).chipLoadRange).toBeNull();
  });
});

/** Issue 4, "Machines": said before a program is made. Rail A is 26 1/4 × 1 1/4 × 3/4 in (PRODUCT). */
describe.each([
  ['a rail longer than the work area', 'length', {}, { machine: { ...TABLE, workArea: { x: 26, y: 32, z: 4 } } }, ['26 1/4 in', '26 in', 'X'], { machine: { ...TABLE, workArea: { x: 26.25, y: 32, z: 4 } } }],
  ['a rail wider than the work area', 'railWidth', {}, { machine: { ...TABLE, workArea: { x: 32, y: 1, z: 4 } } }, ['1 1/4 in', '1 in', 'Y'], { machine: { ...TABLE, workArea: { x: 32, y: 1.25, z: 4 } } }],
  // Rail 3/4 and safe height 3/4
  ['a safe height above the work area', 'safeHeight', {}, { machine: { ...TABLE, workArea: { x: 32, y: 32, z: 1.4 } } }, ['1 1/2 in', '1.4 in', 'thinner rail'], { machine: { ...TABLE, workArea: { x: 32, y: 32, z: 1.5 } } }],
  ['a rail wider than the vise', 'railWidth', {}, { machine: { ...TABLE, holdings: [{ kind: 'side vise', widest: 1, height: 0, reach: 0 }] } }, ['1 1/4 in', 'side vise grips 1 in', 'another way'], { machine: { ...TABLE, holdings: [{ kind: 'side vise', widest: 1.25, height: 0, reach: 0 }] } }],
  // Nut 5/8 from the bit's middle, which goes 1/16 off the rail's middle: past the rail's edge at 5/8. Needs 1/2 + 3/16 showing.
  ['a nut on the jaws', 'stickout', { stepdown: 0.0625, safeHeight: 1.5 }, { bit: { ...QUARTER, cuttingLength: 0.6, stickout: 0.6 }, machine: { ...TABLE, holdings: [{ kind: 'side vise', widest: 4, height: 0.5, reach: 0 }] } }, ['0.6 in', 'jaws 1/2 in', '11/16 in or more'], { bit: { ...QUARTER, cuttingLength: 0.6, stickout: 0.6875 }, machine: { ...TABLE, holdings: [{ kind: 'side vise', widest: 4, height: 0.5, reach: 0 }] } }],
  ["a feed beyond the machine's slower axis", 'feed', { feed: 90 }, { machine: { ...TABLE, topFeed: { x: 200, y: 80, z: 100 } } }, ['90 in/min', '80'], { machine: { ...TABLE, topFeed: { x: 200, y: 90, z: 100 } } }],
  ["a plunge feed beyond the machine's Z", 'plungeFeed', { plungeFeed: 25 }, { machine: { ...TABLE, topFeed: { x: 200, y: 200, z: 20 } } }, ['25 in/min', '20', 'Z'], { machine: { ...TABLE, topFeed: { x: 200, y: 200, z: 25 } } }],
  ["a speed beyond the machine's", 'spindleSpeed', { spindleSpeed: 25000 }, {}, ['25000', '8000 to 24000'], { machine: { ...TABLE, spindleRange: [8000, 25000] } }],
  ["a speed beyond the bit maker's", 'spindleSpeed', { spindleSpeed: 20000 }, { bit: { ...QUARTER, topSpeed: 18000 } }, ['20000', "maker allows 18000", '8000 to 18000'], { bit: { ...QUARTER, topSpeed: 20000 } }],
  ['a machine too fast for the bit', 'spindleSpeed', {}, { machine: { ...TABLE, spindleRange: [18000, 24000] }, bit: { ...QUARTER, topSpeed: 12000 } }, ['12000', '18000', 'another bit'], { machine: { ...TABLE, spindleRange: [12000, 24000] }, bit: { ...QUARTER, topSpeed: 12000 } }],
])('%s', (_, field, rail, records, names, good) => {
  it('is said by field, value and what would work', () => {
    const here = refusals(rail, shop(records)).filter((problem) => problem.field === field).map(({ message }) => message).join(' ');
    for (const name of names) expect(here).toContain(name);
  });

  it('has a neighbour that is fine', () => {
    expect(refusals(rail, shop(good))).toEqual([]);
  });
});

describe('a drawing that is wrong by itself', () => {
  it('is refused by the slot\'s own rules, each once', () => {
    const problems = refusals({ depth: 3, wood: 'balsa' }, shop({ machine: { ...TABLE, workArea: { x: 26, y: 32, z: 4 } } }));
    expect(problems.map(({ field }) => field)).toEqual(expect.arrayContaining(['depth', 'wood']));
    expect(new Set(problems.map(({ field, message }) => field + message)).size).toBe(problems.length);
  });

  it("has the machine's objections beside the slot's", () => {
    // The bit is too wide for the slot here, and the rail too long for the table: the drawing had another bit.
    const problems = refusals({}, shop({ bit: { ...QUARTER, diameter: 0.5 }, machine: { ...TABLE, workArea: { x: 26, y: 32, z: 4 } } }));
    expect(problems.map(({ field }) => field)).toEqual(expect.arrayContaining(['bitDiameter', 'length']));
  });
});
