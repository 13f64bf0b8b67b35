import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { FIRST_DRAFT, TEXT_KEYS, TRIO, draftOf, follower, isRate, isSize, isTrio, unitsOf, withPick, withText } from '../../../app/utils/draft';

const key = fc.constantFrom(...TEXT_KEYS);

describe('a draft', () => {
  it('of rail length, slot length and stop margin two always hold and one follows, whatever is typed', () => {
    fc.assert(fc.property(fc.array(fc.tuple(key, fc.string()), { maxLength: 12 }), (typed) => {
      const draft = typed.reduce((now, [at, text]) => withText(now, at, text), FIRST_DRAFT);
      expect(new Set([...draft.held, follower(draft)])).toEqual(new Set(TRIO));
      const last = typed.findLast(([at]) => isTrio(at));
      if (last) expect(draft.held[1]).toBe(last[0]);
    }));
  });

  it('typing in the one that follows lets the one typed longest ago give way', () => {
    expect(follower(FIRST_DRAFT)).toBe('length');
    expect(follower(withText(FIRST_DRAFT, 'length', '20'))).toBe('railLength');
    expect(follower(withText(withText(FIRST_DRAFT, 'railLength', '20'), 'length', '18'))).toBe('stopMargin');
  });

  it('keeps each text with the units of its moment, and touches nothing else', () => {
    fc.assert(fc.property(key, fc.string(), (at, text) => {
      const before = { ...FIRST_DRAFT, figures: 'mm' } as const;
      const after = withText(before, at, text);
      expect(after.texts[at]).toEqual({ text, units: 'mm' });
      for (const other of TEXT_KEYS) if (other !== at) expect(after.texts[other]).toBe(before.texts[other]);
    }));
  });

  it('picks one thing and leaves the rest', () => {
    const after = withPick(FIRST_DRAFT, 'wood', 'walnut');
    expect(after.picks).toEqual({ ...FIRST_DRAFT.picks, wood: 'walnut' });
    expect(after.texts).toBe(FIRST_DRAFT.texts);
  });

  it('fills what is not given with empty texts in its units', () => {
    const draft = draftOf({}, {}, 'mm', ['stopMargin', 'length']);
    expect(unitsOf(draft)).toBe('mm');
    expect(new Set(Object.values(draft.texts).map(({ text, units }) => `${text}|${units}`))).toEqual(new Set(['|mm']));
    expect(new Set(Object.values(draft.picks))).toEqual(new Set(['']));
  });

  it('knows sizes from rates', () => {
    expect([isSize('stickout'), isSize('feed'), isRate('feed'), isRate('flutes')]).toEqual([true, false, true, false]);
  });
});
