import type { Box } from './block';

/** Lines of the net laid over the cut. The outermost ones lie just off it, so that a straight wall stands upright. */
export interface Grid {
  readonly columns: number;
  readonly rows: number;
  /** Even spacing between the inner lines. */
  readonly cellX: number;
  readonly cellY: number;
  /** First inner line. */
  readonly x0: number;
  readonly y0: number;
  readonly xs: Float64Array;
  readonly ys: Float64Array;
}

/** How many crossings the net may have: past this the cells grow. A quarter of a million is what a plain laptop draws with ease. */
const MOST_VERTICES = 200_000;
/** Graphics cards of the last ten years take textures at least this long on a side. */
const LONGEST_SIDE = 8192;

/**
 * @param cell wanted size of a cell.
 * @param lip how far outside the cut the outermost lines lie.
 * @param layers lines stacked above each other in one texture.
 */
export function layGrid(area: Pick<Box, 'x0' | 'x1' | 'y0' | 'y1'>, cell: number, lip: number, layers: number): Grid {
  const width = Math.max(area.x1 - area.x0, lip);
  const height = Math.max(area.y1 - area.y0, lip);
  const mostRows = Math.floor(LONGEST_SIDE / layers) - 3;
  const size = Math.max(cell, Math.sqrt((width * height) / MOST_VERTICES), width / (LONGEST_SIDE - 3), height / mostRows);
  const across = Math.max(1, Math.round(width / size));
  // An even number, so that one line runs along the middle, where the section is cut.
  const up = Math.max(2, 2 * Math.round(height / size / 2));
  return {
    columns: across + 3,
    rows: up + 3,
    cellX: width / across,
    cellY: height / up,
    x0: area.x0,
    y0: area.y0,
    xs: lines(area.x0, width, across, lip),
    ys: lines(area.y0, height, up, lip),
  };
}

function lines(from: number, span: number, parts: number, lip: number): Float64Array {
  const at = new Float64Array(parts + 3);
  for (let i = 0; i <= parts; i++) at[i + 1] = from + (span * i) / parts;
  at[0] = from - lip;
  at[parts + 2] = from + span + lip;
  return at;
}
