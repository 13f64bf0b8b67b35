import type { Units } from '../measure/units';
import { assert } from '../assert';
import { fewestRails } from './fewestRails';
import { type KindToPlace, type RailRoom, inLength, loadOf, stepsDown } from './grid';
import { leaveOut } from './leave';
import { type Filling, type Load, at, costOf, sumOf } from './packing';
import { keepTogether } from './together';

/** Coins that the maker has put in a rail by hand: they stay there, the rest is arranged round them. */
export interface Pin {
  readonly rail: string;
  readonly kind: string;
  readonly count: number;
}

export interface AssignRequest {
  readonly units: Units;
  readonly rails: readonly RailRoom[];
  readonly kinds: readonly KindToPlace[];
  /** Between neighbours, and between the outermost coins and the groove's ends. */
  readonly gap: number;
  readonly pins: readonly Pin[];
  /** Rails fuller than the evenest by no more than this look alike: kinds are kept together at the cost of it. 0: strictly the evenest. */
  readonly evenWithin: number;
}

/** A figure reached and the best that any arrangement could reach; where they are one, the arrangement is proved best. */
export interface Proved {
  readonly value: number;
  readonly bound: number;
}

export interface RailContents {
  readonly name: string;
  /** In the order of the request; only kinds that stand here. `toCome` of them are places kept free. */
  readonly kinds: readonly { readonly name: string; readonly count: number; readonly toCome: number }[];
  /** Length of groove left over once every coin has its gaps. */
  readonly spare: number;
}

/**
 * Coins in rails: the most coins placed (of these the smallest left out), then the fewest rails, then the greatest
 * least spare of the rails used, then, giving up no more than `evenWithin` of that spare, the fewest rail-and-kind
 * pairs. Each figure of the proof is best among arrangements as good as this one in the figures before it; `spare` there
 * is the evenest found, before kinds were drawn together.
 */
export interface Assignment {
  readonly rails: readonly RailContents[];
  readonly unplaced: readonly { readonly name: string; readonly count: number; readonly toCome: number; readonly reason: 'noRoom' | 'noRailTakesIt' }[];
  readonly proof: { readonly unplaced: Proved; readonly rails: Proved; readonly spare: Proved; readonly pairs: Proved };
}

export interface AssignProblem {
  readonly field: 'rails' | 'kinds' | 'gap' | 'pins';
  readonly message: string;
}

/** Steps of one search: some milliseconds. Small jobs end long before it; large ones say their bound. */
const LIMIT = 20_000;

const isProved = ({ value, bound }: Proved) => value === bound;
export const isBest = ({ proof }: Assignment) => isProved(proof.unplaced) && isProved(proof.rails) && isProved(proof.spare) && isProved(proof.pairs);

/** What is wrong with a request, in words. */
function problemsOf({ rails, kinds, pins, gap }: AssignRequest, load: Load, pinned: Filling): AssignProblem[] {
  const problems: AssignProblem[] = [];
  if (rails.length === 0) problems.push({ field: 'rails', message: 'The piece has no rail. Choose at least one lane.' });
  if (!(gap >= 0)) problems.push({ field: 'gap', message: `The gap is ${gap}. Use 0 or more.` });
  for (const { name, diameter } of kinds) if (!(diameter > 0)) problems.push({ field: 'kinds', message: `${name} is ${diameter} across. Measure the coin.` });
  for (const { rail, kind, count } of pins) {
    const room = rails.findIndex(({ name }) => name === rail);
    const place = kinds.findIndex(({ name }) => name === kind);
    if (room < 0 || place < 0) problems.push({ field: 'pins', message: `${kind} is pinned to rail ${rail}, and the piece has no such ${room < 0 ? 'rail' : 'coin'}. Take the pin out.` });
    else if (load.takes[room]?.[place] !== true) problems.push({ field: 'pins', message: `${kind} is pinned to rail ${rail}, where it does not stand. Pin it to another rail.` });
    else if (!(Number.isInteger(count) && count > 0)) problems.push({ field: 'pins', message: `${count} of ${kind} are pinned to rail ${rail}. Use a whole number.` });
  }
  if (problems.length > 0) return problems;
  kinds.forEach(({ name }, kind) => {
    const count = sumOf(pinned.map((row) => at(row, kind)));
    if (count > at(load.counts, kind)) problems.push({ field: 'pins', message: `${count} of ${name} are pinned and there are ${at(load.counts, kind)}. Pin fewer.` });
  });
  rails.forEach(({ name }, room) => {
    const length = costOf(pinned[room] ?? [], load.costs);
    if (length > 0 && length > at(load.rooms, room)) problems.push({ field: 'pins', message: `The coins pinned to rail ${name} are longer than its groove. Pin fewer there.` });
  });
  return problems;
}

/** Coins in rails, best in the order named at `Assignment`, or what is wrong with the request. */
export function assignCoins(request: AssignRequest): { readonly ok: true; readonly assignment: Assignment } | { readonly ok: false; readonly problems: readonly AssignProblem[] } {
  const { units, rails, kinds, gap, pins, evenWithin } = request;
  const load = loadOf(rails, kinds, gap, units);
  const pinned = rails.map((rail) => kinds.map((kind) => sumOf(pins.filter((pin) => pin.rail === rail.name && pin.kind === kind.name).map(({ count }) => count))));
  const problems = problemsOf(request, load, pinned);
  if (problems.length > 0) return { ok: false, problems };

  // What is pinned stands already: its room and its coins are taken off.
  const rest: Load = {
    ...load,
    rooms: load.rooms.map((room, index) => Math.max(0, room - costOf(pinned[index] ?? [], load.costs))), // a groove shorter than its gaps holds nothing
    counts: load.counts.map((count, kind) => count - sumOf(pinned.map((row) => at(row, kind)))),
  };
  const must = rest.rooms.flatMap((_, room) => (sumOf(pinned[room] ?? []) > 0 ? [room] : []));
  const { left, bound: leftBound } = leaveOut(rest, LIMIT);
  const placed: Load = { ...rest, counts: rest.counts.map((count, kind) => count - at(left, kind)) };
  const fewest = fewestRails(placed, must, LIMIT);
  assert(fewest, 'coins that were found to fit fit');

  const there = pinned.map((row) => row.map((count) => count > 0));
  const ties = fewest.chosen.map(({ rails: used, load: part, even }) => {
    const eased = { ...part, rooms: part.rooms.map((room) => (Number.isFinite(even.spare) ? Math.max(0, room - even.spare + Math.min(stepsDown(evenWithin, units), Math.max(0, even.spare))) : room)) };
    return { used, even, together: keepTogether(eased, even.filling, used.map((room) => there[room] ?? []), LIMIT) };
  });
  const best = ties.reduce((a, b) => (b.together.pairs < a.together.pairs ? b : a));
  const pinnedPairs = sumOf(there.map((row) => row.filter(Boolean).length));
  const pairs = best.together.pairs + pinnedPairs;
  const filling = rails.map((_, room) => {
    const row = best.together.filling[best.used.indexOf(room)] ?? [];
    return kinds.map((_kind, kind) => at(row, kind) + at(pinned[room] ?? [], kind));
  });
  const spare = Number.isFinite(best.even.spare) ? best.even.spare : 0;
  return {
    ok: true,
    assignment: {
      ...contentsOf(request, load, filling, left),
      proof: {
        unplaced: { value: sumOf(left), bound: leftBound },
        rails: { value: best.used.length, bound: fewest.railBound },
        spare: { value: inLength(spare, units), bound: inLength(Number.isFinite(fewest.spareBound) ? fewest.spareBound : spare, units) },
        pairs: { value: pairs, bound: fewest.open ? Math.min(pairs, placed.counts.filter((count) => count > 0).length) : Math.min(...ties.map(({ together }) => together.bound)) + pinnedPairs },
      },
    },
  };
}

/** Counts as a person reads them: places for coins to come are the last of their kind, and the first to be left out. */
function contentsOf({ units, rails, kinds }: AssignRequest, load: Load, filling: Filling, left: readonly number[]): Pick<Assignment, 'rails' | 'unplaced'> {
  const here = kinds.map(({ count, toCome }, kind) => count - Math.max(0, at(left, kind) - toCome));
  const contents = rails.map(({ name }, room) => ({
    name,
    kinds: kinds.flatMap((kind, index) => {
      const all = at(filling[room] ?? [], index);
      const count = Math.min(all, at(here, index));
      here[index] = at(here, index) - count;
      return all > 0 ? [{ name: kind.name, count, toCome: all - count }] : [];
    }),
    spare: inLength(at(load.rooms, room) - costOf(filling[room] ?? [], load.costs), units),
  }));
  const unplaced = kinds.flatMap(({ name, toCome }, kind) => {
    const out = at(left, kind);
    if (out === 0) return [];
    const taken = load.takes.some((row, room) => row[kind] === true && at(load.rooms, room) >= at(load.costs, kind));
    return [{ name, count: Math.max(0, out - toCome), toCome: Math.min(out, toCome), reason: taken ? 'noRoom' as const : 'noRailTakesIt' as const }];
  });
  return { rails: contents, unplaced };
}
