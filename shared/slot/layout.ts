import { byUnits } from '../measure/units';
import { rampCapacity, share } from './entry';
import { type CentreArea, type Lap, centreArea, lapAt, onGrid, slopeLength } from './lap';
import { type SlotSpec, isOneBit } from './spec';

/** What the bit does at each pass depth, decided before any move is planned. */
export interface Layout {
  readonly area: CentreArea;
  /** Depth of each pass in whole steps of `grid`; they add up to the slot's depth. */
  readonly passes: readonly number[];
  readonly grid: number;
  /** Laps of one pass, innermost first; none where the bit runs along a line between the two ends. */
  readonly laps: readonly Lap[];
  /** The lap that each pass is entered on. */
  readonly opening: number;
  /** The lap on the walls at full depth; null where no finish lap is asked. */
  readonly finish: Lap | null;
  /** False where even the longest travel is too short to ramp on. */
  readonly ramps: boolean;
  /** Times round in one pass, each with a ramp: more than one where the lap is too short for the whole ramp. */
  readonly descents: number;
  /** Steepest descent, as a slope. */
  readonly slope: number;
  /** Height above the wood where the entry ramp starts. */
  readonly entryHeight: number;
}

/** Two sides of a lap must overlap by this share of the bit, or a hair of wood would stand between them. */
const OVERLAP = 0.02;
/** Travel below this share of the bit's diameter is no ramp: the bit would bore all the same. */
const SHORTEST_RAMP = 0.1;

/** Decides passes, laps and entry for a spec. `grid` is one step of the last decimal written, in the spec's units. */
export function layOut(spec: SlotSpec, grid: number): Layout {
  const area = centreArea(spec, grid);
  const { bitDiameter, finishAllowance } = spec;
  const turn = spec.direction === 'climb' ? 1 : -1;
  const passes = passSteps(spec, grid);
  const entryHeight = byUnits(spec.units, 0.02, 0.5);
  const slope = Math.tan((spec.rampAngle * Math.PI) / 180);
  const base = { area, passes, grid, slope, entryHeight };

  const finish = finishAllowance > 0 ? lapAt(area, 0, 1) : null;
  const inset = onGrid(finishAllowance, grid);
  const roughHalf = area.halfWidth - inset;
  const travel = 2 * (area.halfLength - inset);
  const deepest = Math.max(...passes);

  if (isOneBit(spec) || roughHalf < grid) {
    const ramps = travel >= SHORTEST_RAMP * bitDiameter && rampCapacity(2 * travel, slope, grid) > 0;
    return { ...base, laps: [], opening: 0, finish, ramps, descents: 1 };
  }

  const step = spec.stepover * bitDiameter;
  const single = 2 * roughHalf <= (1 - OVERLAP) * bitDiameter;
  const more = single ? 0 : Math.ceil((roughHalf - step / 2) / step - 1e-9);
  const spacing = more === 0 ? 0 : (roughHalf - step / 2) / more;
  const laps = Array.from({ length: more + 1 }, (_, i) => lapAt(area, onGrid(inset + (more - i) * spacing, grid), turn));
  return { ...base, laps, finish, ...openingOf(laps, deepest, base, SHORTEST_RAMP * bitDiameter) };
}

/** The lap to ramp in on: where the times round that a whole ramp needs cost least, the innermost of equals. */
function openingOf(laps: readonly Lap[], deepest: number, { slope, grid }: Pick<Layout, 'slope' | 'grid'>, shortest: number) {
  const [best] = laps.flatMap((lap, opening) => {
    const length = slopeLength(lap);
    const capacity = rampCapacity(length, slope, grid);
    if (length < shortest || capacity === 0) return [];
    const descents = Math.ceil(deepest / capacity);
    return [{ opening, descents, extra: (descents - 1) * length }];
  }).sort((a, b) => a.extra - b.extra || a.opening - b.opening);
  return best ? { opening: best.opening, descents: best.descents, ramps: true } : { opening: 0, descents: 1, ramps: false };
}

/** Equal passes, in whole steps, that reach the depth: none deeper than the stepdown by more than half a step. */
function passSteps(spec: SlotSpec, grid: number): number[] {
  const whole = Math.round(spec.depth / grid);
  const most = Math.max(1, Math.floor(spec.stepdown / grid + 0.5 + 1e-6)); // 1e-6: 0.09375 / 0.0001 is 937.4999999999999
  // The deeper passes come first, so that no ramp is ever more than one pass below the place it goes over again.
  return share(whole, Math.max(1, Math.ceil(whole / most)));
}
