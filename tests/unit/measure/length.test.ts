import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatDecimal, formatFraction, formatSize, lengthIn, nearestFraction, parseLength } from '#shared/measure/length';
import { MM_PER_INCH, convertLength } from '#shared/measure/units';

const SEED = 811; // fixed, so that a failure is the same for everybody; fast-check prints it with the case

describe('a length as somebody wrote it', () => {
  it.each([
    ['26 1/4', 26.25, null], ['26-1/4', 26.25, null], ['26 - 1/4', 26.25, null], ['26-1/4"', 26.25, 'in'], ['1 1/16 in', 1.0625, 'in'],
    ['1 1/16 in.', 1.0625, 'in'], ['3/8', 0.375, null], ['.375', 0.375, null], ['0.375', 0.375, null], ['12.', 12, null], ['7', 7, null],
    ['9 mm', 9, 'mm'], ['9mm', 9, 'mm'], ['9.5 millimetres', 9.5, 'mm'], ['1 millimeter', 1, 'mm'], ['2 inches', 2, 'in'], ['2 Inch', 2, 'in'],
    ['2″', 2, 'in'], ['2”', 2, 'in'], ["2''", 2, 'in'], ['  5/16  ', 0.3125, null], ['5 / 16', 0.3125, null], ['0', 0, null], ['5/4', 1.25, null],
  ] as const)('%j is %d, in %s', (text, value, units) => {
    expect(parseLength(text)).toEqual({ value, units });
  });

  it.each([
    [''], ['   '], ['-1'], ['+1'], ['-1/4'], ['1e3'], ['1E-3'], ['1/0'], ['26 1/0'], ['0/0'], ['.'], ['1..5'], ['1.5.2'], ['1/'], ['/4'], ['1//4'],
    ['1.5/4'], ['1/4.5'], ['1 2'], ['1,5'], ['1 1/4 1/8'], ['NaN'], ['Infinity'], ['∞'], ['0x10'], ['1 cm'], ['1 ft'], ["6'"], ['in'], ['1 in 2'],
    ['½'], ['１'], ['9'.repeat(33)], ['1'.repeat(400)], ['1 1/16 in; G0'], ['1\u0000'],
  ])('%j is no length', (text) => {
    expect(parseLength(text)).toBeNull();
  });

  it('never throws and never answers less than nothing, not a number or infinity', () => {
    fc.assert(fc.property(fc.oneof(fc.string({ unit: 'binary', maxLength: 40 }), fc.stringMatching(/^[0-9 ./"'a-z-]{0,40}$/)), (text) => {
      const written = parseLength(text);
      if (written !== null) {
        expect(Number.isFinite(written.value)).toBe(true);
        expect(written.value).toBeGreaterThanOrEqual(0);
      }
    }), { seed: SEED, numRuns: 3000 });
  });
});

/** NIST SP 811, Appendix B.8: one inch is 25.4 mm exactly. */
describe('a length in other units', () => {
  it('is exact', () => {
    expect(MM_PER_INCH).toBe(25.4);
    expect(lengthIn('mm', { value: 1, units: 'in' })).toBe(25.4);
    expect(lengthIn('in', { value: 25.4, units: 'mm' })).toBe(1);
    expect(lengthIn('mm', { value: 0.375, units: 'in' })).toBeCloseTo(9.525, 12);
    expect(convertLength(36, 'in', 'mm')).toBe(914.4);
  });

  it('is untouched where none or the same was written', () => {
    fc.assert(fc.property(fc.double({ min: 0, max: 1e4, noNaN: true }), fc.constantFrom('in' as const, 'mm' as const), (value, units) => {
      expect(lengthIn(units, { value, units: null })).toBe(value);
      expect(lengthIn(units, { value, units })).toBe(value);
    }), { seed: SEED });
  });

  it('comes back, to the last binary place', () => {
    fc.assert(fc.property(fc.double({ min: 1e-3, max: 1e4, noNaN: true }), (value) => {
      const back = convertLength(convertLength(value, 'in', 'mm'), 'mm', 'in');
      expect(Math.abs(back - value)).toBeLessThanOrEqual(value * Number.EPSILON);
    }), { seed: SEED });
  });
});

describe('a length in decimals', () => {
  it.each([
    [0.375, 'in', '0.3750'], [9, 'mm', '9.000'], [0, 'in', '0.0000'], [-0, 'mm', '0.000'], [-0.00004, 'in', '0.0000'], [-0.0004, 'mm', '0.000'],
    [-0.1875, 'in', '-0.1875'], [24.5, 'in', '24.5000'], [0.00006, 'in', '0.0001'],
  ] as const)('%d %s is %s', (value, units, text) => {
    expect(formatDecimal(value, units)).toBe(text);
  });

  it('never shows minus zero or an exponent, and is never off by more than half its last place', () => {
    fc.assert(fc.property(fc.double({ min: -1e4, max: 1e4, noNaN: true }), fc.constantFrom('in' as const, 'mm' as const), (value, units) => {
      const text = formatDecimal(value, units);
      expect(text).toMatch(units === 'in' ? /^-?\d+\.\d{4}$/ : /^-?\d+\.\d{3}$/);
      expect(text).not.toMatch(/^-0\.0+$/);
      expect(Math.abs(Number(text) - value)).toBeLessThanOrEqual((units === 'in' ? 0.5e-4 : 0.5e-3) + 1e-10);
    }), { seed: SEED });
  });
});

const sixtyFourths = fc.integer({ min: 0, max: 240 * 64 });

describe('an inch fraction', () => {
  it.each([
    [26.25, '26 1/4', true], [0.375, '3/8', true], [2, '2', true], [0, '0', true], [0.015625, '1/64', true], [0.999, '1', false], [0.3543, '23/64', false],
    [1 / 128, '1/64', false], [0.004, '0', false], [0.37500001, '3/8', true], [0.3751, '3/8', false],
  ] as const)('of %d is %s, exact: %s', (value, text, exact) => {
    const fraction = nearestFraction(value);
    expect(formatFraction(fraction)).toBe(text);
    expect(fraction.exact).toBe(exact);
  });

  it('of any 64th is in lowest terms and parses back exactly', () => {
    fc.assert(fc.property(sixtyFourths, (n) => {
      const fraction = nearestFraction(n / 64);
      expect(fraction.exact).toBe(true);
      expect(fraction.numerator).toBeLessThan(fraction.denominator);
      expect(fraction.numerator === 0 ? fraction.denominator : fraction.numerator % 2).toBe(1);
      expect(parseLength(formatFraction(fraction))).toEqual({ value: n / 64, units: null });
    }), { seed: SEED, numRuns: 2000 });
  });

  it('of any length is the nearest 64th', () => {
    fc.assert(fc.property(fc.double({ min: 0, max: 240, noNaN: true }), (value) => {
      const { whole, numerator, denominator, exact } = nearestFraction(value);
      const away = Math.abs(value - whole - numerator / denominator);
      expect(away).toBeLessThanOrEqual(1 / 128 + 1e-12);
      expect(exact).toBe(away <= 1e-6);
    }), { seed: SEED });
  });
});

describe('a size in a sentence', () => {
  it.each([
    [0.375, 'in', '3/8 in'], [1.0625, 'in', '1 1/16 in'], [2, 'in', '2 in'], [0.15, 'in', '0.15 in'], [0.35433, 'in', '0.3543 in'], [0, 'in', '0 in'],
    [9.5, 'mm', '9.5 mm'], [9, 'mm', '9 mm'], [0.375, 'mm', '0.375 mm'], [-0.25, 'in', '-0.25 in'], [6.3504, 'mm', '6.35 mm'],
  ] as const)('%d %s is shown as %s', (value, units, text) => {
    expect(formatSize(value, units)).toBe(text);
  });

  it('can be typed back', () => {
    fc.assert(fc.property(sixtyFourths, (n) => {
      expect(parseLength(formatSize(n / 64, 'in'))).toEqual({ value: n / 64, units: 'in' });
    }), { seed: SEED });
  });
});
