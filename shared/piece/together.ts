import { fillByKind } from './beam';
import { type Filling, type Load, at, costOf, sumOf } from './packing';

/** Kinds and rooms that belong together: a pair is a room in which a kind stands. */
export interface Together {
  readonly filling: Filling;
  readonly pairs: number;
  /** No filling has fewer. */
  readonly bound: number;
}

/** Pairs that a filling has beyond those already `there` (pinned). */
export function pairsOf(filling: Filling, there: readonly (readonly boolean[])[]): number {
  return sumOf(filling.map((row, room) => row.filter((count, kind) => count > 0 && there[room]?.[kind] !== true).length));
}

interface Row {
  readonly counts: readonly number[];
  readonly spare: number;
  readonly pairs: number;
  /** Pairs made less kinds finished: a kind finished is a pair saved later. */
  readonly worth: number;
}

const MOST_ROWS = 2000; // ways to fill one room that are looked at; with more, the search no longer proves anything

/**
 * The filling with the fewest pairs, by branch and bound over the rooms: a kind that stands in a room stands there with
 * as many as go in (any filling can be brought to that form without a new pair). Bound: each kind still needs as many
 * rooms as its coins, divided by what the roomiest takes.
 */
export function keepTogether(load: Load, start: Filling, there: readonly (readonly boolean[])[], limit: number): Together {
  const { rooms, costs, takes } = load;
  const order = rooms.map((_, room) => room).sort((a, b) => at(rooms, b) - at(rooms, a));
  const left = [...load.counts];
  const filling = rooms.map(() => costs.map(() => 0));
  const byKind = fillByKind(load, there);
  let best: Filling = byKind && pairsOf(byKind, there) < pairsOf(start, there) ? byKind : start;
  let pairs = pairsOf(best, there);
  let steps = 0;
  let whole = true;
  const seen = new Map<string, number>();

  /** Least number of new pairs for what is left, in the rooms from `place` on. */
  const bound = (place: number): number => {
    let sum = 0;
    for (let kind = 0; kind < costs.length; kind++) {
      let [need, most] = [at(left, kind), 0];
      if (need === 0) continue;
      for (let n = place; n < order.length; n++) {
        const room = order[n] ?? 0;
        if (takes[room]?.[kind] !== true) continue;
        const holds = Math.floor(at(rooms, room) / at(costs, kind));
        if (there[room]?.[kind]) need -= holds;
        else most = Math.max(most, holds);
      }
      if (need > 0) sum += most > 0 ? Math.ceil(need / most) : Infinity;
    }
    return sum;
  };

  /** Ways to fill one room that waste no more than `slack`. */
  const rowsFor = (room: number, slack: number): Row[] => {
    const rows: Row[] = [];
    const counts = costs.map(() => 0);
    const choose = (kind: number, spare: number, used: number) => {
      if (rows.length >= MOST_ROWS || ++steps > limit) {
        whole = false;
        return;
      }
      if (kind === costs.length) {
        const more = counts.some((count, k) => (count > 0 || there[room]?.[k] === true) && at(left, k) > count && at(costs, k) <= spare && takes[room]?.[k] === true);
        const finished = counts.filter((count, k) => count > 0 && count === at(left, k)).length;
        if (spare <= slack && !more) rows.push({ counts: [...counts], spare, pairs: used, worth: used - finished });
        return;
      }
      let rest = 0;
      for (let k = kind + 1; k < costs.length; k++) rest += at(left, k) * at(costs, k);
      const cost = at(costs, kind);
      const most = takes[room]?.[kind] ? Math.min(at(left, kind), Math.floor(spare / cost)) : 0;
      for (let count = most; count >= 0; count--) {
        if (spare - count * cost - rest > slack) break;
        counts[kind] = count;
        choose(kind + 1, spare - count * cost, used + (count > 0 && there[room]?.[kind] !== true ? 1 : 0));
      }
      counts[kind] = 0;
    };
    choose(0, at(rooms, room), 0);
    return rows.sort((a, b) => a.worth - b.worth || a.spare - b.spare);
  };

  const fill = (place: number, made: number, slack: number) => {
    const room = order[place];
    if (room === undefined) {
      if (left.every((count) => count === 0) && made < pairs) {
        pairs = made;
        best = filling.map((row) => [...row]);
      }
      return;
    }
    if (made + bound(place) >= pairs) return;
    const key = `${place}:${left.join()}`;
    if ((seen.get(key) ?? Infinity) <= made) return;
    seen.set(key, made);
    for (const { counts, spare, pairs: used } of rowsFor(room, slack)) {
      if (steps > limit) {
        whole = false;
        return;
      }
      counts.forEach((count, kind) => { left[kind] = at(left, kind) - count; });
      filling[room] = [...counts];
      fill(place + 1, made + used, slack - spare);
      counts.forEach((count, kind) => { left[kind] = at(left, kind) + count; });
    }
    filling[room] = costs.map(() => 0);
  };

  const least = bound(0);
  fill(0, 0, sumOf(rooms) - costOf(load.counts, costs));
  return { filling: best, pairs, bound: whole ? pairs : Math.min(least, pairs) };
}
