import type { Point3 } from '../../geometry/point';
import type { Motion } from '../../reader/motion';
import { type Cut, pointsOf } from '../cut';
import { type Rule, finding } from './rule';

const known = (value: number, stand: number) => (Number.isNaN(value) ? stand : value);

/**
 * The way to the first known place, from wherever the machine stands.
 *
 * Starts are tried below and above the safe height, at far corners in X and Y. Sideways is safe only once the height
 * is known and safe, so the first motion must be Z alone, up to the safe height from below or down to it from above.
 */
export const start: Rule = (cut) => {
  const { spec, tolerance } = cut;
  const far = 10 * cut.railLength;
  const starts: readonly Point3[] = [-far, far].flatMap((x) => [-far, far].flatMap((y) => [-spec.railThickness, 2 * spec.safeHeight].map((z) => ({ x, y, z }))));
  const [first] = cut.motions;
  const bad = cut.motions.find((motion) => isUnknown(motion.from) && starts.some((stand) => {
    const from = { x: known(motion.from.x, stand.x), y: known(motion.from.y, stand.y), z: known(motion.from.z, stand.z) };
    const to = { x: known(motion.to.x, stand.x), y: known(motion.to.y, stand.y), z: known(motion.to.z, stand.z) };
    const sideways = from.x !== to.x || from.y !== to.y;
    return to.z < spec.safeHeight - tolerance || (sideways && Math.min(from.z, to.z) < spec.safeHeight - tolerance);
  }));
  return finding('start', bad || !first ? 'disagrees' : 'agrees', 'length', (bad ?? first)?.at ?? cut.whole, {
    wanted: spec.safeHeight, measured: first ? known(first.to.z, -spec.railThickness) : null,
  });
};

function isUnknown({ x, y, z }: Point3): boolean {
  return Number.isNaN(x + y + z);
}

/** Lowest rapid that goes sideways, and no rapid down into the wood. */
export const rapids: Rule = (cut) => {
  const { spec, tolerance } = cut;
  let lowest = Infinity;
  let worst: Motion | null = null;
  let into: Motion | null = null;
  for (const motion of cut.motions) {
    const { from, to } = motion;
    if (motion.kind !== 'rapid' || Number.isNaN(from.z)) continue;
    if (to.z <= 0 && to.z < from.z) into ??= motion;
    const low = Math.min(from.z, to.z);
    if ((from.x !== to.x || from.y !== to.y) && low < lowest) [lowest, worst] = [low, motion];
  }
  const low = worst !== null && lowest < spec.safeHeight - tolerance;
  const motion = low ? worst : (into ?? worst);
  return finding('rapids', low || into ? 'disagrees' : 'agrees', 'length', motion?.at ?? cut.whole, {
    wanted: spec.safeHeight,
    measured: into && !low ? into.to.z : worst ? lowest : null,
    point: motion?.to ?? null,
    reason: into && !low ? 'intoWood' : null,
  });
};

/** Gap kept between a thing of some radius at some height above the bit's end, and the clamps at both rail ends; Infinity where it is always above them. */
function gapToClamps(cut: Cut, radius: number, raised: number): { gap: number; motion: Motion | null } {
  const { spec } = cut;
  let gap = Infinity;
  let nearest: Motion | null = null;
  for (const motion of cut.motions) {
    if (isUnknown(motion.from)) continue;
    if (Math.min(motion.from.z, motion.to.z) + raised >= spec.clampHeight) continue;
    for (const { x } of [motion.from, ...pointsOf(motion, cut.tolerance)]) {
      const side = Math.min(x, cut.railLength - x) - spec.clampReach - radius;
      if (side < gap) [gap, nearest] = [side, motion];
    }
  }
  return { gap, motion: nearest };
}

/** The bit passes the clamps at every depth. */
export const clamps: Rule = (cut) => {
  const { gap, motion } = gapToClamps(cut, cut.spec.bitDiameter / 2, 0);
  const measured = Math.min(gap, cut.railLength);
  return finding('clamps', gap > 0 ? 'agrees' : 'disagrees', 'length', motion?.at ?? cut.whole, {
    wanted: 0, measured, point: motion?.to ?? null,
  });
};

/** The nut stays above the rail, and above the clamps or beside them, at every depth. */
export const nut: Rule = (cut) => {
  const { spec, tolerance } = cut;
  const lowest = cut.motions.reduce<Motion | null>((low, motion) => (isUnknown(motion.to) || (low && low.to.z <= motion.to.z) ? low : motion), null);
  const height = (lowest?.to.z ?? 0) + spec.stickout;
  const { gap, motion } = gapToClamps(cut, spec.colletDiameter / 2, spec.stickout);
  const touches = height < -tolerance || gap <= 0;
  const at = gap <= 0 ? motion : lowest;
  return finding('nut', touches ? 'disagrees' : 'agrees', 'length', at?.at ?? cut.whole, {
    wanted: spec.clampHeight, measured: height, point: at?.to ?? null, reason: height < spec.clampHeight - tolerance ? 'beside' : null,
  });
};

/** Every mode stated before the first motion, and none that moves zero, plane or feed elsewhere. */
export const modes: Rule = (cut) => {
  const missing = (motion: Motion): string[] => {
    const { units, plane, distance, feedMode, radiusCompensation, lengthOffset, workOffset } = motion.modes;
    return [
      ...(units === null ? ['G20 or G21'] : []), ...(plane === 17 ? [] : ['G17']), ...(distance === 90 ? [] : ['G90']),
      ...(feedMode === 94 ? [] : ['G94']), ...(radiusCompensation === 40 ? [] : ['G40']), ...(lengthOffset === 49 ? [] : ['G49']),
      ...(workOffset === 54 ? [] : ['G54']),
    ];
  };
  const bad = cut.motions.find((motion) => missing(motion).length > 0);
  return finding('modes', bad ? 'disagrees' : 'agrees', 'words', (bad ?? cut.motions[0])?.at ?? cut.whole, {
    wanted: 'all', measured: bad ? missing(bad).join(', ') : 'all',
  });
};

/** How the program ends: M2 or M30, above the safe height, with the spindle stopped before. */
export const end: Rule = (cut) => {
  const last = cut.steps[cut.steps.length - 1];
  const height = cut.motions[cut.motions.length - 1]?.to.z ?? NaN;
  const ended = last?.kind === 'end';
  const high = height >= cut.spec.safeHeight - cut.tolerance;
  return finding('end', ended && high ? 'agrees' : 'disagrees', 'length', last?.at ?? cut.whole, {
    wanted: cut.spec.safeHeight, measured: Number.isNaN(height) ? null : height, reason: ended ? null : 'noEnd',
  });
};
