import type { Point3 } from '../geometry/point';
import type { Place } from '../reader/motion';

/** How a reading stands to the drawing. One that disagrees withholds the program; a caution is confirmed first. */
export const SEVERITIES = ['agrees', 'caution', 'disagrees', 'not measured'] as const;
export type Severity = (typeof SEVERITIES)[number];

/** Everything the readback looks at, in the order it is shown. */
export const RULES = [
  'read', 'length', 'width', 'depth', 'stopMargin', 'outside', 'cleared', 'floor', 'under', 'beside', 'railWidth',
  'passDepth', 'cuttingLength', 'entry', 'laps', 'retracts',
  'start', 'rapids', 'clamps', 'nut', 'travel', 'modes',
  'spindle', 'spindleSpeed', 'feed', 'plungeFeed', 'chipLoad', 'end',
] as const;
export type RuleName = (typeof RULES)[number];

/** What the figures of a finding are: lengths in the spec's units, feeds per minute, degrees, rev/min, counts, or words. */
export type Quantity = 'length' | 'feed' | 'angle' | 'speed' | 'chipLoad' | 'count' | 'words';
export type Figure = number | readonly number[] | string;

/**
 * One reading: data only. `sentenceOf` (sentences.ts) turns it into words.
 * `at` is where in the text it was measured, `point` where on the rail; a reading of the whole program stands at its
 * first line.
 */
export interface Finding {
  readonly rule: RuleName;
  readonly severity: Severity;
  readonly at: Place;
  readonly point: Point3 | null;
  readonly quantity: Quantity;
  readonly wanted: Figure | null;
  readonly measured: Figure | null;
  /** Why, where one rule can fail in several ways; sentences.ts knows each. */
  readonly reason: string | null;
}

/** The whole readback of one program against one spec. */
export interface Readback {
  /** The worst of all findings; 'not measured' counts as agreeing here and is still shown. */
  readonly verdict: 'agrees' | 'caution' | 'disagrees';
  readonly findings: readonly Finding[];
}
