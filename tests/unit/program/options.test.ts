import { afterEach, describe, expect, it, vi } from 'vitest';
import { type MadeProgram, makeProgram } from '#shared/makeProgram';
import { DEFAULT_OPTIONS, programOptionsSchema } from '#shared/program/options';
import { programFileName } from '#shared/program/write';
import type { RawSpec } from '../../support/randomSpecs';
import { type JudgedOptions, expectSoundCut } from '../../support/soundCut/index';
import { RAIL_A, RAIL_MM, asked } from '../slot/asking';

const ROUND_A = { ...RAIL_A, ends: 'round', name: 'Rail A' } as const;
const ROUND_MM = { ...RAIL_MM, ends: 'round' } as const;

type Good = Extract<MadeProgram, { ok: true }>;

/** Makes a program, and has it judged by what the options say it must be. */
function make(raw: RawSpec, options: JudgedOptions & { fileEnding?: string } = {}): Good {
  const made = makeProgram(asked({ ...raw, options }));
  if (!made.ok) throw new Error(`disagrees: ${made.readback.findings.filter(({ severity }) => severity === 'disagrees').map(({ rule }) => rule).join(', ')}`);
  expectSoundCut(made.program, raw, options);
  return made;
}

const base = make(ROUND_A);
const linesOf = (text: string) => text.trimEnd().split(/\r?\n/);
const blocksOf = (text: string) => linesOf(text).filter((line) => !line.startsWith('('));
/** The mark differs wherever the text does. */
const unmarked = (text: string) => text.replace(/PROGRAM MARK \S+\)/, 'PROGRAM MARK)');

describe('each option changes only what it should', () => {
  it('line numbers: an N word on every block, and nothing else', () => {
    const { program, mark } = make(ROUND_A, { lineNumbers: true });
    expect(program.replace(/^N\d+ /gm, '')).toBe(base.program);
    expect(linesOf(program).filter((line) => !/^(N\d{1,4} |\(|%)/.test(line))).toEqual([]);
    const numbers = [...program.matchAll(/^N(\d+) /gm)].map((found) => Number(found[1]));
    expect(numbers).toEqual(numbers.map((_, i) => 10 * (i + 1)));
    expect(mark).toBe(base.mark); // N words do not count
  });

  it('line numbers of a long program: begin again after 9999, never five digits', () => {
    const { program } = make({ ...ROUND_A, width: 1.5, railWidth: 4, bitDiameter: 0.0625, stepdown: 0.03, stopMargin: 1, depth: 0.06, stepover: 0.3, stickout: 1 }, { lineNumbers: true, chordTolerance: 0.0001 });
    const numbers = [...program.matchAll(/^N(\d+) /gm)].map((found) => Number(found[1]));
    expect(numbers.length).toBeGreaterThan(9999);
    expect(Math.max(...numbers)).toBe(9999);
    expect(numbers.filter((n) => n === 1).length).toBeGreaterThan(1);
  });

  it('CRLF: the line endings alone', () => {
    const { program, mark } = make(ROUND_A, { lineEndings: 'crlf' });
    expect(program.replaceAll('\r\n', '\n')).toBe(base.program);
    expect(program.match(/\n/g)?.length).toBe(program.match(/\r\n/g)?.length);
    expect(mark).toBe(base.mark);
  });

  it('no %: the two lines alone', () => {
    const { program, mark } = make(ROUND_A, { percent: false });
    expect(`%\n${program}%\n`).toBe(base.program);
    expect(mark).toBe(base.mark);
  });

  it('no comments: the comment lines alone', () => {
    const { program } = make(ROUND_A, { comments: false });
    expect(program).not.toMatch(/[()]/);
    expect(linesOf(program)).toEqual(blocksOf(base.program));
  });

  it('no S: the S word alone, and the readback says that no speed was measured', () => {
    const { program, readback } = make(ROUND_A, { speedWord: false });
    expect(unmarked(program)).toBe(unmarked(base.program).replace('S16000 M3', 'M3'));
    expect(readback.findings.find(({ rule }) => rule === 'spindleSpeed')).toMatchObject({ severity: 'not measured', reason: 'noWord' });
  });

  it.each([['seconds', /^G4 P4\.0$/], ['milliseconds', /^G4 P4000\.0$/]] as const)('a wait in %s: one block after M3', (spindleWait, form) => {
    const { program } = make(ROUND_A, { spindleWait });
    const blocks = blocksOf(program);
    const at = blocks.findIndex((block) => form.test(block));
    expect(blocks[at - 1]).toMatch(/M3$/);
    expect(blocks.toSpliced(at, 1)).toEqual(blocksOf(base.program));
  });

  it('waits as long in seconds as in milliseconds', () => {
    expect(make(ROUND_A, { spindleWait: 'milliseconds' }).summary.seconds).toBeCloseTo(make(ROUND_A, { spindleWait: 'seconds' }).summary.seconds, 9);
  });

  it('M2: the last code alone', () => {
    expect(unmarked(make(ROUND_A, { end: 'M2' }).program)).toBe(unmarked(base.program).replace('\nM30\n', '\nM2\n'));
  });

  it('file ending: the name alone', () => {
    const other = make(ROUND_A, { fileEnding: 'ngc' });
    expect(other.program).toBe(base.program);
    expect(other.fileName).toBe(base.fileName.replace(/nc$/, 'ngc'));
  });

  it('chords: the arcs alone', () => {
    const { program } = make(ROUND_A, { chordTolerance: 0.0005 });
    expect(base.program).toMatch(/^G3 /m);
    expect(program).not.toMatch(/^G[23] /m);
    const ends = blocksOf(base.program).filter((block) => /^G3 /.test(block)).map((block) => block.replace(/ I.*$/, ''));
    for (const end of ends) {
      // Each arc's end is still reached, by a word that names what changed.
      const [x = '', y = ''] = [...end.matchAll(/[XY]-?[\d.]+/g)].map(([word]) => word);
      expect(program.includes(x) && program.includes(y)).toBe(true);
    }
    expect(blocksOf(program).filter((block) => /^G0|^[SM%]|^G\d\d/.test(block))).toEqual(blocksOf(base.program).filter((block) => /^G0|^[SM%]|^G\d\d/.test(block)));
  });
});

describe('a program in other units than its drawing', () => {
  it.each([['in', ROUND_A, 'mm', 'G21', 'MILLIMETRES', /[XYZ]-?\d+\.\d{3}(?!\d)/g], ['mm', ROUND_MM, 'in', 'G20', 'INCHES', /[XYZ]-?\d+\.\d{4}(?!\d)/g]] as const)(
    'drawn in %s: is written in the other, and read back in the drawing\'s', (units, raw, programUnits, code, words, form) => {
      const { program, readback, spec } = make(raw, { programUnits });
      expect(blocksOf(program)).toContain(code);
      expect(program).toContain(`(ALL SIZES IN ${words})`);
      expect(blocksOf(program).join('\n').match(/[XYZ]-?[\d.]+/g)?.filter((word) => !word.match(form))).toEqual([]);
      const length = readback.findings.find(({ rule }) => rule === 'length');
      expect(length).toMatchObject({ severity: 'agrees', wanted: raw.length });
      expect(Math.abs(Number(length?.measured) - raw.length)).toBeLessThanOrEqual(units === 'in' ? 0.0005 : 0.01);
      expect(spec.units).toBe(units);
    });

  it('is the plain program where the units are the same', () => {
    expect(make(ROUND_A, { programUnits: 'in' }).program).toBe(base.program);
  });

  it('states sizes, feeds and heights of the header in its own units', () => {
    const { program } = make({ ...ROUND_A, railThickness: 0.75 }, { programUnits: 'mm' });
    expect(program).toContain('(RAIL 666.750 LONG 31.750 WIDE 19.050 THICK)'); // 26 1/4 × 1 1/4 × 3/4 in
    expect(program).toContain('(CLAMPS UP TO 12.700, SAFE HEIGHT 19.050)');
    expect(program).toContain('FEED 3098.8'); // 122 in/min
  });
});

describe('the same slot', () => {
  afterEach(() => void vi.useRealTimers());

  it('gives the same bytes on any day and at any time', () => {
    vi.useFakeTimers();
    const texts = ['1999-12-31T23:59:59Z', '2031-07-04T06:00:00Z'].map((day) => {
      vi.setSystemTime(new Date(day));
      return make(ROUND_A).program;
    });
    expect(new Set([...texts, base.program]).size).toBe(1);
  });
});

describe('the options', () => {
  it('have the defaults that any three-axis controller takes (issue, "The text")', () => {
    expect(DEFAULT_OPTIONS).toEqual({
      lineNumbers: false, chordTolerance: 0, lineEndings: 'lf', percent: true, comments: true, speedWord: true, spindleWait: 'none', end: 'M30', fileEnding: 'nc', programUnits: null,
    });
  });

  it.each([
    [{ fileEnding: '../x' }], [{ fileEnding: 'toolong' }], [{ fileEnding: '' }], [{ chordTolerance: -0.001 }], [{ chordTolerance: Number.NaN }], [{ end: 'M99' }], [{ lineNumbers: 'yes' }],
    [{ programUnits: 'cm' }], [{ spindleWait: 'minutes' }], [{ colour: 'red' }],
  ])('refuse %j', (options) => {
    expect(programOptionsSchema.safeParse(options).success).toBe(false);
  });
});

describe("a file's name", () => {
  it.each([
    ['Rail A', 'rail-a_K74-QDM.nc'], ['', 'rail_K74-QDM.nc'], ['../../etc/passwd', 'etc-passwd_K74-QDM.nc'], ['CON', 'con_K74-QDM.nc'], ['---', 'rail_K74-QDM.nc'], ['軌道', 'rail_K74-QDM.nc'],
    ['A'.repeat(60), `${'a'.repeat(40)}_K74-QDM.nc`],
  ])('for %j is %s', (name, wanted) => {
    expect(programFileName({ ...base.spec, name }, 'K74-QDM', 'nc')).toBe(wanted);
  });
});
