import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type ThreePlaces, firstOffSchema, firstOffVerdict } from '#shared/shop/firstOff';
import { said } from './asking';

/** Rail A's groove (PRODUCT): 3/8 wide, 3/16 deep. */
const GROOVE = { units: 'in', width: 0.375, depth: 0.1875 } as const;
const DEPTHS: ThreePlaces = [0.1875, 0.188, 0.187];

describe('a first-off', () => {
  // DESIGN 6 and 7: "Within 0.005. Carry on." and "Stop. 0.012 too wide for these coins."
  it.each<[ThreePlaces, ThreePlaces, boolean, string]>([
    [[0.375, 0.376, 0.374], DEPTHS, true, 'Within 0.005. Carry on.'],
    [[0.38, 0.38, 0.38], DEPTHS, true, 'Within 0.005. Carry on.'],
    [[0.387, 0.387, 0.386], DEPTHS, false, 'Stop. 0.012 too wide for these coins.'],
    [[0.363, 0.364, 0.365], DEPTHS, false, 'Stop. 0.012 too narrow for these coins.'],
    [[0.375, 0.375, 0.375], [0.2, 0.2, 0.2], false, 'Stop. 0.013 too deep.'],
    [[0.375, 0.375, 0.375], [0.1775, 0.178, 0.1785], false, 'Stop. 0.010 too shallow.'],
    [[0.387, 0.387, 0.386], [0.2, 0.2, 0.2], false, 'Stop. 0.012 too wide for these coins. Stop. 0.013 too deep.'],
  ])('of widths %j and depths %j', (widths, depths, within, sentence) => {
    expect(firstOffVerdict(GROOVE, widths, depths)).toMatchObject({ within, sentence });
  });

  it('is judged by the place furthest off, not by the mean', () => {
    const { width } = firstOffVerdict(GROOVE, [0.369, 0.375, 0.381], DEPTHS);
    expect(width.code).not.toBe('within');
    expect(Math.abs(width.worst)).toBeCloseTo(0.006, 12);
    expect(width.spread).toBeCloseTo(0.012, 12);
  });

  it('says where places differ that neither bit nor zero is to blame', () => {
    expect(firstOffVerdict(GROOVE, [0.375, 0.375, 0.39], DEPTHS).width.cure).toMatch(/differ by 0.015.*rail cannot shift/);
    expect(firstOffVerdict(GROOVE, [0.375, 0.375, 0.375], [0.1875, 0.2, 0.1875]).depth.cure).toMatch(/differ by 0.013.*support under its middle/);
    expect(firstOffVerdict(GROOVE, [0.375, 0.375, 0.375], [0.2, 0.2, 0.2]).depth.cure).toMatch(/Zero Z again/);
    expect(firstOffVerdict(GROOVE, [0.375, 0.375, 0.375], DEPTHS).width.cure).toBeNull();
  });

  it('is never given on a place that nobody measured', () => {
    expect(() => firstOffVerdict(GROOVE, [0.375, NaN, 0.375], DEPTHS)).toThrow(/three places/);
  });

  it('in millimetres has the tolerance and the words in millimetres', () => {
    const metric = { units: 'mm', width: 9, depth: 5 } as const;
    expect(firstOffVerdict(metric, [9.12, 9, 9], [5, 5, 5]).sentence).toBe('Within 0.12 mm. Carry on.');
    expect(firstOffVerdict(metric, [9.3, 9.3, 9.25], [5, 5, 5]).sentence).toBe('Stop. 0.3 mm too wide for these coins.');
  });

  it('stops exactly where a place is off by more than the tolerance', () => {
    const off = fc.double({ min: -0.02, max: 0.02, noNaN: true });
    fc.assert(fc.property(off, off, off, (a, b, c) => {
      const widths: ThreePlaces = [0.375 + a, 0.375 + b, 0.375 + c];
      fc.pre([a, b, c].every((e) => Math.abs(Math.abs(e) - 0.005) > 1e-8));
      expect(firstOffVerdict(GROOVE, widths, DEPTHS).within).toBe([a, b, c].every((e) => Math.abs(e) < 0.005));
    }), { seed: 12 });
  });
});

describe('what is keyed in', () => {
  const KEYED = { units: 'in', widths: ['0.375', '.376', 0.375], depths: ['3/16', 0.188, 0.187] } as const;

  it('is read as numbers, a caliper in millimetres too', () => {
    expect(firstOffSchema.parse(KEYED)).toEqual({ units: 'in', widths: [0.375, 0.376, 0.375], depths: [0.1875, 0.188, 0.187] });
    expect(firstOffSchema.parse({ ...KEYED, widths: ['9.5 mm', 0.375, 0.375] }).widths[0]).toBe(9.5 / 25.4);
  });

  it.each([
    ['widths.1', { widths: [0.375, 'wide', 0.375] }, ['measured width in the middle', '"wide"', 'Try']],
    ['depths.2', { depths: [0.1875, 0.1875, 0] }, ['measured depth at the right end', '0 in', '0.005 in']],
    ['widths', { widths: [0.375, 0.375] }, ['measured width at three places', 'left to right']],
    ['widths', { widths: 0.375 }, ['measured width at three places']],
  ])('is refused at %s by name and value', (path, bad, names) => {
    const here = said(firstOffSchema, { ...KEYED, ...bad }).filter((problem) => problem.path === path).map(({ message }) => message).join(' ');
    for (const name of names) expect(here.toLowerCase()).toContain(name.toLowerCase());
  });
});
