import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitOf, segmentShare } from '#shared/coin/fit';
import { largestLean } from '#shared/coin/lean';
import { leanOnBoard, restOf, tippingAngle } from '#shared/coin/rest';

/** FACTS.md H1, "Upright coin sunk by h": area checked there by numerical integration. D, h, hidden share of the face. */
const SUNK = [[24.26, 6, 0.19255], [25.75, 6, 0.17699], [30.61, 8, 0.20811], [38.1, 8, 0.15263], [44.45, 9.525, 0.15712], [50.8, 12.7, 0.1955]] as const;

/** FACTS.md D2, leaning style, w 0.375 and s 0.4375 in: D, t, lean to a tenth of a degree. */
const ON_BOARD = [[2, 0.157, 19.4], [1.75, 0.125, 23.5], [1.5, 0.118, 28.2], [1.25, 0.118, 34.9]] as const;

interface Section { thickness: number; diameter: number; width: number; depth: number; boardDistance: number }

/** The turned coin as four corners, its front foot edge against the front wall and its back foot edge on the floor; no contact above assumed. */
function fits({ thickness: t, diameter: d, width, depth, boardDistance }: Section, degrees: number): boolean {
  const a = (degrees * Math.PI) / 180;
  const [s, c] = [Math.sin(a), Math.cos(a)];
  const corners = [[0, t * s], [t * c, 0], [t * c + d * s, d * c], [d * s, t * s + d * c]] as const;
  const below: number[] = [];
  corners.forEach(([x0, y0], i) => {
    const [x1, y1] = corners[(i + 1) % 4] ?? [x0, y0];
    if (y0 <= depth) below.push(x0);
    if ((y0 - depth) * (y1 - depth) < 0) below.push(x0 + ((depth - y0) / (y1 - y0)) * (x1 - x0));
  });
  return Math.max(...below) - Math.min(...below) <= width && Math.max(...corners.map(([x]) => x)) <= width + boardDistance;
}

/** Largest lean by turning the coin in small steps until it no longer fits, then halving: the first touch, whatever it is. */
function turnedUntilItTouches(section: Section): number {
  const step = 0.05;
  let low = 0;
  while (low < 89 && fits(section, low + step)) low += step;
  if (low >= 89) return NaN;
  let high = low + step;
  for (let n = 0; n < 50; n++) {
    const middle = (low + high) / 2;
    if (fits(section, middle)) low = middle;
    else high = middle;
  }
  return low;
}

const sections: fc.Arbitrary<Section> = fc.record({
  thickness: fc.double({ min: 1, max: 5, noNaN: true }), diameter: fc.double({ min: 15, max: 70, noNaN: true }),
  depth: fc.double({ min: 3, max: 12, noNaN: true }), play: fc.double({ min: 0.05, max: 8, noNaN: true }), boardDistance: fc.double({ min: 0, max: 20, noNaN: true }),
}).map(({ play, ...section }) => ({ ...section, width: section.thickness + play }));

describe('how a coin fits a groove', () => {
  it.each(SUNK)('a %d mm coin sunk by %d hides %d of its face', (diameter, h, share) => {
    expect(segmentShare(diameter, h)).toBeCloseTo(share, 5);
    const fit = fitOf({ diameter, thickness: 3 }, { units: 'mm', style: 'upright', width: 3.1, depth: h, boardDistance: null });
    expect(fit.hidden.areaShare).toBeCloseTo(share, 5);
    expect(fit.hidden.height).toBe(h);
  });

  it.each(ON_BOARD)('a %d × %d in coin leans on the board by %d degrees', (diameter, thickness, degrees) => {
    const coin = { diameter, thickness, width: 0.375, depth: 0.1875, boardDistance: 0.4375 };
    expect(Math.abs(leanOnBoard(coin) - degrees)).toBeLessThanOrEqual(0.05);
    expect(restOf(coin)).toMatchObject({ how: 'leans', against: 'board', keeps: true });
    // FACTS.md D2: the front lip at least 0.06 in above the coin's lowest front edge.
    expect(fitOf(coin, { units: 'in', style: 'leaning', ...coin }).lip).toBeGreaterThan(0.06);
  });

  it('finds the lean at which a turned coin first touches, for 1 000 coins and grooves', () => {
    let [board, rim] = [0, 0];
    fc.assert(fc.property(sections, (section) => {
      const touch = turnedUntilItTouches(section);
      const [onBoard, onRim] = [leanOnBoard(section), largestLean(section)];
      const lean = Number.isNaN(onBoard) ? onRim : Math.min(onBoard, onRim);
      if (Number.isNaN(touch)) expect(lean).toBeGreaterThanOrEqual(89);
      else if (section.thickness * Math.sin((touch * Math.PI) / 180) <= section.depth) expect(lean).toBeCloseTo(touch, 6);
      if (lean === onBoard) board++;
      else rim++;
    }), { numRuns: 1000 });
    expect(Math.min(board, rim)).toBeGreaterThan(50); // both cases were really met
  });

  it('stands upright by itself exactly while the first touch comes before the tipping angle', () => {
    fc.assert(fc.property(sections, (section) => {
      const touch = turnedUntilItTouches(section);
      const tips = tippingAngle(section);
      fc.pre(!Number.isNaN(touch) && Math.abs(touch - tips) > 1e-6 && section.depth < section.diameter * Math.cos((touch * Math.PI) / 180));
      expect(restOf(section).how === 'upright').toBe(touch < tips);
    }), { numRuns: 500 });
  });

  it('keeps its mass centre behind its foot up to the tilt it says, and not beyond', () => {
    fc.assert(fc.property(sections, (section) => {
      const fit = fitOf(section, { units: 'mm', style: 'leaning', ...section });
      fc.pre(fit.rest.how === 'leans');
      const { thickness: t, diameter: d } = section;
      // Mass centre of the turned rectangle before its turning edge, from its corners alone.
      const ahead = (degrees: number) => {
        const a = (degrees * Math.PI) / 180;
        const xs = [-t * Math.cos(a), 0, d * Math.sin(a), d * Math.sin(a) - t * Math.cos(a)];
        return -xs.reduce((sum, x) => sum + x, 0) / 4;
      };
      expect(fit.footing).toBeCloseTo(-ahead(fit.lean), 9);
      expect(ahead(fit.lean - fit.tiltKept)).toBeCloseTo(0, 9);
      expect(ahead(fit.lean - fit.tiltKept - 0.01)).toBeGreaterThan(0);
    }), { numRuns: 300 });
  });
});
