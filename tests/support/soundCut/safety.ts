import { planLength } from './geometry';
import type { Run } from './interpret';
import { slotOf } from './slotShape';
import { inches, type JudgedOptions, type JudgedSpec, type Move, type Rule, type Violation } from './types';
import { blocksOf, type ProgramText } from './words';

const CLAMP_CLEARANCE = 0.125; // in; a lower safe height is refused (issue, "The slot spec")
const LEAD = { in: 0.02, mm: 0.5 }; // the ramp starts this far above the top (issue, "The plan"); no rapid goes lower
const ANGLE_SLACK = 0.05; // degrees over the ramp angle, for the rounding of Z over a ramp of ordinary length

/** Where the program has to be at rest: at least this high, or as high as the spec says. */
function safeHeightOf(spec: JudgedSpec, first: Move | undefined): number {
  const clamp = spec.clampHeight ?? (spec.units === 'in' ? 0.5 : 12); // issue's default
  const least = clamp + inches(CLAMP_CLEARANCE, spec.units);
  return spec.safeHeight ?? Math.max(least, first?.to.z ?? least);
}

/** What can hurt a person, a clamp or a bit, in the order it happens. All rows: issue, "The plan" and "The text". */
export function judgeSafety(run: Run, program: ProgramText, spec: JudgedSpec, options: JudgedOptions): Violation[] {
  const found: Violation[] = [];
  const say = (rule: Rule, line: number, message: string): void => void found.push({ rule, line, message });
  const near = run.step / 2 + 1e-9; // half the last decimal, and binary rounding
  const [first] = run.moves;
  const safe = safeHeightOf(spec, first);
  const byHand = spec.spindle === 'hand';

  if (first === undefined || !first.rapid || !Number.isNaN(first.to.x) || !(Math.abs(first.to.z - safe) <= near)) {
    say('first-motion', first?.line ?? 0, `the first motion must be a rapid in Z alone, to the safe height ${safe}`);
  }
  let spindleOn = false;
  let stops = 0;
  let stopsBefore = 0;
  let z = NaN;
  let hasCut = false;
  let inWood = false;
  let retracts = 0;
  for (const step of run.steps) {
    if (step.kind === 'spindle') {
      if (byHand) say('spindle', step.line, 'M3 or M5, though the spindle is switched by hand');
      if (!step.on && z < safe - near) say('spindle', step.line, `the spindle stops at Z ${z}, below the safe height`);
      if (step.on && (options.speedWord ?? true) && !(step.speed > 0)) say('speed', step.line, 'the spindle starts without a speed');
      spindleOn = step.on;
      continue;
    }
    if (step.kind === 'stop') {
      stops += 1;
      if (!byHand) say('stop', step.line, 'a stop not asked for');
      if (!(Math.abs(z - safe) <= near)) say('stop', step.line, `M0 at Z ${z}, not at the safe height`);
      continue;
    }
    const { move } = step;
    const { line, from, to, rapid } = move;
    const low = Number.isNaN(from.z) ? to.z : Math.min(from.z, to.z);
    const sideways = planLength(move) > 0 || (Number.isNaN(from.x) && !Number.isNaN(to.x));
    if (rapid && sideways && low < safe - near) say('rapid-sideways', line, `a rapid sideways at Z ${low}, below the safe height`);
    if (rapid && to.z < from.z && to.z < LEAD[spec.units] - near) say('rapid-down', line, `a rapid down to Z ${to.z}`);
    if (to.z < safe - near && from.z >= safe - near) stopsBefore = stops;
    if (low < safe - near && !(byHand ? stops > 0 : spindleOn)) say('spindle', line, 'below the safe height with the spindle off');
    if (low < -near) hasCut = inWood = true;
    if (inWood && to.z > near) {
      retracts += 1;
      inWood = false;
    }
    if (!rapid) found.push(...judgeEntry(move, spec, run.step));
    z = to.z;
  }
  if (hasCut && retracts !== 1) say('retract', 0, `${retracts} retracts, not one`);
  if (!(z >= safe - near)) say('retract', 0, `the program ends at Z ${z}, below the safe height`);
  if (!byHand && spindleOn) say('spindle', 0, 'the spindle is not switched off');
  if (byHand && (stopsBefore < 1 || stops <= stopsBefore)) say('stop', 0, 'by hand: one M0 before the cut and one after it');
  const speedsAllowed = !byHand && (options.speedWord ?? true);
  for (const block of blocksOf(program)) {
    if (!speedsAllowed && block.words.some(word => word.letter === 'S')) say('speed', block.line, 'an S word not asked for');
  }
  return found;
}

/** Ramps at most `rampAngle`; a plunge only where the bit's middle has nowhere to go (issue, "The plan"). */
function judgeEntry(move: Move, spec: JudgedSpec, step: number): Violation[] {
  const { from, to, line } = move;
  const drop = from.z - to.z;
  if (!(drop > 0) || to.z >= -step / 2) return [];
  const along = planLength(move);
  const { home } = slotOf(spec);
  const room = 2 * Math.hypot(home.halfX + home.round, home.halfY + home.round);
  if (along === 0) {
    return room <= step ? [] : [{ rule: 'plunge', line, message: `straight down by ${drop} where a ramp fits` }];
  }
  const most = spec.rampAngle ?? 3;
  const angle = Math.atan2(drop, along) * 180 / Math.PI;
  // A very short move: Z rounds by up to one step between its ends, its way by 1.5.
  const rounded = drop - step <= (along + 1.5 * step) * Math.tan(most * Math.PI / 180);
  return angle <= most + ANGLE_SLACK || rounded ? [] : [{ rule: 'ramp', line, message: `a ramp of ${angle.toFixed(3)} degrees, at most ${most}` }];
}
