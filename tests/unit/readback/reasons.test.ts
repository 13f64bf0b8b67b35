import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { Finding, RuleName } from '#shared/readback/finding';
import { readBack } from '#shared/readback/readBack';
import { readProgram } from '#shared/reader/index';
import type { SlotSpec } from '#shared/slot/spec';
import { asked } from '../slot/asking';

const fixture = (file: string) => readFileSync(new URL(`../../../fixtures/refused/${file}`, import.meta.url), 'utf8');
const SOUND = fixture('sound.nc');
const { spec: SPEC } = asked(JSON.parse(fixture('sound.json')) as object);

/** Replaces text that must be there, so that a case cannot pass by changing nothing. */
function changed(edits: readonly (readonly [string | RegExp, string])[]): string {
  return edits.reduce((text, [from, to]) => {
    const after = text.replace(from, to);
    if (after === text) throw new Error(`the program has no ${String(from)}`);
    return after;
  }, SOUND);
}

function findingOf(rule: RuleName, edits: readonly (readonly [string | RegExp, string])[], spec: Partial<SlotSpec> = {}): Finding | undefined {
  const read = readProgram(changed(edits));
  if (!read.ok) throw new Error(read.error.reason);
  return readBack(read.program, { ...SPEC, ...spec }, false).findings.find((finding) => finding.rule === rule);
}

type Case = readonly [what: string, rule: RuleName, severity: string, reason: string | null, edits: readonly (readonly [string | RegExp, string])[], spec?: Partial<SlotSpec>];

const BY_HAND: readonly (readonly [string, string])[] = [['S16000 M3', 'M0'], ['\nM5\n', '\nM0\n']];

const CASES: readonly Case[] = [
  ['M3 left out', 'spindle', 'disagrees', 'stopped', [['S16000 M3', 'S16000']]],
  ['M3 only once the bit is down', 'spindle', 'disagrees', 'stopped', [['S16000 M3\n', 'S16000\n'], ['G1 X3.5550 Z-0.0938', 'M3\nG1 X3.5550 Z-0.0938']]],
  ['the retract and M5 in one block (NISTIR 6556 Table 8: M5 comes first)', 'spindle', 'disagrees', 'changesLow', [['G0 Z0.7500\nM5', 'G0 Z0.7500 M5']]],
  ['a spindle that turns backwards', 'spindle', 'disagrees', 'backwards', [['M3', 'M4']]],
  ['a stop in the wood', 'spindle', 'disagrees', 'stopsLow', [['G1 X5.3550 Z-0.1875', 'M0\nG1 X5.3550 Z-0.1875']]],
  ['a spindle switched by hand', 'spindle', 'not measured', 'byHand', BY_HAND, { spindle: 'hand' }],
  ['by hand without the second stop', 'spindle', 'disagrees', 'noStop', [['S16000 M3', 'M0'], ['M5\n', '']], { spindle: 'hand' }],
  ['by hand without the first stop', 'spindle', 'disagrees', 'noStop', [['S16000 M3\n', ''], ['\nM5\n', '\nM0\nM0\n']], { spindle: 'hand' }],
  ['by hand, and M3 all the same', 'spindle', 'disagrees', 'byProgram', [], { spindle: 'hand' }],
  ['no S word', 'spindleSpeed', 'not measured', 'noWord', [['S16000 M3', 'M3']]],
  ['a speed changed on the way', 'spindleSpeed', 'disagrees', null, [['G1 X5.3550 Z-0.1875', 'S12000\nG1 X5.3550 Z-0.1875']]],
  ['no machine given', 'travel', 'not measured', 'noMachine', [], { machine: null }],
  ['no travel given', 'travel', 'not measured', 'noMachine', [], { machine: { topFeed: 200 } }],
  ['a plunge with a bit that cuts at its centre', 'entry', 'caution', 'plunge', [['G1 X3.5550 Z-0.0938 F60.0', 'G1 Z-0.0938\nG1 X3.5550 F60.0']], { centreCutting: true }],
  ['a plunge with one that does not', 'entry', 'disagrees', 'plungeWithoutCentre', [['G1 X3.5550 Z-0.0938 F60.0', 'G1 Z-0.0938\nG1 X3.5550 F60.0']]],
  ['a rapid down into the wood', 'rapids', 'disagrees', 'intoWood', [['G1 Z0.0200 F25.0', 'G0 Z-0.0200']]],
  ['a rapid along the slot in the wood', 'rapids', 'disagrees', null, [['G1 X17.6250 F100.0\nG1 Y1.0000', 'G0 X17.6250\nG1 Y1.0000 F100.0']]],
  ['an end in the wood', 'end', 'disagrees', null, [['G0 Z0.7500\nM5', 'M5']]],
  ['an end below the safe height', 'end', 'disagrees', null, [['G0 Z0.7500\nM5', 'G0 Z0.5000\nM5']]],
  ['a cut before any feed', 'feed', 'disagrees', 'noFeed', [['Z0.0200 F25.0', 'Z0.0200'], ['Z-0.0938 F60.0', 'Z-0.0938']]],
  ["a feed above the machine's", 'feed', 'disagrees', null, [], { feed: 100, machine: { topFeed: 90 } }],
  ['too light a chip', 'chipLoad', 'caution', 'rubs', [], { flutes: 4 }],
  ['too heavy a chip', 'chipLoad', 'caution', 'heavy', [], { flutes: 1 }],
  ["the bit maker's own chip load", 'chipLoad', 'agrees', "the bit's maker", [], { chipLoadRange: [0.002, 0.004] }],
  ['a chip load outside it', 'chipLoad', 'caution', 'rubs', [], { chipLoadRange: [0.004, 0.006] }],
  ['units left out', 'modes', 'disagrees', null, [['G20\n', '']]],
  ['increments in the middle', 'modes', 'disagrees', null, [['G1 X5.3550 Z-0.1875', 'G91\nG1 X1.8000 Z-0.0937'], ['G1 X17.6250 F100.0\nG1 Y1.0000\nG1 X1.3750\nG1 Y0.7500\nG1 X5.3550\nG0', 'G90\nG1 X17.6250 F100.0\nG1 Y1.0000\nG1 X1.3750\nG1 Y0.7500\nG1 X5.3550\nG0']]],
  ['a first motion below the safe height', 'start', 'disagrees', null, [['G0 Z0.7500', 'G0 Z0.6000']]],
  ['a first motion along all axes at once', 'start', 'disagrees', null, [['G0 Z0.7500\n', 'G0 X1.3750 Y0.7500 Z0.7500\n']]],
  ['a first motion above the safe height', 'start', 'agrees', null, [['G0 Z0.7500', 'G0 Z1.0000']]],
  ['a bit wider than the slot by 0.005', 'width', 'disagrees', null, [], { width: 0.495 }],
  ['cut deeper than the flutes are long in one go', 'cuttingLength', 'disagrees', null, [], { cuttingLength: 0.09 }],
  ['the last ramp not cleaned', 'cleared', 'disagrees', null, [['G1 X5.3550\nG0', 'G0']]],
  ['a wall left standing along a part of it', 'cleared', 'disagrees', null, [['G1 Y1.0000\nG1 X1.3750\nG1 Y0.7500\nG1 X5', 'G1 Y1.0000\nG1 X9.0000\nG1 Y0.9990\nG1 X8.0000\nG1 Y1.0000\nG1 X1.3750\nG1 Y0.7500\nG1 X5']]],
  ['a nut that comes down beside the clamps', 'nut', 'agrees', 'beside', [], { stickout: 0.6 }],
  ['a nut that comes down on them', 'nut', 'disagrees', 'beside', [], { stickout: 0.6, clampReach: 0.8 }],
];

describe('why a rule says what it says', () => {
  it.each(CASES.map((one) => ({ what: one[0], one })))('$what', ({ one: [, rule, severity, reason, edits, spec] }) => {
    const finding = findingOf(rule, edits, spec);
    expect([finding?.severity, finding?.reason]).toEqual([severity, reason]);
  });
});

describe('a one-bit slot', () => {
  const line = `G20\nG17 G40 G49 G54 G80 G90 G94\nG0 Z0.7500\nS16000 M3\nG0 X1.3750 Y0.8750\nG1 Z0.0200 F25.0\nG1 X3.5550 Z-0.0938 F60.0\nG1 X1.3750 F100.0\nG1 X17.6250\nG0 Z0.7500\nM5\nM30\n`;
  const measured = (width: number) => {
    const read = readProgram(line);
    return read.ok ? readBack(read.program, { ...SPEC, width, depth: 0.0938 }, false) : null;
  };

  it.each([[0.25, 'agrees', null], [0.2504, 'agrees', null], [0.253, 'caution', 'oneBit'], [0.247, 'caution', 'oneBit'], [0.255, 'caution', 'oneBit'], [0.256, 'disagrees', null]])(
    'asked %d wide with a quarter-inch bit: %s', (width, severity, reason) => {
      const finding = measured(width)?.findings.find(({ rule }) => rule === 'width');
      expect([finding?.severity, finding?.reason]).toEqual([severity, reason]);
      expect(finding?.measured).toBeCloseTo(0.25, 9);
    });

  it('has no direction of laps', () => {
    expect(measured(0.25)?.findings.some(({ rule }) => rule === 'laps')).toBe(false);
  });
});
