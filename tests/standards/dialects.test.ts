import { describe, expect, it } from 'vitest';
import { programLint, readText, type Violation, wordLint, type ProgramText } from '../support/soundCut/index';

/**
 * What controllers read differently, one lint rule per hazard (FACTS A9; NISTIR 6556 beside "other RS-274-D / ISO 6983-1
 * practice", whose entries are common practice, no source). Every generated program passes these rules in expectSoundCut;
 * here each is shown a text that all controllers read alike and texts that some do not.
 */
interface Hazard {
  readonly topic: string;
  readonly rule: (program: ProgramText) => Violation[];
  readonly alike: string;
  readonly differs: readonly string[];
}

const HAZARDS: readonly Hazard[] = [
  { topic: 'inch or mm: G20 or G21, once, on its own line (ISO 6983-1 has G70, G71)', rule: program => programLint.units(program), alike: 'G20\nG17 G90', differs: ['G20 G17', 'G21\nG20'] },
  { topic: 'inch or mm: not by G70 or G71', rule: wordLint.codes, alike: 'G21', differs: ['G70', 'G71'] },
  { topic: 'program number: none', rule: wordLint.letters, alike: '(K74-QDM RAIL A)', differs: ['O1001', ':1001'] },
  { topic: '%: first and last line, or neither (NISTIR 6556 3.1)', rule: program => programLint.percent(program), alike: '%\nM30\n%', differs: ['%\nM30', 'M30\n%', 'G20\n%\nM30\n%', '% RAIL\nM30\n%'] },
  { topic: 'comments: closed, not nested (NISTIR 6556 3.3.4), upper-case ASCII, own line', rule: programLint.comment, alike: '(RAIL A, 19.0000 LONG)', differs: ['(Rail A)', '(RAIL (A))', '(RAIL A', '(1/4 IN)', '(50%)', '(A; B)', 'G20 (INCHES)', '(RAIL \u00C9)'] },
  { topic: 'comments: no semicolon', rule: wordLint.letters, alike: 'G20', differs: ['G20 ; INCHES'] },
  { topic: 'a number without a point may count least increments', rule: wordLint.decimalPoint, alike: 'G1 X1000.0000 F60.0', differs: ['G1 X1000 F60.0', 'G1 X1.0000 F60', 'G3 X1.0000 Y1.0000 I0 J1.0000'] },
  { topic: 'leading zeros: X0.5, not X.5', rule: wordLint.numberForm, alike: 'G1 X0.5000', differs: ['G1 X.5000', 'G1 X-.5000', 'G1 X+0.5000', 'G1 X5E-1'] },
  { topic: 'trailing zeros: fixed decimals', rule: wordLint.decimals, alike: 'G20\nG1 X0.5000\nG3 X0.50001 Y1.0000 I0.00001 J0.5000', differs: ['G20\nG1 X0.5', 'G20\nG1 X0.50000', 'G21\nG1 X0.5000'] },
  { topic: 'a minus sign before zero', rule: wordLint.negativeZero, alike: 'G1 X0.0000 Y-0.0001', differs: ['G1 X-0.0000', 'G1 Y-0.'] },
  { topic: 'address letters in the order N G X Y Z I J F S T M', rule: wordLint.wordOrder, alike: 'N10 G3 X1.0000 Y1.0000 Z-1.0000 I0.5000 J0.5000 F60.0', differs: ['G1 Y1.0000 X1.0000', 'F60.0 G1 X1.0000', 'M3 S16000', 'G20 N10'] },
  { topic: 'address letters of the subset alone', rule: wordLint.letters, alike: 'G1 X1.0000 Y1.0000 Z-1.0000', differs: ['G1 U1.0000', 'G1 A90.0', 'T1', 'H1', 'G1 X#1', 'G1 X[1+1]', '/G1 X1.0000'] },
  { topic: 'N words: none', rule: program => programLint.lineNumber(program, false), alike: 'G20', differs: ['N10 G20'] },
  { topic: 'N words asked for: up to four digits (NISTIR 6556 3.3.1: five)', rule: program => programLint.lineNumber(program, true), alike: 'N10 G20\nN9999 G17', differs: ['N10000 G20', 'N000009 G20', 'N10. G20', 'N10 G20\nG17'] },
  { topic: 'dwell: none, since P is seconds here and milliseconds elsewhere', rule: program => programLint.dwell(program), alike: 'M3', differs: ['M3\nG4 P4'] },
  { topic: 'dwell asked for: after M3, in the unit asked for', rule: program => programLint.dwell(program, 'milliseconds'), alike: 'M3\nG4 P4000', differs: ['M3\nG4 P4', 'G4 P4000\nM3', 'M3\nG4', 'M3'] },
  { topic: 'path modes: none (G61 is exact path here, exact stop elsewhere)', rule: wordLint.codes, alike: 'G17 G40', differs: ['G61', 'G61.1', 'G64'] },
  { topic: 'arc centres: I, J, X and Y all written', rule: wordLint.arcWords, alike: 'G3 X1.0000 Y1.0000 I0.0000 J1.0000', differs: ['G3 X1.0000 Y1.0000 J1.0000', 'G3 X1.0000 I0.0000 J1.0000', 'G2\nX1.0000 Y1.0000 I1.0000', 'G1 X1.0000 I1.0000'] },
  { topic: 'arc centres: no absolute mode', rule: wordLint.codes, alike: 'G90', differs: ['G90.1', 'G91'] },
  { topic: 'full circles: X and Y are never left out', rule: wordLint.arcWords, alike: 'G2 X1.0000 Y1.0000 I1.0000 J0.0000', differs: ['G2 I1.0000 J0.0000', 'G2 I1.0000'] },
  { topic: 'arcs by radius: none', rule: wordLint.letters, alike: 'G2 X1.0000 Y1.0000 I1.0000 J0.0000', differs: ['G2 X1.0000 Y1.0000 R1.0000'] },
  { topic: 'end: M2 or M30 alone on the last code line', rule: program => programLint.end(program), alike: 'M5\nM30\n%', differs: ['M5', 'M30\nM5', 'M30\nM30', 'G0 Z1.0000 M2'] },
  { topic: 'one M word on a line (NISTIR 6556 3.3.5: four)', rule: wordLint.mWords, alike: 'M5\nM30', differs: ['M3 M8', 'M5 M30'] },
  { topic: 'an M word beside a move: which comes first (NISTIR 6556 Table 8: M5, then the move)', rule: wordLint.mWithMotion, alike: 'G0 Z1.0000\nM5', differs: ['G0 Z1.0000 M5', 'G0 Z1.0000 M3'] },
  { topic: 'one word of a modal group on a line (NISTIR 6556 3.3.5)', rule: wordLint.modalGroup, alike: 'G17 G90 G94', differs: ['G0 G1 X1.0000', 'G20 G21', 'G80 G0'] },
  { topic: 'any other letter once on a line (NISTIR 6556 3.3.5)', rule: wordLint.repeat, alike: 'G1 X1.0000 Y1.0000', differs: ['G1 X1.0000 X1.0000', 'S1 S2'] },
  { topic: 'rapids: Z alone, or X and Y; some controllers dog-leg', rule: programLint.rapidWords, alike: 'G0 Z1.0000\nG0 X1.0000 Y1.0000', differs: ['G0 X1.0000 Z1.0000', 'G0\nX1.0000 Y1.0000 Z1.0000'] },
  { topic: 'lines of at most 72 characters (NISTIR 6556 3.3: 256)', rule: programLint.lineLength, alike: `(${'A'.repeat(70)})`, differs: [`(${'A'.repeat(71)})`] },
  { topic: 'every mode stated: none is the same after every controller is switched on', rule: programLint.modes, alike: 'G20\nG17 G90 G94\nG40 G49 G80\nG54\nG0 Z1.0000', differs: ['G20\nG17 G90 G94\nG40 G49 G80\nG0 Z1.0000\nG54', 'G17 G90 G94\nG40 G49 G80\nG54\nG0 Z1.0000'] },
  { topic: 'one kind of line ending, plain ASCII', rule: program => programLint.lineEnding(program), alike: 'G20\nG17\n', differs: ['G20\r\nG17\n', 'G20\tG17\n', 'G20'] },
];

describe.each(HAZARDS)('$topic', ({ rule, alike, differs }) => {
  it('is kept by a text that all read alike', () => {
    expect(rule(readText(alike))).toEqual([]);
  });

  it.each(differs.map(text => [text] as const))('is broken by %j', (text) => {
    expect(rule(readText(text))).not.toEqual([]);
  });
});
