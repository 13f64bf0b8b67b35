import { formatSize } from '../measure/length';
import { byUnits } from '../measure/units';
import { WOOD_FACTS } from '../wood/woods';
import { countBlocks, MOST_BLOCKS } from './blockCount';
import { FIELDS } from './fields';
import { LENGTH_FIELDS, type SlotSpec, isOneBit, railLength } from './spec';

/** What is wrong with one field, and what would work. */
export interface Problem {
  readonly field: keyof SlotSpec;
  readonly message: string;
}

/** Figures that decide what is too thin, too short or too steep. */
const LIMITS = {
  /** Any size, inches: below 0.01 nothing is routed, above 240 (20 ft) no board is sold. */
  smallest: 0.01,
  largest: 240,
  /** Wood left under the slot: common practice, no source. */
  floor: { in: 1 / 8, mm: 3 },
  /** Wood left beside it: common practice, no source. */
  wall: { in: 1 / 16, mm: 1.5 },
  /** End grain that a coin may roll against: common practice, no source. */
  stop: { in: 1 / 4, mm: 6 },
  /** Between safe height and clamps, and between bit and clamp. */
  clear: { in: 1 / 8, mm: 3 },
} as const;

/** Sizes that may be zero or thinner than any cut: an allowance, a bare table, a rail held from outside. */
const MAY_BE_ZERO: ReadonlySet<string> = new Set(['finishAllowance', 'clampHeight', 'clampReach']);

/** Greatest depth of one pass as a share of the bit's diameter: half in hardwood, all of it in softer stuff or on a heavy machine (common practice, no source). */
export function advisedStepdown(spec: Pick<SlotSpec, 'bitDiameter' | 'wood' | 'machine'>): number {
  const half = WOOD_FACTS[spec.wood].kind === 'hardwood' && !spec.machine?.heavy;
  return half ? spec.bitDiameter / 2 : spec.bitDiameter;
}

/**
 * Everything impossible or dangerous in a spec, all at once.
 *
 * A size that could not be read is NaN here: every rule is a comparison that NaN never meets, so that one unreadable
 * field hides no other.
 */
export function findProblems(spec: SlotSpec, chordTolerance = 0): Problem[] {
  const problems: Problem[] = [];
  const size = (value: number) => formatSize(value, spec.units);
  const limit = (pair: { readonly in: number; readonly mm: number }) => pair[spec.units];
  const hair = byUnits(spec.units, 1e-9, 1e-8); // sums of decimals miss by a few units in the last binary place
  const refuse = (when: boolean, field: keyof SlotSpec, message: () => string) => {
    if (when) problems.push({ field, message: message() });
  };

  const unit = byUnits(spec.units, 1, 25.4);
  const [least, most] = [LIMITS.smallest * unit, LIMITS.largest * unit];
  for (const field of LENGTH_FIELDS) {
    const value = spec[field];
    const low = MAY_BE_ZERO.has(field) ? 0 : least;
    refuse(value < low || value > most, field, () => `The ${FIELDS[field].words} is ${size(value)}. Use ${size(low)} to ${size(most)}.`);
  }
  const { length, width, depth, bitDiameter, stepdown, stopMargin, railWidth, railThickness } = spec;

  refuse(bitDiameter > width && !isOneBit(spec), 'bitDiameter',
    () => `The bit is wider than the slot: ${size(bitDiameter)} in a slot of ${size(width)}. Use ${size(width)} or less.`);
  refuse(length < Math.max(width, isOneBit(spec) ? bitDiameter : 0) - hair, 'length',
    () => `The slot length is ${size(length)}, less than its width. Use ${size(Math.max(width, bitDiameter))} or more.`);

  const deepest = railThickness - limit(LIMITS.floor);
  refuse(depth >= railThickness, 'depth', () => `The slot depth is ${size(depth)}, as deep as the rail is thick (${size(railThickness)}). Use ${size(deepest)} or less.`);
  refuse(depth < railThickness && depth > deepest + hair, 'depth',
    () => `A slot depth of ${size(depth)} leaves only ${size(railThickness - depth)} under the slot. Use ${size(deepest)} or less.`);
  refuse((railWidth - width) / 2 < limit(LIMITS.wall) - hair, 'railWidth',
    () => `A rail width of ${size(railWidth)} leaves less than ${size(limit(LIMITS.wall))} beside the slot. Give the rail's own width, ${size(width + 2 * limit(LIMITS.wall))} or more.`);

  refuse(stepdown > spec.cuttingLength + hair, 'stepdown',
    () => `The stepdown is ${size(stepdown)}, more than the bit's cutting length of ${size(spec.cuttingLength)}. Use ${size(spec.cuttingLength)} or less.`);
  const advised = advisedStepdown(spec);
  refuse(stepdown > advised + hair, 'stepdown',
    () => `The stepdown is ${size(stepdown)}. In ${WOOD_FACTS[spec.wood].words} take at most ${size(advised)} a pass with a ${size(bitDiameter)} bit.`);

  refuse(stopMargin < limit(LIMITS.stop) - hair, 'stopMargin',
    () => `A stop margin of ${size(stopMargin)} is too short to stop a coin. Use ${size(limit(LIMITS.stop))} or more.`);
  refuse(spec.clampReach > 0 && spec.clampReach > stopMargin - limit(LIMITS.clear) + hair, 'clampReach',
    () => `The clamps reach ${size(spec.clampReach)} onto the rail and the slot starts at ${size(stopMargin)}. Keep them ${size(limit(LIMITS.clear))} clear, or widen the stop margin.`);
  const nutBeside = stopMargin + bitDiameter / 2 - spec.clampReach < spec.colletDiameter / 2 - hair;
  refuse(spec.stickout - depth < spec.clampHeight - hair && nutBeside, 'stopMargin',
    () => `With ${size(spec.stickout)} of bit showing, the collet nut comes down beside a clamp ${size(spec.clampHeight)} high. Use a stop margin of ${size(spec.colletDiameter / 2 + spec.clampReach - bitDiameter / 2)} or more, or let more of the bit show.`);
  refuse(spec.stickout < depth + hair, 'stickout',
    () => `With ${size(spec.stickout)} of bit showing, the nut meets the rail before the slot is ${size(depth)} deep. Let at least ${size(depth + limit(LIMITS.clear))} show.`);
  refuse(spec.safeHeight < spec.clampHeight + limit(LIMITS.clear) - hair, 'safeHeight',
    () => `The safe height is ${size(spec.safeHeight)} and the clamps stand ${size(spec.clampHeight)} high. Use ${size(spec.clampHeight + limit(LIMITS.clear))} or more.`);

  const widestAllowance = Math.max(0, (width - bitDiameter) / 2);
  refuse(spec.finishAllowance > widestAllowance + hair, 'finishAllowance',
    () => `The finish allowance is ${size(spec.finishAllowance)}. Between slot and bit there is room for ${size(widestAllowance)} or less.`);

  const { machine } = spec;
  const perMinute = `${spec.units}/min`;
  for (const field of ['feed', 'plungeFeed'] as const) {
    refuse(spec[field] > (machine?.topFeed ?? Infinity), field,
      () => `The ${FIELDS[field].words} is ${spec[field]} ${perMinute}, more than the machine's ${machine?.topFeed} ${perMinute}. Use that or less.`);
  }
  const [slowest, fastest] = machine?.spindleRange ?? [0, Infinity];
  refuse(spec.spindleSpeed < slowest || spec.spindleSpeed > fastest, 'spindleSpeed',
    () => `The spindle speed is ${spec.spindleSpeed} rev/min. This machine turns ${slowest} to ${fastest}.`);
  const reach = { x: length - bitDiameter, y: width - bitDiameter, z: depth + spec.safeHeight };
  for (const axis of ['x', 'y', 'z'] as const) {
    const travel = machine?.travel?.[axis] ?? Infinity;
    refuse(reach[axis] > travel, 'machine',
      () => `The cut travels ${size(reach[axis])} along ${axis.toUpperCase()} and the machine has ${size(travel)}. Use a shorter slot or another machine.`);
  }
  refuse(railLength(spec) > most, 'length', () => `Slot and stop margins make a rail of ${size(railLength(spec))}. Use ${size(most)} or less.`);

  const blocks = problems.length === 0 ? countBlocks(spec, chordTolerance) : 0;
  refuse(blocks > MOST_BLOCKS, 'stepdown',
    () => `This cut needs about ${blocks} lines of program; the most is ${MOST_BLOCKS}. Use a deeper stepdown, a wider stepover, a steeper ramp or a larger bit.`);
  return problems;
}
