import { z } from 'zod';
import { LENGTH_HELP, type WrittenLength, formatDecimal, lengthIn, parseLength } from '../measure/length';
import { UNITS, byUnits } from '../measure/units';
import { CONTROL, capital, objectError, quote } from '../measure/messages';
import { DEFAULT_OPTIONS, type ProgramOptions, programOptionsSchema } from '../program/options';
import { WOODS } from '../wood/woods';
import { type GivenSpec, fillDefaults } from './defaults';
import { FIELDS } from './fields';
import { findProblems } from './rules';
import { BIT_KINDS, DIRECTIONS, ENDS, LENGTH_FIELDS, SPINDLE_CONTROLS, type SlotSpec, WORK_ZEROS } from './spec';

/** A slot as asked for, every size filled in: what the planner, the readback and the answer work from. */
export interface SlotRequest {
  readonly spec: SlotSpec;
  readonly options: ProgramOptions;
  /** Fields that stand at their default. */
  readonly assumed: readonly (keyof SlotSpec)[];
  /** What was converted on the way in, in words: `Slot width: 9 mm is 0.3543 in.` */
  readonly notes: readonly string[];
}

const missing = (field: keyof SlotSpec, help: string) => (issue: { readonly input?: unknown }) =>
  issue.input === undefined
    ? `${capital(FIELDS[field].words)} is missing. ${help}`
    : `${capital(FIELDS[field].words)} is ${quote(issue.input)}. ${help}`;

/** A length: a number in the spec's units, or text in the trade's notation. */
const size = (field: keyof SlotSpec) =>
  z
    .union([z.number(), z.string()], { error: missing(field, LENGTH_HELP) })
    .transform((value, context): WrittenLength => {
      if (typeof value === 'number') return { value, units: null };
      const written = parseLength(value);
      if (written) return written;
      context.addIssue({ code: 'custom', message: `${capital(FIELDS[field].words)} is ${quote(value)}. That is not a size we can read. ${LENGTH_HELP}` });
      return z.NEVER;
    });

const figure = (field: keyof SlotSpec, least: number, most: number, what: string) => {
  const help = `Use ${least} to ${most} ${what}.`;
  return z.number({ error: missing(field, help) }).min(least, { error: missing(field, help) }).max(most, { error: missing(field, help) });
};

const choice = <const Values extends readonly [string, ...string[]]>(field: keyof SlotSpec, values: Values) =>
  z.enum(values, { error: missing(field, `Use ${values.join(' or ')}.`) });

const limit = (what: string, most: number) => z.number({ error: `Give ${what} as a number.` }).positive({ error: `Give ${what} as a number above 0.` }).max(most, { error: `Give ${what} as ${most} or less.` });

const machineSchema = z.strictObject({
  travel: z.strictObject({ x: limit('travel along X', 1e5), y: limit('travel along Y', 1e5), z: limit('travel along Z', 1e5) }, { error: objectError('travel as x, y and z') }).optional(),
  topFeed: limit('the top feed', 1e5).optional(),
  acceleration: limit('the acceleration', 1e6).optional(),
  spindleRange: z.tuple([limit('the lowest spindle speed', 1e5), limit('the highest spindle speed', 1e5)], { error: 'Give the spindle range as two numbers, lowest then highest.' })
    .refine(([low, high]) => low <= high, { error: 'Give the spindle range as lowest, then highest.' }).optional(),
  heavy: z.boolean({ error: 'Give heavy as true or false.' }).optional(),
}, { error: objectError('the machine as an object with travel, topFeed, acceleration, spindleRange or heavy') });

/** A name goes into the program's header and its file name; longer ones would not fit a line there. */
const LONGEST_NAME = 60;

const shape = {
  units: choice('units', UNITS),
  name: z.string({ error: missing('name', 'Give it as text.') })
    .max(LONGEST_NAME, { error: `The name is too long. Use ${LONGEST_NAME} characters or fewer.` })
    .refine((name) => !CONTROL.test(name), { error: 'The name holds a control character. Use plain text on one line.' }).optional(),
  length: size('length'),
  width: size('width'),
  depth: size('depth'),
  stopMargin: size('stopMargin'),
  bitDiameter: size('bitDiameter'),
  stepdown: size('stepdown'),
  railWidth: size('railWidth').optional(),
  railThickness: size('railThickness').optional(),
  ends: choice('ends', ENDS).optional(),
  wood: choice('wood', WOODS).optional(),
  flutes: figure('flutes', 1, 8, 'flutes').int({ error: missing('flutes', 'Use a whole number.') }).optional(),
  spindleSpeed: figure('spindleSpeed', 1000, 60000, 'rev/min').optional(),
  feed: figure('feed', 1, 50000, 'units a minute').optional(),
  plungeFeed: figure('plungeFeed', 0.5, 50000, 'units a minute').optional(),
  rampAngle: figure('rampAngle', 0.5, 10, 'degrees').optional(),
  stepover: figure('stepover', 0.05, 0.5, "of the bit's diameter").optional(),
  finishAllowance: size('finishAllowance').optional(),
  direction: choice('direction', DIRECTIONS).optional(),
  cuttingLength: size('cuttingLength').optional(),
  bitKind: choice('bitKind', BIT_KINDS).optional(),
  centreCutting: z.boolean({ error: missing('centreCutting', 'Use true or false.') }).optional(),
  chipLoadRange: z.tuple([limit('the least chip load', 10), limit('the greatest chip load', 10)], { error: missing('chipLoadRange', 'Use two numbers, least then most.') })
    .refine(([least, most]) => least < most, { error: 'Give the chip load range as least, then most.' }).nullable().optional(),
  colletDiameter: size('colletDiameter').optional(),
  stickout: size('stickout').optional(),
  clampHeight: size('clampHeight').optional(),
  clampReach: size('clampReach').optional(),
  safeHeight: size('safeHeight').optional(),
  workZero: choice('workZero', WORK_ZEROS).optional(),
  spindle: choice('spindle', SPINDLE_CONTROLS).optional(),
  machine: machineSchema.nullable().optional(),
  options: programOptionsSchema.optional(),
};

type Shape = z.output<z.ZodObject<typeof shape>>;

/** The spec in its own units, defaults filled; a field in `unreadable` is left to its default, a size becomes NaN, which no rule's comparison meets. */
function fill(value: Shape, unreadable: ReadonlySet<PropertyKey>): SlotSpec {
  const units = unreadable.has('units') ? 'in' : value.units;
  const given: Record<string, unknown> = { ...value, units };
  for (const field of unreadable) if (typeof field === 'string') given[field] = undefined;
  for (const field of LENGTH_FIELDS) {
    const written = value[field];
    if (unreadable.has(field) || unreadable.has('units')) given[field] = NaN;
    else given[field] = written && lengthIn(units, written);
  }
  return fillDefaults(given as unknown as GivenSpec);
}

/** Nothing unreadable. */
const NONE: ReadonlySet<PropertyKey> = new Set();

/** The spec that the rules saw of a request is the one it becomes: filled once. */
const filled = new WeakMap<object, SlotSpec>();

function conversions(value: Shape): string[] {
  return LENGTH_FIELDS.flatMap((field) => {
    const written = value[field];
    if (!written?.units || written.units === value.units) return [];
    const here = formatDecimal(lengthIn(value.units, written), value.units);
    return [`${capital(FIELDS[field].words)}: ${written.value} ${written.units} is ${here} ${value.units}.`];
  });
}

const fieldNames = Object.keys(FIELDS) as readonly (keyof SlotSpec)[];

/**
 * The one request that makes a program: a slot spec (spec.ts; fields and defaults in fields.ts) and program options.
 *
 * Lengths are numbers in `units` or text in the trade's notation. Parsing answers a `SlotRequest`, or every problem
 * at once: each issue's path names the field, its message the value and what would work.
 */
export const slotRequestSchema = z
  .strictObject(shape, {
    error: objectError('one JSON object with the slot spec'),
  })
  .superRefine(
    (value, context) => {
      if (context.issues.some((issue) => issue.code === 'invalid_type' && !issue.path?.length)) return;
      const unreadable = new Set(context.issues.map((issue) => issue.path?.[0] ?? ''));
      const spec = fill(value, unreadable);
      filled.set(value, spec);
      for (const { field, message } of findProblems(spec, value.options?.chordTolerance)) {
        context.addIssue({ code: 'custom', path: [field], message });
      }
      const most = byUnits(value.units, 0.0005, 0.01); // the finished slot is the asked one to within this
      if ((value.options?.chordTolerance ?? 0) > most) {
        context.addIssue({ code: 'custom', path: ['options', 'chordTolerance'], message: `The chord tolerance is ${value.options?.chordTolerance}. Use ${most} ${value.units} or less.` });
      }
    },
    // Also where some fields could not be read: everything wrong is said at once.
    { when: () => true },
  )
  .transform((value): SlotRequest => ({
    spec: filled.get(value) ?? fill(value, NONE),
    options: value.options ?? DEFAULT_OPTIONS,
    assumed: fieldNames.filter((field) => value[field] === undefined),
    notes: conversions(value),
  }));

/** What may be posted. */
export type SlotRequestInput = z.input<typeof slotRequestSchema>;
