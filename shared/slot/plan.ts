import { type Point2, norm } from '../geometry/point';
import { assert } from '../assert';
import { type Go, openLap, openLine } from './entry';
import { type Lap, type Side, distanceAlong, pointAlong } from './lap';
import { layOut } from './layout';
import type { CutMove, MoveRole, SlotPath } from './path';
import type { SlotSpec } from './spec';

/** A lead onto the wall this many bits long is so shallow that the bit takes hardly more than the allowance on the way. */
const LEAD_BITS = 4;

/**
 * Plans one slot as a single continuous cut with no retract between passes.
 *
 * The entry descends along the slot itself, over the same places in each pass, so that no point is ever cut deeper
 * than one pass; the last ramp is cut again level, so that the floor is flat. Wider slots go lap by lap within
 * the stepover, the wall last. A finish lap follows at the last depth, and before it wherever the wall would grow taller than the
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

  const { laps, passes, finish } = layout;
  const levels = passes.map((_, i) => passes.slice(0, i + 1).reduce((sum, pass) => sum + pass, 0));
  const finishing = finish ? finishPasses(levels, spec.cuttingLength / grid) : new Set<number>();
  const first = laps[layout.opening];
  const opening = first ? openLap(layout, first, go) : openLine(layout, spec.finishAllowance, go);
  // From the lap that was entered on inward, then outward, so that the wall comes last.
  const others = [...laps.slice(0, layout.opening).reverse(), ...laps.slice(layout.opening + 1)];
  levels.forEach((level, i) => {
    const last = i === passes.length - 1;
    const { at, side } = opening.pass(i, level, last);
    const outermost = others.reduce((from, lap) => goRound(lap, side, from, level, 'pass', go), at);
    if (finish && finishing.has(i)) goFinish(finish, layout.area.middle, outermost, level, spec, go);
    if (!last) go(at, level, 'pass');
  });

  const start = opening.start;
  return { start: { x: start.x, y: start.y, z: layout.entryHeight }, moves, levels: levels.map((level) => level * grid) };
}

/** The passes that a finish lap follows: the last, and before it each from which the wall would grow too tall for the flutes. */
function finishPasses(levels: readonly number[], tallest: number): Set<number> {
  const finishing = new Set<number>();
  let finished = 0;
  levels.forEach((level, i) => {
    if ((levels[i + 1] ?? Infinity) - finished <= tallest) return;
    finishing.add(i);
    finished = level;
  });
  return finishing;
}

/**
 * On to the wall along a shallow lead, once round it climbing, and off it again so that the retract leaves no mark.
 * The lead is along the long side with more room for it, or the nearer of two; it starts where roughing has been.
 */
function goFinish(lap: Lap, middle: Point2, from: Point2, level: number, spec: SlotSpec, go: Go): void {
  const lead = LEAD_BITS * spec.bitDiameter;
  const [best] = lap.sides.map((side, index) => {
    // The way over leads through the open middle, along no wall; from an end of the slot it lands clear of the corner.
    const near = distanceAlong(side, from);
    const foot = near > 2 * spec.finishAllowance ? near : Math.min(spec.bitDiameter, side.length / 2);
    const room = side.from.y === side.to.y ? Math.min(lead, side.length - foot) : 0;
    const at = pointAlong(side, foot);
    return { index, side, foot, room, away: norm(at.x - from.x, at.y - from.y) };
  }).sort((a, b) => b.room - a.room || a.away - b.away);
  assert(best, 'a finish lap has sides');
  const off = inwardOf(best.side, best.foot, spec.finishAllowance);
  const on = pointAlong(best.side, best.foot + best.room);
  if (norm(off.x - from.x, off.y - from.y) > spec.bitDiameter / 100) go({ x: off.x, y: middle.y }, level, 'pass');
  go(off, level, 'pass');
  goRound(lap, best.index, on, level, 'finish', go);
  go(off, level, 'finish');
}

/** The point some way inside a counterclockwise lap from a place on one of its sides. */
function inwardOf(side: Side, distance: number, inset: number): Point2 {
  const at = pointAlong(side, distance);
  const { from, to, centre } = side;
  const [x, y] = centre ? [centre.x - at.x, centre.y - at.y] : [from.y - to.y, to.x - from.x];
  const scale = inset / norm(x, y);
  return { x: at.x + x * scale, y: at.y + y * scale };
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
