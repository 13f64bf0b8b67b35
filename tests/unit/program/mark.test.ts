import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { BLANK_MARK, MARK_LETTERS, markComment, markIn, markedText, programMark, readMark, sha256Hex } from '#shared/program/mark';
import { RAIL_A, asked } from '../slot/asking';

const SEED = 28; // fixed, so that a failure is the same for everybody; fast-check prints it with the case

function make(raw: object): { program: string; mark: string; sha256: string; fileName: string } {
  const made = makeProgram(asked(raw));
  if (!made.ok) throw new Error('the rail is good');
  return made;
}

const { program, mark, sha256, fileName } = make({ ...RAIL_A, name: 'Rail A' });
const lines = program.trimEnd().split('\n');

describe('the alphabet of marks', () => {
  it('has 28 letters, each once, all capitals or digits', () => {
    expect(MARK_LETTERS).toMatch(/^[A-Z0-9]{28}$/);
    expect(new Set(MARK_LETTERS).size).toBe(28);
  });

  it.each([['0', 'O'], ['1', 'I'], ['5', 'S'], ['8', 'B'], ['2', 'Z']])('has at most one of the look-alikes %s and %s', (one, other) => {
    expect([one, other].filter((letter) => MARK_LETTERS.includes(letter)).length).toBeLessThanOrEqual(1);
  });
});

describe('the mark of a program', () => {
  it('stands in its first comment and in its file name, shown XXX-XXX', () => {
    expect(mark).toMatch(new RegExp(`^[${MARK_LETTERS}]{3}-[${MARK_LETTERS}]{3}$`));
    expect(lines[1]).toBe(markComment(mark));
    expect(markIn(program)).toBe(mark);
    expect(fileName).toBe(`rail-a_${mark}.nc`);
    expect(programMark(program)).toBe(mark);
  });

  /** FIPS 180-4, by Node's own implementation: 40 bits as six digits of base 28, the lowest first. */
  it('comes from the SHA-256 of the text with the mark blanked', () => {
    const hash = createHash('sha256').update(lines.filter((line) => line !== '%').join('\n').replace(mark, BLANK_MARK)
      .split('\n').map((line) => (line.startsWith('(') ? line : line.replaceAll(' ', ''))).join('\n')).digest();
    let number = hash.readUIntBE(0, 5);
    let letters = '';
    for (let i = 0; i < 6; i++, number = Math.floor(number / 28)) letters += MARK_LETTERS.charAt(number % 28);
    expect(`${letters.slice(0, 3)}-${letters.slice(3)}`).toBe(mark);
  });

  it('goes with a digest of the very bytes', () => {
    expect(sha256).toBe(createHash('sha256').update(program).digest('hex'));
    expect(sha256Hex('é')).toBe(createHash('sha256').update('é', 'utf8').digest('hex'));
  });

  it.each<readonly [string, (text: string) => string]>([
    ['CRLF', (text) => text.replaceAll('\n', '\r\n')],
    ['CR alone', (text) => text.replaceAll('\n', '\r')],
    ['no last line ending', (text) => text.trimEnd()],
    ['no % lines', (text) => text.replaceAll('%\n', '')],
    ['N words', (text) => text.split('\n').map((line, i) => (/^[GMS]/.test(line) ? `N${10 * i} ${line}` : line)).join('\n')],
    ['N words without a blank, in lower case', (text) => text.split('\n').map((line, i) => (/^[GMS]/.test(line) ? `n${i}${line}` : line)).join('\n')],
    // Some post-editors number every line, comments too. The mark's own comment then no longer begins its line.
    ['N words before comments', (text) => text.split('\n').map((line, i) => (/^[GMS(]/.test(line) ? `N${10 * i} ${line}` : line)).join('\n')],
    ['blanks taken out', (text) => text.split('\n').map((line) => (line.startsWith('(') ? line : line.replaceAll(' ', ''))).join('\n')],
    ['blanks and tabs put in', (text) => text.split('\n').map((line) => (line.startsWith('(') ? `  ${line}\t` : line.replace(/([XYZF])/g, '\t $1  '))).join('\n')],
    ['empty lines', (text) => text.replaceAll('\n', '\n\n')],
    ['another mark in its place', (text) => text.replace(mark, 'AAA-AAA')],
  ])('does not change with %s', (_what, change) => {
    expect(change(program)).not.toBe(program);
    expect(programMark(change(program))).toBe(mark);
  });

  const changes = lines.flatMap((line, at): (readonly [string, string])[] => {
    const replaced = (to: string) => lines.map((other, i) => (i === at ? to : other)).join('\n');
    if (line.startsWith('(') && at > 1) return [[line, replaced(line.replace(/\)$/, ' )'))], [line, replaced(line.replace(/[A-Z]/, 'Q'))], [line, replaced('')]];
    return [...line.matchAll(/[XYZIJFS]-?[\d.]+/g)].map((word): readonly [string, string] => {
      const last = word.index + word[0].length - 1;
      return [`${line}: ${word[0]}`, replaced(`${line.slice(0, last)}${(Number(line.charAt(last)) + 1) % 10}${line.slice(last + 1)}`)];
    });
  });

  it.each(changes)('changes with one character in %s', (_where, text) => {
    expect(programMark(text)).not.toBe(mark);
  });

  it('changes with lines swapped, a line left out, and a code changed', () => {
    expect(programMark(program.replace('G0 Z0.7500\nM5', 'M5\nG0 Z0.7500'))).not.toBe(mark);
    expect(programMark(program.replace('M5\n', ''))).not.toBe(mark);
    expect(programMark(program.replace('M3', 'M4'))).not.toBe(mark);
  });

  it('gives each letter about as often as any other', () => {
    const counts = new Map([...MARK_LETTERS].map((letter) => [letter, 0]));
    for (let i = 0; i < 2000; i++) for (const letter of programMark(`G0 X${i}`).replace('-', '')) counts.set(letter, (counts.get(letter) ?? 0) + 1);
    expect(counts.size).toBe(28);
    // 12 000 letters, 428.6 of each, standard deviation 20.3: six of them either way.
    for (const count of counts.values()) expect(Math.abs(count - 12000 / 28)).toBeLessThan(6 * 20.3);
  });

  it('of any text at all is a mark, and markedText holds to itself', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary', maxLength: 100 }), (text) => {
      expect(readMark(programMark(text))).toBe(programMark(text));
      expect(markedText(markedText(text))).toBe(markedText(text));
    }), { seed: SEED });
  });
});

describe('a mark as somebody typed it', () => {
  it.each([['K74-QDM'], ['k74qdm'], ['K74 QDM'], [' k74-qdm '], ['K-7-4-Q-D-M']])('%j is K74-QDM', (text) => {
    expect(readMark(text)).toBe('K74-QDM');
  });

  it.each([[''], ['K74-QD'], ['K74-QDMM'], ['K70-QDM'], ['K74-QDO'], ['K7I-QDM'], ['K74-SDM'], ['K74_QDM'], ['(K74-QDM)'], ['К74-QDM']])('%j is none', (text) => {
    expect(readMark(text)).toBeNull();
  });

  it('is not read from a text that bears none', () => {
    expect(markIn('(PROGRAM MARK ___-___)\nG20')).toBeNull();
    expect(markIn('G20 (PROGRAM MARK K74-QDM)')).toBeNull();
    expect(markIn('%\r\n(PROGRAM MARK K74-QDM)\r\nG20')).toBe('K74-QDM');
  });
});
