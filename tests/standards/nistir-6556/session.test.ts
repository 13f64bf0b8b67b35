// NISTIR 6556 Table 10 (5.1.2): the sample session. Rows with expressions, tool length offsets and canned cycles are refused by name.
import { describe, expect, it } from 'vitest';
import { canonicalCalls } from './canonicalCalls';
import { accepted, motions, refused } from './reading';

describe('Table 10', () => {
  const session = ['g1 x3 y1 f20.0', 'g2 x0 r 7.01 z0.5', '(that was a helical arc)', 't2', 'm6', 'm2'].join('\n');

  it('gives the printed calls, with x0 for the expression that makes it', () => {
    expect(canonicalCalls(accepted(session))).toEqual([
      'STRAIGHT_FEED(3.0000, 1.0000, 0.0000)', // line 5
      'ARC_FEED(0.0000, 1.0000, 1.5000, 7.8476, -1, 0.5000)', // line 6
      'CHANGE_TOOL(2)', // line 9
      'PROGRAM_END()', // line 13
    ]);
  });

  it('has the feed of line 4 and the comment of line 7', () => {
    const program = accepted(session);
    expect(motions(program)[0]?.feed).toBe(20);
    expect(program.comments).toEqual([{ text: 'that was a helical arc', at: { line: 3, column: 1 } }]);
  });

  it('has the arc’s centre at 1 + sqrt(7.01² - 1.5²)', () => {
    expect(motions(accepted(session))[1]?.arc?.centre.y).toBeCloseTo(7.847634628, 9);
  });

  it.each([
    ['g2 x[6-[4*3/2]] r 7.01 z0.5', 'expressionNotRead', 5, 'Expressions'],
    ['m6 g43 h2', 'codeNotRead', 4, 'G43 (tool length offset)'],
    ['g1 x asin[0.5]', 'functionNotRead', 6, 'ASIN'],
    ['g1 x asim[0.5]', 'missingNumber', 4, 'X'], // an error in the report's session too
    ['g91 g81 x3 y2 z-0.8 r1.5 l2', 'codeNotRead', 5, 'G81 (canned cycle)'],
  ])('refuses %s by name', (line, code, column, name) => {
    const error = refused(`${line}\nm2`);
    expect(error).toMatchObject({ code, at: { line: 1, column } });
    expect(error.reason).toContain(name);
  });
});
