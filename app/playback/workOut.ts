import { type Box, type Removal, type Segments, type StageSizes, finishSteps, packFalls, pathSegments, removalInSlices, stageSizes } from '#shared/playback/index';
import type { SlotSpec } from '#shared/slot/spec';
import type { Timeline } from '#shared/time/index';
import { type PackedLines, packLines } from './packLines';

/** Chords of an arc run inside it by at most this share of the bit's diameter: less than a pixel at any zoom. */
const CHORD = 1 / 2000;

/** A program's path as the playback draws it, its finish laps told apart. */
export function segmentsOf(timeline: Timeline, spec: SlotSpec): Segments {
  const { bitDiameter, finishAllowance } = stageSizes(spec);
  return pathSegments(timeline, bitDiameter * CHORD, finishSteps(timeline, finishAllowance));
}

/** The net over the cut, ready for the graphics card. Its heights at any moment come from the falls. */
export interface CutField {
  readonly grid: Removal['grid'];
  /** Three numbers a crossing, and six a cell: its two triangles. */
  readonly position: Float32Array<ArrayBuffer>;
  readonly index: Uint32Array<ArrayBuffer>;
  readonly falls: { readonly data: Float32Array; readonly layers: number };
}

/** All that takes time to work out of a program's picture. */
export interface WorkedOut {
  readonly lines: PackedLines;
  /** Null where nothing is cut. */
  readonly field: CutField | null;
}

/** Long enough that a rail's edge is a few dozen pieces. */
export const pieceOf = ({ x0, x1 }: Box): number => (x1 - x0) / 32;

/** Works a picture out in slices; each `yield` gives the share done. Pure, so that it can run in a worker. */
export function* workOut(segments: Segments, { bitDiameter, rail }: Pick<StageSizes, 'bitDiameter' | 'rail'>): Generator<number, WorkedOut> {
  const removal = yield* removalInSlices(segments, bitDiameter, rail);
  yield 1;
  const lines = packLines(segments, pieceOf(rail));
  yield 1;
  return { lines, field: removal && fieldOf(removal) };
}

function fieldOf({ grid, places, falls }: Removal): CutField {
  const { columns, rows } = grid;
  const position = new Float32Array(columns * rows * 3);
  for (let v = 0; v < columns * rows; v++) {
    position[v * 3] = places[v * 2] ?? 0;
    position[v * 3 + 1] = places[v * 2 + 1] ?? 0;
  }
  const index = new Uint32Array((columns - 1) * (rows - 1) * 6);
  let at = 0;
  for (let r = 0; r < rows - 1; r++) {
    for (let c = 0; c < columns - 1; c++) {
      const v = r * columns + c;
      // Two triangles that share the diagonal from the first corner.
      index[at] = index[at + 3] = v;
      index[at + 1] = v + 1;
      index[at + 2] = index[at + 4] = v + columns + 1;
      index[at + 5] = v + columns;
      at += 6;
    }
  }
  return { grid, position, index, falls: packFalls(falls, columns, rows) };
}
