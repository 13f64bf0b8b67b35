/**
 * What the judge is told, and what it answers. Written from the issue and NISTIR 6556 alone: nothing here or beside it
 * may come from shared/, so that a mistake there cannot hide itself. Field names are those a person posts.
 */
export type LengthUnits = 'in' | 'mm';

/** The slot that was asked for. What is left out has the default. */
export interface JudgedSpec {
  readonly units: LengthUnits;
  readonly length: number;
  readonly width: number;
  readonly depth: number;
  readonly stopMargin: number;
  readonly bitDiameter: number;
  readonly stepdown: number;
  readonly railWidth?: number | undefined;
  readonly ends?: 'cornered' | 'round' | undefined;
  readonly workZero?: 'corner' | 'centre' | undefined;
  readonly spindle?: 'program' | 'hand' | undefined;
  readonly rampAngle?: number | undefined;
  readonly stepover?: number | undefined;
  readonly finishAllowance?: number | undefined;
  readonly direction?: 'climb' | 'conventional' | undefined;
  readonly cuttingLength?: number | undefined;
  readonly clampHeight?: number | undefined;
  /** Left out: the height of the first motion stands for it, if that clears the clamps. */
  readonly safeHeight?: number | undefined;
}

/** How the text was asked to be written. What is left out has the default. */
export interface JudgedOptions {
  readonly lineNumbers?: boolean | undefined;
  /** Added to what may stay uncut where a wall is curved, in the spec's units; never to what may be cut outside. */
  readonly chordTolerance?: number | undefined;
  readonly lineEndings?: 'lf' | 'crlf' | undefined;
  readonly percent?: boolean | undefined;
  readonly comments?: boolean | undefined;
  readonly speedWord?: boolean | undefined;
  readonly spindleWait?: 'none' | 'seconds' | 'milliseconds' | undefined;
  readonly end?: 'M30' | 'M2' | undefined;
  readonly programUnits?: LengthUnits | null | undefined;
}

/** Every rule of the judge; a test fires each. The first 24 need only the text. */
export const RULES = [
  'line-length', 'line-ending', 'letters', 'codes', 'number-form', 'decimal-point', 'decimals', 'negative-zero',
  'repeat', 'modal-group', 'm-words', 'm-with-motion', 'word-order', 'line-number', 'percent', 'comment', 'date',
  'mark', 'modes', 'units', 'dwell', 'arc-words', 'end', 'parser',
  'axis-words', 'arc-sweep', 'arc-radius', 'first-motion', 'feed', 'start', 'rapid-sideways', 'rapid-down', 'spindle',
  'speed', 'stop', 'retract', 'ramp', 'plunge', 'outside', 'deepest', 'uncut-wall', 'uncut-floor', 'length', 'width',
  'stop-margin', 'too-deep', 'cutting-length', 'direction', 'finish-lap',
] as const;
export type Rule = (typeof RULES)[number];

export interface Violation {
  readonly rule: Rule;
  /** Counted from 1; 0 speaks of the whole program. */
  readonly line: number;
  readonly message: string;
}

export interface Point {
  readonly x: number;
  readonly y: number;
}

export interface Place extends Point {
  readonly z: number;
}

/** Part of a circle in plan: from angle `start`, turning by `sweep` (counterclockwise positive), radians. */
export interface Turn {
  readonly centre: Point;
  readonly radius: number;
  readonly start: number;
  readonly sweep: number;
}

/** One move of the tool's tip, in the spec's units. X and Y are NaN until the program says them. */
export interface Move {
  readonly line: number;
  readonly rapid: boolean;
  readonly from: Place;
  readonly to: Place;
  readonly turn: Turn | null;
}

/** The finest written step in the spec's units: 4 decimals in inches, 3 in millimetres (issue, "The text"). */
export function finestStep(programUnits: LengthUnits, specUnits: LengthUnits): number {
  const step = programUnits === 'in' ? 0.0001 : 0.001;
  if (programUnits === specUnits) return step;
  return programUnits === 'in' ? step * 25.4 : step / 25.4;
}

/** "To 0.0005 in / 0.01 mm" (issue, "The plan"). */
export function sizeTolerance(units: LengthUnits): number {
  return units === 'in' ? 0.0005 : 0.01;
}

/** A length given in inches, in the spec's units. */
export function inches(value: number, units: LengthUnits): number {
  return units === 'in' ? value : value * 25.4;
}
