import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { largestLean, standingOf, widthForLean } from '#shared/coin/lean';

/** t, D, w, h in mm; the largest lean in degrees, found by root, by quartic and by a search without assumed contacts. */
const ROWS = [
  [3, 38.1, 3.5, 8, 3.619012, 'upright'],
  [3, 44.45, 4, 8, 7.296252, 'leans'],
  [1.75, 24.26, 2.4, 6, 6.282095, 'leans'],
  [4, 50.8, 5, 12.7, 4.558928, 'leans'],
  [2, 26.49, 3.175, 3.175, 22.734708, 'leans'],
  [3, 38.1, 3, 8, 0, 'upright'],
] as const;

const grooves = fc.record({
  thickness: fc.double({ min: 1, max: 5, noNaN: true }), diameter: fc.double({ min: 15, max: 70, noNaN: true }),
  depth: fc.double({ min: 3, max: 15, noNaN: true }), play: fc.double({ min: 0.01, max: 6, noNaN: true }),
}).map(({ play, ...coin }) => ({ ...coin, width: coin.thickness + play }));

/** The turned coin's part below the rim, cut off corner by corner: how wide it is. */
function widthBelowRim({ thickness, diameter, depth }: { thickness: number; diameter: number; depth: number }, degrees: number): number {
  const a = (degrees * Math.PI) / 180;
  const [s, c] = [Math.sin(a), Math.cos(a)];
  const corners = [[0, thickness * s], [thickness * c, 0], [thickness * c + diameter * s, diameter * c], [diameter * s, thickness * s + diameter * c]] as const;
  const xs: number[] = [];
  corners.forEach(([x0, y0], i) => {
    const [x1, y1] = corners[(i + 1) % 4] ?? [x0, y0];
    if (y0 <= depth) xs.push(x0);
    if ((y0 - depth) * (y1 - depth) < 0) xs.push(x0 + ((depth - y0) / (y1 - y0)) * (x1 - x0));
  });
  return Math.max(...xs) - Math.min(...xs);
}

describe('lean of a coin in a groove', () => {
  it.each(ROWS)('t %d, D %d in w %d, h %d leans %d at most: %s', (thickness, diameter, width, depth, degrees, how) => {
    const coin = { thickness, diameter, width, depth };
    expect(largestLean(coin)).toBeCloseTo(degrees, 5);
    expect(standingOf(coin).how).toBe(how);
  });

  it.each([[9.525, 5, 3.8219], [9.525, 10, 4.6339], [9.525, 15, 5.45], [8, 10, 4.365]])('depth %d, lean %d wants width %d', (depth, lean, width) => {
    expect(widthForLean({ thickness: 3, depth }, lean)).toBeCloseTo(width, 4);
  });

  it('goes from a lean to its width and back', () => {
    fc.assert(fc.property(grooves, (coin) => {
      expect(widthForLean(coin, largestLean(coin))).toBeCloseTo(coin.width, 9);
    }));
  });

  it('fits between the walls at that lean and not a little beyond', () => {
    fc.assert(fc.property(grooves, (coin) => {
      const lean = largestLean(coin);
      fc.pre(standingOf(coin).how === 'leans' || standingOf(coin).how === 'upright');
      expect(widthBelowRim(coin, lean)).toBeLessThanOrEqual(coin.width + 1e-9);
      expect(widthBelowRim(coin, lean + 1e-4)).toBeGreaterThan(coin.width);
    }));
  });

  it('grows with the width and shrinks with the depth', () => {
    fc.assert(fc.property(grooves, (coin) => {
      expect(largestLean({ ...coin, width: coin.width + 0.01 })).toBeGreaterThan(largestLean(coin));
      expect(largestLean({ ...coin, depth: coin.depth + 0.01 })).toBeLessThan(largestLean(coin));
    }));
  });

  it('stands upright by itself up to the lean whose tangent is t / D', () => {
    const coin = { thickness: 3, diameter: 38.1, depth: 8 };
    const tips = (Math.atan(3 / 38.1) * 180) / Math.PI;
    expect(tips).toBeCloseTo(4.502, 3);
    expect(standingOf({ ...coin, width: widthForLean(coin, tips - 0.001) }).how).toBe('upright');
    expect(standingOf({ ...coin, width: widthForLean(coin, tips + 0.001) }).how).toBe('leans');
  });

  it('says what does not stand', () => {
    expect(standingOf({ thickness: 3.01, diameter: 38, width: 3, depth: 8 })).toEqual({ how: 'tooThick' });
    expect(standingOf({ thickness: 2, diameter: 7, width: 4, depth: 8 })).toEqual({ how: 'sinks' });
    expect(standingOf({ thickness: 3, diameter: 38, width: 9, depth: 1 })).toEqual({ how: 'falls' });
    expect(standingOf({ thickness: 0.125, diameter: 1.75, width: 0.375, depth: 0.1875 })).toMatchObject({ how: 'leans', keeps: false });
  });
});
