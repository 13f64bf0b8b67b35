import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { chordPoints, evenCentre } from '#shared/program/arc';

const SEED = 353; // fixed, so that a failure is the same for everybody; fast-check prints it with the case
const coordinate = fc.double({ min: -300, max: 300, noNaN: true });
const point = fc.record({ x: coordinate, y: coordinate });
const apart = fc.tuple(point, point, point).filter(([from, to]) => Math.hypot(to.x - from.x, to.y - from.y) > 1e-3);

/** NISTIR 6556 3.5.3: the radii to start and end must agree within 0.0002 in or 0.002 mm. */
describe('the centre of an arc between rounded ends', () => {
  it('is equally far from both', () => {
    fc.assert(fc.property(apart, ([from, to, centre]) => {
      const even = evenCentre(from, to, centre);
      const [r0, r1] = [Math.hypot(even.x - from.x, even.y - from.y), Math.hypot(even.x - to.x, even.y - to.y)];
      expect(Math.abs(r0 - r1)).toBeLessThanOrEqual(1e-9 * (1 + r0));
    }), { seed: SEED, numRuns: 500 });
  });

  it('is the nearest such point: it moves along the chord only', () => {
    fc.assert(fc.property(apart, ([from, to, centre]) => {
      const even = evenCentre(from, to, centre);
      const chord = Math.hypot(to.x - from.x, to.y - from.y);
      const across = ((even.x - centre.x) * (to.y - from.y) - (even.y - centre.y) * (to.x - from.x)) / chord;
      expect(Math.abs(across)).toBeLessThanOrEqual(1e-9 * (1 + Math.hypot(even.x - centre.x, even.y - centre.y)));
    }), { seed: SEED, numRuns: 500 });
  });

  it('is not moved where it is even already', () => {
    expect(evenCentre({ x: 1, y: 0 }, { x: 0, y: 1 }, { x: 0, y: 0 })).toEqual({ x: 0, y: 0 });
  });
});

describe('chords for a quarter arc or less', () => {
  const arc = fc.record({
    centre: point, radius: fc.double({ min: 0.05, max: 150, noNaN: true }), start: fc.double({ min: -3, max: 3, noNaN: true }),
    sweep: fc.double({ min: 0.01, max: Math.PI / 2, noNaN: true }), turn: fc.constantFrom(1 as const, -1 as const), tolerance: fc.double({ min: 1e-5, max: 0.01, noNaN: true }),
  });

  it('end where the arc ends and stray from it by at most the tolerance, all on its inside', () => {
    fc.assert(fc.property(arc, ({ centre, radius, start, sweep, turn, tolerance }) => {
      const at = (angle: number) => ({ x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) });
      const [from, to] = [at(start), at(start + turn * sweep)];
      const points = chordPoints(from, to, centre, turn, tolerance);
      expect(points.at(-1)).toEqual(to);
      let before = from;
      for (const next of points) {
        expect(Math.hypot(next.x - centre.x, next.y - centre.y)).toBeCloseTo(radius, 9);
        const middle = { x: (before.x + next.x) / 2, y: (before.y + next.y) / 2 };
        const sagitta = radius - Math.hypot(middle.x - centre.x, middle.y - centre.y);
        expect(sagitta).toBeGreaterThanOrEqual(-1e-9);
        expect(sagitta).toBeLessThanOrEqual(tolerance + 1e-9);
        // Always onward in the arc's own sense.
        expect(turn * ((before.x - centre.x) * (next.y - centre.y) - (before.y - centre.y) * (next.x - centre.x))).toBeGreaterThan(0);
        before = next;
      }
    }), { seed: SEED, numRuns: 500 });
  });

  it('are no more than the formula asks for', () => {
    fc.assert(fc.property(arc, ({ centre, radius, start, sweep, turn, tolerance }) => {
      const at = (angle: number) => ({ x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) });
      const wanted = Math.max(1, sweep / (2 * Math.acos(1 - Math.min(1, tolerance / radius))));
      const count = chordPoints(at(start), at(start + turn * sweep), centre, turn, tolerance).length;
      expect(count).toBeGreaterThanOrEqual(Math.floor(wanted));
      expect(count).toBeLessThanOrEqual(Math.ceil(wanted) + 1);
    }), { seed: SEED });
  });
});
