import type { SlotSpec } from './spec';
import { rampCapacity } from './entry';
import { layOut } from './layout';
import { GRID } from '../program/grid';

/** Longest program worth writing: beyond it a stepdown or stepover was mistyped. */
export const MOST_BLOCKS = 100_000;

/** Lines around the cut: header, modes, start and end. */
const AROUND = 60;

/**
 * About how many blocks a spec's program will have, without planning it: sides, ramps and steps of every lap.
 *
 * @param chordTolerance as in the program options: 0 where arcs stay arcs.
 */
export function countBlocks(spec: SlotSpec, chordTolerance = 0): number {
  const grid = GRID[spec.units];
  // Passes and laps are multiplied before any is laid out: a count far past the limit must not cost what it counts.
  const passes = Math.ceil(spec.depth / Math.max(spec.stepdown, grid));
  const laps = Math.ceil((spec.width - spec.bitDiameter) / 2 / (spec.stepover * spec.bitDiameter));
  const least = passes * Math.max(1, 4 * laps);
  if (least > MOST_BLOCKS) return least;

  const layout = layOut(spec, grid);
  const radius = layout.area.round ? Math.max(layout.area.halfWidth, grid) : 0;
  const chords = radius > 0 && chordTolerance > 0 ? Math.ceil(Math.PI / 4 / Math.acos(1 - Math.min(1, chordTolerance / radius))) : 1;
  const round = layout.area.round ? 2 + 4 * chords : 4;
  const trips = Math.ceil(Math.max(...layout.passes) / Math.max(1, rampCapacity(4 * layout.area.halfLength, layout.slope, grid)));
  const perPass = layout.laps.length > 0 ? (layout.descents + layout.laps.length) * (round + 2) : trips * 2 + 1;
  const finishing = layout.finish ? Math.ceil(spec.depth / spec.cuttingLength + 1) * (round + 4) : 0;
  return layout.passes.length * perPass + finishing + AROUND;
}
