import type { AssignRequest } from './assign';
import { loadOf, markOf } from './grid';
import { fillSomehow } from './leave';
import { type Load, at, costOf, sumOf } from './packing';

/** One change that makes every coin fit. `proved`: no smaller change of this sort does. */
export type WayToFit =
  | { readonly change: 'gap'; readonly from: number; readonly to: number; readonly proved: boolean }
  | { readonly change: 'stopMargin'; readonly from: number; readonly to: number; readonly proved: boolean }
  | { readonly change: 'grooveLength'; readonly by: number; readonly proved: boolean }
  | { readonly change: 'rails'; readonly more: number; readonly length: number; readonly proved: boolean };

/** What may be changed, and how far. */
export interface Leeway {
  readonly leastGap: number;
  readonly stopMargin: number;
  readonly leastStopMargin: number;
}

const LIMIT = 20_000; // steps of one search
const MOST_MARKS = 4096; // 256 in by sixteenths: longer than any rail
const MOST_RAILS = 12; // what one piece carries

/** The request's load with what is pinned taken off. */
function restOf(request: AssignRequest): Load {
  const load = loadOf(request.rails, request.kinds, request.gap, request.units);
  const pinned = request.rails.map((rail) => request.kinds.map((kind) => sumOf(request.pins.filter((pin) => pin.rail === rail.name && pin.kind === kind.name).map(({ count }) => count))));
  return {
    ...load,
    rooms: load.rooms.map((room, index) => Math.max(0, room - costOf(pinned[index] ?? [], load.costs))),
    counts: load.counts.map((count, kind) => count - sumOf(pinned.map((row) => at(row, kind)))),
  };
}

/** The least n in 1..most at which everything fits (it fits at every greater one too), by halving; null where it never does. */
function least(most: number, fits: (n: number) => { readonly found: unknown; readonly complete: boolean }): { readonly n: number; readonly proved: boolean } | null {
  if (most < 1 || !fits(most).found) return null;
  let [low, high, proved] = [0, most, true];
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    const { found, complete } = fits(middle);
    if (found) high = middle;
    else {
      low = middle;
      proved = complete; // the last failure stands next to the answer
    }
  }
  return { n: high, proved };
}

const longer = (request: AssignRequest, by: number): AssignRequest => ({ ...request, rails: request.rails.map((rail) => ({ ...rail, length: rail.length + by })) });

/**
 * The smallest changes, each by itself, by which every coin finds a place: a smaller gap, shorter stop margins, longer
 * grooves, more rails like the longest. Sizes change by the shop's marks (1/16 in, 1 mm). Empty where nothing is left
 * over, or where none of them helps.
 */
export function waysToFit(request: AssignRequest, leeway: Leeway): WayToFit[] {
  const fits = (changed: AssignRequest) => fillSomehow(restOf(changed), LIMIT);
  if (fits(request).found) return [];
  const mark = markOf(request.units);
  const ways: WayToFit[] = [];

  const gapAt = (n: number) => Math.max(leeway.leastGap, (Math.ceil(request.gap / mark - 1e-9) - n) * mark);
  const marksDown = Math.ceil((request.gap - leeway.leastGap) / mark - 1e-9);
  const gap = least(marksDown, (n) => fits({ ...request, gap: gapAt(n) }));
  if (gap) ways.push({ change: 'gap', from: request.gap, to: gapAt(gap.n), proved: gap.proved });

  const marksIn = Math.floor((leeway.stopMargin - leeway.leastStopMargin) / mark + 1e-9);
  const margin = least(marksIn, (n) => fits(longer(request, 2 * n * mark)));
  if (margin) ways.push({ change: 'stopMargin', from: leeway.stopMargin, to: leeway.stopMargin - margin.n * mark, proved: margin.proved });

  const length = least(MOST_MARKS, (n) => fits(longer(request, n * mark)));
  if (length) ways.push({ change: 'grooveLength', by: length.n * mark, proved: length.proved });

  const longest = Math.max(...request.rails.map((rail) => rail.length));
  const moreRails = (n: number): AssignRequest => ({ ...request, rails: [...request.rails, ...Array.from({ length: n }, (_, index) => ({ name: `+${index + 1}`, length: longest, takes: null }))] });
  const rails = least(MOST_RAILS - request.rails.length, (n) => fits(moreRails(n)));
  if (rails) ways.push({ change: 'rails', more: rails.n, length: longest, proved: rails.proved });
  return ways;
}
