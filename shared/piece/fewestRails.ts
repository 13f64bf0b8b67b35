import { type Even, fillBySwaps, fillEvenly, spareBound } from './even';
import { fillSomehow } from './leave';
import { type Filling, type Load, at, cannotFit, sumOf } from './packing';

/** One choice of rails and its evenest filling; rows stand in the order of `rails`. */
export interface Chosen {
  readonly rails: readonly number[];
  readonly load: Load;
  readonly even: Even;
}

export interface Fewest {
  /** All choices of the fewest rails that are evenest alike. */
  readonly chosen: readonly Chosen[];
  readonly railBound: number;
  readonly spareBound: number;
  /** Other choices of rails might be as even: nothing is proved of what is best among them. */
  readonly open: boolean;
}

const MOST_TIES = 4; // choices alike in evenness among which kinds are kept together
const MOST_SUBSETS = 24; // unlike choices of so many rails that are searched

/** The load in these rails only. */
const inRails = (load: Load, rails: readonly number[]): Load => ({
  ...load,
  rooms: rails.map((rail) => at(load.rooms, rail)),
  takes: rails.map((rail) => load.takes[rail] ?? []),
});

/** Choices of `size` rails, those in `must` always among them, one of each lot that is alike; roomiest first. */
function subsets(load: Load, must: readonly number[], size: number): number[][] {
  const free = load.rooms.map((_, rail) => rail).filter((rail) => !must.includes(rail));
  const lots = new Map<string, number[]>();
  for (const rail of free) {
    const like = `${at(load.rooms, rail)}:${load.takes[rail]?.map(Number).join('') ?? ''}`;
    lots.set(like, [...(lots.get(like) ?? []), rail]);
  }
  let lists: number[][] = [[...must]];
  for (const lot of lots.values()) lists = lists.flatMap((list) => Array.from({ length: lot.length + 1 }, (_, n) => [...list, ...lot.slice(0, n)]).filter(({ length }) => length <= size));
  const room = (rails: readonly number[]) => sumOf(rails.map((rail) => at(load.rooms, rail)));
  return lists.filter(({ length }) => length === size).map((rails) => rails.sort((a, b) => a - b)).sort((a, b) => room(b) - room(a));
}

/** The fewest rails that take the whole load (rails in `must` are used whatever stands in them), evenest filled; null where none was found. */
export function fewestRails(load: Load, must: readonly number[], limit: number): Fewest | null {
  let railBound: number | null = null; // the least number not proved too few
  for (let size = Math.max(must.length, 0); size <= load.rooms.length; size++) {
    const lists = subsets(load, must, size).filter((rails) => !cannotFit(inRails(load, rails)));
    const tried = lists.slice(0, MOST_SUBSETS);
    let whole = lists.length === tried.length;
    const fillings: { rails: readonly number[]; load: Load; found: Filling }[] = [];
    const bounds: number[] = [];
    for (const rails of tried) {
      const part = inRails(load, rails);
      const { found, complete } = fillSomehow(part, limit);
      if (found) fillings.push({ rails, load: part, found });
      else if (!complete) {
        whole = false;
        bounds.push(spareBound(part));
      }
    }
    if (fillings.length === 0) {
      if (!whole) railBound ??= size;
      continue;
    }
    // Swaps for all of them first; then only choices that might be evener than the best are searched.
    const none: Even = { filling: [], spare: Infinity, bound: Infinity };
    const swapped = fillings.map(({ rails, load: part, found }) => ({ rails, load: part, even: rails.length === 0 ? none : fillBySwaps(part, found) }))
      .sort((a, b) => b.even.bound - a.even.bound || b.even.spare - a.even.spare);
    let best = Math.max(...swapped.map(({ even }) => even.spare));
    const search = (choice: Chosen, above: number): Chosen => {
      if (choice.even.bound <= above || choice.even.spare > above) return choice;
      const even = fillEvenly(choice.load, choice.even, above, limit);
      best = Math.max(best, even.spare);
      return { ...choice, even };
    };
    const evener = swapped.map((choice) => search(choice, best));
    // Few choices are searched for ties too, so that kinds are kept together in the best of them.
    const chosen = evener.length > MOST_TIES ? evener : evener.map((choice) => search(choice, best - 1));
    const evenest = chosen.filter(({ even }) => even.spare === best);
    const open = evenest.length > MOST_TIES || lists.length > tried.length || bounds.length > 0 || chosen.some(({ even }) => even.spare < best && even.bound >= best);
    const most = Math.max(...chosen.map(({ even }) => even.bound), ...bounds, ...(lists.length > tried.length ? [spareBound(load)] : []));
    return { chosen: evenest.slice(0, MOST_TIES), railBound: railBound ?? size, spareBound: most, open };
  }
  return null;
}
