import { placeAt, wayLength } from './geometry';
import type { Run } from './interpret';
import { deepestOf } from './sizes';
import { insetOf, outsideHome, perimeterOf, type Slot } from './slotShape';
import type { JudgedOptions, JudgedSpec, Move, Violation } from './types';

interface LapMove {
  readonly cut: Move;
  /** How far its line lies inside the home's edge, all along. */
  readonly inset: number;
  /** The area it sweeps about the slot's middle: above zero when it goes counterclockwise. */
  readonly area: number;
}

/**
 * FACTS B3: with the spindle clockwise (M3) a counterclockwise lap inside a slot climbs, so the signed area of a closed
 * climb lap is above zero. Issue, "The plan": `direction` for every lap but the finish lap, which always climbs.
 */
export function judgeLaps(run: Run, cuts: readonly Move[], spec: JudgedSpec, slot: Slot, options: JudgedOptions): Violation[] {
  if (slot.oneBit) return []; // a line has no side
  const { home, tolerance } = slot;
  const allowance = spec.finishAllowance ?? 0;
  const floor = deepestOf(cuts) + 1e-7;
  const found: Violation[] = [];
  const sign = (spec.direction ?? 'climb') === 'climb' ? 1 : -1;
  const middle = Math.max(home.round, home.halfY);
  const parallel = 1.5 * run.step; // a lap's ends round by half a step each; a way in or out crosses the whole allowance
  const atWall = allowance > 0 ? Math.min(tolerance, allowance / 2) : tolerance;
  const laps = cuts.flatMap(cut => lapMove(cut, slot, parallel));

  for (const lap of laps) {
    const level = lap.cut.from.z === lap.cut.to.z;
    const wall = lap.inset <= atWall;
    if (!level || lap.inset > middle - tolerance) continue; // ramps may come back over themselves; the middle line has no side
    const finish = allowance > 0 && wall;
    if (finish ? lap.area < 0 : lap.area * sign < 0) {
      found.push({
        rule: finish ? 'finish-lap' : 'direction',
        line: lap.cut.line,
        message: finish ? 'the finish lap goes clockwise, so it does not climb' : `this lap is not ${spec.direction ?? 'climb'}`,
      });
    }
  }
  if (allowance <= 2 * parallel) return found; // nothing that the text could show
  // Roughing leaves the allowance on the walls; only the last lap, at full depth, takes it.
  for (const cut of cuts) {
    if (Math.min(cut.from.z, cut.to.z) <= floor) continue;
    const nearWall = [0, 0.5, 1].map(t => placeAt(cut, t)).some(({ x, y }) =>
      outsideHome(home, x, y) === 0 && insetOf(home, x, y) < allowance - 2.5 * run.step); // ends and middles of bends round, each by 0.71 of a step
    if (nearWall) found.push({ rule: 'finish-lap', line: cut.line, message: `roughing comes nearer to the wall than ${allowance}` });
  }
  const finishing = laps.filter(lap => lap.inset <= atWall && lap.cut.to.z <= floor && lap.area > 0);
  const round = finishing.reduce((sum, lap) => sum + wayLength(lap.cut), 0);
  const chords = (options.chordTolerance ?? 0) > 0;
  const whole = perimeterOf(home) - (chords ? 2 * Math.PI * home.round : 0); // a chord is not parallel to its bend: the sides tell
  if (round < whole - 16 * tolerance) found.push({ rule: 'finish-lap', line: 0, message: `the finish lap is ${round.toFixed(4)} long, once round is ${whole.toFixed(4)}` });
  const lastWall = cuts.findLastIndex(cut => finishing.some(lap => lap.cut === cut));
  const after = cuts.slice(lastWall + 1).filter(cut => cut.to.z <= floor && lapMove(cut, slot, parallel).some(lap => lap.inset > allowance - parallel));
  for (const cut of after) found.push({ rule: 'finish-lap', line: cut.line, message: 'a lap after the finish lap' });
  return found;
}

/** A move along the slot's own outline, shrunk: the same inset all along, and some way round the middle. */
function lapMove(cut: Move, { home, tolerance }: Slot, parallel: number): LapMove[] {
  const from = placeAt(cut, 0.1); // not in the corner itself, where the next side's rounding would tell
  const half = placeAt(cut, 0.5);
  const to = placeAt(cut, 0.9);
  const insets = [from, half, to].map(({ x, y }) => outsideHome(home, x, y) > 0 ? -outsideHome(home, x, y) : insetOf(home, x, y));
  const inset = insets.reduce((sum, one) => sum + one, 0) / insets.length;
  const spread = cut.turn === null ? parallel : 2 * parallel; // a turn's middle and radius round as well as its ends
  if (Math.max(...insets) - Math.min(...insets) > spread || wayLength(cut) < 4 * tolerance) return [];
  const { x, y } = home.centre;
  const cross = (a: { x: number; y: number }, b: { x: number; y: number }): number => (a.x - x) * (b.y - y) - (a.y - y) * (b.x - x);
  return [{ cut, inset, area: (cross(from, half) + cross(half, to)) / 2 }];
}
