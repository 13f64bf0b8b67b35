import type { Units } from '#shared/measure/units';

/** What the rod is drawn from, lengths in `units`. */
export interface RodSizes {
  readonly units: Units;
  readonly railLength: number;
  readonly stopMargin: number;
  readonly length: number;
}

export interface RodTick {
  readonly x: number;
  /** px above the rod's lower edge. */
  readonly high: number;
  readonly number: number | null;
  /** Where the number stands: in a last inch without room for it, left of its tick. */
  readonly side: 'right' | 'left';
}

export interface RodView {
  readonly scale: number;
  readonly left: number;
  readonly right: number;
  /** The groove's two ends. */
  readonly stops: readonly [number, number];
  readonly at: (along: number) => number;
  readonly ticks: readonly RodTick[];
  /** Parts of an inch, or millimetres between two ticks' full units: 16, 8, 4 or 1, 5, 10 mm. */
  readonly finest: number;
}

const APART = 3; // px: finer divisions than this run into each other
const NUMBER_ROOM = 26; // px a number takes
/** A last inch with less after it than this has its number left of its tick. */
const AFTER = { in: 0.4, mm: 10 } as const;
const HIGH = [26, 18, 14, 9, 6] as const; // px: whole, half, quarter, eighth, sixteenth

/** Divisions of an inch that stand far enough apart, or millimetres between ticks. */
export function finestOf(scale: number, units: Units): number {
  if (units === 'mm') return scale >= APART ? 1 : scale * 5 >= APART ? 5 : 10;
  return scale / 16 >= APART ? 16 : scale / 8 >= APART ? 8 : 4;
}

function tickHeight(index: number, parts: number): number {
  for (let level = 0, step = parts; level < HIGH.length; level++, step /= 2) if (index % step === 0) return HIGH[level] ?? 6;
  return 6;
}

/** The whole rail in the room there is, always in proportion. */
export function rodView(sizes: RodSizes, room: { readonly left: number; readonly right: number }): RodView {
  const { units, railLength } = sizes;
  const scale = (room.right - room.left) / railLength;
  const at = (along: number) => room.left + along * scale;
  const finest = finestOf(scale, units);
  const step = units === 'in' ? 1 / finest : finest;
  const parts = units === 'in' ? finest : 1;
  // Numbers stand at whole inches or centimetres, as often as they have room.
  const unit = units === 'in' ? 1 : 10;
  const every = [1, 2, 5, 10, 20, 50, 100].find((n) => n * unit * scale >= NUMBER_ROOM) ?? 200;
  const count = Math.max(0, Math.ceil(railLength / step - 1e-6) - 1);
  const ticks = Array.from({ length: Math.min(count, 6000) }, (_, i): RodTick => {
    const along = (i + 1) * step;
    const mm = (i + 1) * finest;
    const whole = units === 'in' ? (i + 1) % parts === 0 : mm % 10 === 0;
    const high = units === 'in' ? tickHeight(i + 1, parts) : mm % 10 === 0 ? HIGH[0] : mm % 5 === 0 ? HIGH[2] : HIGH[4];
    const value = units === 'in' ? (i + 1) / parts : mm;
    const side = railLength - along < AFTER[units] ? 'left' : 'right';
    const room = side === 'right' || every * unit * scale >= 2 * NUMBER_ROOM - 8; // two numbers back to back between their ticks
    return { x: at(along), high, number: whole && room && (value / unit) % every === 0 ? value : null, side };
  });
  return { scale, left: room.left, right: room.right, stops: [at(sizes.stopMargin), at(sizes.stopMargin + sizes.length)], at, ticks, finest };
}

