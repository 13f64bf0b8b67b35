import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readTally, tallyTemplate, writeTally } from '#shared/coin/csv';
import { TALLY_LIMITS, countOf, tallySchema } from '#shared/coin/tally';
import { UNITS } from '#shared/measure/units';

const fixture = (name: string) => readFileSync(new URL(`../../../fixtures/tallies/${name}`, import.meta.url), 'utf8');
const said = (text: string) => readTally(text, 'in').problems.map(({ line, field }) => `${line} ${field}`);

describe('a tally in CSV', () => {
  it('is read in any column order, with semicolons, decimal commas, units in the headings and a cell of two lines', () => {
    const { tally, problems, ignored, kinds } = readTally(fixture('semicolons.csv'), 'mm');
    expect(problems).toEqual([]);
    expect(ignored).toEqual(['Remarks']);
    expect(tally?.kinds).toEqual([
      { name: 'Chair', diameter: 50.8, thickness: 3.2, count: 2, mass: null },
      { name: 'Crew\nwith oar', diameter: 44.5, thickness: 3, count: 8, mass: null },
    ]);
    expect(kinds.map(({ line }) => line)).toEqual([2, 3]);
  });

  it('names line and field of everything wrong, and imports nothing', () => {
    const read = readTally(fixture('bad-lines.csv'), 'in');
    expect(read.tally).toBeNull();
    expect(read.problems.map(({ line, field }) => [line, field])).toEqual([[3, 'thickness'], [4, 'name'], [5, 'diameter'], [5, 'thickness'], [5, 'count']]);
    expect(read.problems[1]?.message).toContain('line 2');
    expect(read.kinds.map(({ name }) => name)).toEqual(['Line good']);
  });

  it('counts lines through a quoted cell that holds line ends', () => {
    expect(said('name,dia,thk,qty\n"a\nb\nc",2,1/8,1\nnext,2,1/8,none\n')).toEqual(['5 count']);
    expect(said('name,dia,thk,qty\r\n"a\r\nb",2,1/8,1\r\n\r\nnext,2,1/8,none\r\n')).toEqual(['5 count']);
  });

  it('converts to the tally\'s units: the cell\'s own unit before its heading\'s', () => {
    const { tally } = readTally('name,diameter (mm),thickness,count\na,38.1,1/8,1\nb,1 1/2 in,3.175 mm,1\n', 'in');
    expect(tally?.kinds).toHaveLength(2);
    for (const { diameter, thickness } of tally?.kinds ?? []) {
      expect(diameter).toBeCloseTo(1.5, 12);
      expect(thickness).toBeCloseTo(0.125, 12);
    }
  });

  it.each([
    ['', '1 line'],
    ['name,dia,thk,qty\n', '1 line'],
    ['name,dia,qty\na,2,1\n', '1 thickness'],
    ['name,dia,size,thk,qty\na,2,2,1/8,1\n', '1 diameter'],
    ['name,dia,thk,qty\na,2,1/8,0\n', '2 count'],
    ['name,dia,thk,qty\na,2,1/8,-3\n', '2 count'],
    ['name,dia,thk,qty\na,2,1/8,1e2\n', '2 count'],
    ['name,dia,thk,qty\n,2,1/8,1\n', '2 name'],
    ['name,dia,thk,qty\na,9,1/8,1\n', '2 diameter'],
    ['name,dia,thk,qty\na,wide,1/8,1\n', '2 diameter'],
    ['name,dia,thk,qty\na, of brass,2,1/8,1\n', '2 line'],
    ['name,dia,thk,qty,grams\na,2,1/8,1,heavy\n', '2 mass'],
    [`name,dia,thk,qty\n${'long '.repeat(20)},2,1/8,1\n`, '2 name'],
    ['x'.repeat(100_001), '1 line'],
  ])('refuses %j', (text, first) => {
    expect(said(text)[0]).toBe(first);
    expect(readTally(text, 'in').tally).toBeNull();
  });

  it.each(UNITS)('has a template in %s that reads without a problem', (units) => {
    const { tally, problems } = readTally(tallyTemplate(units), units);
    expect(problems).toEqual([]);
    expect(tally && countOf(tally)).toBe(19);
  });

  it('reads back what it wrote, whatever the names', () => {
    const kind = fc.record({
      name: fc.string({ minLength: 1, maxLength: TALLY_LIMITS.name }).map((name) => name.trim()).filter((name) => name !== ''),
      diameter: fc.integer({ min: 60, max: 1250 }).map((n) => n / 10), thickness: fc.integer({ min: 5, max: 30 }).map((n) => n / 10),
      count: fc.integer({ min: 1, max: 1000 }), mass: fc.option(fc.integer({ min: 1, max: 1000 })),
    });
    const tallies = fc.uniqueArray(kind, { minLength: 1, maxLength: 12, selector: ({ name }) => name.toLowerCase() });
    fc.assert(fc.property(tallies, (kinds) => {
      const { tally, problems } = readTally(writeTally({ units: 'mm', kinds }), 'mm');
      expect(problems).toEqual([]);
      expect(tally).toEqual({ units: 'mm', kinds });
    }));
  });

  it('never throws, and never gives a tally beside a problem', () => {
    fc.assert(fc.property(fc.string({ maxLength: 200 }), fc.boolean(), (text, headed) => {
      const { tally, problems } = readTally(headed ? `name,dia,thk,qty\n${text}` : text, 'mm');
      expect(tally === null).toBe(problems.length > 0);
    }));
  });
});

describe('a tally as a form gives it', () => {
  it('takes the trade\'s notation', () => {
    expect(tallySchema.parse({ units: 'in', kinds: [{ name: ' Squad ', diameter: '1 3/4', thickness: 0.125, count: 8 }] }))
      .toEqual({ units: 'in', kinds: [{ name: 'Squad', diameter: 1.75, thickness: 0.125, count: 8, mass: null }] });
  });

  it.each([
    [{ name: 'a', diameter: 2, thickness: 0.1, count: 1.5 }, 'kinds.0.count'],
    [{ name: 'a', diameter: '2 feet', thickness: 0.1, count: 1 }, 'kinds.0.diameter'],
    [{ name: 'a', thickness: 0.1, count: 1 }, 'kinds.0.diameter'],
    [{ name: 'a', diameter: 0.5, thickness: 0.4, count: 1 }, 'kinds.0.thickness'],
    [{ name: '  ', diameter: 2, thickness: 0.1, count: 1 }, 'kinds.0.name'],
  ])('refuses %j at its field', (kind, path) => {
    const parsed = tallySchema.safeParse({ units: 'in', kinds: [kind] });
    expect(parsed.success ? [] : parsed.error.issues.map((issue) => issue.path.join('.'))).toEqual([path]);
  });

  it('refuses one name twice', () => {
    const kind = { name: 'Cadet', diameter: 1.25, thickness: 0.118, count: 1 };
    const parsed = tallySchema.safeParse({ units: 'in', kinds: [kind, { ...kind, name: 'cadet ' }] });
    expect(parsed.error?.issues[0]?.path).toEqual(['kinds', 1, 'name']);
  });
});
