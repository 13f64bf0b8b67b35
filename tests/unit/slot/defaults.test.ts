import { describe, expect, it } from 'vitest';
import { FIELDS } from '#shared/slot/fields';
import type { SlotSpec } from '#shared/slot/spec';
import { RAIL_A, RAIL_MM, asked } from './asking';

const { railWidth: _rail, ...BARE_IN } = RAIL_A;
const { railWidth: _railMm, ...BARE_MM } = RAIL_MM;

/**
 * Issue, "The slot spec", and FIELDS where it leaves a figure open. The feed is the light band's lower third
 * (FACTS B2, 1/4 in hardwood .009 to .011, a third to a half of it): .003 + .0025 / 3, × 16 000 × 2 = 122.7, set at 122.
 */
const COMMON = {
  name: '', ends: 'cornered', wood: 'hardwood', flutes: 2, spindleSpeed: 16000, rampAngle: 3, stepover: 0.4, finishAllowance: 0,
  direction: 'climb', bitKind: 'straight', centreCutting: false, chipLoadRange: null, clampReach: 0, workZero: 'corner', spindle: 'program', machine: null,
} as const;
const INCH = {
  ...COMMON, railWidth: 1.125, railThickness: 0.75, feed: 122, plungeFeed: 30, cuttingLength: 0.75, colletDiameter: 1.25, stickout: 0.9375,
  clampHeight: 0.5, safeHeight: 0.75,
} as const;
/** 6 mm is .23622 in: .00833 to .01033 of the chart, so .002778 to .005167 in = .07055 to .13123 mm; .09078 × 32 000 = 2904. */
const METRIC = {
  ...COMMON, railWidth: 27, railThickness: 19, feed: 2900, plungeFeed: 720, cuttingLength: 18, colletDiameter: 32, stickout: 23,
  clampHeight: 12, safeHeight: 18,
} as const;

describe.each([['in', BARE_IN, INCH], ['mm', BARE_MM, METRIC]] as const)('defaults on a drawing in %s', (_units, bare, wanted) => {
  const { spec, assumed } = asked(bare);

  it.each(Object.entries(wanted))('%s is %j', (field, value) => {
    const filled = Object.entries(spec).find(([name]) => name === field)?.[1];
    if (typeof value === 'number') expect(filled).toBeCloseTo(value, 9);
    else expect(filled).toEqual(value);
  });

  it('are all listed as assumed, and nothing else is', () => {
    expect([...assumed].sort()).toEqual(Object.keys(wanted).sort());
  });
});

describe('every field', () => {
  const optional = Object.entries(FIELDS).filter(([, facts]) => facts.defaultSource !== null).map(([field]) => field);

  it('with a default names its source, and no other does', () => {
    expect(optional.sort()).toEqual(Object.keys(INCH).sort());
    for (const { defaultSource, words } of Object.values(FIELDS)) {
      expect(words).not.toBe('');
      expect(defaultSource).not.toBe('');
    }
  });

  it('given is not assumed', () => {
    const given: Partial<SlotSpec> = { ...asked(BARE_IN).spec };
    expect(asked(given).assumed).toEqual([]);
  });

  it('given is kept as it is', () => {
    const given = { ...asked(BARE_IN).spec, flutes: 3, feed: 90, wood: 'pine', ends: 'round', safeHeight: 1, rampAngle: 2, name: 'Rail A' };
    expect(asked(given).spec).toEqual(given);
  });
});

describe('a default that follows from another field', () => {
  it('takes the rail width from the slot, the clear height from the clamps, the stickout from depth and clamps', () => {
    const { spec } = asked({ ...BARE_IN, width: 0.5, clampHeight: 1, depth: 0.25, stepdown: 0.125 });
    expect([spec.railWidth, spec.safeHeight, spec.stickout]).toEqual([1.5, 1.25, 1.5]);
  });

  it('takes the feed from the heavy band only where the machine says so', () => {
    // .009 + .002 / 3 = .009667, × 32 000 = 309.3
    expect(asked({ ...BARE_IN, machine: { heavy: true } }).spec.feed).toBe(309);
    expect(asked({ ...BARE_IN, machine: { heavy: false } }).spec.feed).toBe(122);
  });

  it("caps the feed at the machine's, and the speed within its range", () => {
    expect(asked({ ...BARE_IN, machine: { topFeed: 80 } }).spec).toMatchObject({ feed: 80, plungeFeed: 20 });
    expect(asked({ ...BARE_IN, machine: { spindleRange: [18000, 24000] } }).spec.spindleSpeed).toBe(18000);
    expect(asked({ ...BARE_IN, machine: { spindleRange: [5000, 10000] } }).spec.spindleSpeed).toBe(10000);
  });

  it("takes the feed from the bit maker's own figures where given", () => {
    // .004 + .002 / 3 = .0046667, × 32 000 = 149.3
    expect(asked({ ...BARE_IN, chipLoadRange: [0.004, 0.006] }).spec.feed).toBe(149);
  });
});

describe('mixed units', () => {
  it('convert exactly and say so', () => {
    const { spec, notes } = asked({ ...RAIL_A, width: '9 mm', bitDiameter: '1/4 in' });
    expect(spec.width).toBe(9 / 25.4);
    expect(spec.bitDiameter).toBe(0.25);
    expect(notes).toEqual(['Slot width: 9 mm is 0.3543 in.']);
  });

  it('convert inches into a metric drawing', () => {
    const { spec, notes } = asked({ ...RAIL_MM, bitDiameter: '1/4"', stopMargin: '20mm' });
    expect(spec.bitDiameter).toBe(6.35);
    expect(notes).toEqual(['Bit diameter: 0.25 in is 6.350 mm.']);
  });

  it('are not noted where there are none', () => {
    expect(asked({ ...RAIL_A, length: '24 1/2', width: '3/8 in' })).toMatchObject({ notes: [], spec: { length: 24.5, width: 0.375 } });
  });
});
