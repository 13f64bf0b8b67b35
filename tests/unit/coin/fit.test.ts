import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { grooveFor, kindsInGroove } from '#shared/coin/advice';
import type { Groove } from '#shared/coin/fit';
import { FIT_RULES, fitFindings } from '#shared/coin/fitFindings';
import { daylight, leastGap, reachBeside, spacingFindings } from '#shared/coin/spacing';

const leaning: Groove = { units: 'in', style: 'leaning', width: 0.3125, depth: 0.1875, boardDistance: 0.4375 };
const upright: Groove = { units: 'mm', style: 'upright', width: 3.5, depth: 8, boardDistance: null };
const said = (coin: { diameter: number; thickness: number }, groove: Groove) =>
  Object.fromEntries(fitFindings({ name: 'it', ...coin }, groove).map(({ rule, severity, reason }) => [rule, reason ? `${severity}: ${reason}` : severity]));

describe('what is said of a coin in a groove', () => {
  it('agrees with a coin that leans on its board as the trade has it', () => {
    expect(said({ diameter: 1.75, thickness: 0.125 }, leaning)).toEqual({ clearance: 'agrees', rest: 'agrees: leansOnBoard', width: 'agrees', depth: 'agrees', frontLip: 'agrees', hidden: 'agrees', footing: 'agrees' });
  });

  it('agrees with a coin that stands upright and only rattles', () => {
    expect(said({ diameter: 38.1, thickness: 3 }, upright)).toMatchObject({ rest: 'agrees: upright', width: 'agrees', depth: 'agrees' });
  });

  it.each([
    ['a coin thicker than the groove', { diameter: 1.75, thickness: 0.32 }, leaning, { clearance: 'disagrees: tooThick', rest: 'disagrees: tooThick' }],
    ['one that only rattles where it should lean', { diameter: 1.75, thickness: 0.125 }, { ...leaning, width: 0.13, boardDistance: 0 }, { rest: 'caution: rattles' }],
    ['one that meets the rim before a board far behind', { diameter: 1.75, thickness: 0.125 }, { ...leaning, width: 0.16, boardDistance: 2 }, { rest: 'caution: rimFirst', width: 'caution: below' }],
    ['one that would climb over the rim', { diameter: 1.75, thickness: 0.125 }, { ...leaning, width: 0.375, boardDistance: null }, { rest: 'disagrees: climbsRim' }],
    ['a shallow groove whose lip is low', { diameter: 1.75, thickness: 0.125 }, { ...leaning, depth: 0.1 }, { frontLip: 'caution: below', depth: 'caution: below' }],
    ['a groove too shallow for the foot', { diameter: 1.75, thickness: 0.125 }, { ...leaning, depth: 0.04 }, { rest: 'disagrees: slips' }],
    ['a groove as deep as the coin is high', { diameter: 10, thickness: 2 }, { ...upright, depth: 11 }, { rest: 'disagrees: sinks' }],
    ['a groove that hides half the face', { diameter: 16, thickness: 3 }, upright, { hidden: 'caution: above', depth: 'caution: above' }],
    ['an upright coin with too much play', { diameter: 44.45, thickness: 3 }, { ...upright, width: 4.5 }, { rest: 'caution: leansOnRim', width: 'caution: above' }],
    ['a coin that a wall out of plumb tips', { diameter: 1.75, thickness: 0.125 }, { ...leaning, width: 0.18, boardDistance: 0.1 }, { footing: 'caution: below' }],
  ] as const)('speaks of %s', (_what, coin, groove, expected) => {
    expect(said(coin, groove)).toMatchObject(expected);
  });

  it('looks at everything it says it looks at', () => {
    expect(fitFindings({ name: 'it', diameter: 1.75, thickness: 0.125 }, leaning).map(({ rule }) => rule).sort()).toEqual([...FIT_RULES].sort());
  });
});

describe('advice on a groove', () => {
  const kinds = fc.array(fc.record({ diameter: fc.double({ min: 30, max: 55, noNaN: true }), thickness: fc.double({ min: 2.5, max: 4, noNaN: true }) }), { minLength: 1, maxLength: 4 })
    .map((discs) => discs.map((disc, index) => ({ name: `kind ${index}`, ...disc })));

  it.each(['upright', 'leaning'] as const)('gives %s coins a width and a depth that nothing is said against, or names two that no size suits', (style) => {
    let advised = 0;
    fc.assert(fc.property(kinds, (coins) => {
      const { width, depth } = grooveFor(coins, style, 'mm', 10);
      for (const size of [width, depth]) if (!size.suits) expect(size.wantsMore).not.toBe(size.wantsLess);
      if (!width.suits || !depth.suits) return;
      advised++;
      const groove = { units: 'mm', style, width: width.advised, depth: depth.advised, boardDistance: 10 } as const;
      for (const { findings } of kindsInGroove(coins, groove)) {
        for (const { rule, severity } of findings) if (rule === 'width' || rule === 'depth' || (rule === 'frontLip' && style === 'leaning')) expect(severity).toBe('agrees');
      }
    }), { numRuns: 300 });
    expect(advised).toBeGreaterThan(20);
  });

  it('names the coins between which no width serves', () => {
    const { width } = grooveFor([{ name: 'thin', diameter: 40, thickness: 2 }, { name: 'thick', diameter: 40, thickness: 4 }], 'upright', 'mm', null);
    expect(width).toEqual({ suits: false, wantsMore: 'thick', wantsLess: 'thin' });
  });
});

describe('coins beside each other', () => {
  it('never come nearer than the gap, by a search over both rims', () => {
    fc.assert(fc.property(fc.double({ min: 15, max: 60, noNaN: true }), fc.double({ min: 15, max: 60, noNaN: true }), fc.double({ min: 0, max: 10, noNaN: true }), (first, second, gap) => {
      // The rim point of each disc nearest the other's centre: measured from coordinates.
      const [a, b] = [{ x: first / 2, y: first / 2 }, { x: first + gap + second / 2, y: second / 2 }];
      let least = Infinity;
      for (let n = 0; n < 3600; n++) {
        const angle = (n * Math.PI) / 1800;
        least = Math.min(least, Math.hypot(a.x + (first / 2) * Math.cos(angle) - b.x, a.y + (first / 2) * Math.sin(angle) - b.y) - second / 2);
      }
      expect(daylight(first, second, gap)).toBeGreaterThanOrEqual(gap - 1e-12);
      expect(Math.abs(daylight(first, second, gap) - least)).toBeLessThan(0.001);
    }), { numRuns: 100 });
  });

  it('let a finger down to where the room is as wide as it, and no further', () => {
    fc.assert(fc.property(fc.double({ min: 20, max: 60, noNaN: true }), fc.double({ min: 0, max: 15, noNaN: true }), (diameter, gap) => {
      const reach = reachBeside(diameter, diameter, gap, 16);
      fc.pre(reach > 0 && reach < diameter / 2);
      const half = Math.sqrt(reach * (diameter - reach)); // half the chord at that depth
      expect(gap + diameter - 2 * half).toBeCloseTo(16, 6);
    }));
  });

  it.each([[0, 'disagrees', 'touch'], [leastGap('in') / 2, 'caution', 'below'], [leastGap('in'), 'agrees', null]])('with a gap of %d: %s', (gap, severity, reason) => {
    expect(spacingFindings([{ name: 'a', diameter: 1.5 }], gap, 'in')[0]).toMatchObject({ rule: 'gap', severity, reason });
  });

  it('say which coin a finger cannot get hold of', () => {
    const reaches = spacingFindings([{ name: 'small', diameter: 0.5 }, { name: 'large', diameter: 2 }], 0.125, 'in').filter(({ rule }) => rule === 'reach');
    expect(reaches.map(({ about, severity }) => [about, severity])).toEqual([['small', 'caution'], ['large', 'agrees']]);
  });
});
