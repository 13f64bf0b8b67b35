import type { Step } from '#shared/reader/motion';
import { type SlotSpec, railLength } from '#shared/slot/spec';
import { type Units, MM_PER_INCH } from '#shared/measure/units';
import type { PlanSizes } from './planView';

/** CSS fixes the inch at 96 px, on paper too: a drawing in these units prints at true size at 100 %. */
export const PX_PER_INCH = 96;
/** One paper's share of the drawing, 10 × 5 1/4 in: inside the margins of Letter and of A4 laid sideways. */
export const TILE = { width: 960, height: 504 } as const;
/** Bare paper round the rail, for its sizes and the disc at work zero. */
export const PAD = { x: 24, y: 64 } as const;
/** Two neighbours show at least this much of the same rail. */
export const OVERLAP = 48;

export interface Point {
  readonly x: number;
  readonly y: number;
}
export interface Box extends Point {
  readonly width: number;
  readonly height: number;
}
/** A line on which two papers meet; both show it. */
export interface Join {
  readonly name: string;
  readonly at: number;
}
/** One paper: the part of the whole drawing it shows. */
export interface Tile extends Box {
  readonly number: number;
}
/** The rail at true size in CSS px, Y down, front edge at the bottom; the papers it is printed on, row by row. */
export interface Template {
  readonly rail: Box;
  readonly slot: Box & { readonly radius: number };
  readonly zero: Point;
  readonly bit: (Point & { readonly radius: number }) | null;
  readonly tiles: readonly Tile[];
  readonly upright: readonly Join[];
  readonly level: readonly Join[];
}

/** What the template is drawn from: the plan's sizes, and the bit and where it is set to zero. */
export interface TemplateSizes extends PlanSizes {
  readonly bitDiameter: number;
  readonly workZero: 'corner' | 'centre';
}

export const toPx = (value: number, units: Units): number => (units === 'in' ? value : value / MM_PER_INCH) * PX_PER_INCH;

/** Cuts a span into windows of one size that overlap evenly, and says where two of them meet: mid-overlap. */
export function windows(span: number, room: number, overlap: number): { readonly size: number; readonly starts: readonly number[]; readonly joins: readonly number[] } {
  if (span <= room) return { size: span, starts: [0], joins: [] };
  const count = Math.ceil((span - overlap) / (room - overlap) - 1e-9);
  const step = (span - room) / (count - 1);
  const starts = Array.from({ length: count }, (_, i) => i * step);
  return { size: room, starts, joins: starts.slice(1).map((start) => start + (room - step) / 2) };
}

/** Where the bit stands as it first goes into the wood, from the rail's front left corner, Y up. */
export function entryOf(steps: readonly Step[], spec: SlotSpec): Point | null {
  const [x0, y0] = spec.workZero === 'centre' ? [railLength(spec) / 2, spec.railWidth / 2] : [0, 0];
  for (const step of steps) {
    if (!('from' in step) || step.kind === 'rapid' || !(step.to.z < 0)) continue;
    const [x, y] = [step.from.x + x0, step.from.y + y0];
    return Number.isFinite(x) && Number.isFinite(y) ? { x, y } : null;
  }
  return null;
}

/** Lays the rail out at true size. `entry` is where the bit goes in, in the sizes' units, Y up. */
export function template(sizes: TemplateSizes, entry: Point | null): Template {
  const px = (value: number) => toPx(value, sizes.units);
  const rail = { x: PAD.x, y: PAD.y, width: px(sizes.railLength), height: px(sizes.railWidth) };
  const bottom = rail.y + rail.height;
  const slot = {
    x: rail.x + px(sizes.stopMargin), y: rail.y + (rail.height - px(sizes.width)) / 2,
    width: px(sizes.length), height: px(sizes.width), radius: px(sizes.cornerRadius),
  };
  const zero = sizes.workZero === 'centre' ? { x: rail.x + rail.width / 2, y: rail.y + rail.height / 2 } : { x: rail.x, y: bottom };
  const bit = entry && { x: rail.x + px(entry.x), y: bottom - px(entry.y), radius: px(sizes.bitDiameter) / 2 };
  const across = windows(rail.width + 2 * PAD.x, TILE.width, OVERLAP);
  const down = windows(rail.height + 2 * PAD.y, TILE.height, OVERLAP);
  const tiles = down.starts.flatMap((y, row) => across.starts.map((x, column): Tile => (
    { number: row * across.starts.length + column + 1, x, y, width: across.size, height: down.size }
  )));
  return {
    rail, slot, zero, bit, tiles,
    upright: across.joins.map((at, i) => ({ name: `join ${i + 1}`, at })),
    level: down.joins.map((at, i) => ({ name: `join ${across.joins.length + i + 1}`, at })),
  };
}

/** The joins a paper shows. */
export function joinsOn(tile: Tile, whole: Pick<Template, 'upright' | 'level'>): { readonly upright: readonly Join[]; readonly level: readonly Join[] } {
  return {
    upright: whole.upright.filter(({ at }) => at > tile.x && at < tile.x + tile.width),
    level: whole.level.filter(({ at }) => at > tile.y && at < tile.y + tile.height),
  };
}
