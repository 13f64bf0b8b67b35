import { type Point3, norm } from '../../geometry/point';
import type { Motion } from '../../reader/motion';
import { isOneBit } from '../../slot/spec';
import { type Cut, piecesBelow } from '../cut';
import { deepestCut } from '../depthOfCut';
import type { Finding } from '../finding';
import { type Rule, finding, placeOf } from './rule';
import { pastSlot } from './slotShape';

/**
 * Depth of one pass against the stepdown, and of any cut against the bit's cutting length. The skin that was left for
 * a finish lap does not count as a pass: that lap takes it at its whole height.
 */
export function depthsOfCut(cut: Cut): Finding[] {
  const { spec, tolerance } = cut;
  const radius = spec.bitDiameter / 2;
  // Chords as coarse as this lose nothing of a depth; what they stray sideways is taken off the width that counts.
  const sagitta = radius / 100;
  const pieces = cut.motions.flatMap((motion) => piecesBelow(motion, sagitta));
  const hair = tolerance + sagitta;
  const any = deepestCut(pieces, radius, hair);
  const full = spec.finishAllowance > 0 ? deepestCut(pieces, radius, hair, (x, y) => pastSlot(cut, x, y, spec.finishAllowance) <= 0) : any;
  const at = (deepest: typeof full) => deepest.piece?.motion.at ?? cut.whole;
  const passes = finding('passDepth', full.depth <= spec.stepdown + tolerance ? 'agrees' : 'disagrees', 'length', at(full), {
    wanted: spec.stepdown, measured: full.depth, point: full.point,
  });
  const tooTall = any.depth > spec.cuttingLength + tolerance;
  const shankInSlot = spec.depth > spec.cuttingLength + tolerance;
  const edges = finding('cuttingLength', tooTall ? 'disagrees' : shankInSlot ? 'caution' : 'agrees', 'length', at(any), {
    wanted: spec.cuttingLength,
    measured: tooTall ? any.depth : Math.max(any.depth, spec.depth),
    point: any.point,
    reason: !tooTall && shankInSlot ? 'shank' : null,
  });
  return [passes, edges];
}

/** Length of a motion in plan; of an arc along the arc. */
function planLength({ arc, from, to }: Motion): number {
  return arc ? arc.radius * arc.sweep : norm(to.x - from.x, to.y - from.y);
}

/** Cutting motions that go down in the wood, and how far below the top. */
function descents({ motions }: Cut): { motion: Motion; into: number; along: number }[] {
  return motions.flatMap((motion) => {
    const { from, to, kind } = motion;
    if (kind === 'rapid' || !(to.z < from.z) || to.z >= 0) return [];
    return [{ motion, into: Math.min(from.z, 0) - to.z, along: planLength(motion) }];
  });
}

/** Steepest way into the wood. Straight down is for bits that cut at their centre, and a caution even then. */
export const entry: Rule = (cut) => {
  const { spec } = cut;
  const slope = Math.tan((spec.rampAngle * Math.PI) / 180);
  let steepest = 0;
  let worst: Motion | null = null;
  let plunge: Motion | null = null;
  for (const { motion, into, along } of descents(cut)) {
    if (along === 0) {
      plunge ??= motion;
      continue;
    }
    // Depths are written in whole steps of the last decimal, so a ramp may stand one step steeper than it was meant.
    const fall = motion.from.z > 0 ? motion.from.z - motion.to.z : into;
    const angle = (Math.atan2(Math.max(0, fall - cut.step), along) * 180) / Math.PI;
    if (angle > steepest) [steepest, worst] = [angle, motion];
  }
  const point = (motion: Motion | null): Point3 | null => motion && motion.to;
  if (plunge && Math.atan(slope) * (180 / Math.PI) + 1e-6 >= steepest) {
    return finding('entry', spec.centreCutting ? 'caution' : 'disagrees', 'angle', plunge.at, {
      wanted: spec.rampAngle, measured: 90, point: point(plunge), reason: spec.centreCutting ? 'plunge' : 'plungeWithoutCentre',
    });
  }
  return finding('entry', steepest <= spec.rampAngle + 1e-6 ? 'agrees' : 'disagrees', 'angle', worst?.at ?? cut.whole, {
    wanted: spec.rampAngle, measured: steepest, point: point(worst),
  });
};

/**
 * Which way the laps run. A piece belongs to a lap where it keeps its distance from the slot's edge; with the spindle
 * clockwise it climbs where it goes counterclockwise about the slot's middle (the cut edge lies on its right).
 */
export const laps: Rule = (cut) => {
  const { spec, step } = cut;
  if (isOneBit(spec)) return null;
  const [cx, cy] = [cut.railLength / 2, spec.railWidth / 2];
  const along = cut.pieces.flatMap((piece) => {
    if (piece.z0 !== piece.z1) return []; // a ramp may come back over itself
    const [from, middle, to] = [0.1, 0.5, 0.9].map((t) => ({ x: piece.x0 + t * (piece.x1 - piece.x0) - cx, y: piece.y0 + t * (piece.y1 - piece.y0) - cy }));
    if (!from || !middle || !to) return [];
    const past = [from, middle, to].map(({ x, y }) => pastSlot(cut, x + cx, y + cy) + spec.bitDiameter / 2);
    if (Math.max(...past) - Math.min(...past) > 2 * step || norm(to.x - from.x, to.y - from.y) < spec.bitDiameter / 4) return [];
    const inset = -(past[1] ?? 0);
    if (inset > (spec.width - spec.bitDiameter) / 2 - 2 * step) return []; // the middle line has no side
    return [{ piece, climbs: from.x * to.y - from.y * to.x > 0, finishes: spec.finishAllowance > 0 && inset < spec.finishAllowance / 2 }];
  });
  const wrong = along.find(({ climbs, finishes }) => climbs !== (finishes || spec.direction === 'climb'));
  if (along.length === 0) return null;
  const climbing = along.filter(({ climbs }) => climbs).length;
  const measured = climbing === 0 ? 'conventional' : climbing === along.length ? 'climb' : 'both ways';
  const wanted = spec.finishAllowance > 0 && spec.direction === 'conventional' ? 'conventional, climb at the wall' : spec.direction;
  return finding('laps', wrong ? 'disagrees' : 'agrees', 'words', (wrong ?? along[0])?.piece.motion.at ?? cut.whole, {
    wanted, measured: !wrong && measured === 'both ways' ? wanted : measured, point: placeOf(cut, wrong?.piece).point,
  });
};

/** Times that the bit leaves the wood. */
export const retracts: Rule = (cut) => {
  const leaving = cut.motions.filter(({ from, to }) => from.z < 0 && to.z >= 0);
  const last = leaving[leaving.length - 1];
  return finding('retracts', leaving.length === 1 ? 'agrees' : 'disagrees', 'count', last?.at ?? cut.whole, {
    wanted: 1, measured: leaving.length, point: last?.to ?? null,
  });
};
