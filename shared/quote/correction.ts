/** How long a thing was thought to take and how long it took, in any unit of time that both share. */
export interface Taken {
  readonly expected: number;
  readonly took: number;
}

/** How a shop's real times stand to what was expected. */
export interface Correction {
  /** What an expected time is multiplied by. */
  readonly ratio: number;
  /** Half of the times lay between these ratios; null where too few are known. */
  readonly spread: { readonly low: number; readonly high: number } | null;
  /** Times that it is taken from; those that were not timed are not counted. */
  readonly count: number;
}

/** A cut as the log has it, beside what its program was thought to take. */
export interface TimedCut {
  readonly outcome: 'well' | 'spoiled';
  readonly estimated: number;
  readonly seconds: number | null;
}

/** The times that the cut log gives: of cuts that went well and were timed. A spoiled one may have been stopped anywhere. */
export const timesOfCuts = (cuts: readonly TimedCut[]): Taken[] =>
  cuts.flatMap(({ outcome, estimated, seconds }) => (outcome === 'well' && seconds !== null ? [{ expected: estimated, took: seconds }] : []));

/** Below this nothing is corrected: one odd time of two would be half the answer. Common practice, no source. */
export const LEAST_TIMES = 3;

/** A quantile of sorted numbers, on the straight line between the two nearest (Hyndman and Fan 1996, definition 7). */
function quantile(sorted: readonly number[], q: number): number {
  const at = (sorted.length - 1) * q;
  const [low, high] = [sorted[Math.floor(at)] ?? NaN, sorted[Math.ceil(at)] ?? NaN];
  return low + (high - low) * (at - Math.floor(at));
}

/**
 * The shop's own ratio of real to expected time: the median, so that a stopwatch left running over lunch moves it
 * little, with the middle half as its spread. Fewer than three times leave the estimate as it is.
 */
export function correctionOf(times: readonly Taken[]): Correction {
  const ratios = times.filter(({ expected, took }) => expected > 0 && took > 0 && Number.isFinite(took / expected)).map(({ expected, took }) => took / expected).sort((a, b) => a - b);
  const count = ratios.length;
  if (count < LEAST_TIMES) return { ratio: 1, spread: null, count };
  return { ratio: quantile(ratios, 0.5), spread: { low: quantile(ratios, 0.25), high: quantile(ratios, 0.75) }, count };
}
