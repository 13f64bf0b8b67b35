import { formatDecimal, formatSize } from '../measure/length';
import { type Units, byUnits, convertLength } from '../measure/units';
import { isOneBit } from '../slot/spec';
import { type Bit, sameBit } from './bit';

/** One width measured on a cut slot, beside what its program was made from; lengths in `units`. */
export interface WidthMeasured {
  readonly units: Units;
  readonly drawnWidth: number;
  /** The diameter that the program was made for. */
  readonly programmedDiameter: number;
  readonly measuredWidth: number;
}

/** Fewer measurements than this are chance (common practice, no source). */
export const LEAST_MEASUREMENTS = 3;
/** Measurements further apart than this do not speak of one bit: 0.003 in, 0.08 mm (common practice, no source). */
export const closeTogether = (units: Units): number => byUnits(units, 0.003, 0.08);

/**
 * How wide the bit's centre is led across the slot: the programmed path keeps half a bit off each wall, so drawn width
 * less programmed diameter; along a one-bit slot it runs on a single line.
 */
export function pathWidth({ units, drawnWidth, programmedDiameter }: WidthMeasured): number {
  return isOneBit({ units, width: drawnWidth, bitDiameter: programmedDiameter }) ? 0 : Math.max(0, drawnWidth - programmedDiameter);
}

/**
 * The diameter that a measured width shows the bit to cut.
 *
 * The centre is led over p = drawn − programmed, and a bit that cuts d reaches d / 2 beyond it on both sides, so the
 * slot is p + d wide. Hence d = measured − p = programmed + (measured − drawn): each wall moves by half of what d is
 * off, both together by all of it. Where the slot is one bit wide p is 0 and d is the measured width itself.
 */
export function effectiveDiameter(measured: WidthMeasured): number {
  return measured.measuredWidth - pathWidth(measured);
}

export const CORRECTION_RESULTS = ['measureMore', 'measureAgain', 'askBit', 'offer'] as const;
export const OTHER_CAUSES = ['runout', 'wear', 'machineScale'] as const;

/** Something besides the bit's ground size that gives the same widths. */
export interface OtherCause {
  readonly cause: (typeof OTHER_CAUSES)[number];
  /** How much of it that would take: a length in the bit's units, for the machine's scale a share of 1. */
  readonly amount: number;
  readonly sentence: string;
}

/** One measurement's way to a diameter, for a page to write out as a sum; lengths in the bit's units. */
export interface CorrectionStep {
  readonly measured: number;
  readonly drawn: number;
  readonly programmed: number;
  /** What the centre was led over: taken off the measured width. */
  readonly path: number;
  readonly effective: number;
}

/** What the measurements say of the bit, with the numbers it was worked out from. */
export interface BitCorrection {
  readonly result: (typeof CORRECTION_RESULTS)[number];
  readonly count: number;
  /** Greatest less least effective diameter. */
  readonly spread: number;
  /** Mean effective diameter: what the owner is offered; null without any measurement. */
  readonly diameter: number | null;
  /** That less what is written on the bit. */
  readonly correction: number | null;
  readonly steps: readonly CorrectionStep[];
  readonly otherCauses: readonly OtherCause[];
  /** What to do next. */
  readonly sentence: string;
}

function stepOf(units: Units, one: WidthMeasured): CorrectionStep {
  const here = (value: number) => convertLength(value, one.units, units);
  return {
    measured: here(one.measuredWidth), drawn: here(one.drawnWidth), programmed: here(one.programmedDiameter),
    path: here(pathWidth(one)), effective: here(effectiveDiameter(one)),
  };
}

/** What measured widths say that a bit really cuts. Answers an offer only for three or more that agree, near the bit's own size. */
export function bitCorrection(bit: Pick<Bit, 'units' | 'diameter'>, measurements: readonly WidthMeasured[]): BitCorrection {
  const { units } = bit;
  const steps = measurements.map((one) => stepOf(units, one));
  const found = steps.map(({ effective }) => effective);
  const count = found.length;
  const spread = count === 0 ? 0 : Math.max(...found) - Math.min(...found);
  const diameter = count === 0 ? null : found.reduce((sum, value) => sum + value, 0) / count;
  const correction = diameter === null ? null : diameter - bit.diameter;
  const causes = correction === null ? [] : otherCauses(units, correction, steps);
  const answer = (result: BitCorrection['result'], sentence: string): BitCorrection => ({ result, count, spread, diameter, correction, steps, otherCauses: causes, sentence });

  const slack = byUnits(units, 1e-9, 1e-8); // sums of decimals miss by a few units in the last binary place
  const size = (value: number) => `${formatDecimal(value, units)} ${units}`;
  if (diameter !== null && correction !== null && Math.abs(correction) > sameBit(units) + slack) {
    return answer('askBit', `It cuts ${size(diameter)} and the bit is a ${formatSize(bit.diameter, units)}. Is the right bit in? Check it, and measure again.`);
  }
  if (diameter === null || count < LEAST_MEASUREMENTS) {
    return answer('measureMore', `${count} of ${LEAST_MEASUREMENTS} measurements. Take ${LEAST_MEASUREMENTS - count} more.`);
  }
  if (spread > closeTogether(units) + slack) {
    return answer('measureAgain', `The measurements differ by ${size(spread)}. Measure again, or leave out what slipped, until they lie within ${size(closeTogether(units))}.`);
  }
  return answer('offer', `It cuts ${size(diameter)}: ${count} measurements within ${size(spread)}. Use that for its next programs?`);
}

/** Runout widens the circle that the edges run on by all of what a dial shows; a scale that is off stretches the path alone. */
function otherCauses(units: Units, correction: number, steps: readonly CorrectionStep[]): OtherCause[] {
  const size = (value: number) => `${formatDecimal(Math.abs(value), units)} ${units}`;
  const causes: OtherCause[] = correction > 0
    ? [{ cause: 'runout', amount: correction, sentence: `Runout of ${size(correction)} would do the same. Clean the collet and hold a dial to the shank.` }]
    : correction < 0
      ? [{ cause: 'wear', amount: -correction, sentence: `A bit worn or ground down by ${size(correction)} would do the same. Measure it.` }]
      : [];
  const path = steps.reduce((sum, step) => sum + step.path, 0) / Math.max(1, steps.length);
  if (path > 0 && correction !== 0) {
    const share = correction / path;
    causes.push({ cause: 'machineScale', amount: share, sentence: `So would a machine that moves ${(Math.abs(share) * 100).toFixed(1)} % too ${share > 0 ? 'far' : 'short'} along Y. Measure a long move with a rule.` });
  }
  return causes;
}
