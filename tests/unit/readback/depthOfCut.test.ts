import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Piece } from '#shared/readback/cut';
import { deepestCut } from '#shared/readback/depthOfCut';
import { distanceTo, levelPieces } from './paths';

const SEED = 75; // fixed, so that a failure is the same for everybody; fast-check prints it with the case
const RADIUS = 0.4;
const NARROW = 0.05;

/**
 * Brute force: at 65 places along each piece and 161 across the cutter, how far the wood that earlier pieces left stands
 * above it, over more than `narrow` of its width. The wood is looked up point by point from the distances alone.
 */
function bruteForce(pieces: readonly Piece[], narrow: number): number {
  const [ALONG, ACROSS] = [64, 160];
  let deepest = 0;
  pieces.forEach((piece, order) => {
    const [dx, dy] = [piece.x1 - piece.x0, piece.y1 - piece.y0];
    const length = Math.hypot(dx, dy);
    const earlier = pieces.slice(0, order);
    // Straight down has no direction of its own: it is looked at both ways across.
    const ways = length === 0 ? [[1, 0], [0, 1]] as const : [[-dy / length, dx / length]] as const;
    for (const [nx, ny] of ways) for (let i = 0; i <= ALONG; i++) {
      const depths: number[] = [];
      for (let j = 0; j <= ACROSS; j++) {
        const u = RADIUS * ((2 * j) / ACROSS - 1);
        const [x, y] = [piece.x0 + (dx * i) / ALONG + u * nx, piece.y0 + (dy * i) / ALONG + u * ny];
        const surface = earlier.reduce((height, other) => (distanceTo(other, x, y) < RADIUS ? Math.min(height, other.z0) : height), 0);
        depths.push(surface - piece.z0);
      }
      depths.sort((a, b) => b - a);
      deepest = Math.max(deepest, depths[Math.ceil((narrow / (2 * RADIUS)) * ACROSS) + 1] ?? 0);
    }
  });
  return deepest;
}

/** Along the axes on a lattice, one of four depths each: the depth of cut is one of few figures, never nearly another. */
const path = fc.array(fc.record({ along: fc.boolean(), to: fc.integer({ min: 0, max: 12 }), depth: fc.integer({ min: 1, max: 4 }) }), { minLength: 2, maxLength: 8 })
  .map((legs) => {
    let at = { x: 0, y: 0, z: 0 };
    return levelPieces([at, ...legs.map(({ along, to, depth }) => (at = { x: along ? to / 4 : at.x, y: along ? at.y : to / 6, z: -depth / 10 }))]);
  });

describe('the deepest cut of a program', () => {
  it('is what a grid of points finds, for paths along the axes at several depths', () => {
    fc.assert(fc.property(path, (pieces) => {
      const { depth } = deepestCut(pieces, RADIUS, NARROW);
      // A grid tells widths to its own pitch, so it is asked for somewhat more and somewhat less of the width.
      expect(depth).toBeGreaterThanOrEqual(bruteForce(pieces, NARROW + 0.03) - 1e-9);
      expect(depth).toBeLessThanOrEqual(bruteForce(pieces, NARROW - 0.03) + 1e-9);
    }), { seed: SEED, numRuns: 300, endOnFailure: true });
  });

  const go = (...points: readonly (readonly [number, number, number])[]) => levelPieces(points.map(([x, y, z]) => ({ x, y, z })));

  it.each([
    ['one line', go([0, 0, 0], [3, 0, -0.1]), 0.1],
    ['two passes on one line', go([0, 0, 0], [3, 0, -0.1], [0, 0, -0.25]), 0.15],
    ['a second pass that runs farther than the first', go([0, 0, 0], [2, 0, -0.1], [0, 0, -0.2], [3, 0, -0.2]), 0.2],
    ['a side cut at full depth beside a pass', go([0, 0, 0], [3, 0, -0.1], [3, 0.2, -0.1], [0, 0.2, -0.3]), 0.3],
    ['a shaving narrower than what counts', go([0, 0, 0], [3, 0, -0.1], [0, 0, -0.2], [3, 0, -0.3], [3, 0.03, -0.3], [0, 0.03, -0.3]), 0.1],
    ['nothing at all', [], 0],
    ['air already cut', go([0, 0, 0], [3, 0, -0.1], [0, 0, -0.1]), 0.1],
    ['an uncut bridge in the middle of a line', go([0, 0, 0], [1, 0, -0.1]).concat(go([3, 0, 0], [2.5, 0, -0.1])).concat(go([0, 0, 0], [3, 0, -0.15])), 0.15],
    // The first pass left 3.2 in of wood, eight radii, between its two parts; the second meets it at twice the depth.
    ['an uncut bridge away from the middle of a line', go([0, 0, 0], [1, 0, -0.1]).concat(go([5, 0, 0], [20, 0, -0.1])).concat(go([0, 0, 0], [20, 0, -0.2])), 0.2],
    ['a bridge as wide as the bit', go([0, 0, 0], [1, 0, -0.1]).concat(go([2.6, 0, 0], [20, 0, -0.1])).concat(go([0, 0, 0], [20, 0, -0.2])), 0.2],
  ] as const)('of %s is right', (_what, pieces, wanted) => {
    expect(deepestCut(pieces, RADIUS, NARROW).depth).toBeCloseTo(wanted, 9);
  });

  it('names the first piece that cuts so deep, and where', () => {
    const pieces = go([0, 0, 0], [3, 0, -0.1], [0, 0, -0.3], [3, 0, -0.4]);
    const { piece, point } = deepestCut(pieces, RADIUS, NARROW);
    expect(piece).toBe(pieces[1]);
    expect(point?.z).toBeCloseTo(-0.3, 9);
  });

  it('of a ramp is measured where it is deepest', () => {
    const [ramp] = go([0, 0, 0], [3, 0, -0.1]);
    expect(ramp && deepestCut([{ ...ramp, z0: 0 }], RADIUS, NARROW).depth).toBeCloseTo(0.1, 9);
  });

  it('leaves out the skin beyond an area', () => {
    // The bit's outer 0.1 along y > 0.3 does not count: under it only the rest, cut before, is left.
    const pieces = go([0, 0, 0], [3, 0, -0.1], [0, 0, -0.2], [0, 0.1, -0.2], [3, 0.1, -0.2]);
    expect(deepestCut(pieces, RADIUS, NARROW).depth).toBeCloseTo(0.2, 9);
    expect(deepestCut(pieces, RADIUS, NARROW, (_x, y) => y <= 0.4).depth).toBeCloseTo(0.1, 9);
  });
});
