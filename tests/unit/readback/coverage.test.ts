import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { firstUncovered } from '#shared/readback/coverage';
import { edgeParts, follows } from '#shared/readback/edge';
import { circleOutline, distanceTo, lattice, levelPieces, rectangleOutline } from './paths';

const SEED = 117; // fixed, so that a failure is the same for everybody; fast-check prints it with the case
const RADIUS = 0.4;

const outlines = fc.constantFrom(rectangleOutline(0.25, 0.25, 2.75, 1.75), rectangleOutline(0, 0, 1, 1), rectangleOutline(1, 0.5, 1, 1.5), circleOutline(1.5, 1, 0.75), circleOutline(1, 1, 0.2));

/** Brute force: a grid of points of the area, each against every piece. */
const gridOf = ({ left, right, edges }: ReturnType<typeof circleOutline>) => {
  const points: { x: number; y: number }[] = [];
  for (let i = 0; i <= 60; i++) {
    const x = left + ((right - left) * i) / 60;
    const [low, high] = edges(x);
    for (let j = 0; j <= 60 && low <= high; j++) points.push({ x, y: low + ((high - low) * j) / 60 });
  }
  return points;
};

describe('a place that the cutter never reached', () => {
  it('is found exactly where a grid of points finds one', () => {
    let open = 0;
    fc.assert(fc.property(outlines, fc.array(lattice, { minLength: 2, maxLength: 14 }), (outline, points) => {
      const pieces = levelPieces(points.map((point) => ({ ...point, z: -0.1 })));
      const found = firstUncovered(outline, pieces, RADIUS);
      const away = ({ x, y }: { x: number; y: number }) => Math.min(Infinity, ...pieces.map((piece) => distanceTo(piece, x, y)));
      if (found) {
        open += 1;
        const [low, high] = outline.edges(found.x);
        expect(found.x).toBeGreaterThanOrEqual(outline.left);
        expect(found.x).toBeLessThanOrEqual(outline.right);
        expect(found.y).toBeGreaterThanOrEqual(low);
        expect(found.y).toBeLessThanOrEqual(high);
        expect(away(found)).toBeGreaterThanOrEqual(RADIUS - 1e-9);
      } else {
        for (const point of gridOf(outline)) expect(away(point)).toBeLessThanOrEqual(RADIUS + 1e-9);
      }
    }), { seed: SEED, numRuns: 400 });
    expect(open).toBeGreaterThan(40); // both answers were met
    expect(open).toBeLessThan(360);
  });

  it('is found where a strip stands between two passes, however narrow', () => {
    const passes = (gap: number) => levelPieces([{ x: 0, y: 0, z: -1 }, { x: 10, y: 0, z: -1 }]).concat(levelPieces([{ x: 0, y: 2 * RADIUS + gap, z: -1 }, { x: 10, y: 2 * RADIUS + gap, z: -1 }]));
    const area = rectangleOutline(1, 0, 9, 2 * RADIUS);
    for (const gap of [1e-3, 1e-5, 1e-7]) {
      const found = firstUncovered(area, passes(gap), RADIUS);
      expect(found?.y).toBeGreaterThan(RADIUS);
      expect(found?.y).toBeLessThan(RADIUS + gap);
    }
    expect(firstUncovered(area, passes(0), RADIUS)).toBeNull();
    expect(firstUncovered(area, passes(-1e-7), RADIUS)).toBeNull();
  });

  it('is anywhere in the area where nothing was cut', () => {
    expect(firstUncovered(rectangleOutline(0, 0, 1, 1), [], RADIUS)).not.toBeNull();
  });
});

describe('a wall that the bit follows', () => {
  const edges = edgeParts({ x: 1.5, y: 1 }, 1, 0.5, 0.25);

  it('has eight parts, end on start, as long as the rounded rectangle round it', () => {
    let length = 0;
    edges.forEach((part, i) => {
      const next = edges[(i + 1) % edges.length];
      expect(Math.hypot(part(1).x - (next?.(0).x ?? NaN), part(1).y - (next?.(0).y ?? NaN))).toBeLessThan(1e-12);
      for (let t = 0; t < 1000; t++) length += Math.hypot(part((t + 1) / 1000).x - part(t / 1000).x, part((t + 1) / 1000).y - part(t / 1000).y);
    });
    // FACTS H1: perimeter 2 (a + b) - (8 - 2 π) r.
    expect(length).toBeCloseTo(2 * (2 + 1) - (8 - 2 * Math.PI) * 0.25, 5);
  });

  const WITHIN = 0.3;
  it('is followed where every point of it is near the path, and not where one is far', () => {
    let followed = 0;
    fc.assert(fc.property(fc.constantFrom(...edges), fc.array(lattice, { minLength: 2, maxLength: 12 }), (part, points) => {
      const pieces = levelPieces(points.map((point) => ({ ...point, z: -0.1 })));
      const farthest = Math.max(...Array.from({ length: 400 }, (_, i) => part(i / 399)).map(({ x, y }) => Math.min(...pieces.map((piece) => distanceTo(piece, x, y)))));
      const answer = follows(part, pieces, WITHIN);
      if (answer) {
        followed += 1;
        expect(farthest).toBeLessThanOrEqual(WITHIN + 1e-9);
      } else {
        // A proof may fail where two pieces take turns, but never with the path half as near.
        expect(farthest).toBeGreaterThan(0.4 * WITHIN);
      }
    }), { seed: SEED, numRuns: 600 });
    expect(followed).toBeGreaterThan(30);
    expect(followed).toBeLessThan(570);
  });
});
