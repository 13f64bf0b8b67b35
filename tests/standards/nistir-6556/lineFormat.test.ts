// NISTIR 6556 3.3, 3.3.1, 3.3.2.1, 3.3.4 and Appendix E: what case files cannot show, such as line ends and lengths.
import { describe, expect, it } from 'vitest';
import { readBlocks } from '#shared/reader/words';
import { accepted, motions, refusal } from './reading';

describe('a line (3.3)', () => {
  it('ends with a carriage return, a line feed or both', () => {
    for (const end of ['\n', '\r', '\r\n']) {
      const program = accepted(`G0 X1${end}${end}X2${end}M2${end}`);
      expect(program.steps.map(({ at }) => at.line)).toEqual([1, 3, 4]);
      expect(program.lines).toBe(4);
    }
  });

  it('may hold 256 characters and not 257', () => {
    const line = (length: number) => `G0 X1${' '.repeat(length - 5)}`;
    expect(motions(accepted(`${line(256)}\nM2\n`))).toHaveLength(1);
    expect(refusal(`${line(257)}\nM2\n`)).toBe('lineTooLong 1:257');
  });

  it('counts the characters of comments, of blank lines and of a last line without an end', () => {
    expect(refusal(`(${'-'.repeat(300)})\nM2\n`)).toBe('lineTooLong 1:257');
    expect(refusal(`${' '.repeat(257)}\nM2\n`)).toBe('lineTooLong 1:257');
    expect(refusal(`M2${' '.repeat(255)}`)).toBe('lineTooLong 1:257');
    expect(refusal(`%\nG0 X1\n%${' '.repeat(256)}`)).toBe('lineTooLong 3:257');
  });

  it('gives the first error of a line that is also too long', () => {
    expect(refusal(`G0 X1 ;${' '.repeat(300)}\nM2`)).toBe('character 1:7');
    expect(refusal(`G0 X1${' '.repeat(251)};\nM2`)).toBe('lineTooLong 1:257');
  });

  it('takes tabs as spaces', () => {
    expect(motions(accepted('\tG\t0\tX\t1\t2\nM2')).map(({ to }) => to.x)).toEqual([12]);
  });

  it.each([
    ['a null', '\0', 'character 1:3'],
    ['a form feed', '\f', 'character 1:3'],
    ['a no-break space', '\u00A0', 'character 1:3'],
    ['a byte order mark', '\uFEFF', 'character 1:3'],
    ['half a surrogate pair', '\uD800', 'character 1:3'],
  ])('refuses %s between words', (_, character, error) => {
    expect(refusal(`M2${character}`)).toBe(error);
  });

  it('refuses control characters in a comment (E: printable characters, space and tab)', () => {
    expect(refusal('(a\0)\nM2')).toBe('commentCharacter 1:3');
    expect(refusal('(a\u007F)\nM2')).toBe('commentCharacter 1:3');
    expect(accepted('(a\tb “c”)\nM2').comments).toEqual([{ text: 'a\tb “c”', at: { line: 1, column: 1 } }]);
  });
});

describe('a number (3.3.2.1)', () => {
  const value = (number: string) => {
    const read = readBlocks(`X${number}`);
    return read.ok ? read.blocks[0]?.words[0]?.value : read.error.code;
  };

  it('keeps about seventeen significant digits', () => {
    expect(value('1.2345678901234567')).toBe(1.2345678901234567);
    expect(value('0.1')).toBe(0.1);
    expect(value('123456789012345')).toBe(123456789012345);
    expect(value(`1${'0'.repeat(200)}`)).toBe(1e200);
  });

  it('has the same value with initial and trailing zeros', () => {
    expect(value('000000000000000000002.50000000000000000000')).toBe(2.5);
  });

  it('has no minus zero', () => {
    expect(value('-0')).toBe(0);
    expect(value('-0.000000000000000000')).toBe(0);
  });
});

describe('words keep their places', () => {
  it('by line and column, a line number apart', () => {
    const read = readBlocks('\n/N12 g1 (x) X-1.5\n');
    expect(read).toEqual({
      ok: true,
      blocks: [
        {
          at: { line: 2, column: 1 },
          number: 12,
          deleted: true,
          words: [
            { letter: 'G', value: 1, at: { line: 2, column: 6 } },
            { letter: 'X', value: -1.5, at: { line: 2, column: 13 } },
          ],
        },
      ],
      comments: [{ text: 'x', at: { line: 2, column: 9 } }],
      percent: false,
      lines: 2,
    });
  });
});
