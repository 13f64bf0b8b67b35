import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { LONGEST_LINE, commentLines, commentText, formatFeed, formatSteps } from '#shared/program/words';
import { readBlocks } from '#shared/reader/index';

const SEED = 72; // fixed, so that a failure is the same for everybody; fast-check prints it with the case
const anyText = fc.string({ unit: 'binary', maxLength: 200 });
/** What would hurt if it came through: ends of comments and lines, words, other alphabets' forms of them. */
const hostile = fc.array(fc.constantFrom(...'()%;/\\\n\r\t\u0000\u2028:!#[]*{}<>', ')G0 Z-9', '（', '）', '⑴', '％', '；', '／', 'ß', 'ﬃ', 'é', 'İ', 'K74-QDM', ' ', 'a', '１', '½'), { maxLength: 80 })
  .map((parts) => parts.join(''));

describe("a coordinate's number", () => {
  it.each([
    [9375, 4, '0.9375'], [-1875, 4, '-0.1875'], [0, 4, '0.0000'], [-0, 3, '0.000'], [1, 6, '0.000001'], [-1, 6, '-0.000001'], [2400000, 4, '240.0000'], [6096000, 3, '6096.000'],
  ])('of %d steps with %d decimals is %s', (steps, decimals, text) => {
    expect(formatSteps(steps, decimals)).toBe(text);
  });

  it('always has its point, never an exponent and never minus zero, and is exact', () => {
    fc.assert(fc.property(fc.integer({ min: -1e12, max: 1e12 }), fc.integer({ min: 3, max: 6 }), (steps, decimals) => {
      const text = formatSteps(steps, decimals);
      expect(text).toMatch(new RegExp(`^-?\\d+\\.\\d{${decimals}}$`));
      expect(text).not.toMatch(/^-0\.0+$/);
      expect(Number(text.replace('.', ''))).toBe(steps === 0 ? 0 : steps);
    }), { seed: SEED, numRuns: 1000 });
  });
});

describe("a feed's number", () => {
  it.each([[100, '100.0'], [25, '25.0'], [0.3, '0.3'], [0.30000000000000004, '0.3'], [99.99, '99.9'], [3937.0078, '3937.0'], [0.5 * 25.4, '12.7'], [2540, '2540.0']])('%d is %s', (feed, text) => {
    expect(formatFeed(feed)).toBe(text);
  });

  it('is never above the feed that was asked for, nor a tenth below it', () => {
    fc.assert(fc.property(fc.double({ min: 0.1, max: 2e6, noNaN: true }), (feed) => {
      const text = formatFeed(feed);
      expect(text).toMatch(/^\d+\.\d$/);
      expect(Number(text)).toBeLessThanOrEqual(feed + 1e-6); // 1e-6: 0.3 in binary is a little less than 0.3
      expect(Number(text)).toBeGreaterThan(feed - 0.1 - 1e-9);
    }), { seed: SEED, numRuns: 1000 });
  });
});

describe("a person's text in a comment", () => {
  it.each([
    ['Rail A', 'RAIL A'], ['Squad (front) 100% ; N10 G0', 'SQUAD FRONT 100 N10 G0'], ['A) G0 Z-9 (', 'A G0 Z-9'], ['Pâté, 1/4"', 'PATE, 1 4'], ['', ''], ['   ', ''],
    ['（ａ）', 'A'], ['3/8 rail', '3 8 RAIL'], ['Straße', 'STRASSE'], ['\u0000\n\r', ''], ["Ines' rail + 1", "INES' RAIL + 1"],
  ])('%j becomes %j', (text, cleaned) => {
    // A letter keeps its place without its accent, which is a character of its own after decomposition (Unicode NFKD): it is replaced as any other.
    expect(commentText(text)).toBe(cleaned);
  });

  it('keeps only upper-case ASCII that can neither close a comment nor start one, a delimiter or a block delete', () => {
    fc.assert(fc.property(fc.oneof(anyText, hostile), (text) => {
      expect(commentText(text)).toMatch(/^[A-Z0-9 .,+'-]*$/);
      expect(commentText(commentText(text))).toBe(commentText(text));
    }), { seed: SEED, numRuns: 2000 });
  });

  it('stays in its own comments, each closed on a line of at most 72 characters', () => {
    expect(LONGEST_LINE).toBe(72); // issue, "The text"
    fc.assert(fc.property(fc.oneof(anyText, hostile), (text) => {
      const lines = commentLines(text);
      for (const line of lines) {
        expect(line).toMatch(/^\([A-Z0-9 .,+'-]+\)$/);
        expect(line.length).toBeLessThanOrEqual(72);
      }
      // To the reader they are comments and nothing else.
      const read = readBlocks(`${lines.join('\n')}\nM30\n`);
      expect(read.ok && read.blocks.map((block) => block.words.map(({ letter }) => letter))).toEqual([['M']]);
      expect(read.ok && read.comments.length).toBe(lines.length);
    }), { seed: SEED, numRuns: 2000 });
  });

  it('is broken between words and loses none of them', () => {
    fc.assert(fc.property(fc.array(fc.stringMatching(/^[A-Z0-9]{1,30}$/), { minLength: 1, maxLength: 20 }), (words) => {
      expect(commentLines(words.join(' ')).map((line) => line.slice(1, -1)).join(' ')).toBe(words.join(' '));
    }), { seed: SEED });
  });
});
