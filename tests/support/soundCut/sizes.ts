import { boxOf, placeAt, trackOf } from './geometry';
import type { Run } from './interpret';
import { farthestOutside, type Slot } from './slotShape';
import type { JudgedOptions, JudgedSpec, Move, Rule, Violation } from './types';

/** The part of a move at or under a height, or null: Z keeps pace with the way, so one share of it. */
export function partBelow(move: Move, height: number): { readonly move: Move; readonly share: number } | null {
  const a = move.from.z - height;
  const b = move.to.z - height;
  if (a <= 0 && b <= 0) return { move, share: 1 };
  if (a > 0 && b > 0) return null;
  const crossing = a / (a - b);
  const at = placeAt(move, crossing);
  const share = a > 0 ? 1 - crossing : crossing;
  const turn = move.turn === null ? null
    : { ...move.turn, start: a > 0 ? move.turn.start + move.turn.sweep * crossing : move.turn.start, sweep: move.turn.sweep * share };
  return { move: a > 0 ? { ...move, from: at, turn } : { ...move, to: at, turn }, share };
}

/** Moves that go below the top, clipped to what is below it. */
export function cutsOf(moves: readonly Move[]): Move[] {
  return moves.flatMap((move) => {
    const known = ![move.from.x, move.from.y, move.from.z, move.to.x, move.to.y, move.to.z].some(Number.isNaN);
    const lowest = Math.min(move.from.z, move.to.z);
    const part = known && lowest < -1e-9 ? partBelow(move, 0) : null; // 1e-9: on the top is not in the wood
    return part === null ? [] : [part.move];
  });
}

export function deepestOf(cuts: readonly Move[]): number {
  return cuts.reduce((least, cut) => Math.min(least, cut.from.z, cut.to.z), 0);
}

/** The moves that lie wholly on the floor: what a ramp leaves behind it is no flat floor. */
export function floorOf(cuts: readonly Move[]): Move[] {
  const floor = deepestOf(cuts) + 1e-7; // equal in the text, converted between units
  return cuts.filter(cut => !cut.rapid && cut.from.z <= floor && cut.to.z <= floor);
}

/** Nothing outside the slot, and length, width, depth and margins to 0.0005 in / 0.01 mm (issue, "The plan"). */
export function judgeSizes(run: Run, cuts: readonly Move[], spec: JudgedSpec, slot: Slot, options: JudgedOptions): Violation[] {
  const found: Violation[] = [];
  const tolerance = slot.tolerance + 1e-9;
  for (const cut of cuts) {
    // A slot is its home grown by the bit's radius, so the bit leaves the slot exactly as far as its middle leaves home.
    const outside = farthestOutside(slot.home, cut);
    if (outside > tolerance) found.push({ rule: 'outside', line: cut.line, message: `the bit leaves the slot by ${outside.toFixed(6)}` });
  }
  const deepest = deepestOf(cuts);
  if (!(Math.abs(deepest + spec.depth) <= run.step / 2 + 1e-9)) {
    const line = cuts.find(cut => Math.min(cut.from.z, cut.to.z) === deepest)?.line ?? 0;
    found.push({ rule: 'deepest', line, message: `deepest Z ${deepest}, not ${-spec.depth}` });
  }
  const floor = floorOf(cuts);
  if (floor.length === 0) return [...found, { rule: 'uncut-floor', line: 0, message: 'no move on the floor' }];
  const boxes = floor.map(cut => trackOf(cut).box);
  const box = boxOf(boxes.flatMap(({ x0, y0, x1, y1 }) => [{ x: x0, y: y0 }, { x: x1, y: y1 }]));
  const railStart = slot.home.centre.x - spec.length / 2 - spec.stopMargin;
  const railEnd = slot.home.centre.x + spec.length / 2 + spec.stopMargin;
  const size = (rule: Rule, what: string, measured: number, wanted: number): void => {
    const slack = tolerance + (slot.home.round > 0 ? options.chordTolerance ?? 0 : 0);
    if (Math.abs(measured - wanted) > slack) found.push({ rule, line: 0, message: `${what} ${measured.toFixed(6)}, wanted ${wanted.toFixed(6)}` });
  };
  size('length', 'length', box.x1 - box.x0 + 2 * slot.bitRadius, spec.length);
  size('width', 'width', box.y1 - box.y0 + 2 * slot.bitRadius, slot.width);
  size('stop-margin', 'left stop margin', box.x0 - slot.bitRadius - railStart, spec.stopMargin);
  size('stop-margin', 'right stop margin', railEnd - box.x1 - slot.bitRadius, spec.stopMargin);
  return found;
}
