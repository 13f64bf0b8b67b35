import { z } from 'zod';
import { UNITS } from '../measure/units';

/**
 * How the text is written: each at the form that any three-axis controller takes unless the shop's own asks otherwise.
 * What differs between controllers, and why these defaults are read alike by all, stands in tests/standards/dialects.
 */
export const programOptionsSchema = z.strictObject({
  /** N words: off, since controllers differ in how many digits they take. */
  lineNumbers: z.boolean().default(false),
  /** 0 writes arcs; more writes chords that stray from the arc by at most this, in the drawing's units. */
  chordTolerance: z.number().min(0).max(0.01).default(0),
  lineEndings: z.enum(['lf', 'crlf']).default('lf'),
  /** A % line before and after the program (NISTIR 6556 3.1: both or neither). */
  percent: z.boolean().default(true),
  comments: z.boolean().default(true),
  /** The S word, for machines whose spindle speed is set by a dial. */
  speedWord: z.boolean().default(true),
  /** A wait after the spindle starts: G4 P counts seconds in NISTIR 6556 and milliseconds on some controllers. */
  spindleWait: z.enum(['none', 'seconds', 'milliseconds']).default('none'),
  end: z.enum(['M30', 'M2']).default('M30'),
  fileEnding: z.string().regex(/^[a-z0-9]{1,5}$/i, { error: 'Give the file ending as one to five letters or digits, such as nc.' }).default('nc'),
  /** Null: the drawing's units. Others are converted once, by the writer. */
  programUnits: z.enum(UNITS).nullable().default(null),
});

export type ProgramOptions = z.infer<typeof programOptionsSchema>;

/** Every option at its default. */
export const DEFAULT_OPTIONS: ProgramOptions = programOptionsSchema.parse({});

/** Seconds waited where a wait is asked: small spindles are at speed well within it (common practice, no source). */
export const SPINDLE_WAIT_SECONDS = 4;
