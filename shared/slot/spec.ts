import type { Units } from '../measure/units';
import type { Wood } from '../wood/woods';

/** Inside corners keep the bit's radius, or both ends are half circles as wide as the slot. */
export const ENDS = ['cornered', 'round'] as const;
/** Which way the cutting edge meets the wood; with the spindle clockwise a counterclockwise lap inside a slot climbs. */
export const DIRECTIONS = ['climb', 'conventional'] as const;
export const BIT_KINDS = ['straight', 'upcut', 'downcut', 'compression'] as const;
/** X and Y zero: front left corner of the rail, or its middle. Z zero is the rail's top either way. */
export const WORK_ZEROS = ['corner', 'centre'] as const;
/** Who switches the spindle: M3 and M5 in the program, or a hand at two M0 stops. */
export const SPINDLE_CONTROLS = ['program', 'hand'] as const;

/** What the shop says of its machine. What is left out cannot be measured against, and the readback says so. */
export interface MachineLimits {
  /** Usable travel on each axis. */
  readonly travel?: { readonly x: number; readonly y: number; readonly z: number } | undefined;
  /** Highest feed, units per minute. */
  readonly topFeed?: number | undefined;
  /** Units per second squared, the same on every axis. */
  readonly acceleration?: number | undefined;
  /** Lowest and highest spindle speed, rev/min. */
  readonly spindleRange?: readonly [number, number] | undefined;
  /** True for an industrial frame: the heavier chip load band and stepdown apply. */
  readonly heavy?: boolean | undefined;
}

/**
 * A slot with every size known: lengths in `units`, angles in degrees, feeds in units per minute.
 * Made only by `slotRequestSchema`; `FIELDS` (fields.ts) says where each default comes from.
 */
export interface SlotSpec {
  readonly units: Units;
  readonly name: string;
  /** Finished slot, end to end. */
  readonly length: number;
  readonly width: number;
  readonly depth: number;
  /** Solid wood between each rail end and the slot: rail length = length + 2 × stopMargin. */
  readonly stopMargin: number;
  readonly bitDiameter: number;
  /** Greatest depth of one pass. */
  readonly stepdown: number;
  readonly railWidth: number;
  readonly railThickness: number;
  readonly ends: (typeof ENDS)[number];
  readonly wood: Wood;
  readonly flutes: number;
  /** rev/min */
  readonly spindleSpeed: number;
  readonly feed: number;
  readonly plungeFeed: number;
  /** Steepest entry, degrees. */
  readonly rampAngle: number;
  /** Fraction of the bit's diameter. */
  readonly stepover: number;
  /** Left on the walls for a last lap that always climbs; 0 = no such lap. */
  readonly finishAllowance: number;
  readonly direction: (typeof DIRECTIONS)[number];
  readonly cuttingLength: number;
  readonly bitKind: (typeof BIT_KINDS)[number];
  readonly centreCutting: boolean;
  /** The bit maker's own chip load, least and most per tooth; null: the common-practice chart stands in. */
  readonly chipLoadRange: readonly [number, number] | null;
  /** Of the nut, the widest thing that comes down beside a clamp. */
  readonly colletDiameter: number;
  /** Bit showing below the nut. */
  readonly stickout: number;
  /** Highest thing above the rail's top. */
  readonly clampHeight: number;
  /** How far the holding comes in from each rail end. */
  readonly clampReach: number;
  readonly safeHeight: number;
  readonly workZero: (typeof WORK_ZEROS)[number];
  readonly spindle: (typeof SPINDLE_CONTROLS)[number];
  readonly machine: MachineLimits | null;
}

/** The numbers of a spec that are lengths in its units. */
export const LENGTH_FIELDS = [
  'length', 'width', 'depth', 'stopMargin', 'bitDiameter', 'stepdown', 'railWidth', 'railThickness', 'cuttingLength',
  'colletDiameter', 'stickout', 'clampHeight', 'clampReach', 'safeHeight', 'finishAllowance',
] as const satisfies readonly (keyof SlotSpec)[];
export type LengthField = (typeof LENGTH_FIELDS)[number];

/** The whole rail, end to end. */
export function railLength(spec: SlotSpec): number {
  return spec.length + 2 * spec.stopMargin;
}

/**
 * Bit and slot this near are a one-bit slot, cut as a line: a bit is ground to about this, and a lap that narrow
 * would only rub (common practice, no source).
 */
export function isOneBit(spec: Pick<SlotSpec, 'units' | 'width' | 'bitDiameter'>): boolean {
  const near = spec.units === 'in' ? 0.005 : 0.12;
  return Math.abs(spec.width - spec.bitDiameter) <= near + 1e-9; // 1e-9: 0.255 - 0.25 is 0.005000000000000004
}
