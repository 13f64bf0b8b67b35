import { FIELDS } from '#shared/slot/fields';
import type { CountKey, PickKey, RateKey, SizeKey } from './draft';

/** One line of "More settings": a box, or a choice. `unit` is what stands behind a box. */
export type Setting =
  | { readonly kind: 'box'; readonly field: SizeKey | RateKey | CountKey; readonly words: string; readonly unit: 'length' | 'perMinute' | 'perSecond2' | string; readonly help: string }
  | { readonly kind: 'pick'; readonly field: PickKey; readonly words: string; readonly standard: string; readonly choices: readonly (readonly [string, string])[]; readonly help: string };

const source = (field: keyof typeof FIELDS) => `If left open: ${FIELDS[field].defaultSource ?? ''}.`;
const box = (field: SizeKey | RateKey | CountKey, words: string, unit: string, help: string): Setting => ({ kind: 'box', field, words, unit, help });
const pick = (field: PickKey, words: string, standard: string, choices: readonly (readonly [string, string])[], help: string): Setting =>
  ({ kind: 'pick', field, words, standard, choices, help });
const onOff = (on: string, off: string) => [['true', on], ['false', off]] as const;

/** Everything that has a default, by what it belongs to. */
export const SETTINGS: readonly { readonly name: string; readonly settings: readonly Setting[] }[] = [
  {
    name: 'Wood and cut',
    settings: [
      pick('wood', 'Wood', 'hardwood', [['white-oak', 'white oak'], ['walnut', 'walnut'], ['cherry', 'cherry'], ['poplar', 'poplar'], ['pine', 'pine'], ['softwood', 'softwood'], ['plywood', 'plywood'], ['mdf', 'MDF']], source('wood')),
      pick('ends', 'Ends', 'cornered', [['round', 'full round']], source('ends')),
      box('rampAngle', 'Steepest entry', '°', source('rampAngle')),
      box('stepover', 'Stepover, share of the bit', '', source('stepover')),
      box('finishAllowance', 'Finish allowance', 'length', source('finishAllowance')),
      pick('direction', 'Direction', 'climb', [['conventional', 'conventional']], source('direction')),
    ],
  },
  {
    name: 'Bit',
    settings: [
      pick('bitKind', 'Kind', 'straight', [['upcut', 'upcut'], ['downcut', 'downcut'], ['compression', 'compression']], source('bitKind')),
      pick('centreCutting', 'Cuts at its centre', 'no', [['true', 'yes']], source('centreCutting')),
      box('cuttingLength', 'Cutting length', 'length', source('cuttingLength')),
      box('stickout', 'Bit showing below the nut', 'length', source('stickout')),
      box('colletDiameter', 'Collet nut, across', 'length', source('colletDiameter')),
      box('chipLoadRange.0', "Maker's least chip load", 'length', source('chipLoadRange')),
      box('chipLoadRange.1', "Maker's greatest chip load", 'length', source('chipLoadRange')),
    ],
  },
  {
    name: 'Holding and zero',
    settings: [
      box('clampHeight', 'Clamps stand above the rail', 'length', source('clampHeight')),
      box('clampReach', 'Clamps reach in from each end', 'length', source('clampReach')),
      box('safeHeight', 'Safe height', 'length', source('safeHeight')),
      pick('workZero', 'Work zero', 'front left corner', [['centre', "middle of the rail's top"]], `${source('workZero')} Z zero is the rail's top.`),
      pick('spindle', 'Spindle switched by', 'the program', [['hand', 'hand, at two stops']], source('spindle')),
    ],
  },
  {
    name: 'Machine',
    settings: [
      box('machine.travel.x', 'Travel along X', 'length', 'If left open: travel is not measured. Give all three.'),
      box('machine.travel.y', 'Travel along Y', 'length', 'If left open: travel is not measured. Give all three.'),
      box('machine.travel.z', 'Travel along Z', 'length', 'If left open: travel is not measured. Give all three.'),
      box('machine.topFeed', 'Top feed', 'perMinute', 'If left open: feeds are not capped.'),
      box('machine.acceleration', 'Acceleration', 'perSecond2', "If left open: a light machine's, and the time says so."),
      box('machine.spindleRange.0', 'Slowest spindle speed', 'rev/min', 'If left open: any speed is taken. Give both.'),
      box('machine.spindleRange.1', 'Fastest spindle speed', 'rev/min', 'If left open: any speed is taken. Give both.'),
      pick('machine.heavy', 'Industrial frame', 'no', [['true', 'yes']], 'If left open: the chip loads of a light machine.'),
    ],
  },
  {
    name: 'Program text',
    settings: [
      pick('options.lineNumbers', 'Line numbers', 'off', [['true', 'on']], 'If left open: off, since controllers differ in how many digits they take.'),
      pick('options.lineEndings', 'Line endings', 'LF', [['crlf', 'CR LF']], 'If left open: LF.'),
      pick('options.percent', '% before and after', 'on', [onOff('on', 'off')[1]], 'If left open: on, both or neither.'),
      pick('options.comments', 'Comments', 'on', [onOff('on', 'off')[1]], 'If left open: on. Off leaves out the header, mark and cautions.'),
      pick('options.speedWord', 'S word', 'on', [onOff('on', 'off')[1]], 'If left open: on. Off where a dial sets the speed.'),
      pick('options.spindleWait', 'Wait after spindle start', 'none', [['seconds', 'G4 P in seconds'], ['milliseconds', 'G4 P in milliseconds']], 'If left open: none.'),
      pick('options.end', 'Last word', 'M30', [['M2', 'M2']], 'If left open: M30.'),
      pick('options.programUnits', "Program's units", "the drawing's", [['in', 'inches, G20'], ['mm', 'millimetres, G21']], "If left open: the drawing's. Others are converted once, in the writer."),
      box('options.chordTolerance', 'Arcs as chords within', 'length', 'If left open or 0: arcs stay arcs.'),
    ],
  },
];
