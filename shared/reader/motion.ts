import type { Point3 } from '../geometry/point';
import type { Units } from '../measure/units';
import type { ReadErrorCode } from './errors';

/** A place in the program text, both counted from 1. Everything the reader makes carries one. */
export interface Place {
  readonly line: number;
  readonly column: number;
}

/** One word of a block: a letter and its number, as read. */
export interface Word {
  readonly letter: string;
  readonly value: number;
  readonly at: Place;
}

/** One comment, without its parentheses. */
export interface Comment {
  readonly text: string;
  readonly at: Place;
}

/** One line of the program that holds words; `deleted` where it began with a slash (read, and executed: the switch is off). */
export interface Block {
  readonly at: Place;
  readonly number: number | null;
  readonly deleted: boolean;
  readonly words: readonly Word[];
}

/** The modal state in force (NISTIR 6556 Table 4); one frozen object is shared by all steps until a block changes it. */
export interface Modes {
  /** Group 1, as a code: 0, 1, 2, 3 or 80; null until stated. */
  readonly motion: 0 | 1 | 2 | 3 | 80 | null;
  readonly plane: 17 | 18 | 19 | null;
  readonly distance: 90 | 91 | null;
  readonly feedMode: 93 | 94 | null;
  readonly units: Units | null;
  readonly radiusCompensation: 40 | null;
  readonly lengthOffset: 49 | null;
  /** 54 … 59, 59.1, 59.2, 59.3. */
  readonly workOffset: number | null;
  /** G61 exact path, G61.1 exact stop, G64 continuous. */
  readonly pathControl: 61 | 61.1 | 64 | null;
  readonly spindle: 'clockwise' | 'counterclockwise' | 'stopped' | null;
  /** rev/min; null until an S word. */
  readonly spindleSpeed: number | null;
  /** Slot of the tool last selected by a T word (3.7.3); null until one. */
  readonly selectedTool: number | null;
  /** 'both' is mist and flood together, which Table 4 allows. */
  readonly coolant: 'mist' | 'flood' | 'both' | 'off' | null;
  /** M48 feed and speed overrides on, M49 off. */
  readonly overrides: 48 | 49 | null;
  /**
   * Units per minute as written (under G93: 1/minutes); null until an F word, and again once G20, G21, G93 or G94
   * changes what the number counts: the report converts no feed.
   */
  readonly feed: number | null;
}

/** The circle an arc follows, in its plane; Z (or the axis normal to the plane) changes evenly along it. */
export interface ArcPath {
  /** Centre as a point of space; its third coordinate is the start's. */
  readonly centre: Point3;
  readonly radius: number;
  /** Radians swept, always positive, up to 2π. */
  readonly sweep: number;
  /** +1 counterclockwise, -1 clockwise, seen from the positive end of the normal axis. */
  readonly turn: 1 | -1;
}

/**
 * One motion of the controlled point, in the program's own units.
 * A coordinate of `from` is NaN while the machine's position on that axis is not known yet; one of `to` where the
 * program has still not stated it.
 */
export interface Motion {
  readonly kind: 'rapid' | 'line' | 'arc';
  /** Of its block. */
  readonly at: Place;
  readonly from: Point3;
  readonly to: Point3;
  /** Null unless `kind` is 'arc'. */
  readonly arc: ArcPath | null;
  /**
   * Length units per minute along the path, helix included (2.1.2.6); null for a rapid, for a cutting motion before any F
   * word, and under G93 from an unknown position.
   */
  readonly feed: number | null;
  readonly modes: Modes;
}

/** What happens besides motion, in the order of execution (NISTIR 6556 Table 8). */
export type Event =
  | { readonly kind: 'dwell'; readonly at: Place; readonly seconds: number; readonly modes: Modes }
  | { readonly kind: 'spindle'; readonly at: Place; readonly modes: Modes }
  | { readonly kind: 'toolChange'; readonly at: Place; readonly modes: Modes }
  | { readonly kind: 'coolant'; readonly at: Place; readonly modes: Modes }
  /** M0, M1 (optional) or M60. */
  | { readonly kind: 'stop'; readonly at: Place; readonly optional: boolean; readonly modes: Modes }
  /** M2 or M30; nothing after it is executed. */
  | { readonly kind: 'end'; readonly at: Place; readonly code: 2 | 30; readonly modes: Modes };

export type Step = Motion | Event;

/** Whether a step moves the controlled point. */
export function isMotion(step: Step): step is Motion {
  return step.kind === 'rapid' || step.kind === 'line' || step.kind === 'arc';
}

/** A program as read: the words, and what the machine will do. */
export interface ReadProgram {
  /** Made when first asked for; the words of every line, also of those after the end. */
  readonly blocks: readonly Block[];
  readonly comments: readonly Comment[];
  /** In the order of execution, up to and with the end. */
  readonly steps: readonly Step[];
  /** Units of the coordinates in `steps`: of the program's first motion (without one: the last in force). */
  readonly units: Units;
  /** True where a pair of % lines holds the program. */
  readonly percent: boolean;
  /** Lines read: to the end of the text, or to the closing % line. */
  readonly lines: number;
}

/** Why a text was refused: the first thing wrong, where, and the rule's code for whoever tests it. */
export interface ReadError {
  readonly code: ReadErrorCode;
  readonly at: Place;
  /** One sentence in plain words that names the word or character and what is allowed. */
  readonly reason: string;
}

export type ReadResult = { readonly ok: true; readonly program: ReadProgram } | { readonly ok: false; readonly error: ReadError };

/** What a dialect leaves open; the defaults are NISTIR 6556's. */
export interface ReadOptions {
  /** Where the machine stands before the first block, in the units of its first motion; an axis left out is not known. */
  readonly start?: Partial<Point3>;
  /** What G4 P counts: NISTIR 6556 3.5.4 says seconds; some controllers take milliseconds. */
  readonly dwellIn?: 'seconds' | 'milliseconds';
  /** Units before any G20 or G21; NISTIR 6556's sample session starts in millimetres. */
  readonly units?: Units;
}
