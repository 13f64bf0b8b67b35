import type { Severity } from '../readback/finding';

/** Where a finding's wanted figure comes from: worked out from the shapes, a table or law named beside it, or the trade. */
export const FINDING_SOURCES = ['geometry', 'common practice', 'Wood Handbook', 'product label'] as const;
export type FindingSource = (typeof FINDING_SOURCES)[number];

/** What a finding's figures are: lengths in the drawing's units, shares of one, degrees, counts, grams, days. */
export const JOB_QUANTITIES = ['length', 'share', 'degrees', 'count', 'grams', 'days', 'words'] as const;
export type JobQuantity = (typeof JOB_QUANTITIES)[number];

/** From `least` to `most`; null leaves a side open. */
export interface Wanted {
  readonly least: number | null;
  readonly most: number | null;
}

/**
 * One reading of the job before or after the cut: data only, like the readback's findings. `about` names the coin,
 * rail or part; the sentence is made where it is shown.
 */
export interface JobFinding<Rule extends string = string> {
  readonly rule: Rule;
  readonly severity: Exclude<Severity, 'not measured'>;
  readonly about: string;
  readonly quantity: JobQuantity;
  readonly wanted: Wanted | null;
  readonly measured: number | null;
  /** Why, where one rule can fail in several ways. */
  readonly reason: string | null;
  readonly source: FindingSource;
}

/** Sums of decimals miss a limit by a few units in the last binary place; a billionth is far below anything measured. */
const HAIR = 1e-9;

export function isWithin({ least, most }: Wanted, value: number): boolean {
  return value >= (least ?? -Infinity) - HAIR && value <= (most ?? Infinity) + HAIR;
}

/** The worst severity of a list: what a badge shows. */
export function worstOf(findings: readonly JobFinding[]): 'agrees' | 'caution' | 'disagrees' {
  if (findings.some(({ severity }) => severity === 'disagrees')) return 'disagrees';
  return findings.some(({ severity }) => severity === 'caution') ? 'caution' : 'agrees';
}
