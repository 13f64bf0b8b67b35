import { MM_PER_INCH, type Units } from '#shared/measure/units';

/** What the plan is drawn from, lengths in `units`. */
export interface PlanSizes {
  readonly units: Units;
  readonly railLength: number;
  readonly railWidth: number;
  readonly length: number;
  readonly width: number;
  readonly stopMargin: number;
  /** Radius of the groove's corners: the bit's, or half the width for full-round ends. */
  readonly cornerRadius: number;
}

/** One drawn piece of the rail: from … to along the rail, and the pixel where `from` stands. */
export interface Piece {
  readonly from: number;
  readonly to: number;
  readonly left: number;
  readonly right: number;
  /** Outline with wavy breaks, closed. */
  readonly outline: string;
}

export interface PlanView {
  readonly scale: number;
  readonly broken: boolean;
  readonly pieces: readonly Piece[];
  readonly top: number;
  readonly bottom: number;
  readonly left: number;
  readonly right: number;
  /** Pixel of a place along the rail; inside a break, the middle of the break. */
  readonly at: (along: number) => number;
  /** Pixel of a place across the rail, counted from its front edge. */
  readonly across: (from: number) => number;
}

const LEAST_HEIGHT = 72; // px: below this the groove of a 1 1/4 rail is too thin to read
const BROKEN_HEIGHT = LEAST_HEIGHT * 1.25; // px: a rail in pieces stands well over what can just be read
const MOST_HEIGHT = 180; // px: a short wide rail must not push the rest off the sheet
const BREAK_GAP = 20; // px of bare sheet between two pieces

/** The wavy wood break, downwards: two shallow bends. */
const wave = (x: number, top: number, bottom: number) => {
  const h = (bottom - top) / 3;
  return `C${x - 5} ${top + h * 0.5} ${x - 5} ${top + h} ${x} ${top + h * 1.5}S${x + 5} ${bottom - h * 0.5} ${x} ${bottom}`;
};
const waveUp = (x: number, top: number, bottom: number) => {
  const h = (bottom - top) / 3;
  return `C${x + 5} ${bottom - h * 0.5} ${x + 5} ${bottom - h} ${x} ${bottom - h * 1.5}S${x - 5} ${top + h * 0.5} ${x} ${top}`;
};

function outline(left: number, right: number, top: number, bottom: number, cut: { readonly left: boolean; readonly right: boolean }): string {
  const down = cut.right ? wave(right, top, bottom) : `V${bottom}`;
  const up = cut.left ? waveUp(left, top, bottom) : `V${top}`;
  return `M${left} ${top}H${right}${down}H${left}${up}Z`;
}

/**
 * Lays the rail out in the room there is: whole where it is then thick enough to read, else in true-scale pieces with
 * the wood break between them, so that both ends and their stop margins stay readable.
 *
 * @param room `tall`: how high a rail in pieces is drawn, where there is more room than it needs.
 */
export function planView(sizes: PlanSizes, room: { readonly left: number; readonly right: number; readonly top: number; readonly tall?: number }): PlanView {
  const { railLength, railWidth, stopMargin } = sizes;
  const span = room.right - room.left;
  const whole = Math.min(span / railLength, MOST_HEIGHT / railWidth);
  const count = span < 480 ? 2 : 3;
  const shown = span - BREAK_GAP * (count - 1);
  // An end piece must show its stop margin and half as much groove again.
  const fit = Math.min((room.tall ?? BROKEN_HEIGHT) / railWidth, shown / count / (1.6 * stopMargin));
  const broken = whole * railWidth < LEAST_HEIGHT && fit > whole * 1.15;
  const scale = broken ? fit : whole;
  const height = scale * railWidth;
  const [top, bottom] = [room.top, room.top + height];

  const ends = broken ? shown / count : scale * railLength;
  const start = broken ? room.left : room.left + (span - ends) / 2;
  const spans: readonly (readonly [number, number, number])[] = broken
    ? Array.from({ length: count }, (_, i) => {
        const long = ends / scale;
        const from = i === 0 ? 0 : i === count - 1 ? railLength - long : (railLength - long) / 2;
        return [from, from + long, room.left + i * (ends + BREAK_GAP)] as const;
      })
    : [[0, railLength, start]];
  const pieces = spans.map(([from, to, left], i): Piece => {
    const right = left + (to - from) * scale;
    return { from, to, left, right, outline: outline(left, right, top, bottom, { left: i > 0, right: i < spans.length - 1 }) };
  });
  const last = pieces.at(-1);

  const at = (along: number) => {
    const piece = pieces.find(({ from, to }) => along >= from - 1e-9 && along <= to + 1e-9);
    if (piece) return piece.left + (along - piece.from) * scale;
    const before = pieces.findLast(({ to }) => to < along);
    return before ? before.right + BREAK_GAP / 2 : room.left;
  };
  return { scale, broken, pieces, top, bottom, left: start, right: last?.right ?? room.right, at, across: (from) => bottom - from * scale };
}

/** Open crow's feet, two strokes 24° each side of the line: `toward` is +1 where the line comes from the right. */
export function foot(x: number, y: number, toward: 1 | -1, along: 'x' | 'y' = 'x'): string {
  const [reach, spread] = [8 * Math.cos((24 * Math.PI) / 180), 8 * Math.sin((24 * Math.PI) / 180)];
  const r = (value: number) => value.toFixed(1);
  return along === 'x'
    ? `M${r(x + toward * reach)} ${r(y - spread)}L${r(x)} ${r(y)}L${r(x + toward * reach)} ${r(y + spread)}`
    : `M${r(x - spread)} ${r(y + toward * reach)}L${r(x)} ${r(y)}L${r(x + spread)} ${r(y + toward * reach)}`;
}

/** A mark on the front edge, as on a steel rule. */
export interface Tick {
  readonly x: number;
  readonly high: number;
  /** The figure above it, or null. */
  readonly number: number | null;
}

/** Ticks along the front edge by the room there is: sixteenths, eighths or quarters; millimetres, fives or tens. */
export function ticks(view: PlanView, units: Units): readonly Tick[] {
  const unit = units === 'in' ? 1 : 10;
  const fine = view.scale * (units === 'in' ? 1 : MM_PER_INCH);
  const parts = units === 'in' ? (fine / 16 >= 3 ? 16 : fine / 8 >= 3 ? 8 : 4) : view.scale >= 3 ? 10 : view.scale * 5 >= 3 ? 2 : 1;
  const every = [1, 2, 5, 10, 20, 50].find((n) => n * unit * view.scale >= (units === 'in' ? 26 : 44)) ?? 100;
  return view.pieces.flatMap((piece) => {
    const first = Math.ceil((piece.from * parts) / unit + 1e-6);
    const last = Math.floor((piece.to * parts) / unit - 1e-6);
    return Array.from({ length: Math.max(0, last - first + 1) }, (_, i): Tick => {
      const index = first + i;
      const x = piece.left + ((index * unit) / parts - piece.from) * view.scale;
      const inBreak = (piece.from > 0 && x - piece.left < 7) || (piece !== view.pieces.at(-1) && piece.right - x < 7);
      const level = index % parts === 0 ? 12 : (index * 2) % parts === 0 ? 9 : (index * 4) % parts === 0 ? 7 : 4;
      const count = index / parts;
      const room = x - piece.left > 12 && piece.right - x > 12;
      return { x, high: inBreak ? 0 : level, number: index % parts === 0 && count % every === 0 && room && !inBreak ? count * (units === 'in' ? 1 : 10) : null };
    }).filter(({ high }) => high > 0);
  });
}
