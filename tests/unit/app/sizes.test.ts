import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { FIRST_DRAFT, withText } from '../../../app/utils/draft';
import { editText, numberIn, readNumber, readSize, sizesOf } from '../../../app/utils/sizes';

const inches = (text: string) => ({ text, units: 'in' } as const);

describe('sizes of a draft', () => {
  it('reads the unit beside a figure, or else the one of its moment', () => {
    expect(readSize(inches('9 mm'))).toEqual({ value: 9, units: 'mm' });
    expect(readSize(inches('3/8'))).toEqual({ value: 0.375, units: 'in' });
    expect(readSize(inches('wide'))).toBeNull();
  });

  it('rail length is slot length and two stop margins, whichever of them follows', () => {
    const sixteenths = fc.integer({ min: 1, max: 800 }).map((count) => count / 16);
    fc.assert(fc.property(sixteenths, sixteenths, (slot, margin) => {
      const railLength = slot + 2 * margin;
      for (const [first, second] of [['railLength', 'stopMargin'], ['railLength', 'length'], ['stopMargin', 'length']] as const) {
        const values = { railLength, stopMargin: margin, length: slot };
        const sizes = sizesOf(withText(withText(FIRST_DRAFT, first, String(values[first])), second, String(values[second])));
        expect(sizes).toMatchObject(values);
      }
    }));
  });

  it('what follows a size that cannot be read is unknown, not zero', () => {
    expect(sizesOf(withText(FIRST_DRAFT, 'stopMargin', '')).length).toBeNull();
    expect(sizesOf(withText(FIRST_DRAFT, 'railLength', 'x'))).toMatchObject({ railLength: null, length: null, stopMargin: 0.875 });
  });

  it('turns to millimetres and back without moving', () => {
    const there = sizesOf({ ...FIRST_DRAFT, figures: 'mm' });
    expect(there.railLength).toBeCloseTo(666.75, 9);
    expect(sizesOf({ ...FIRST_DRAFT, figures: 'fractions' })).toEqual(sizesOf(FIRST_DRAFT));
  });

  it('reads plain numbers and guesses at nothing', () => {
    expect(['100', ' 25 ', '.5', '3.'].map(readNumber)).toEqual([100, 25, 0.5, 3]);
    for (const text of ['', '1,5', '1e3', '-1', '1 2', 'NaN', 'Infinity', '0x10']) expect(readNumber(text), text).toBeNaN();
  });

  it('rates follow the units, counts do not', () => {
    expect(numberIn('mm', 'feed', inches('100'))).toBeCloseTo(2540, 9);
    expect(numberIn('mm', 'flutes', inches('2'))).toBe(2);
    expect(numberIn('in', 'feed', inches('100'))).toBe(100);
  });

  it('edits the text as typed, with its unit once the drawing is in the other', () => {
    expect(editText(inches('3/8'), 'width', 'in')).toBe('3/8');
    expect(editText(inches('3/8'), 'width', 'mm')).toBe('3/8 in');
    expect(editText(inches('9 mm'), 'width', 'mm')).toBe('9 mm');
    expect(editText(inches('oops'), 'width', 'mm')).toBe('oops');
    expect(editText(inches('100'), 'feed', 'mm')).toBe('2540');
    expect(editText(inches('fast'), 'feed', 'mm')).toBe('fast');
    expect(editText(inches('2'), 'flutes', 'mm')).toBe('2');
    expect(editText(inches(''), 'width', 'mm')).toBe('');
  });
});
