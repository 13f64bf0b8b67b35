import { type Timeline, isMotion } from '../time/index';

/** One depth of the cut, as the program text has it. */
export interface Pass {
  /** Seconds at which the bit leaves the depth before, or the top, for this one. */
  readonly start: number;
  readonly step: number;
  /** Below the rail's top, so less than 0. */
  readonly depth: number;
}

/** Level cuts shorter than this share of the longest are landings on a ramp, not a pass. */
const LANDING = 0.25;

/** Finds the passes from the motions: each new depth at which the bit cuts level for a good way. */
export function findPasses(timeline: Timeline): Pass[] {
  const level = new Map<number, number>();
  timeline.steps.forEach((step, i) => {
    if (!isMotion(step) || step.kind === 'rapid' || !(step.to.z < 0) || step.from.z !== step.to.z) return;
    level.set(step.to.z, (level.get(step.to.z) ?? 0) + (timeline.length[i] ?? 0));
  });
  let longest = 0;
  for (const length of level.values()) longest = Math.max(longest, length);
  const passes: Pass[] = [];
  let reached = 0;
  let left = -1;
  timeline.steps.forEach((step, i) => {
    if (!isMotion(step)) return;
    if (step.to.z < reached && left < 0) left = i;
    if (step.kind === 'rapid' || !(step.to.z < reached) || step.from.z !== step.to.z) return;
    if ((level.get(step.to.z) ?? 0) < longest * LANDING) return;
    passes.push({ start: timeline.start[left] ?? 0, step: left, depth: step.to.z });
    reached = step.to.z;
    left = -1;
  });
  return passes;
}

/** Which pass is under way at a moment, counted from 1; 0 before the first. */
export function passAt(passes: readonly Pass[], seconds: number): number {
  let n = 0;
  while ((passes[n]?.start ?? Infinity) <= seconds) n++;
  return n;
}
