// NISTIR 6556 Table 4 and 3.3.5: any two codes of one group clash on a line, any two of different groups do not.
import { describe, expect, it } from 'vitest';
import { readProgram } from '#shared/reader/program';
import { ORIGIN } from './reading';

/** Table 4 as printed, kept here apart from the reader's own copy. */
const G_TABLE = {
  1: 'G0 G1 G2 G3 G38.2 G80 G81 G82 G83 G84 G85 G86 G87 G88 G89',
  2: 'G17 G18 G19',
  3: 'G90 G91',
  5: 'G93 G94',
  6: 'G20 G21',
  7: 'G40 G41 G42',
  8: 'G43 G49',
  10: 'G98 G99',
  12: 'G54 G55 G56 G57 G58 G59 G59.1 G59.2 G59.3',
  13: 'G61 G61.1 G64',
  0: 'G4 G10 G28 G30 G53 G92 G92.1 G92.2 G92.3',
};
const M_TABLE = { 4: 'M0 M1 M2 M30 M60', 6: 'M6', 7: 'M3 M4 M5', 8: 'M7 M8 M9', 9: 'M48 M49' };

const codes = [...Object.values(G_TABLE), ...Object.values(M_TABLE)].flatMap((list) => list.split(' '));
const groupOf = (code: string) => Object.entries(code.startsWith('G') ? G_TABLE : M_TABLE).find(([, list]) => list.split(' ').includes(code))?.[0];

describe('Table 4', () => {
  it.each(codes)('%s clashes with its own group alone', (code) => {
    for (const other of codes) {
      const result = readProgram(`${code} ${other}\nM2`, { start: ORIGIN });
      const clash = !result.ok && result.error.code === 'modalGroup';
      const sameGroup = code[0] === other[0] && groupOf(code) === groupOf(other);
      expect(`${code} ${other} ${clash}`).toBe(`${code} ${other} ${sameGroup}`);
    }
  });

  it('knows no other code', () => {
    for (let tenths = 0; tenths < 1100; tenths++) {
      const result = readProgram(`G${tenths / 10}\nM2`, { start: ORIGIN });
      const unknown = !result.ok && result.error.code === 'unknownCode';
      expect(`G${tenths / 10} ${unknown}`).toBe(`G${tenths / 10} ${!codes.includes(`G${tenths / 10}`)}`);
    }
    for (let code = 0; code < 110; code++) {
      const result = readProgram(`M${code}\nM2`, { start: ORIGIN });
      const unknown = !result.ok && result.error.code === 'unknownCode';
      expect(`M${code} ${unknown}`).toBe(`M${code} ${!codes.includes(`M${code}`)}`);
    }
  });
});
