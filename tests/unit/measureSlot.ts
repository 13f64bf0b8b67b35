import { trackOf } from '../support/soundCut/geometry';
import { interpret } from '../support/soundCut/interpret';
import { cutsOf, deepestOf, floorOf } from '../support/soundCut/sizes';
import type { JudgedSpec } from '../support/soundCut/types';
import { readText } from '../support/soundCut/words';

/** A finished slot on its rail, from the rail's front left corner: what the judge's own interpreter sees of the floor. */
export interface MeasuredSlot {
  readonly left: number;
  readonly right: number;
  readonly front: number;
  readonly back: number;
  readonly length: number;
  readonly width: number;
  readonly depth: number;
  /** Depths that the bit travels level at, shallowest first. */
  readonly levels: readonly number[];
}

export function measureSlot(program: string, spec: JudgedSpec): MeasuredSlot {
  const cuts = cutsOf(interpret(readText(program), spec.units).moves);
  const boxes = floorOf(cuts).map((cut) => trackOf(cut).box);
  const radius = spec.bitDiameter / 2;
  const zero = spec.workZero === 'centre' ? { x: spec.length / 2 + spec.stopMargin, y: (spec.railWidth ?? 3 * spec.width) / 2 } : { x: 0, y: 0 };
  const left = Math.min(...boxes.map(({ x0 }) => x0)) - radius + zero.x;
  const right = Math.max(...boxes.map(({ x1 }) => x1)) + radius + zero.x;
  const front = Math.min(...boxes.map(({ y0 }) => y0)) - radius + zero.y;
  const back = Math.max(...boxes.map(({ y1 }) => y1)) + radius + zero.y;
  const level = cuts.filter(({ from, to }) => from.z === to.z).map(({ to }) => -to.z);
  return { left, right, front, back, length: right - left, width: back - front, depth: -deepestOf(cuts), levels: [...new Set(level)].sort((a, b) => a - b) };
}
