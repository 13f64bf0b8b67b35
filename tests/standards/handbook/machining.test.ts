import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { chordPoints } from '#shared/program/arc';
import { chipLoad, feedFor } from '#shared/slot/chipLoad';
import { planSlot } from '#shared/slot/plan';
import { type JudgedSpec, expectSoundCut } from '../../support/soundCut/index';
import { asked } from '../../unit/slot/asking';

/** A quarter-inch bit on a metric drawing: 6.35 mm, 18 000 rev/min, two flutes. */
const METRIC = {
  units: 'mm', length: 300, width: 9.525, depth: 6, stopMargin: 20, bitDiameter: 6.35, stepdown: 3, railWidth: 30, spindleSpeed: 18000, flutes: 2, feed: 3600,
} as const;
const INCH = {
  units: 'in', length: 12, width: 0.375, depth: 0.25, stopMargin: 1, bitDiameter: 0.25, stepdown: 0.125, railWidth: 1.25, spindleSpeed: 18000, flutes: 2, feed: 144,
} as const;

/** General machining formulas, as on a tool trade's sheet and in Machinery's Handbook (from memory): v = π D n, F = n z fz, Q = ae ap F. */
describe('machining formulas', () => {
  it('surface speed: 6.35 mm at 18 000 rev/min is 359.084 m/min', () => {
    expect(makeProgram(asked(METRIC)).summary.surfaceSpeed).toBeCloseTo(359.084, 3);
  });

  it('surface speed: 1/4 in at 18 000 rev/min is 1178.10 ft/min', () => {
    expect(makeProgram(asked(INCH)).summary.surfaceSpeed).toBeCloseTo(1178.1, 1);
  });

  it('speed from surface speed: 12 × 1178.10 ÷ (π × 0.25) is 18 000', () => {
    expect((12 * makeProgram(asked(INCH)).summary.surfaceSpeed) / (Math.PI * 0.25)).toBeCloseTo(18000, 6);
  });

  it('feed: 18 000 × 2 × 0.1 mm is 3600 mm/min, 18 000 × 2 × 0.004 in is 144 in/min', () => {
    expect(feedFor(0.1, { spindleSpeed: 18000, flutes: 2 })).toBeCloseTo(3600, 9);
    expect(feedFor(0.004, { spindleSpeed: 18000, flutes: 2 })).toBeCloseTo(144, 9);
  });

  it('chip load: 3600 ÷ (18 000 × 2) is 0.1 mm, 144 ÷ 36 000 is 0.004 in', () => {
    expect(chipLoad({ feed: 3600, spindleSpeed: 18000, flutes: 2 })).toBeCloseTo(0.1, 12);
    expect(makeProgram(asked(METRIC)).summary.chipLoad).toBeCloseTo(0.1, 12);
    expect(makeProgram(asked(INCH)).summary.chipLoad).toBeCloseTo(0.004, 12);
  });

  it('removal rate: 6.35 × 3 × 3600 mm is 68.58 cm³/min', () => {
    expect(makeProgram(asked(METRIC)).summary.removalRate).toBeCloseTo(68.58, 9);
  });

  it('removal rate: 0.25 × 0.125 × 144 in is 4.5 in³/min', () => {
    expect(makeProgram(asked(INCH)).summary.removalRate).toBeCloseTo(4.5, 9);
  });
});

/** Plane trigonometry: a ramp of depth d at an angle a is d ÷ tan a long. */
describe('ramps', () => {
  it('2 mm at 3 degrees take 38.1623 mm, and two steps of the last decimal more', () => {
    const { moves } = planSlot(asked({ ...METRIC, length: 600, stepdown: 2, depth: 6 }).spec, 0.001);
    const ramps = moves.flatMap(({ to, role }, i) => {
      const from = moves[i - 1]?.to;
      return role === 'ramp' && from ? [{ depth: from.z - to.z, along: Math.hypot(to.x - from.x, to.y - from.y) }] : [];
    });
    expect(ramps).toHaveLength(2); // the first starts in the air
    for (const { depth, along } of ramps) {
      expect(depth).toBeCloseTo(2, 9);
      expect(along).toBeGreaterThanOrEqual(38.1623);
      expect(along).toBeLessThanOrEqual(38.1623 + 0.002 / Math.tan(Math.PI / 60) + 0.001);
    }
  });
});

/** Plane geometry: N = ceil(sweep ÷ (2 acos(1 - e/R))); radius 20, sagitta 0.01, a full circle: 100. */
describe('arcs as chords', () => {
  it('four quarters of radius 20 within 0.01 are 100 chords', () => {
    const corners = [{ x: 20, y: 0 }, { x: 0, y: 20 }, { x: -20, y: 0 }, { x: 0, y: -20 }, { x: 20, y: 0 }];
    const counts = corners.slice(1).map((to, i) => chordPoints(corners[i] ?? to, to, { x: 0, y: 0 }, 1, 0.01).length);
    expect(counts).toEqual([25, 25, 25, 25]);
  });
});

/** Twice the area of each closed loop of a way, signed: positive counterclockwise. There and back encloses nothing. */
function loopsOf(points: readonly { readonly x: number; readonly y: number }[]): number[] {
  const loops: number[] = [];
  const way: { x: number; y: number }[] = [];
  for (const point of points) {
    const before = way.findLastIndex(({ x, y }) => Math.hypot(point.x - x, point.y - y) < 1e-6);
    if (before >= 0) {
      const loop = way.splice(before + 1);
      const all = [...way.slice(-1), ...loop, point];
      loops.push(all.slice(1).reduce((sum, b, i) => sum + ((all[i]?.x ?? 0) * b.y - (all[i]?.y ?? 0) * b.x), 0));
    } else {
      way.push(point);
    }
  }
  return loops.filter((area) => Math.abs(area) > 1e-6);
}

/**
 * Geometry of a clockwise spindle (M3) seen from above: the edge on the right of travel climbs, so a wall inside a slot
 * climbs counterclockwise: signed area above zero.
 */
describe('climb and conventional', () => {
  const CASES: readonly (readonly [string, JudgedSpec])[] = [
    ['one lap at each depth', INCH], ['a wide slot, cornered', { ...INCH, width: 0.9, railWidth: 3 }], ['a wide slot, round', { ...INCH, width: 0.9, railWidth: 3, ends: 'round' }],
    ['millimetres', METRIC], ['millimetres, round', { ...METRIC, ends: 'round' }],
  ];

  it.each(CASES.flatMap(([what, raw]) => [[what, raw, 'climb', 1], [what, raw, 'conventional', -1]] as const))('%s: every loop is %3$s', (_what, raw, direction, sign) => {
    const made = makeProgram(asked({ ...raw, direction }));
    const floor = made.steps.flatMap((step) => ('to' in step && step.kind !== 'rapid' && Math.abs(step.to.z + raw.depth) < 1e-3 && step.from.z === step.to.z ? [step.from, step.to] : []));
    const loops = loopsOf(floor);
    expect(loops.length).toBeGreaterThan(0);
    expect(loops.map(Math.sign)).toEqual(loops.map(() => sign));
    expectSoundCut(made.ok ? made.program : '', { ...raw, direction });
  });

  it('a finish lap climbs also where the other laps are conventional', () => {
    const raw = { ...INCH, direction: 'conventional', finishAllowance: 0.02 } as const;
    const made = makeProgram(asked(raw));
    const floor = made.steps.flatMap((step) => ('to' in step && step.kind === 'line' && step.from.z === step.to.z ? [step] : []));
    const wall = floor.filter(({ from, to }) => from.y === to.y && Math.abs(from.y - 0.625) > 0.0624);
    expect(wall.length).toBeGreaterThan(0);
    for (const { from, to } of wall) expect(Math.sign(to.x - from.x)).toBe(from.y < 0.625 ? 1 : -1);
    expectSoundCut(made.ok ? made.program : '', raw);
  });
});
