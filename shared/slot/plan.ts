import type { Point2 } from '../geometry/point';
import { assert } from '../assert';
import { type Go, openLap, openLine } from './entry';
import { type Lap, type Side, distanceAlong, pointAlong } from './lap';
import { layOut } from './layout';
import type { CutMove, MoveRole, SlotPath } from './path';
import type { SlotSpec } from './spec';

/** A lead onto the wall this many bits long is so shallow that the bit takes no more than the allowance on the way. */
const LEAD_BITS = 4;

/**
 * Plans one slot as a single continuous cut with no retract between passes.
 *
 * The entry descends along the slot itself, over the same places in each pass, so that no point is ever cut deeper
 * than one pass; the last ramp is cut again level, so that the floor is flat. Wider slots go outward lap by lap from
 * the middle. A finish lap follows at the last depth, and before it wherever the wall would grow taller than the
 * bit's cutting length.
 *
 * @param grid one step of the last decimal written, in the spec's units: depths are whole steps of it.
 * @returns the path in the spec's units, from the work zero.
 */
export function planSlot(spec: SlotSpec, grid: number): SlotPath {
  const layout = layOut(spec, grid);
  const moves: CutMove[] = [];
  const go: Go = (to, steps, role, arc = null) => {
    moves.push({ to: { x: to.x, y: to.y, z: -steps * grid }, arc, role });
  };

  const innermost = layout.laps[0];
  const opening = innermost ? openLap(layout, innermost, go) : openLine(layout, spec.finishAllowance, go);
  const levels: number[] = [];
  let level = 0;
  let finished = 0;
  layout.passes.forEach((pass, i) => {
    level += pass;
    levels.push(level * grid);
    const last = i === layout.passes.length - 1;
    const { at, side } = opening.pass(i, level, last);
    const outermost = goOutward(layout.laps, at, side, level, go);
    const next = layout.passes[i + 1] ?? 0;
    if (layout.finish && (last || (level + next - finished) * grid > spec.cuttingLength)) {
      goFinish(layout.finish, outermost, level, LEAD_BITS * spec.bitDiameter, go);
      finished = level;
    }
    if (!last && (layout.finish || layout.laps.length > 1)) go(at, level, 'pass');
  });

  const start = opening.start;
  return { start: { x: start.x, y: start.y, z: layout.entryHeight }, moves, levels };
}

/** Steps outward from the innermost lap and goes once round each of the others; answers where it ended. */
function goOutward(laps: readonly Lap[], from: Point2, side: number, level: number, go: Go): Point2 {
  return laps.slice(1).reduce((at, lap) => goRound(lap, side, at, level, 'pass', go), from);
}

/** On to the wall along a shallow lead, once round it climbing, and off it again so that the retract leaves no mark. */
function goFinish(lap: Lap, from: Point2, level: number, lead: number, go: Go): void {
  const { index, on } = leadOn(lap, from, lead);
  goRound(lap, index, on, level, 'finish', go);
  go(from, level, 'finish');
}

/** The straight side with most room for the lead ahead of a point's foot, the nearer one where two have as much. */
function leadOn(lap: Lap, from: Point2, lead: number): { index: number; on: Point2 } {
  const [best] = lap.sides.map((side, index) => {
    const foot = distanceAlong(side, from);
    const room = side.centre ? 0 : Math.min(lead, side.length - foot);
    const on = pointAlong(side, foot + room);
    return { index, on, room, away: Math.hypot(on.x - from.x, on.y - from.y) };
  }).sort((a, b) => b.room - a.room || a.away - b.away);
  assert(best, 'a finish lap has sides');
  return best;
}

/** Once round a lap from the foot of a point on one of its sides, back to that foot. */
function goRound(lap: Lap, index: number, from: Point2, level: number, role: MoveRole, go: Go): Point2 {
  const first = lap.sides[index];
  assert(first, 'laps of one slot have the same sides');
  const distance = distanceAlong(first, from);
  const foot = pointAlong(first, distance);
  go(foot, level, role);
  for (let i = 0; i < lap.sides.length; i++) {
    const side = lap.sides[(index + i) % lap.sides.length];
    assert(side, 'the index is held to the sides');
    if (i > 0 || distance < side.length) go(side.to, level, role, arcOf(lap, side));
  }
  if (distance > 0) go(foot, level, role, arcOf(lap, first));
  return foot;
}

/** The centre and sense of a side that is part of a round end. */
function arcOf(lap: Lap, side: Side): CutMove['arc'] {
  return side.centre && { centre: side.centre, turn: lap.turn };
}
