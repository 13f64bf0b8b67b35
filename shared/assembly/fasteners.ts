import { type JobFinding, type Wanted, isWithin } from '../coin/finding';
import { type Units, convertLength } from '../measure/units';
import type { RailSection } from '../piece/spec';

/** Brads and finish nails: wire gauge and diameter in inches, lengths on sale in inches (common practice, no source). */
export const BRADS = {
  23: { diameter: 0.0258, lengths: [0.5, 0.625, 0.75, 1, 1.25, 1.375, 1.5, 2] },
  18: { diameter: 0.0475, lengths: [0.625, 0.75, 1, 1.25, 1.5, 1.75, 2] },
  16: { diameter: 0.0625, lengths: [1, 1.25, 1.5, 1.75, 2, 2.5] },
  15: { diameter: 0.072, lengths: [1.25, 1.5, 1.75, 2, 2.5] },
} as const;
export type BradGauge = keyof typeof BRADS;
export const BRAD_GAUGES: readonly BradGauge[] = [23, 18, 16, 15];

export const FASTENER_RULES = ['groove', 'frontFace', 'bite', 'holding', 'edge'] as const;
export type FastenerFinding = JobFinding<(typeof FASTENER_RULES)[number]>;

/** Common practice, no source; inches. */
export const FASTENER_PRACTICE = {
  /** Wood between a brad and the groove's floor or back wall, and between its point and the front face. */
  clear: 1 / 8,
  /** Least length in the rail. */
  bite: 3 / 8,
  /** A nail is three times as long as what it fastens is thick. */
  timesThickness: 3,
  /** Along an edge and from an end, in diameters, without a lead hole. */
  edge: 2.5,
  end: 15,
  /** Brads stand no further apart than this. */
  apart: 5,
  /** A rail this long is clamped and nailed from its ends inwards. */
  long: 12,
} as const;

/** A brad driven level from behind, through the board into a rail; lengths in the piece's units. */
export interface Brad {
  readonly gauge: BradGauge;
  readonly length: number;
  /** Below the rail's top. */
  readonly below: number;
}

/** The board and rail that a brad joins. */
export interface Joint {
  readonly units: Units;
  readonly boardThickness: number;
  readonly section: RailSection;
}

const inches = (joint: Joint, length: number) => convertLength(length, 'in', joint.units);

/** How deep a brad goes into the rail. */
export const depthInRail = ({ length }: Brad, { boardThickness }: Joint): number => length - boardThickness;

/**
 * Height at which brads go in: the middle of the wood between groove floor and underside, with the clearance above
 * and the edge distance below; null where no wood is left for it. Then only a brad that stops short of the groove goes.
 */
export function heightBelowGroove(joint: Joint, gauge: BradGauge): number | null {
  const { grooveDepth, thickness } = joint.section;
  const d = inches(joint, BRADS[gauge].diameter);
  const top = grooveDepth + inches(joint, FASTENER_PRACTICE.clear) + d / 2;
  const bottom = thickness - FASTENER_PRACTICE.edge * d;
  return bottom >= top ? (top + bottom) / 2 : null;
}

/**
 * The longest brad on sale that comes through neither the groove nor the front face, with where it goes in: below the
 * groove where there is wood for it, else in the middle of the rail's height and short of the groove's back wall.
 * Null where every brad on sale is too long or bites too little.
 */
export function chooseBrad(joint: Joint, gauge: BradGauge): Brad | null {
  const { section, boardThickness } = joint;
  const clear = inches(joint, FASTENER_PRACTICE.clear);
  const below = heightBelowGroove(joint, gauge);
  const deepest = below === null ? (section.width - section.grooveWidth) / 2 - clear : section.width - clear;
  const lengths = BRADS[gauge].lengths.map((length) => inches(joint, length)).filter((length) => length - boardThickness >= inches(joint, FASTENER_PRACTICE.bite) && length - boardThickness <= deepest);
  const length = lengths.at(-1);
  return length === undefined ? null : { gauge, length, below: below ?? section.thickness / 2 };
}

/** What is to be said of a brad, chosen or typed, in its joint: whether it meets the groove, the front face, and holds. */
export function bradFindings(brad: Brad, joint: Joint): FastenerFinding[] {
  const { section, boardThickness } = joint;
  const d = inches(joint, BRADS[brad.gauge].diameter);
  const clear = inches(joint, FASTENER_PRACTICE.clear);
  const depth = depthInRail(brad, joint);
  const find = (rule: FastenerFinding['rule'], measured: number, wanted: Wanted, bad: 'caution' | 'disagrees', reason: string, source: FastenerFinding['source'] = 'geometry'): FastenerFinding => {
    const within = isWithin(wanted, measured);
    return { rule, severity: within ? 'agrees' : bad, about: `${brad.gauge} ga`, quantity: 'length', wanted, measured, reason: within ? null : reason, source };
  };
  const underFloor = brad.below - d / 2 - section.grooveDepth;
  const beforeWall = (section.width - section.grooveWidth) / 2 - depth;
  // It may pass under the groove or stop before it: the better of the two counts.
  const groove = Math.max(underFloor, beforeWall);
  return [
    find('groove', groove, { least: clear, most: null }, 'disagrees', groove < 0 ? 'throughGroove' : 'nearGroove'),
    find('frontFace', section.width - depth, { least: clear, most: null }, 'disagrees', depth > section.width ? 'throughFace' : 'nearFace'),
    find('bite', depth, { least: inches(joint, FASTENER_PRACTICE.bite), most: null }, 'disagrees', depth <= 0 ? 'misses' : 'short', 'common practice'),
    find('holding', brad.length, { least: FASTENER_PRACTICE.timesThickness * boardThickness, most: null }, 'caution', 'shortForBoard', 'common practice'),
    find('edge', Math.min(section.thickness - brad.below, brad.below), { least: FASTENER_PRACTICE.edge * d, most: null }, 'caution', 'nearEdge', 'common practice'),
  ];
}

/**
 * Places of brads along a rail from its left end, in the order of driving: a short rail is held and nailed along; a
 * long one is clamped, nailed at both ends, then towards the middle (common practice, no source).
 */
export function bradPlaces(railLength: number, gauge: BradGauge, units: Units): { readonly at: number; readonly order: number }[] {
  const scale = convertLength(1, 'in', units);
  const end = Math.min(FASTENER_PRACTICE.end * BRADS[gauge].diameter * scale, railLength / 4);
  const spans = Math.max(1, Math.ceil((railLength - 2 * end) / (FASTENER_PRACTICE.apart * scale)));
  const places = Array.from({ length: spans + 1 }, (_, n) => end + (n * (railLength - 2 * end)) / spans);
  if (railLength < FASTENER_PRACTICE.long * scale) return places.map((at, n) => ({ at, order: n + 1 }));
  const turns = places.map((_, n) => n).sort((a, b) => Math.min(a, spans - a) - Math.min(b, spans - b) || a - b);
  return places.map((at, n) => ({ at, order: turns.indexOf(n) + 1 }));
}

/** The longest screw or brad through a batten into the board that stays clear of the board's face; lengths in the piece's units. */
export function longestThroughBatten(battenThickness: number, boardThickness: number, units: Units): number {
  return battenThickness + boardThickness - convertLength(FASTENER_PRACTICE.clear, 'in', units);
}

/**
 * Allowable withdrawal load of plain nails from side grain, pounds: 1380 G^2.5 D per inch of depth, a fifth of what
 * pulls them (Forest Products Laboratory, FPL-093). G is the ovendry specific gravity, D and depth in inches.
 */
export function withdrawalLoad(specificGravity: number, diameter: number, depth: number): number {
  return 1380 * specificGravity ** 2.5 * diameter * depth;
}
