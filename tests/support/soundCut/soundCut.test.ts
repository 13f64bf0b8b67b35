import { describe, expect, it } from 'vitest';
import { cutLength, cutLengthBound, expectSoundCut, judgeCut, type JudgedOptions, type JudgedSpec, type Rule, RULES } from './index';
import { GROOVE, LINE, ROUND, type Sample, SAMPLES, WIDE } from './samplePrograms';

/** Replaces text that must be there, so that a case cannot pass by changing nothing. */
function changed(program: string, ...edits: readonly (readonly [string | RegExp, string])[]): string {
  return edits.reduce((text, [from, to]) => {
    const after = text.replace(from, to);
    if (after === text) throw new Error(`the sample has no ${String(from)}`);
    return after;
  }, program);
}

function rulesOf(program: string, spec: JudgedSpec, options?: JudgedOptions): Set<Rule> {
  return new Set(judgeCut(program, spec, options).map(violation => violation.rule));
}

describe('sound programs', () => {
  it.each(SAMPLES.map(sample => [/QDM (\w+)/.exec(sample.program)?.[1], sample] as const))('%s has nothing against it', (_, { program, spec }) => {
    expect(judgeCut(program, spec)).toEqual([]);
    expect(() => expectSoundCut(program, spec)).not.toThrow();
  });

  it('takes CRLF, N words, no %, M2, no speed word and a wait when they are asked for', () => {
    let n = 0;
    const program = changed(GROOVE.program, [/%\n/g, ''], ['M30', 'M2'], ['S16000 M3', 'M3\nG4 P4'])
      .replace(/^([GM])/gm, (_, letter: string) => `N${n += 10} ${letter}`).replaceAll('\n', '\r\n');
    const options = { lineNumbers: true, lineEndings: 'crlf', percent: false, end: 'M2', speedWord: false, spindleWait: 'seconds' } as const;
    expect(judgeCut(program, GROOVE.spec, options)).toEqual([]);
    expect(rulesOf(program, GROOVE.spec)).toEqual(new Set<Rule>(['line-number', 'line-ending', 'percent', 'end', 'speed', 'dwell']));
  });

  it('converts a program in the other units', () => {
    // 3/32 in is 2.38125 mm: two passes of 2.381 mm are 4.762, within half the last decimal of 3/16 in.
    const program = changed(GROOVE.program, ['G20', 'G21'], ['Z-0.0938', 'Z-0.09374'], ['Z-0.1875', 'Z-0.18748'])
      .replace(/([XYZ])(-?[\d.]+)/g, (word, letter: string, value: string) => word.startsWith('X 1') ? word : `${letter}${(Number(value) * 25.4).toFixed(3)}`);
    expect(judgeCut(program, GROOVE.spec, { programUnits: 'mm' })).toEqual([]);
    expect(rulesOf(program, GROOVE.spec)).toEqual(new Set<Rule>(['units']));
  });

  it('takes arcs as chords only when they are asked for', () => {
    // A half circle of radius 3 in chords of 15 degrees strays by 3 (1 - cos 7.5) = 0.0257 mm (sagitta, FACTS H1).
    const chords = (middle: number, from: number, radius: number): string => Array.from({ length: 12 }, (_, i) => {
      const angle = (from + 15 * (i + 1)) * Math.PI / 180;
      return `G1 X${(middle + radius * Math.cos(angle)).toFixed(3)} Y${(20 + radius * Math.sin(angle)).toFixed(3)}`;
    }).join('\n');
    const program = changed(ROUND.program,
      ['G3 X117.000 Y20.000 I0.000 J3.000\nG3 X114.000 Y23.000 I-3.000 J0.000', chords(114, -90, 3)],
      ['G3 X23.000 Y20.000 I0.000 J-3.000\nG3 X26.000 Y17.000 I3.000 J0.000', chords(26, 90, 3)]);
    expect(judgeCut(program, ROUND.spec, { chordTolerance: 0.03 })).toEqual([]);
    expect(rulesOf(program, ROUND.spec)).toContain('uncut-wall');
  });

  it('takes conventional laps when they are asked for', () => {
    expect(judgeCut(changed(GROOVE.program, ...OTHER_WAY), { ...GROOVE.spec, direction: 'conventional' })).toEqual([]);
  });

  it.each(['8PM-KTW', 'T8W-3AM'])('takes the mark %s for no time of day', (mark) => {
    // \b stands before and after a hyphen too: two marks of 1500 random programs were read as times.
    expect(judgeCut(changed(GROOVE.program, ['K74-QDM', mark]), GROOVE.spec)).toEqual([]);
  });

  it('lists every violation in one error', () => {
    const program = changed(GROOVE.program, ['G17 ', ''], ['M30', 'M5 M30']);
    expect(() => expectSoundCut(program, GROOVE.spec)).toThrow(/modes, .*G17[\s\S]*m-words, line 26/);
  });
});

type Case = readonly [name: string, rule: Rule, sample: Sample, edits: readonly (readonly [string | RegExp, string])[], spec?: Partial<JudgedSpec>, options?: JudgedOptions];

/** The same laps clockwise. */
const OTHER_WAY: Case[3] = [[/Y0\.7500/g, 'Y?'], [/Y1\.0000/g, 'Y0.7500'], [/Y\?/g, 'Y1.0000']];

const CASES: readonly Case[] = [
  // The text.
  ['a comment of 73 characters', 'line-length', GROOVE, [['(RAIL', `(${'A'.repeat(46)} RAIL`]]],
  ['one CRLF among LF', 'line-ending', GROOVE, [['G54\n', 'G54\r\n']]],
  ['no ending on the last line', 'line-ending', GROOVE, [[/%\n$/, '%']]],
  ['a letter from outside ASCII', 'line-ending', GROOVE, [['GROOVE)', 'RAINÉ)']]],
  ['a tool word', 'letters', GROOVE, [['G54\n', 'G54\nT1\n']]],
  ['a semicolon comment', 'letters', GROOVE, [['G54\n', 'G54 ;\n']]],
  ['a block delete', 'letters', GROOVE, [['G54\n', '/G54\n']]],
  ['lower-case words', 'letters', GROOVE, [['G54\n', 'g54\n']]],
  ['a path mode', 'codes', GROOVE, [['G54\n', 'G54\nG64\n']]],
  ['coolant', 'codes', GROOVE, [['G54\n', 'G54\nM8\n']]],
  ['no digit before the point', 'number-form', GROOVE, [['Y0.7500', 'Y.7500']]],
  ['a plus sign', 'number-form', GROOVE, [['Y0.7500', 'Y+0.7500']]],
  ['an exponent', 'number-form', GROOVE, [['Y0.7500', 'Y7.5e-1']]],
  ['a whole number in X', 'decimal-point', ROUND, [['X26.000', 'X26']]],
  ['a whole number in F', 'decimal-point', GROOVE, [['F100.0', 'F100']]],
  ['three decimals in inches', 'decimals', GROOVE, [['X1.3750', 'X1.375']]],
  ['four decimals in mm', 'decimals', ROUND, [['X26.000', 'X26.0000']]],
  ['minus zero', 'negative-zero', LINE, [['Y0.0000', 'Y-0.0000']]],
  ['two X words', 'repeat', GROOVE, [['G1 X17.6250', 'G1 X17.6250 X17.6250']]],
  ['two motion words', 'modal-group', GROOVE, [['G1 Y1.0000', 'G0 G1 Y1.0000']]],
  ['two M words', 'm-words', GROOVE, [['M5\nM30', 'M5 M30']]],
  ['M5 beside the retract', 'm-with-motion', GROOVE, [['G0 Z0.7500\nM5', 'G0 Z0.7500 M5']]],
  ['F before X', 'word-order', GROOVE, [['G1 X17.6250 F100.0', 'G1 F100.0 X17.6250']]],
  ['N words not asked for', 'line-number', GROOVE, [['G54\n', 'N10 G54\n']]],
  ['no closing %', 'percent', GROOVE, [['M30\n%', 'M30']]],
  ['no % at all', 'percent', GROOVE, [[/%\n/g, '']]],
  ['% inside the program', 'percent', GROOVE, [['G54\n', 'G54\n%\n']]],
  ['a lower-case comment', 'comment', GROOVE, [['GROOVE)', 'Groove)']]],
  ['a nested comment', 'comment', GROOVE, [['GROOVE)', '(GROOVE))']]],
  ['a slash in a comment', 'comment', GROOVE, [['GROOVE)', '1/4)']]],
  ['a comment that is not closed', 'comment', GROOVE, [['GROOVE)', 'GROOVE']]],
  ['a comment beside words', 'comment', GROOVE, [['G54\n', 'G54 (ZERO)\n']]],
  ['a date', 'date', GROOVE, [['GROOVE)', '2031-05-07)']]],
  ['a time of day', 'date', GROOVE, [['GROOVE)', '14:05)']]],
  ['a time of day in words', 'date', GROOVE, [['GROOVE)', 'CUT AT 4 PM)']]],
  ['a day and month', 'date', GROOVE, [['GROOVE)', 'CUT 7 MAY)']]],
  ['no mark', 'mark', GROOVE, [['K74-QDM ', '']]],
  ['a mark with a look-alike', 'mark', GROOVE, [['K74-QDM', 'K10-QDM']]],
  ['a comment though comments are off', 'mark', GROOVE, [['GROOVE', 'GROOVES']], {}, { comments: false }],
  ['no G90', 'modes', GROOVE, [['G90 ', '']]],
  ['G80 only after the first motion', 'modes', GROOVE, [[' G80', ''], ['M3', 'G80\nM3']]],
  ['units twice', 'units', GROOVE, [['G54\n', 'G54\nG20\n']]],
  ['units beside other modes', 'units', GROOVE, [['G20\nG17', 'G20 G17']]],
  ['a wait not asked for', 'dwell', GROOVE, [['S16000 M3', 'S16000 M3\nG4 P4']]],
  ['a wait in the wrong unit', 'dwell', GROOVE, [['S16000 M3', 'S16000 M3\nG4 P4']], {}, { spindleWait: 'milliseconds' }],
  ['an arc without J', 'arc-words', ROUND, [['I-2.000 J0.000', 'I-2.000']]],
  ['words after M30', 'end', GROOVE, [['M30\n', 'M30\nG54\n']]],
  ['M2 where M30 was asked for', 'end', GROOVE, [['M30', 'M2']]],
  ['a letter without a number', 'parser', GROOVE, [['G54', 'G54 X']]],
  // Reading.
  ['a motion word without axes', 'axis-words', GROOVE, [['G54\n', 'G54\nG1\n']]],
  ['axes while G80 is in force', 'axis-words', GROOVE, [['G0 Z0.7500\nS', 'Z0.7500\nS']]],
  ['a half circle', 'arc-sweep', ROUND, [['G3 X116.000 Y20.000 I0.000 J2.000\nG3 X114.000 Y22.000 I-2.000 J0.000', 'G3 X114.000 Y22.000 I0.000 J2.000']]],
  ['radii 0.003 mm apart', 'arc-radius', ROUND, [['G3 X117.000 Y20.000', 'G3 X117.003 Y20.000']]],
  ['no feed', 'feed', GROOVE, [[/ F\d+\.0/g, '']]],
  ['X without Y in the first move sideways', 'start', GROOVE, [['X1.3750 Y0.7500', 'X1.3750']]],
  // Safety.
  ['a first motion with X and Y', 'first-motion', GROOVE, [['G0 Z0.7500', 'G0 X0.0000 Y0.0000 Z0.7500']]],
  ['a first motion below the safe height', 'first-motion', GROOVE, [['G0 Z0.7500', 'G0 Z0.7000']]],
  ['a safe height under the clamps', 'first-motion', GROOVE, [[/Z0\.7500/g, 'Z0.6000']], { safeHeight: undefined }],
  ['a rapid sideways under the safe height', 'rapid-sideways', GROOVE, [['G0 X1.3750 Y0.7500\nG0 Z0.0200', 'G0 Z0.0200\nG0 X1.3750 Y0.7500']]],
  ['a rapid down into the wood', 'rapid-down', GROOVE, [['G0 Z0.0200', 'G0 Z-0.0100']]],
  ['a rapid down to the top', 'rapid-down', GROOVE, [['G0 Z0.0200', 'G0 Z0.0000']]],
  ['a late spindle', 'spindle', GROOVE, [['S16000 M3\n', ''], ['G0 Z0.0200', 'G0 Z0.0200\nS16000 M3']]],
  ['a spindle stopped in the wood', 'spindle', GROOVE, [['G0 Z0.7500\nM5', 'M5\nG0 Z0.7500']]],
  ['a spindle never stopped', 'spindle', GROOVE, [['M5\n', '']]],
  ['M3 though by hand', 'spindle', LINE, [['M0\n', 'M0\nM3\n']]],
  ['no speed', 'speed', GROOVE, [['S16000 ', '']]],
  ['a speed word though by hand', 'speed', LINE, [['M0\n', 'S16000\nM0\n']]],
  ['a stop not asked for', 'stop', GROOVE, [['M5\n', 'M0\nM5\n']]],
  ['by hand without a second stop', 'stop', LINE, [['OFF)\nM0', 'OFF)']]],
  ['by hand, the stop under the safe height', 'stop', LINE, [['M0\nG0 Z0.0200', 'G0 Z0.0200\nM0']]],
  ['two retracts', 'retract', GROOVE, [['G1 Y1.0000\n', 'G1 Y1.0000\nG1 Z0.0100\nG1 Z-0.0938\n']]],
  ['no retract', 'retract', GROOVE, [['G0 Z0.7500\nM5', 'M5']]],
  ['a steep ramp', 'ramp', GROOVE, [['X3.5550 Z-0.0938', 'X3.4000 Z-0.0938']]],
  ['a plunge', 'plunge', GROOVE, [['G1 X3.5550 Z-0.0938', 'G1 Z-0.0938']]],
  // What is left of the wood.
  ['the wall overcut by 0.001', 'outside', GROOVE, [[/Y1\.0000/g, 'Y1.0010']]],
  ['the wall overcut by 0.001 in the first pass only', 'outside', GROOVE, [['Y1.0000', 'Y1.0010']]],
  ['an arc that bulges out', 'outside', ROUND, [['G3 X117.000 Y20.000 I0.000 J3.000', 'G3 X117.000 Y20.000 I0.500 J2.500']]],
  ['0.001 too deep', 'deepest', GROOVE, [['Z-0.1875', 'Z-0.1885']]],
  ['0.0001 too deep', 'deepest', GROOVE, [['Z-0.1875', 'Z-0.1876']]],
  ['a corner cut short', 'uncut-wall', GROOVE, [[/G1 X17\.6250 F100\.0\nG1 Y1\.0000/g, 'G1 X17.6000 F100.0\nG1 X17.6250 Y0.7750\nG1 Y1.0000']]],
  ['the last ramp not cleaned', 'uncut-wall', GROOVE, [[/G1 Y0\.7500\nG1 X5\.3550\n/, 'G1 Y0.7500\n']]],
  ['a wall 0.001 short along a part of it', 'uncut-wall', GROOVE, [[/G1 X1\.3750\nG1 Y0\.7500\nG1 X5/, 'G1 X9.0000\nG1 Y0.9990\nG1 X5.0000\nG1 Y1.0000\nG1 X1.3750\nG1 Y0.7500\nG1 X5']]],
  ['a sliver of 0.002 in the middle', 'uncut-floor', WIDE, [[/G1 X6\.7750\n[\s\S]*?G1 Y0\.6000\n/, ''], ['Y0.7500\nG0 Z0.02', 'Y0.7520\nG0 Z0.02']]],
  ['the middle line left out', 'uncut-floor', WIDE, [['G1 X6.6250 F100.0\nG1 X1.3750\n', 'G1 X2.9750 Y0.6000 F100.0\n']]],
  ['a floor that is not flat', 'uncut-floor', WIDE, [['G1 X1.3750\nG1 X1.2250 Y0.6000', 'G1 X4.0000 Z-0.0615\nG1 X1.3750\nG1 X1.2250 Y0.6000 Z-0.0625'],
    ['G1 X6.6250 F100.0', 'G1 X6.6250 Z-0.0615 F100.0'], [/G1 X6\.7750\n[\s\S]*?G1 Y0\.6000\n/, '']]],
  ['no cut at the depth', 'uncut-floor', WIDE, [['G1 X6.6250 F100.0', 'G1 X6.6250 Z-0.0610 F100.0']]],
  ['0.001 too long', 'length', GROOVE, [], { length: 16.501 }],
  ['0.001 too narrow', 'width', GROOVE, [[/Y1\.0000/g, 'Y0.9990']]],
  ['a wrong stop margin', 'stop-margin', GROOVE, [], { stopMargin: 1.251 }],
  ['zero at the wrong place', 'stop-margin', GROOVE, [], { workZero: 'centre' }],
  ['a pass too deep by 0.001', 'too-deep', GROOVE, [[/Z-0\.0938/, 'Z-0.0948'], ['X3.5550 Z', 'X3.5600 Z']]],
  ['the stepdown 0.001 less', 'too-deep', GROOVE, [], { stepdown: 0.0928 }],
  ['the second ramp before the first is cleaned', 'too-deep', LINE, [['X-0.2750 Z-0.0625 F60.0\nG1 X-1.8750 F100.0\nG1 X1.8750\n', 'X-0.2750 Z-0.0625 F60.0\nG1 X1.8750 F100.0\n'],
    ['G1 X0.6750 Z-0.1250', 'G1 X-1.8750 F100.0\nG1 X0.6750 Z-0.1250']], { stepdown: 0.0500 }],
  ['two plunges, each within the stepdown, then along', 'too-deep', WIDE, [['G1 X2.9750 Z-0.0625 F60.0', 'G1 Z-0.0300 F60.0\nG1 Z-0.0625']], { stepdown: 0.04 }],
  ['a finish lap beyond the cutting length', 'cutting-length', ROUND, [], { cuttingLength: 2.5, stepdown: 2.4 }],
  ['a climb lap though conventional was asked for', 'direction', GROOVE, [], { direction: 'conventional' }],
  ['laps the wrong way round', 'direction', GROOVE, OTHER_WAY],
  ['a finish lap that is missing', 'finish-lap', ROUND, [[/G1 Y17\.000\n[\s\S]*?G0 Z18/, 'G0 Z18']]],
  ['a finish lap clockwise', 'finish-lap', ROUND, [[/G1 X114\.000\nG3 X117[\s\S]*?G0 Z18/, `G1 X26.000
G2 X23.000 Y20.000 I0.000 J3.000
G2 X26.000 Y23.000 I3.000 J0.000
G1 X114.000
G2 X117.000 Y20.000 I0.000 J-3.000
G2 X114.000 Y17.000 I-3.000 J0.000
G1 X93.000
G0 Z18`]]],
  ['roughing on the wall', 'finish-lap', ROUND, [[/G1 X93\.000 Z-3\.000/, 'G1 X60.000 Y17.000 Z-1.500\nG1 X93.000 Y18.000 Z-3.000']]],
];

describe('programs with one thing wrong', () => {
  it.each(CASES.map(one => ({ one, name: one[0], rule: one[1] })))('$name: $rule', ({ one: [, rule, sample, edits, spec = {}, options = {}] }) => {
    expect(rulesOf(changed(sample.program, ...edits), { ...sample.spec, ...spec }, options)).toContain(rule);
  });

  it('fires every rule', () => {
    expect(RULES.filter(rule => !CASES.some(one => one[1] === rule))).toEqual([]);
  });
});

describe('cut length', () => {
  it('is the length of the feed moves under the top', () => {
    // 0.0938 / 0.1138 of hypot(2.18, 0.1138), two laps of 33 in less what each ramp replaces, the second ramp.
    const first = Math.hypot(2.18, 0.1138) * 0.0938 / 0.1138;
    const second = Math.hypot(1.8, 0.0937);
    expect(cutLength(GROOVE.program)).toBeCloseTo(first + second + 2 * 33, 6);
  });

  it('has the bound of its regime', () => {
    expect(cutLengthBound(GROOVE.spec)).toEqual({ regime: 'up to two bits', passes: 2, bound: 2 * 2 * (16.25 + 0.25), limit: 1.06 });
    const line = cutLengthBound(LINE.spec);
    expect([line.regime, line.passes, line.bound]).toEqual(['one bit', 2, 7.5]);
    expect(line.limit).toBeCloseTo(1.02 + 2 * 0.0625 / Math.tan(Math.PI / 60) / 3.75, 12);
    const wide = cutLengthBound(WIDE.spec);
    expect([wide.regime, wide.passes]).toEqual(['wider', 1]);
    expect(wide.bound).toBeCloseTo((4.5 - (4 - Math.PI) / 64) / 0.1, 12);
  });
});
