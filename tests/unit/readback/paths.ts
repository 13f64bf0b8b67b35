import fc from 'fast-check';
import type { Outline } from '#shared/readback/coverage';
import type { Piece } from '#shared/readback/cut';
import type { Motion } from '#shared/reader/index';

/** A place on a quarter-inch lattice of 3 × 2: small paths that touch, cross and run over themselves. */
export const lattice = fc.record({ x: fc.integer({ min: 0, max: 12 }).map((n) => n / 4), y: fc.integer({ min: 0, max: 8 }).map((n) => n / 4) });

const NOWHERE = { x: 0, y: 0, z: 0 };
const MOTION: Motion = {
  kind: 'line', at: { line: 1, column: 1 }, from: NOWHERE, to: NOWHERE, arc: null, feed: 100,
  modes: {
    motion: 1, plane: 17, distance: 90, feedMode: 94, units: 'in', radiusCompensation: 40, lengthOffset: 49, workOffset: 54, pathControl: null,
    spindle: 'clockwise', spindleSpeed: 16000, selectedTool: null, coolant: null, overrides: null, feed: 100,
  },
};

/** Straight pieces from point to point, each at the height of its end; going down is no piece. */
export function levelPieces(points: readonly { readonly x: number; readonly y: number; readonly z: number }[]): Piece[] {
  return points.slice(1).map((to, i) => {
    const from = points[i] ?? to;
    return { x0: from.x, y0: from.y, z0: to.z, x1: to.x, y1: to.y, z1: to.z, motion: MOTION };
  });
}

/** Distance in plan of a place from a piece. */
export function distanceTo({ x0, y0, x1, y1 }: Piece, x: number, y: number): number {
  const [dx, dy] = [x1 - x0, y1 - y0];
  const square = dx * dx + dy * dy;
  const t = square === 0 ? 0 : Math.min(1, Math.max(0, ((x - x0) * dx + (y - y0) * dy) / square));
  return Math.hypot(x - x0 - t * dx, y - y0 - t * dy);
}

export function rectangleOutline(left: number, bottom: number, right: number, top: number): Outline {
  return { left, right, edges: () => [bottom, top] };
}

export function circleOutline(x: number, y: number, radius: number): Outline {
  return {
    left: x - radius, right: x + radius,
    edges: (at) => {
      const half = Math.sqrt(Math.max(0, radius * radius - (at - x) * (at - x)));
      return [y - half, y + half];
    },
  };
}
