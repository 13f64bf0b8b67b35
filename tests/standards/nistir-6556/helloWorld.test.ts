// NISTIR 6556 C.1: the sample program, copied line by line from the report's text as printed (its page break and margin left out).
// The figures were reckoned from the printed lines by hand and by formula, not by the reader.
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { accepted, degrees, lengthOf, motions, total } from './reading';

const text = readFileSync(new URL('../../../fixtures/reader/nistir-6556-c1.ngc', import.meta.url), 'utf8');

describe('C.1, from (0, 0, 50)', () => {
  const program = accepted(text, { start: { x: 0, y: 0, z: 50 } });
  const all = motions(program);
  const cuts = all.filter(({ kind }) => kind !== 'rapid');
  const rapids = all.filter(({ kind }) => kind === 'rapid');

  it('has 61 numbered lines, n0180 left out', () => {
    const numbers = program.blocks.map(({ number }) => number);
    expect(numbers).toHaveLength(61);
    expect(numbers).toEqual(Array.from({ length: 62 }, (_, n) => (n + 1) * 10).filter((number) => number !== 180));
  });

  it('has 25 rapids, 29 straight feeds and 5 arcs', () => {
    expect(rapids).toHaveLength(25);
    expect(cuts.filter(({ kind }) => kind === 'line')).toHaveLength(29);
    expect(cuts.filter(({ kind }) => kind === 'arc')).toHaveLength(5);
  });

  it('plunges 12 times', () => {
    expect(cuts.filter(({ from, to }) => to.z < from.z)).toHaveLength(12);
  });

  it('cuts 183.4305 mm and moves 202.0528 mm at traverse rate', () => {
    expect(total(cuts.map(lengthOf))).toBeCloseTo(183.4305, 4);
    expect(total(rapids.map(lengthOf))).toBeCloseTo(202.0528, 4);
  });

  it('cuts for 9.1715 minutes at F20', () => {
    expect(total(cuts.map((cut) => lengthOf(cut) / (cut.feed ?? NaN)))).toBeCloseTo(9.1715, 4);
  });

  it('stays within X 0 to 81, Y 0 to 10, Z -0.5 to 50', () => {
    const range = (axis: 'x' | 'y' | 'z') => [Math.min(...all.map(({ to }) => to[axis])), Math.max(...all.map(({ to }) => to[axis]))];
    expect([range('x'), range('y'), range('z')]).toEqual([[0, 81], [0, 10], [-0.5, 50]]);
  });

  it('has the arcs of e, o, o, r and d', () => {
    const arcs = cuts.flatMap(({ arc }) => arc ?? []);
    const expected = [
      { x: 13.5, y: 2.5, radius: 2.5, sweep: 270, turn: 1 },
      { x: 32.5, y: 2.5, radius: 2.5, sweep: 360, turn: -1 },
      { x: 57.5, y: 2.5, radius: 2.5, sweep: 360, turn: -1 },
      { x: 66.5, y: 4 - Math.sqrt(16 - 2.5 ** 2), radius: 4, sweep: 77.364, turn: -1 },
      { x: 79.5, y: 2.5, radius: 2.5, sweep: 180, turn: -1 },
    ];
    expect(arcs).toHaveLength(expected.length);
    expected.forEach(({ x, y, radius, sweep, turn }, n) => {
      const arc = arcs[n];
      expect(arc?.centre.x).toBeCloseTo(x, 9);
      expect(arc?.centre.y).toBeCloseTo(y, 9);
      expect(arc?.radius).toBeCloseTo(radius, 9);
      expect(degrees(arc?.sweep ?? NaN)).toBeCloseTo(sweep, 3);
      expect(arc?.turn).toBe(turn);
    });
    expect((arcs[3]?.radius ?? NaN) * (arcs[3]?.sweep ?? NaN)).toBeCloseTo(5.4011, 4);
  });

  it('turns the spindle at 4000 rev/min while it cuts, and ends with M2', () => {
    expect(cuts.every(({ modes }) => modes.spindle === 'clockwise' && modes.spindleSpeed === 4000)).toBe(true);
    expect(program.steps.at(-1)).toMatchObject({ kind: 'end', code: 2, at: { line: 62 } });
    expect(program.units).toBe('mm');
  });
});
