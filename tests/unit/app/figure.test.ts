import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseLength } from '#shared/measure/length';
import { FIGURES } from '../../../app/utils/draft';
import { faceOf, nextSize, sayFraction, textOf } from '../../../app/utils/figure';

const unitsOf = (figures: (typeof FIGURES)[number]) => (figures === 'mm' ? 'mm' as const : 'in' as const);
const read = (text: string) => parseLength(text)?.value ?? NaN;

describe('a figure on the drawing', () => {
  it('is a fraction where it is one, decimals where not, with the other notation beside it', () => {
    expect(faceOf(26.25, 'in', 'fractions')).toMatchObject({ text: '26 1/4', beside: '26.2500', spoken: '26 and 1 quarter inches' });
    expect(faceOf(0.3937, 'in', 'fractions')).toMatchObject({ fraction: null, text: '0.3937', beside: 'near 25/64' });
    expect(faceOf(0.375, 'in', 'decimals')).toMatchObject({ fraction: null, text: '0.375', beside: '3/8' });
    expect(faceOf(9.525, 'mm', 'mm')).toMatchObject({ text: '9.525', beside: '3/8 in', spoken: '9.525 millimetres' });
    expect(faceOf(1, 'in', 'fractions').spoken).toBe('1 inch');
  });

  it.each([
    [{ whole: 0, numerator: 1, denominator: 2 }, '1 half'], [{ whole: 0, numerator: 3, denominator: 8 }, '3 eighths'], [{ whole: 2, numerator: 0, denominator: 1 }, '2'],
    [{ whole: 1, numerator: 63, denominator: 64 }, '1 and 63 sixty-fourths'], [{ whole: 0, numerator: 2, denominator: 3 }, '2 over 3s'],
  ])('%o is said "%s"', (fraction, said) => expect(sayFraction({ ...fraction, exact: true })).toBe(said));

  it('text to edit reads back as the value it was made of', () => {
    fc.assert(fc.property(fc.constantFrom(...FIGURES), fc.integer({ min: 0, max: 400_000 }), (figures, count) => {
      const value = figures === 'fractions' ? count / 64 : count / 1000;
      expect(read(textOf(value, unitsOf(figures), figures))).toBeCloseTo(value, 9);
    }));
  });

  it('an arrow goes to the next even step, and back again from there', () => {
    fc.assert(fc.property(fc.constantFrom(...FIGURES), fc.boolean(), fc.integer({ min: 1, max: 4000 }), (figures, fine, count) => {
      const units = unitsOf(figures);
      const step = units === 'in' ? (fine ? 1 / 64 : 1 / 16) : fine ? 0.1 : 0.5;
      const up = read(nextSize(count * step, units, figures, { up: true, fine }));
      // Decimals are shown to a ten-thousandth, half of which the shown figure may be off by.
      const near = (value: number, wanted: number) => expect(Math.abs(value - wanted)).toBeLessThanOrEqual(0.5001e-4);
      near(up, (count + 1) * step);
      if (figures !== 'decimals') near(read(nextSize(up, units, figures, { up: false, fine })), count * step);
      // From between two steps the first press goes to the nearer end of that gap, never past it.
      near(read(nextSize((count + 0.4) * step, units, figures, { up: false, fine })), count * step);
    }));
    expect(nextSize(0, 'in', 'fractions', { up: false, fine: false })).toBe('0');
  });
});
