import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Point3 } from '#shared/geometry/point';
import { arcLength, centreArc, radiusArc } from '#shared/reader/arc';
import { PLANES } from '#shared/reader/planes';
import type { ArcPath } from '#shared/reader/motion';

const SEED = 6556;
const CODES = [17, 18, 19] as const;
const TURNS = [1, -1] as const;

const length = fc.double({ min: 0.05, max: 500, noNaN: true });
const coordinate = fc.double({ min: -500, max: 500, noNaN: true });
const angle = fc.double({ min: 0.02, max: 2 * Math.PI - 0.02, noNaN: true });
const code = fc.constantFrom(...CODES);
const turn = fc.constantFrom(...TURNS);

const expectArc = (arc: ArcPath | string): ArcPath => (typeof arc === 'string' ? expect.fail(arc) : arc);

/** A point in a plane's own axes. */
function inPlane(plane: (typeof PLANES)[17], first: number, second: number, normal: number): Point3 {
  const values = { x: 0, y: 0, z: 0 };
  values[plane.first] = first;
  values[plane.second] = second;
  values[plane.normal] = normal;
  return values;
}

describe('both formats find the circle an arc was made from', () => {
  it('in every plane and direction', () => {
    fc.assert(
      fc.property(code, turn, coordinate, coordinate, length, angle, angle, (planeCode, direction, u, v, radius, begin, sweep) => {
        const plane = PLANES[planeCode];
        const at = (theta: number) => inPlane(plane, u + radius * Math.cos(theta), v + radius * Math.sin(theta), 7);
        const [from, to] = [at(begin), at(begin + direction * sweep)];
        const byCentre = expectArc(centreArc(plane, from, to, u - from[plane.first], v - from[plane.second], direction, 'mm'));
        expect(byCentre.sweep).toBeCloseTo(sweep, 7);
        expect(byCentre.radius).toBeCloseTo(radius, 7);
        expect(byCentre.centre[plane.normal]).toBe(7);
        if (Math.abs(sweep - Math.PI) < 0.01) return; // R has no firm centre near half a turn (3.5.3.1)
        const byRadius = expectArc(radiusArc(plane, from, to, sweep < Math.PI ? radius : -radius, direction, 'mm'));
        expect(byRadius.sweep).toBeCloseTo(sweep, 5);
        expect(byRadius.centre[plane.first]).toBeCloseTo(u, 4);
        expect(byRadius.centre[plane.second]).toBeCloseTo(v, 4);
      }),
      { seed: SEED, numRuns: 2000 },
    );
  });

  it('and the two arcs between two points make a whole circle', () => {
    fc.assert(
      fc.property(turn, length, fc.double({ min: 0.01, max: 0.99, noNaN: true }), (direction, radius, part) => {
        const from = { x: 0, y: 0, z: 0 };
        const to = { x: 2 * radius * part, y: 0, z: 0 };
        const minor = expectArc(radiusArc(PLANES[17], from, to, radius, direction, 'mm'));
        const major = expectArc(radiusArc(PLANES[17], from, to, -radius, direction, 'mm'));
        expect(minor.sweep).toBeLessThan(Math.PI);
        expect(minor.sweep + major.sweep).toBeCloseTo(2 * Math.PI, 9);
      }),
      { seed: SEED, numRuns: 500 },
    );
  });
});

describe('the reversed arc', () => {
  it('has the same circle and sweep', () => {
    const [from, to] = [{ x: 3, y: 0, z: 0 }, { x: 0, y: 3, z: 0 }];
    const there = expectArc(centreArc(PLANES[17], from, to, -3, 0, 1, 'mm'));
    const back = expectArc(centreArc(PLANES[17], to, from, 0, -3, -1, 'mm'));
    expect(back).toEqual({ ...there, turn: -1 });
  });
});

it('a helix of radius r, sweep a and rise h is sqrt((r a)² + h²) long', () => {
  const arc = { centre: { x: 0, y: 0, z: 0 }, radius: 3, sweep: 4 / 3, turn: 1 } as const;
  expect(arcLength(arc, 3)).toBe(5);
  expect(arcLength(arc, 0)).toBe(4);
});

it('an arc too large to reckon with is refused, not answered with NaN', () => {
  const far = { x: 1e200, y: 0, z: 0 };
  expect(centreArc(PLANES[17], { x: 0, y: 0, z: 0 }, far, 1e200, 1e200, 1, 'mm')).toBe('arcRadiiDiffer');
  expect(typeof radiusArc(PLANES[17], { x: 0, y: 0, z: 0 }, far, 1, 1, 'mm')).toBe('string');
});
