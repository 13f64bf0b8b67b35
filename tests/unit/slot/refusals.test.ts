import { describe, expect, it } from 'vitest';
import { slotRequestSchema } from '#shared/slot/request';
import { RAIL_A, RAIL_MM, refusals } from './asking';

/** One rule of refusal (issue, "The slot spec"): a spec that fires it, what the message names, and a neighbour that is fine. */
interface Refusal {
  readonly rule: string;
  readonly path: string;
  readonly bad: object;
  /** The field's words, the value as the trade writes it, and what would work. */
  readonly names: readonly string[];
  readonly good: object;
}

const REFUSALS: readonly Refusal[] = [
  { rule: 'bit wider than the slot', path: 'bitDiameter', bad: { bitDiameter: 0.5 }, names: ['bit', '1/2 in', '3/8 in or less'], good: { bitDiameter: 0.38 } },
  { rule: 'length under width', path: 'length', bad: { length: 0.25 }, names: ['length', '1/4 in', '3/8 in or more'], good: { length: 0.375 } },
  { rule: 'slot as deep as the rail', path: 'depth', bad: { depth: 0.75 }, names: ['depth', '3/4 in', '5/8 in or less'], good: { depth: 0.625 } },
  { rule: 'too thin a floor', path: 'depth', bad: { depth: 0.6876 }, names: ['depth', '0.6876 in', '0.0624 in', '5/8 in or less'], good: { depth: 0.62 } },
  { rule: 'walls too thin', path: 'railWidth', bad: { railWidth: 0.4375 }, names: ['rail width', '7/16 in', '1/2 in or more'], good: { railWidth: 0.5 } },
  { rule: 'stepdown beyond the cutting length', path: 'stepdown', bad: { cuttingLength: 0.0625 }, names: ['stepdown', '3/32 in', 'cutting length of 1/16 in'], good: { cuttingLength: 0.09375 } },
  { rule: 'stepdown beyond the advised share', path: 'stepdown', bad: { stepdown: 0.1876 }, names: ['stepdown', '0.1876 in', 'at most 1/8 in'], good: { stepdown: 0.125 } },
  { rule: 'the same in softwood', path: 'stepdown', bad: { wood: 'pine', depth: 0.5, stepdown: 0.26 }, names: ['stepdown', '0.26 in', '1/4 in'], good: { wood: 'pine', depth: 0.5, stepdown: 0.25 } },
  { rule: 'stop margin too short', path: 'stopMargin', bad: { stopMargin: 0.1875 }, names: ['stop margin', '3/16 in', '1/4 in or more'], good: { stopMargin: 0.25 } },
  { rule: 'clamps onto the slot', path: 'clampReach', bad: { clampReach: 0.875 }, names: ['clamps reach 7/8 in', '1/8 in clear'], good: { clampReach: 0.75 } },
  { rule: "stop margin under the nut's radius beside a clamp", path: 'stopMargin', bad: { stopMargin: 0.3, stickout: 0.6 }, names: ['stop margin', '1/2 in or more', 'clamp 1/2 in high'], good: { stopMargin: 0.5, stickout: 0.6 } },
  { rule: 'the nut into the rail', path: 'stickout', bad: { stickout: 0.125, clampHeight: 0 }, names: ['1/8 in of bit', '3/16 in deep', '5/16 in'], good: { stickout: 0.19, clampHeight: 0 } },
  { rule: 'safe height near the clamps', path: 'safeHeight', bad: { safeHeight: 0.5625 }, names: ['safe height', '9/16 in', '5/8 in or more'], good: { safeHeight: 0.625 } },
  { rule: 'finish allowance without room', path: 'finishAllowance', bad: { finishAllowance: 0.0626 }, names: ['finish allowance', '0.0626 in', '1/16 in or less'], good: { finishAllowance: 0.0625 } },
  { rule: "feed above the machine's", path: 'feed', bad: { feed: 201, machine: { topFeed: 200 } }, names: ['feed', '201 in/min', '200 in/min'], good: { feed: 200, machine: { topFeed: 200 } } },
  { rule: "plunge feed above the machine's", path: 'plungeFeed', bad: { plungeFeed: 201, machine: { topFeed: 200 } }, names: ['plunge feed', '201 in/min', '200 in/min'], good: { plungeFeed: 200, machine: { topFeed: 200 } } },
  { rule: "speed outside the machine's range", path: 'spindleSpeed', bad: { spindleSpeed: 25000, machine: { spindleRange: [8000, 24000] } }, names: ['spindle speed', '25000', '8000 to 24000'], good: { spindleSpeed: 24000, machine: { spindleRange: [8000, 24000] } } },
  { rule: 'more travel than the machine has', path: 'machine', bad: { machine: { travel: { x: 24, y: 32, z: 4 } } }, names: ['24 1/4 in', 'X', '24 in', 'shorter slot'], good: { machine: { travel: { x: 24.25, y: 32, z: 4 } } } },
  { rule: 'a size under 0.01 in', path: 'depth', bad: { depth: 0.0099 }, names: ['depth', '0.0099 in', '0.01 in to 240 in'], good: { depth: 0.01, stepdown: 0.01 } },
  { rule: 'a size over 240 in', path: 'length', bad: { length: 240.1 }, names: ['length', '240.1 in', '240 in'], good: { length: 238 } },
  { rule: 'a rail over 240 in', path: 'length', bad: { length: 239 }, names: ['240 3/4 in', '240 in or less'], good: { length: 238.25 } },
  { rule: 'a ramp too steep', path: 'rampAngle', bad: { rampAngle: 10.5 }, names: ['ramp angle', '10.5', '0.5 to 10 degrees'], good: { rampAngle: 10 } },
  { rule: 'a stepover over a half', path: 'stepover', bad: { stepover: 0.51 }, names: ['stepover', '0.51', '0.05 to 0.5'], good: { stepover: 0.5 } },
  { rule: 'no flutes', path: 'flutes', bad: { flutes: 0 }, names: ['flute', '0', '1 to 8'], good: { flutes: 1 } },
  { rule: 'half a flute', path: 'flutes', bad: { flutes: 1.5 }, names: ['flute', '1.5', 'whole number'], good: { flutes: 2 } },
  { rule: 'no number', path: 'width', bad: { width: Number.NaN }, names: ['width', 'NaN'], good: {} },
  { rule: 'infinity', path: 'width', bad: { width: Infinity }, names: ['width', 'Infinity'], good: {} },
  { rule: 'a negative size', path: 'width', bad: { width: -0.375 }, names: ['width', '-0.375 in', '0.01 in to 240 in'], good: {} },
  { rule: 'zero', path: 'stepdown', bad: { stepdown: 0 }, names: ['stepdown', '0 in', '0.01 in'], good: {} },
  { rule: 'a size nobody can read', path: 'width', bad: { width: '3/8 furlong' }, names: ['width', '3/8 furlong', 'Try 26 1/4, 0.375 or 9 mm'], good: { width: '3/8"' } },
  { rule: 'a fraction over zero', path: 'depth', bad: { depth: '1/0' }, names: ['depth', '1/0', 'Try'], good: { depth: '3/16' } },
  { rule: 'a huge name', path: 'name', bad: { name: 'A'.repeat(61) }, names: ['name', '60 characters or fewer'], good: { name: 'A'.repeat(60) } },
  { rule: 'control characters', path: 'name', bad: { name: 'Rail\nG0 Z-1' }, names: ['name', 'control character', 'plain text'], good: { name: 'Rail G0 Z-1' } },
  { rule: 'unknown keys', path: '', bad: { stopmargin: 1 }, names: ['stopmargin', 'spelling'], good: {} },
  { rule: 'wrong units', path: 'units', bad: { units: 'cm' }, names: ['unit', 'cm', 'in or mm'], good: { units: 'in' } },
  { rule: 'an unknown wood', path: 'wood', bad: { wood: 'balsa' }, names: ['wood', 'balsa', 'walnut'], good: { wood: 'walnut' } },
  { rule: 'chords coarser than the slot is exact', path: 'options.chordTolerance', bad: { options: { chordTolerance: 0.001 } }, names: ['chord tolerance', '0.001', '0.0005 in or less'], good: { options: { chordTolerance: 0.0005 } } },
];

describe.each(REFUSALS)('$rule', ({ path, bad, names, good }) => {
  it('is refused by name, value and what would work', () => {
    const said = refusals({ ...RAIL_A, ...bad });
    const here = said.filter((problem) => problem.path === path).map(({ message }) => message).join(' ');
    for (const name of names) expect(here.toLowerCase()).toContain(name.toLowerCase());
  });

  it('has a neighbour that is fine', () => {
    expect(refusals({ ...RAIL_A, ...good })).toEqual([]);
  });
});

describe('a metric drawing', () => {
  it.each([
    ['depth', { depth: 16.5 }, { depth: 16 }], ['stopMargin', { stopMargin: 5.9 }, { stopMargin: 6 }], ['length', { length: 6097 }, { length: 6000 }],
    ['safeHeight', { safeHeight: 14.9 }, { safeHeight: 15 }], ['depth', { depth: 0.25 }, { depth: 0.254 }], ['stepdown', { stepdown: 3.1 }, { stepdown: 3 }],
    ['options.chordTolerance', { options: { chordTolerance: 0.0101 } }, { options: { chordTolerance: 0.01 } }],
  ])('%s has the limit in millimetres', (path, bad, good) => {
    expect(refusals({ ...RAIL_MM, ...bad }).map((problem) => problem.path)).toContain(path);
    expect(refusals({ ...RAIL_MM, ...good })).toEqual([]);
  });
});

describe('required fields', () => {
  it.each(['units', 'length', 'width', 'depth', 'stopMargin', 'bitDiameter', 'stepdown'])('%s is asked for', (field) => {
    const rest = Object.fromEntries(Object.entries(RAIL_A).filter(([name]) => name !== field));
    const said = refusals(rest);
    expect(said.map(({ path }) => path)).toContain(field);
    expect(said.find(({ path }) => path === field)?.message).toMatch(/missing/);
  });

  it.each([[null], [[]], ['rail'], [7], [undefined]])('%j is no spec', (raw) => {
    const said = refusals(raw);
    expect(said.map(({ path }) => path)).toEqual(['']);
    expect(said[0]?.message).toMatch(/one JSON object with the slot spec/);
  });
});

describe('everything wrong', () => {
  it('is said at once, also beside a size nobody can read', () => {
    const said = refusals({ ...RAIL_A, width: 'wide', depth: 3, stopMargin: 0.1, feed: -1, wood: 'balsa', colour: 'red', safeHeight: 0.1 });
    expect(new Set(said.map(({ path }) => path))).toEqual(new Set(['', 'width', 'depth', 'stopMargin', 'feed', 'wood', 'safeHeight']));
  });

  it('never says the same thing twice', () => {
    const said = refusals({ ...RAIL_A, width: -1, depth: 99, bitDiameter: 'x', units: 'ft' }).map(({ path, message }) => `${path} ${message}`);
    expect(new Set(said).size).toBe(said.length);
  });
});

describe('a program of more than 100 000 blocks', () => {
  /** 50 000 laps at each of 1000 depths: to plan it would take minutes and more memory than there is. */
  const ENDLESS = {
    units: 'in', length: 200, width: 100, depth: 10, stopMargin: 1, bitDiameter: 0.02, stepdown: 0.01, stepover: 0.05, railWidth: 110, railThickness: 12,
    cuttingLength: 11, stickout: 12, machine: { travel: { x: 240, y: 240, z: 40 } },
  };

  it('is refused before it is planned', () => {
    const start = process.cpuUsage();
    const said = refusals(ENDLESS);
    // Of processor time, so that other work on the machine does not count. A request that anyone may post costs no more.
    expect(process.cpuUsage(start).user / 1000).toBeLessThan(250);
    expect(said).toHaveLength(1);
    expect(said[0]?.message).toMatch(/about \d{6,} lines.*100000.*deeper stepdown/);
  });

  it('is counted with the chords of its round ends', () => {
    const round = { ...RAIL_A, ends: 'round', width: 6, railWidth: 20, bitDiameter: 0.125, stepdown: 0.0125, stepover: 0.06 };
    expect(refusals(round)).toEqual([]);
    expect(refusals({ ...round, options: { chordTolerance: 0.000001 } }).map(({ path }) => path)).toEqual(['stepdown']);
  });
});

describe('the schema', () => {
  it('takes what it made', () => {
    const { spec, options } = slotRequestSchema.parse(RAIL_A);
    expect(slotRequestSchema.parse({ ...spec, options })).toMatchObject({ spec, options });
  });
});
