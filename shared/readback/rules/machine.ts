import { norm } from '../../geometry/point';
import { byUnits } from '../../measure/units';
import type { Motion } from '../../reader/motion';
import { advisedChipLoad, chipLoad as feedPerTooth } from '../../slot/chipLoad';
import { type Rule, finding, greatest, placeOf } from './rule';

/** Below the safe height the bit must turn; where a hand switches it nothing in the text can show that. */
export const spindle: Rule = (cut) => {
  const { spec, tolerance } = cut;
  let height = Infinity;
  let turning = false;
  let stops = 0;
  let wrong: { at: Motion['at']; reason: string } | null = null;
  const low = () => height < spec.safeHeight - tolerance;
  for (const step of cut.steps) {
    if (step.kind === 'stop') {
      if (low()) wrong ??= { at: step.at, reason: 'stopsLow' };
      stops += 1;
    } else if (step.kind === 'spindle') {
      if (turning && low()) wrong ??= { at: step.at, reason: 'changesLow' };
      turning = step.modes.spindle === 'clockwise';
      if (spec.spindle === 'hand' && turning) wrong ??= { at: step.at, reason: 'byProgram' };
      if (step.modes.spindle === 'counterclockwise') wrong ??= { at: step.at, reason: 'backwards' };
    } else if ('to' in step) {
      height = Number.isNaN(step.to.z) ? height : step.to.z;
      if (!low()) continue;
      if (spec.spindle === 'program' && !turning) wrong ??= { at: step.at, reason: 'stopped' };
      if (spec.spindle === 'hand' && stops === 0) wrong ??= { at: step.at, reason: 'noStop' };
    }
  }
  if (spec.spindle === 'hand' && stops < 2) wrong ??= { at: cut.whole, reason: 'noStop' };
  const words = spec.spindle === 'hand' ? 'by hand' : 'turning below the safe height';
  if (wrong) return finding('spindle', 'disagrees', 'words', wrong.at, { wanted: words, measured: null, reason: wrong.reason });
  if (spec.spindle === 'hand') return finding('spindle', 'not measured', 'words', cut.whole, { wanted: words, measured: null, reason: 'byHand' });
  return finding('spindle', 'agrees', 'words', cut.steps.find((step) => step.kind === 'spindle')?.at ?? cut.whole, { wanted: words, measured: words });
};

/** What the program travels on each axis against what the machine has. */
export const travel: Rule = (cut) => {
  const limits = cut.spec.machine?.travel;
  if (!limits) return finding('travel', 'not measured', 'length', cut.whole, { wanted: null, measured: null, reason: 'noMachine' });
  const points = cut.motions.map((motion) => motion.to).filter(({ x, y, z }) => !Number.isNaN(x + y + z));
  const span = (axis: 'x' | 'y' | 'z') => {
    const values = points.map((point) => point[axis]);
    return values.reduce((high, value) => Math.max(high, value), -Infinity) - values.reduce((low, value) => Math.min(low, value), Infinity);
  };
  const measured = [span('x'), span('y'), span('z')];
  const wanted = [limits.x, limits.y, limits.z];
  const fits = measured.every((reach, axis) => reach <= (wanted[axis] ?? 0) + cut.tolerance);
  return finding('travel', fits ? 'agrees' : 'disagrees', 'length', cut.whole, { wanted, measured });
};

/** Speed while cutting. */
export const spindleSpeed: Rule = (cut) => {
  const { spec } = cut;
  const cutting = cut.pieces.find((piece) => piece.motion.modes.spindleSpeed !== Math.round(spec.spindleSpeed)) ?? cut.pieces[0];
  const measured = cutting?.motion.modes.spindleSpeed ?? null;
  if (measured === null) return finding('spindleSpeed', 'not measured', 'speed', cut.whole, { wanted: spec.spindleSpeed, measured: null, reason: 'noWord' });
  return finding('spindleSpeed', Math.abs(measured - spec.spindleSpeed) <= 1 ? 'agrees' : 'disagrees', 'speed', cutting?.motion.at ?? cut.whole, {
    wanted: spec.spindleSpeed, measured,
  });
};

/** Fastest feed in the wood. */
export const feed: Rule = (cut) => {
  const { spec } = cut;
  const wanted = Math.min(spec.feed, spec.machine?.topFeed ?? Infinity);
  const slack = byUnits(spec.units, 0.1, 1); // a feed is written with one decimal
  let fastest: Motion | null = null;
  for (const { motion } of cut.pieces) {
    if (motion.kind === 'rapid') continue;
    if (motion.feed === null || motion.feed <= 0) return finding('feed', 'disagrees', 'feed', motion.at, { wanted, measured: null, reason: 'noFeed' });
    if (!fastest || motion.feed > (fastest.feed ?? 0)) fastest = motion;
  }
  const measured = fastest?.feed ?? null;
  return finding('feed', measured !== null && measured <= wanted + slack ? 'agrees' : 'disagrees', 'feed', fastest?.at ?? cut.whole, { wanted, measured });
};

/** Fastest way down: the part of the feed that points into the wood. */
export const plungeFeed: Rule = (cut) => {
  const { spec } = cut;
  let measured = 0;
  let fastest: Motion | null = null;
  for (const { motion } of cut.pieces) {
    const { from, to } = motion;
    if (motion.kind === 'rapid' || to.z >= from.z || motion.feed === null) continue;
    const along = motion.arc ? motion.arc.radius * motion.arc.sweep : norm(to.x - from.x, to.y - from.y);
    // Depths are written in whole steps of the last decimal: one step of fall may be rounding.
    const fall = along > 0 ? Math.max(0, from.z - to.z - cut.step) : from.z - to.z;
    const down = (motion.feed * fall) / norm(along, fall);
    if (down > measured) [measured, fastest] = [down, motion];
  }
  const slack = byUnits(spec.units, 0.1, 1); // a feed is written with one decimal
  return finding('plungeFeed', measured <= spec.plungeFeed + slack ? 'agrees' : 'disagrees', 'feed', fastest?.at ?? cut.whole, {
    wanted: spec.plungeFeed, measured,
  });
};

/** Feed per tooth against the advised range. */
export const chipLoad: Rule = (cut) => {
  const { spec } = cut;
  const band = advisedChipLoad(spec);
  const fastest = greatest(cut.pieces, ({ motion }) => motion.feed ?? 0);
  const measured = feedPerTooth({ ...spec, feed: Math.max(0, fastest.value) });
  // A feed is set on whole figures, so it may stand one such step outside.
  const slack = feedPerTooth({ ...spec, feed: byUnits(spec.units, 0.5, 5) });
  const below = measured < band.least - slack;
  const above = measured > band.most + slack;
  return finding('chipLoad', below || above ? 'caution' : 'agrees', 'chipLoad', placeOf(cut, fastest.piece).at, {
    wanted: [band.least, band.most], measured, reason: below ? 'rubs' : above ? 'heavy' : band.source,
  });
};
