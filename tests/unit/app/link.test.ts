import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { FIGURES, FIRST_DRAFT, PICK_KEYS, TEXT_KEYS, TRIO, type Typed, draftOf } from '../../../app/utils/draft';
import { draftFrom, linkOf } from '../../../app/utils/link';

const typed = fc.record({ text: fc.string({ unit: 'grapheme', maxLength: 20 }), units: fc.constantFrom('in' as const, 'mm' as const) });
const draft = fc.tuple(
  fc.dictionary(fc.constantFrom(...TEXT_KEYS), typed), fc.dictionary(fc.constantFrom(...PICK_KEYS), fc.string({ maxLength: 8 })),
  fc.constantFrom(...FIGURES), fc.shuffledSubarray([...TRIO], { minLength: 2, maxLength: 2 }),
).map(([texts, picks, figures, [older = TRIO[0], newer = TRIO[1]]]) => {
  // An empty text has no moment of its own: it takes the drawing's units.
  const written = Object.fromEntries(Object.entries(texts as Record<string, Typed>).filter(([, { text }]) => text !== ''));
  return draftOf(written, picks, figures, [older, newer]);
});

describe("the drawing in the page's address", () => {
  it('comes back as it was, whatever was typed and picked', () => {
    fc.assert(fc.property(draft, (one) => {
      expect(draftFrom(linkOf(one))).toEqual(one);
    }));
  });

  it('is an address: letters, figures, - and _ after its version', () => {
    fc.assert(fc.property(draft, (one) => /^#\d+\.[\w-]+$/.test(linkOf(one))));
    expect(linkOf(FIRST_DRAFT).length).toBeLessThan(500);
  });

  it('any other text is no drawing and throws nothing', () => {
    fc.assert(fc.property(fc.oneof(fc.string(), fc.string().map((text) => `#1.${text}`), fc.base64String().map((text) => `#1.${text}`)), (text) => {
      const found = draftFrom(text);
      if (found) expect(draftFrom(linkOf(found))).toEqual(found);
    }));
  });

  it('a shortened, lengthened or later one is refused', () => {
    const link = linkOf(FIRST_DRAFT);
    for (let cut = 1; cut < link.length; cut++) expect(draftFrom(link.slice(0, -cut)), String(cut)).toBeNull();
    expect(draftFrom(link.replace(/^#\d+/, '#99'))).toBeNull();
    expect(draftFrom(`${link}${'A'.repeat(9000)}`)).toBeNull();
  });
});
