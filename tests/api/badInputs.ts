import { RAIL } from './support';

/** What is sent, and the paths that have to be named. */
export interface BadInput {
  readonly what: string;
  /** Fields put in place of the good rail's; text is sent as it is. */
  readonly send: Readonly<Record<string, unknown>> | string;
  readonly paths: readonly string[];
}

const lengths = ['length', 'width', 'depth', 'stopMargin', 'bitDiameter', 'stepdown', 'railWidth', 'railThickness', 'cuttingLength', 'colletDiameter', 'stickout', 'clampHeight', 'clampReach', 'safeHeight', 'finishAllowance'] as const;
const figures = ['flutes', 'spindleSpeed', 'feed', 'plungeFeed', 'rampAngle', 'stepover'] as const;
const choices = ['units', 'ends', 'wood', 'direction', 'bitKind', 'workZero', 'spindle'] as const;
const required = ['units', 'length', 'width', 'depth', 'stopMargin', 'bitDiameter', 'stepdown'] as const;

/** The good rail with one field written into its JSON by hand: 1e999 is JSON and no JavaScript value is written so. */
const raw = (field: string, text: string) => JSON.stringify({ ...RAIL, [field]: '@' }).replace('"@"', text);
const nested = (depth: number) => '['.repeat(depth) + ']'.repeat(depth);

const each = (fields: readonly string[], what: string, value: unknown): BadInput[] =>
  fields.map((field) => ({ what: `${field} ${what}`, send: { [field]: value }, paths: [field] }));

export const BAD_INPUTS: readonly BadInput[] = [
  // No number, or none that a size can be.
  ...each(lengths, 'NaN in words', 'NaN'),
  ...each(lengths, 'negative', -1),
  ...lengths.slice(0, 6).map((field) => ({ what: `${field} infinite`, send: raw(field, '1e999'), paths: [field] })),
  ...lengths.slice(0, 6).map((field) => ({ what: `${field} negative and infinite`, send: raw(field, '-1e999'), paths: [field] })),
  ...each(lengths.slice(0, 6), 'zero', 0),
  ...each(lengths.slice(0, 6), 'beyond any board', 1e6),
  ...each(['length'], 'null', null),
  ...each(['length'], 'true', true),
  ...each(['length'], 'an array', [24.5]),
  ...each(['length'], 'an object', { value: 24.5 }),
  ...each(['length'], 'an object that is no text', { toString: 1, valueOf: 1 }),
  ...each(['length'], 'empty text', ''),
  ...each(['length'], 'half read', '24.5abc'),
  ...each(['length'], 'an expression', '24+1/2'),
  ...each(['length'], 'over nothing', '24 1/0'),
  ...each(['length'], 'signed text', '-24'),
  ...each(['length'], 'in feet', '2 ft'),
  ...each(['length'], 'in hexadecimal', '0x18'),
  ...each(['length'], 'with a comma', '24,5'),
  ...each(['length'], 'in figures of another script', '٢٤'),
  ...each(['length'], 'very long text', '9'.repeat(5000)),
  { what: 'length nested deeply', send: raw('length', nested(20_000)), paths: ['length'] },
  ...each(figures, 'as text', '100'),
  ...each(figures, 'negative', -5),
  ...figures.map((field) => ({ what: `${field} infinite`, send: raw(field, '1e999'), paths: [field] })),
  ...each(['flutes'], 'a fraction', 2.5),
  ...each(['stepover'], 'above a half', 0.6),
  ...each(['rampAngle'], 'straight down', 90),
  // Words that are not among those offered.
  ...each(choices, 'unknown', 'furlong'),
  ...each(choices, 'a number', 7),
  ...each(['units'], 'in capitals', 'IN'),
  ...each(['wood'], 'an object that is no text', { toString: 1 }),
  ...each(['centreCutting'], 'as text', 'yes'),
  ...required.map((field) => ({ what: `${field} missing`, send: { [field]: undefined }, paths: [field] })),
  // Names.
  ...each(['name'], 'huge', 'A'.repeat(61)),
  ...each(['name'], 'enormous', 'A'.repeat(50_000)),
  ...each(['name'], 'with a line feed', 'Rail\nG0 Z-9'),
  ...each(['name'], 'with a carriage return', 'Rail\rA'),
  ...each(['name'], 'with a null', 'Rail\u0000A'),
  ...each(['name'], 'with an escape', 'Rail\u001b[2J'),
  ...each(['name'], 'with a line separator', 'Rail\u2028A'),
  ...each(['name'], 'a number', 5),
  // Keys that are not fields.
  { what: 'a misspelt field', send: { lenght: 3 }, paths: ['lenght'] },
  { what: 'several unknown fields', send: { one: 1, two: 2 }, paths: ['one', 'two'] },
  { what: 'a field in other case', send: { Length: 3 }, paths: ['Length'] },
  { what: '__proto__', send: raw('x', '1').replace('"x"', '"__proto__"'), paths: ['__proto__'] },
  { what: '__proto__ that would fill a field in', send: JSON.stringify({ ...RAIL, length: undefined }).replace('{', '{"__proto__":{"length":24.5},'), paths: ['__proto__', 'length'] },
  { what: '__proto__ with escapes', send: raw('x', '{"feed":1}').replace('"x"', '"__\\u0070roto__"'), paths: ['__proto__'] },
  { what: 'constructor', send: { constructor: { prototype: { feed: 1 } } }, paths: ['constructor'] },
  { what: 'an unknown key of machine', send: { machine: { speed: 1 } }, paths: ['machine.speed'] },
  { what: '__proto__ of machine', send: raw('machine', '{"__proto__":{"topFeed":1}}'), paths: ['machine.__proto__'] },
  { what: 'an unknown option', send: { options: { coolant: true } }, paths: ['options.coolant'] },
  // Machine and options.
  { what: 'machine as text', send: { machine: 'mine' }, paths: ['machine'] },
  { what: 'negative travel', send: { machine: { travel: { x: -1, y: 32, z: 4 } } }, paths: ['machine.travel.x'] },
  { what: 'a spindle range upside down', send: { machine: { spindleRange: [20000, 8000] } }, paths: ['machine.spindleRange'] },
  { what: 'a file ending with a path', send: { options: { fileEnding: '../x' } }, paths: ['options.fileEnding'] },
  { what: 'chords of a negative tolerance', send: { options: { chordTolerance: -1 } }, paths: ['options.chordTolerance'] },
  { what: 'programs in furlongs', send: { options: { programUnits: 'furlong' } }, paths: ['options.programUnits'] },
  // Readable, and impossible or dangerous.
  { what: 'a bit wider than the slot', send: { bitDiameter: 0.5 }, paths: ['bitDiameter'] },
  { what: 'a slot shorter than wide', send: { length: 0.3 }, paths: ['length'] },
  { what: 'a slot through the rail', send: { depth: 0.75 }, paths: ['depth'] },
  { what: 'a floor too thin', send: { depth: 0.7 }, paths: ['depth'] },
  { what: 'walls too thin', send: { railWidth: 0.4 }, paths: ['railWidth'] },
  { what: 'a stepdown beyond the cutting length', send: { cuttingLength: 0.05 }, paths: ['stepdown'] },
  { what: 'a stepdown beyond what the wood takes', send: { stepdown: 0.2 }, paths: ['stepdown'] },
  { what: 'a stop margin that stops no coin', send: { stopMargin: 0.1 }, paths: ['stopMargin'] },
  { what: 'a safe height under the clamps', send: { clampHeight: 0.5, safeHeight: 0.3 }, paths: ['safeHeight'] },
  { what: 'a finish allowance wider than the slot leaves', send: { finishAllowance: 0.2 }, paths: ['finishAllowance'] },
  { what: 'millimetres called inches', send: { units: 'in', length: 622.3, width: 9.5, depth: 4.8, bitDiameter: 6.35 }, paths: ['length'] },
  { what: 'inches called millimetres', send: { units: 'mm' }, paths: ['stopMargin'] },
  { what: 'more blocks than any controller holds', send: { stepdown: 0.01, depth: 0.6, railThickness: 0.75, width: 24, railWidth: 30, length: 200, bitDiameter: 0.02, stepover: 0.05, cuttingLength: 0.6 }, paths: [] },
  // Everything wrong at once.
  { what: 'an empty object', send: '{}', paths: required },
  { what: 'three fields at once', send: { length: 'long', feed: -1, wood: 'balsa' }, paths: ['length', 'feed', 'wood'] },
  { what: 'an unreadable and an impossible size', send: { length: 'long', bitDiameter: 0.5 }, paths: ['length', 'bitDiameter'] },
  // JSON, and not an object.
  ...['[]', 'null', 'true', '42', '"24.5"', '[{}]', nested(30_000)].map((send) => ({ what: `the body ${send.slice(0, 12)}`, send, paths: [''] })),
];
