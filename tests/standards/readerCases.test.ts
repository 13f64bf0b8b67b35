// Runs every case of fixtures/reader/*.txt. The cases come from NISTIR 6556; each file names its sections.
import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readProgram } from '#shared/reader/program';
import { canonicalCalls } from './nistir-6556/canonicalCalls';
import { ORIGIN } from './nistir-6556/reading';
import { parseCases } from './readerCases';

const folder = new URL('../../fixtures/reader/', import.meta.url);
const files = readdirSync(folder).filter((name) => name.endsWith('.txt'));

it('has case files', () => expect(files.length).toBeGreaterThan(0));

describe.each(files)('%s', (file) => {
  const cases = parseCases(readFileSync(new URL(file, folder), 'utf8'));

  it.each(cases)('$name', ({ input, expected }) => {
    expect(answer(input)).toEqual(expected);
  });
});

/** A program as its canonical calls from the origin, or its error as `error code line:column`. */
function answer(text: string): string[] {
  const result = readProgram(text, { start: ORIGIN });
  if (result.ok) return canonicalCalls(result.program);
  const { code, at } = result.error;
  return [`error ${code} ${at.line}:${at.column}`];
}

describe('the runner', () => {
  it.each([
    ['no case', 'G0 X1\n'],
    ['an empty file', ''],
    ['a case without an arrow', '# one\nM2\nPROGRAM_END()\n'],
    ['two arrows', '# one\nM2\n==>\nPROGRAM_END()\n==>\nPROGRAM_END()\n'],
    ['no expectation', '# one\nM2\n==>\n\n# two\nM2\n==>\nPROGRAM_END()\n'],
    ['two cases of one name', '# one\nM2\n==>\nPROGRAM_END()\n# one\nM2\n==>\nPROGRAM_END()\n'],
    ['a case without a name', '# \nM2\n==>\nPROGRAM_END()\n'],
    ['text before the first case', 'M2\n# one\nM2\n==>\nPROGRAM_END()\n'],
  ])('fails on %s', (_, text) => {
    expect(() => parseCases(text)).toThrow(/case file/);
  });
});
