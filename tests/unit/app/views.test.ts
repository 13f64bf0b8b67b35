import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { foot, planView, ticks } from '../../../app/utils/planView';
import { sectionView } from '../../../app/utils/sectionView';

const rail = fc.record({
  railLength: fc.double({ min: 4, max: 96, noNaN: true }), railWidth: fc.double({ min: 0.6, max: 4, noNaN: true }), share: fc.double({ min: 0.02, max: 0.3, noNaN: true }),
}).map(({ railLength, railWidth, share }) => ({
  units: 'in' as const, railLength, railWidth, stopMargin: railLength * share, length: railLength * (1 - 2 * share), width: railWidth / 3, cornerRadius: 0.1,
}));
const room = fc.integer({ min: 280, max: 1500 }).map((right) => ({ left: 12, right, top: 80 }));

describe('the plan', () => {
  it('stays in its room, at one scale along and across', () => {
    fc.assert(fc.property(rail, room, (sizes, within) => {
      const view = planView(sizes, within);
      for (const piece of view.pieces) {
        expect(piece.left).toBeGreaterThanOrEqual(within.left - 1e-6);
        expect(piece.right).toBeLessThanOrEqual(within.right + 1e-6);
        expect((piece.right - piece.left) / (piece.to - piece.from)).toBeCloseTo(view.scale, 6);
      }
      expect((view.bottom - view.top) / sizes.railWidth).toBeCloseTo(view.scale, 6);
    }));
  });

  it('always shows both ends; a break only ever leaves out wood between pieces', () => {
    fc.assert(fc.property(rail, room, (sizes, within) => {
      const view = planView(sizes, within);
      expect(view.pieces[0]?.from).toBe(0);
      expect(view.pieces.at(-1)?.to).toBeCloseTo(sizes.railLength, 6);
      expect(view.broken).toBe(view.pieces.length > 1);
      expect(view.at(0)).toBeCloseTo(view.left, 6);
      expect(view.at(sizes.railLength)).toBeCloseTo(view.right, 6);
    }));
  });

  it('a place further along the rail is never drawn further left', () => {
    fc.assert(fc.property(rail, room, fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }), (sizes, within, a, b) => {
      const view = planView(sizes, within);
      const [near, far] = [Math.min(a, b) * sizes.railLength, Math.max(a, b) * sizes.railLength];
      expect(view.at(far)).toBeGreaterThanOrEqual(view.at(near) - 1e-6);
      expect(view.across(0)).toBe(view.bottom);
      expect(view.across(sizes.railWidth)).toBeCloseTo(view.top, 6);
    }));
  });

  it('ticks lie on the rail, and numbers stand apart and at whole inches', () => {
    fc.assert(fc.property(rail, room, (sizes, within) => {
      const view = planView(sizes, within);
      const marks = ticks(view, 'in');
      for (const { x } of marks) expect(view.pieces.some(({ left, right }) => x >= left - 0.01 && x <= right + 0.01)).toBe(true);
      const numbered = marks.filter(({ number }) => number !== null);
      numbered.forEach(({ x, number }) => {
        expect(Number.isInteger(number)).toBe(true);
        expect(view.at(number ?? NaN)).toBeCloseTo(x, 3);
      });
    }), { numRuns: 60 });
  });

  it("crow's feet open toward the line, mirrored at its other end", () => {
    expect(foot(10, 20, 1)).toBe('M17.3 16.7L10.0 20.0L17.3 23.3');
    expect(foot(10, 20, -1)).toBe('M2.7 16.7L10.0 20.0L2.7 23.3');
    expect(foot(20, 10, 1, 'y')).toBe('M16.7 17.3L20.0 10.0L23.3 17.3');
  });
});

describe('the section', () => {
  const section = fc.record({ railWidth: fc.double({ min: 0.6, max: 6, noNaN: true }), railThickness: fc.double({ min: 0.3, max: 3, noNaN: true }), part: fc.double({ min: 0.1, max: 0.9, noNaN: true }) })
    .map(({ railWidth, railThickness, part }) => ({ railWidth, railThickness, width: railWidth * part, depth: railThickness * part, passes: [-railThickness * part * 0.5, -railThickness * part] }));

  it('is true to proportion, the groove centred, the last pass on its floor', () => {
    fc.assert(fc.property(section, (sizes) => {
      const view = sectionView(sizes, { middle: 200, span: 150, top: 40 });
      expect((view.right - view.left) / view.scale).toBeCloseTo(sizes.railWidth, 6);
      expect((view.bottom - view.top) / view.scale).toBeCloseTo(sizes.railThickness, 6);
      expect((view.grooveRight - view.grooveLeft) / view.scale).toBeCloseTo(sizes.width, 6);
      expect((view.floor - view.top) / view.scale).toBeCloseTo(sizes.depth, 6);
      expect((view.grooveLeft + view.grooveRight) / 2).toBeCloseTo(200, 6);
      expect(view.passFloors.at(-1)).toBeCloseTo(view.floor, 6);
      expect(view.right - view.left).toBeLessThanOrEqual(150 + 1e-6);
    }));
  });

  it('rings start below the rail and reach its far corner', () => {
    fc.assert(fc.property(section, (sizes) => {
      const view = sectionView(sizes, { middle: 200, span: 150, top: 40 });
      expect(Math.min(...view.rings)).toBeGreaterThan(view.pith.y - view.bottom);
      expect([...view.rings]).toEqual([...view.rings].sort((a, b) => a - b));
    }));
  });
});
