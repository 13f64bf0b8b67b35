// The words of a valid program against another reader of the same grammar, one that only splits lines into words.
import fc from 'fast-check';
import { parseStringSync } from 'gcode-parser';
import { describe, expect, it } from 'vitest';
import { readBlocks } from '#shared/reader/words';
import { generateProgram } from '../../bench/readerVsParser';

const SEED = 6556;

/** Words as letter and value, line by line, lines without words left out. */
function ours(text: string): [string, number][][] {
  const read = readBlocks(text);
  if (!read.ok) return expect.fail(read.error.reason);
  return read.blocks.map(({ words }) => words.map(({ letter, value }): [string, number] => [letter, value])).filter((words) => words.length > 0);
}

function theirs(text: string): (readonly [string, number | string])[][] {
  return parseStringSync(text).map(({ words }) => [...words]).filter((words) => words.length > 0);
}

const decimal = fc.tuple(fc.constantFrom('', '-', '+'), fc.nat(99999), fc.nat(6)).map(([sign, digits, places]) => {
  const text = (digits / 10 ** places).toFixed(places);
  return sign + (places > 0 && text.startsWith('0.') ? text.slice(1) : text);
});
const word = fc.tuple(fc.constantFrom(...'GMXYZIJKFSRPTxyzg'), decimal).map((parts) => parts.join(''));
const comment = fc.constantFrom('', '', ' (pass 1)', ' (a) (b)');
const line = fc.tuple(fc.option(fc.nat(99999)), fc.array(word, { maxLength: 8 }), fc.constantFrom('', ' '), comment);
const program = fc
  .array(line, { maxLength: 30 })
  .map((lines) => lines.map(([n, words, blank, note]) => (n === null ? '' : `N${n} `) + words.join(blank) + note).join('\n'));

describe('words', () => {
  it('are those of the other reader on random valid lines', () => {
    fc.assert(
      fc.property(program, (text) => {
        const other = theirs(text).map((words) => words.map(([letter, value]) => [letter.toUpperCase(), value === 0 ? 0 : value]));
        expect(ours(text)).toEqual(other);
      }),
      { seed: SEED, numRuns: 1000 },
    );
  });

  it('are those of the other reader on a whole program', () => {
    const text = generateProgram(2000);
    const words = ours(text);
    expect(words.length).toBeGreaterThan(1900);
    expect(words).toEqual(theirs(text).map((line) => line.map(([letter, value]) => [letter, value === 0 ? 0 : value])));
  });

  it('have the value the language of the number gives', () => {
    fc.assert(
      fc.property(decimal, (text) => {
        const value = Number(text);
        expect(ours(`X${text}`)).toEqual([[['X', value === 0 ? 0 : value]]]);
      }),
      { seed: SEED, numRuns: 2000 },
    );
  });

  it('mean the same in any order and with any blanks (3.3, 3.3.6)', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray(['G1', 'X1.25', 'Y-.5', 'F600', 'M8', 'S100']), fc.constantFrom('', ' ', '\t', '  '), (words, blank) => {
        const sorted = ours(words.map((text) => [...text].join(blank)).join(blank));
        const plain = ours(words.join(' '));
        expect(sorted).toEqual(plain);
      }),
      { seed: SEED, numRuns: 300 },
    );
  });
});
