import { z } from 'zod';
import { objectError } from '../measure/messages';
import { UNITS } from '../measure/units';

const FILE_ENDING_HELP = 'Give the file ending as one to five letters or digits, such as nc.';

const yesNo = (what: string, standard: boolean) => z.boolean({ error: `Give ${what} as true or false.` }).default(standard);
const oneOf = <const Values extends readonly [string, ...string[]]>(what: string, values: Values) =>
  z.enum(values, { error: `Give ${what} as ${values.join(' or ')}.` });

/**
 * How the text is written: each at the form that any three-axis controller takes unless the shop's own asks otherwise.
 * What differs between controllers, and why these defaults are read alike by all, stands in tests/standards/dialects.
 */
export const programOptionsSchema = z.strictObject({
  /** N words: off, since controllers differ in how many digits they take. */
  lineNumbers: yesNo('line numbers', false),
  /** 0 writes arcs; more writes chords that stray from the arc by at most this, in the drawing's units. */
  chordTolerance: z.number({ error: 'Give the chord tolerance as a number.' }).min(0, { error: 'Give the chord tolerance as 0 or more.' })
    .max(0.01, { error: 'Give the chord tolerance as 0.0005 in or 0.01 mm at most.' }).default(0),
  lineEndings: oneOf('the line endings', ['lf', 'crlf']).default('lf'),
  /** A % line before and after the program (NISTIR 6556 3.1: both or neither). */
  percent: yesNo('percent', true),
  comments: yesNo('comments', true),
  /** The S word, for machines whose spindle speed is set by a dial. */
  speedWord: yesNo('the speed word', true),
  /** A wait after the spindle starts: G4 P counts seconds in NISTIR 6556 and milliseconds on some controllers. */
  spindleWait: oneOf('the wait after the spindle starts', ['none', 'seconds', 'milliseconds']).default('none'),
  end: oneOf('the end', ['M30', 'M2']).default('M30'),
  fileEnding: z.string({ error: FILE_ENDING_HELP }).regex(/^[a-z0-9]{1,5}$/i, { error: FILE_ENDING_HELP }).default('nc'),
  /** Null: the drawing's units. Others are converted once, by the writer. */
  programUnits: oneOf('the program units', UNITS).nullable().default(null),
}, { error: objectError('the options as an object') });

export type ProgramOptions = z.infer<typeof programOptionsSchema>;

/** Every option at its default. */
export const DEFAULT_OPTIONS: ProgramOptions = programOptionsSchema.parse({});

/** Seconds waited where a wait is asked: small spindles are at speed well within it (common practice, no source). */
export const SPINDLE_WAIT_SECONDS = 4;
