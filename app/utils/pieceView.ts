import type { Work } from '#shared/commission/work';
import type { Arrangement, FilledRail } from '#shared/piece/arrange';
import { factsOf, lanesOf, unionOf } from '#shared/piece/kinds';
import type { Wood } from '#shared/wood/woods';

/** A coin where it is drawn, in the piece's units from its top left corner. */
export interface DrawnCoin {
  readonly key: string;
  readonly kind: string;
  /** Which of the tally's kinds: its rim. */
  readonly index: number;
  readonly rail: string;
  readonly x: number;
  readonly y: number;
  readonly r: number;
  readonly toCome: boolean;
  /** It has no place: drawn over the stop of the last rail. */
  readonly lost: boolean;
}

const MOST_LOST = 6; // drawn; the sentence counts the rest

/** The middle of a coin in a rail: its foot on the groove's floor. On a shelf, seen from above, the middle of the groove. */
function heightOf({ piece }: Work, rail: FilledRail, diameter: number): number {
  return factsOf(piece.kind).behind ? rail.top + piece.section.thickness / 2 : rail.top + piece.section.grooveDepth - diameter / 2;
}

/** Every coin of a piece where it stands, and those without a place. */
export function drawnCoins(work: Work, { rails, assignment }: Arrangement): DrawnCoin[] {
  const { piece, tally } = work;
  const indexOf = (kind: string) => tally.kinds.findIndex(({ name }) => name === kind);
  const standing = rails.flatMap((rail) => rail.places.map(({ kind, diameter, middle, toCome }, n): DrawnCoin => ({
    key: `${rail.name} ${n}`, kind, index: indexOf(kind), rail: rail.name, toCome, lost: false, r: diameter / 2, x: rail.left + piece.section.stopMargin + middle, y: heightOf(work, rail, diameter),
  })));
  const last = rails.at(-1);
  if (!last) return standing;
  const diameterOf = new Map(rails.flatMap(({ places }) => places.map(({ kind, diameter }) => [kind, diameter] as const)));
  const convert = (kind: string) => diameterOf.get(kind) ?? tally.kinds[indexOf(kind)]?.diameter ?? 0;
  const end = last.places.reduce((most, { middle, diameter }) => Math.max(most, middle + diameter / 2), 0);
  let x = last.left + piece.section.stopMargin + end; // where the last coin ends
  const lost = assignment.unplaced.flatMap(({ name, count, toCome }) => Array.from({ length: count + toCome }, () => name)).slice(0, MOST_LOST).map((kind, n): DrawnCoin => {
    const r = convert(kind) / 2;
    x += n === 0 ? r : 2 * r;
    return { key: `lost ${n}`, kind, index: indexOf(kind), rail: last.name, toCome: false, lost: true, r, x, y: heightOf(work, last, 2 * r) };
  });
  return [...standing, ...lost];
}

export interface DrawnStrip {
  readonly wood: Wood;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** A board's strips with their woods, the union's among them. */
export function drawnStrips({ piece, build }: Pick<Work, 'piece' | 'build'>): DrawnStrip[] {
  const union = unionOf(piece.kind, piece);
  const strips = lanesOf(piece.kind, piece).map(({ left, right, top, height }, n): DrawnStrip => ({ wood: n % 2 === 0 ? build.odd : build.even, x: left, y: top, width: right - left, height }));
  return union ? [...strips, { wood: build.union, x: 0, y: 0, width: union.width, height: union.height }] : strips;
}

/** What moving one coin from a rail to another pins, on top of what is pinned. */
export function pinsAfterMove(pins: Work['pins'], { rails }: Arrangement['assignment'], kind: string, from: string, to: string): Work['pins'] {
  const countIn = (rail: string) => {
    const found = rails.find(({ name }) => name === rail)?.kinds.find(({ name }) => name === kind);
    return found ? found.count + found.toCome : 0;
  };
  const others = pins.filter((pin) => pin.kind !== kind || (pin.rail !== from && pin.rail !== to));
  const pinnedFrom = pins.find((pin) => pin.kind === kind && pin.rail === from);
  const left = pinnedFrom ? Math.min(pinnedFrom.count, countIn(from) - 1) : 0;
  return [...others, ...(left > 0 ? [{ rail: from, kind, count: left }] : []), { rail: to, kind, count: countIn(to) + 1 }];
}
