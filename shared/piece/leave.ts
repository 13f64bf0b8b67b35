import { type Load, at, cannotFit, costOf, fillRooms, sumOf, type Filling } from './packing';
import { spreadOut } from './even';

/** Which coins are left out, by kind, and the fewest that any filling leaves out. */
export interface LeftOut {
  readonly left: readonly number[];
  readonly bound: number;
}

const MOST_CHOICES = 3000; // ways to leave out so many coins that are listed
const MOST_TRIED = 150; // of these, ones searched; beyond, coins are left out one by one

/** A filling of the whole load, however found, and whether failing to find one proves that there is none. */
export function fillSomehow(load: Load, limit: number): { readonly found: Filling | null; readonly complete: boolean } {
  if (load.rooms.some((room) => room < 0) || cannotFit(load)) return { found: null, complete: true };
  const spread = spreadOut(load);
  return spread ? { found: spread, complete: true } : fillRooms(load, limit);
}

/** Every way to leave out `size` coins, cheapest first; null where there are too many. */
function choices({ counts, costs }: Load, size: number): number[][] | null {
  const list: number[][] = [];
  const row = counts.map(() => 0);
  const choose = (kind: number, rest: number): boolean => {
    if (list.length > MOST_CHOICES) return false;
    if (kind === counts.length) {
      if (rest === 0) list.push([...row]);
      return true;
    }
    for (let count = Math.min(rest, at(counts, kind)); count >= 0; count--) {
      row[kind] = count;
      if (!choose(kind + 1, rest - count)) return false;
    }
    row[kind] = 0;
    return true;
  };
  return choose(0, size) ? list.sort((a, b) => costOf(a, costs) - costOf(b, costs)) : null;
}

const without = (load: Load, left: readonly number[]): Load => ({ ...load, counts: load.counts.map((count, kind) => count - at(left, kind)) });

/** Coins that must stay out by sums alone, were the dearest left out first: fewer never suffice. */
function fewest(load: Load): number {
  const over = costOf(load.counts, load.costs) - sumOf(load.rooms.map((room) => Math.max(0, room)));
  const dear = load.costs.flatMap((cost, kind) => Array.from({ length: at(load.counts, kind) }, () => cost)).sort((a, b) => b - a);
  let [sum, n] = [0, 0];
  while (sum < over && n < dear.length) sum += at(dear, n++);
  return n;
}

/**
 * The fewest coins to leave out so that the rest fits, and of these the smallest. Every choice of so many is tried,
 * cheapest first; where there are too many, the dearest goes out one by one until the rest fits, and the bound says
 * how few it could have been.
 */
export function leaveOut(load: Load, limit: number): LeftOut {
  const total = sumOf(load.counts);
  let bound = fewest(load);
  let proven = true;
  for (let size = bound; size <= total; size++) {
    const list = choices(load, size)?.filter((left) => !cannotFit(without(load, left)));
    if (!list || list.length > MOST_TRIED) break;
    for (const left of list) {
      const { found, complete } = fillSomehow(without(load, left), limit);
      if (found) return { left, bound: proven ? size : bound };
      if (!complete) proven = false;
    }
    if (proven) bound = size + 1;
  }
  const left = load.counts.map(() => 0);
  const nowhere = (kind: number) => load.takes.every((row, room) => !row[kind] || at(load.rooms, room) < at(load.costs, kind));
  load.counts.forEach((count, kind) => { if (nowhere(kind)) left[kind] = count; });
  while (sumOf(left) < total && !fillSomehow(without(load, left), limit).found) {
    const inside = load.counts.flatMap((count, kind) => (count > at(left, kind) ? [kind] : []));
    const dearest = inside.reduce((a, b) => (at(load.costs, b) > at(load.costs, a) ? b : a));
    left[dearest] = at(left, dearest) + 1;
  }
  return { left, bound: Math.min(bound, sumOf(left)) };
}
