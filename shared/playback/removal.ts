import type { Box } from './block';
import { type Grid, layGrid } from './grid';
import { type Falls, addFall, makeFalls } from './layers';
import type { Segments } from './segments';

/** When the wood at each crossing of a net goes, and how deep: the whole playback, whatever the moment. */
export interface Removal {
  readonly grid: Grid;
  /** Two numbers a crossing: x, y. Those beside a wall lie on it. */
  readonly places: Float64Array;
  readonly falls: Falls;
}

/** Falls kept for each crossing; where a program makes more, the slightest are left out. */
export const MOST_LAYERS = 16;
/** Cells to a bit's diameter. */
const CELLS_PER_BIT = 16;
/** The lip beside a wall, in bits: too narrow to see. */
const LIP = 1 / 2000;
/** In bits: covers what double rounding takes off a point that lies on the edge of the sweep. */
const EDGE = 1e-7;
/** In bits: a cut that deepens the wood by less is not worth a layer. */
const SLIGHTEST = 1e-6;
/** Tests between two looks at the clock: about a millisecond. */
const SLICE = 50_000;

/**
 * Works out the removal of a flat-ended bit that follows the segments through the rail, in slices: each `yield` gives
 * the share done, so that a page can draw in between. Answers null where nothing is cut.
 */
export function* removalInSlices(segments: Segments, diameter: number, rail: Box): Generator<number, Removal | null> {
  const radius = diameter / 2;
  const cutting = cuttingSegments(segments, radius, rail);
  const area = reachOf(segments, cutting, radius, rail);
  if (!area) return null;
  const grid = layGrid(area, diameter / CELLS_PER_BIT, diameter * LIP, MOST_LAYERS);
  const places = new Float64Array(grid.columns * grid.rows * 2);
  const off = new Float64Array(grid.columns * grid.rows).fill(Infinity);
  const toward = new Float64Array(grid.columns * grid.rows * 2);
  let work = 0;
  for (const [done, i] of cutting.entries()) {
    work += measureWalls(segments, i, radius, grid, off, toward);
    if (work > SLICE) {
      work = 0;
      yield (done / cutting.length) * 0.5;
    }
  }
  placeCrossings(grid, off, toward, places, diameter * LIP * 0.5);

  const falls = makeFalls(grid.columns * grid.rows, MOST_LAYERS);
  for (const [done, i] of cutting.entries()) {
    work += sweep(segments, i, radius * (1 + EDGE), rail.z0, grid, places, falls, diameter * SLIGHTEST);
    if (work > SLICE) {
      work = 0;
      yield 0.5 + (done / cutting.length) * 0.5;
    }
  }
  return { grid, places, falls };
}

/** The same in one go. */
export function buildRemoval(segments: Segments, diameter: number, rail: Box): Removal | null {
  const slices = removalInSlices(segments, diameter, rail);
  let next = slices.next();
  while (!next.done) next = slices.next();
  return next.value;
}

/** Those that come below the rail's top within a bit's reach of it. A rapid through wood takes it away too. */
function cuttingSegments({ count, ends }: Segments, radius: number, rail: Box): number[] {
  const cutting: number[] = [];
  for (let i = 0; i < count; i++) {
    const [ax = 0, ay = 0, az = 0, bx = 0, by = 0, bz = 0] = ends.subarray(i * 6, i * 6 + 6);
    if (Math.min(az, bz) >= rail.z1) continue;
    const beside = Math.max(ax, bx) + radius <= rail.x0 || Math.min(ax, bx) - radius >= rail.x1 || Math.max(ay, by) + radius <= rail.y0 || Math.min(ay, by) - radius >= rail.y1;
    if (!beside) cutting.push(i);
  }
  return cutting;
}

/** The rectangle the bit's edge stays in, no larger than the rail. */
function reachOf({ ends }: Segments, cutting: readonly number[], radius: number, rail: Box): Pick<Box, 'x0' | 'x1' | 'y0' | 'y1'> | null {
  let [x0, x1, y0, y1] = [Infinity, -Infinity, Infinity, -Infinity];
  for (const i of cutting) {
    const [ax = 0, ay = 0, , bx = 0, by = 0] = ends.subarray(i * 6, i * 6 + 6);
    x0 = Math.min(x0, ax, bx);
    x1 = Math.max(x1, ax, bx);
    y0 = Math.min(y0, ay, by);
    y1 = Math.max(y1, ay, by);
  }
  if (x0 > x1) return null;
  return { x0: Math.max(rail.x0, x0 - radius), x1: Math.min(rail.x1, x1 + radius), y0: Math.max(rail.y0, y0 - radius), y1: Math.min(rail.y1, y1 + radius) };
}

/** First and last line of a row of even lines (with one lip at each end) that lie between two places. */
const firstLine = (at: number, from: number, cell: number) => Math.max(0, Math.ceil((at - from) / cell) + 1);
const lastLine = (at: number, from: number, cell: number, lines: number) => Math.min(lines - 1, Math.floor((at - from) / cell) + 1);
// A lip line lies within a cell of its neighbour: looked at whenever that one is, and its true place decides.

/** Notes for each crossing near the segment how far outside its sweep it lies (inside: less than 0), and the way out. */
function measureWalls({ ends }: Segments, i: number, radius: number, grid: Grid, off: Float64Array, toward: Float64Array): number {
  const [ax = 0, ay = 0, az = 0, bx = 0, by = 0, bz = 0] = ends.subarray(i * 6, i * 6 + 6);
  if (Math.min(az, bz) >= 0) return 0;
  const margin = radius + 1.5 * Math.max(grid.cellX, grid.cellY); // a diagonal of a cell beyond the wall, and a little
  const c0 = firstLine(Math.min(ax, bx) - margin, grid.x0, grid.cellX);
  const c1 = lastLine(Math.max(ax, bx) + margin, grid.x0, grid.cellX, grid.columns);
  const r0 = firstLine(Math.min(ay, by) - margin, grid.y0, grid.cellY);
  const r1 = lastLine(Math.max(ay, by) + margin, grid.y0, grid.cellY, grid.rows);
  const ux = bx - ax;
  const uy = by - ay;
  const square = ux * ux + uy * uy;
  for (let r = r0; r <= r1; r++) {
    const wy = (grid.ys[r] ?? 0) - ay;
    for (let c = c0; c <= c1; c++) {
      const wx = (grid.xs[c] ?? 0) - ax;
      const along = square > 0 ? Math.min(1, Math.max(0, (wx * ux + wy * uy) / square)) : 0;
      const dx = wx - ux * along;
      const dy = wy - uy * along;
      const distance = Math.sqrt(dx * dx + dy * dy);
      const v = r * grid.columns + c;
      if (distance - radius >= (off[v] ?? 0)) continue;
      off[v] = distance - radius;
      toward[v * 2] = distance > 0 ? dx / distance : 0;
      toward[v * 2 + 1] = distance > 0 ? dy / distance : 0;
    }
  }
  return (r1 - r0 + 1) * (c1 - c0 + 1);
}

/**
 * Puts every crossing that has a neighbour on the other side of the finished cut's wall onto that wall, just inside or
 * just outside, so that walls stand upright and round ends are round. The outer frame stays: it joins the block.
 */
function placeCrossings(grid: Grid, off: Float64Array, toward: Float64Array, places: Float64Array, lip: number): void {
  const { columns, rows } = grid;
  const inside = (v: number) => (off[v] ?? Infinity) <= EDGE;
  const beside = [-columns - 1, -columns, -columns + 1, -1, 1, columns - 1, columns, columns + 1];
  for (let r = 0; r < rows; r++) {
    for (let c = 0; c < columns; c++) {
      const v = r * columns + c;
      const frame = r === 0 || c === 0 || r === rows - 1 || c === columns - 1;
      const within = inside(v);
      const atWall = !frame && beside.some((to) => inside(v + to) !== within);
      const shift = atWall && Number.isFinite(off[v]) ? (within ? -lip : lip) - (off[v] ?? 0) : 0;
      places[v * 2] = (grid.xs[c] ?? 0) + (toward[v * 2] ?? 0) * shift;
      places[v * 2 + 1] = (grid.ys[r] ?? 0) + (toward[v * 2 + 1] ?? 0) * shift;
    }
  }
}

/** Adds the fall that one segment makes at each crossing it covers. */
function sweep({ ends, travel }: Segments, i: number, radius: number, floor: number, grid: Grid, places: Float64Array, falls: Falls, least: number): number {
  const [ax = 0, ay = 0, az = 0, bx = 0, by = 0, bz = 0] = ends.subarray(i * 6, i * 6 + 6);
  const begins = travel[i * 2] ?? 0;
  const whole = (travel[i * 2 + 1] ?? 0) - begins;
  const margin = radius + 1.5 * Math.max(grid.cellX, grid.cellY); // crossings have been moved by up to a diagonal
  const c0 = firstLine(Math.min(ax, bx) - margin, grid.x0, grid.cellX);
  const c1 = lastLine(Math.max(ax, bx) + margin, grid.x0, grid.cellX, grid.columns);
  const r0 = firstLine(Math.min(ay, by) - margin, grid.y0, grid.cellY);
  const r1 = lastLine(Math.max(ay, by) + margin, grid.y0, grid.cellY, grid.rows);
  const length = Math.sqrt((bx - ax) ** 2 + (by - ay) ** 2);
  const ux = length > 0 ? (bx - ax) / length : 0;
  const uy = length > 0 ? (by - ay) / length : 0;
  const deepest = Math.max(floor, Math.min(az, bz));
  for (let r = r0; r <= r1; r++) {
    for (let c = c0; c <= c1; c++) {
      const v = r * grid.columns + c;
      const n = falls.count[v] ?? 0;
      if (n > 0 && deepest >= (falls.data[(v * falls.layers + n) * 4 - 1] ?? 0) - least) continue; // already as deep
      const wx = (places[v * 2] ?? 0) - ax;
      const wy = (places[v * 2 + 1] ?? 0) - ay;
      const off = wx * uy - wy * ux;
      const half = radius * radius - off * off;
      const along = wx * ux + wy * uy;
      if (length === 0 ? wx * wx + wy * wy > radius * radius : half < 0) continue;
      const reach = length === 0 ? 0 : Math.sqrt(half);
      if (along + reach < 0 || along - reach > length) continue;
      // Share of the segment at which the bit first and last covers this place; a straight plunge covers it throughout.
      const first = length === 0 ? 0 : Math.max(0, along - reach) / length;
      const last = length === 0 ? 1 : Math.min(length, along + reach) / length;
      const za = Math.max(floor, az + (bz - az) * first);
      const zb = Math.max(floor, az + (bz - az) * last);
      if (zb < za) addFall(falls, v, begins + whole * first, za, begins + whole * last, zb, least);
      else addFall(falls, v, begins + whole * first, za, begins + whole * first, za, least);
    }
  }
  return (r1 - r0 + 1) * (c1 - c0 + 1);
}
