import { type Filling, type Load, at, costOf, sumOf } from './packing';

interface Part {
  readonly left: readonly number[];
  readonly rows: Filling;
  /** Pairs made less kinds finished: what a part has cost so far. */
  readonly worth: number;
  readonly slack: number;
}

const WIDTH = 12; // parts kept from one room to the next
const MOST_ROWS = 1500; // steps through the rows of one room
const MOST_NEW = 24; // rows of one part that are weighed further

/** Rows of one, two or, where those are few, three kinds: each kind stands there with as many as go in. */
function rowsOfFew(load: Load, left: readonly number[], room: number, slack: number): number[][] {
  const size = at(load.rooms, room);
  const kinds = load.costs.flatMap((_, kind) => (at(left, kind) > 0 && load.takes[room]?.[kind] ? [kind] : []));
  const rows: number[][] = [];
  const fits = (kind: number, spare: number) => Math.min(at(left, kind), Math.floor(spare / at(load.costs, kind)));
  const keep = (row: number[], spare: number) => {
    if (spare <= slack && row.every((count, kind) => count === 0 || count === at(left, kind) || at(load.costs, kind) > spare)) rows.push(row);
  };
  let looked = 0;
  const fill = (chosen: readonly number[], n: number, row: readonly number[], spare: number) => {
    const kind = chosen[n];
    if (kind === undefined || ++looked > MOST_ROWS) return;
    const most = fits(kind, spare);
    const last = n === chosen.length - 1;
    for (let count = most; count >= (last ? Math.max(most, 1) : 1); count--) {
      const next = row.map((each, k) => (k === kind ? count : each));
      if (last) keep(next, spare - count * at(load.costs, kind));
      else fill(chosen, n + 1, next, spare - count * at(load.costs, kind));
    }
  };
  const none = load.costs.map(() => 0);
  keep(none, size);
  kinds.forEach((a, i) => {
    fill([a], 0, none, size);
    for (const b of kinds.slice(i + 1)) fill([a, b], 0, none, size);
  });
  if (rows.length < WIDTH) kinds.forEach((a, i) => kinds.slice(i + 1).forEach((b, j) => { for (const c of kinds.slice(i + j + 2)) fill([a, b, c], 0, none, size); }));
  return rows;
}

/**
 * A filling in which kinds stand together, room after room: of all parts so far the dozen with the fewest pairs and
 * the most kinds finished go on. No proof; null where it comes to no end.
 */
export function fillByKind(load: Load, there: readonly (readonly boolean[])[]): Filling | null {
  const order = load.rooms.map((_, room) => room).sort((a, b) => at(load.rooms, a) - at(load.rooms, b));
  let parts: Part[] = [{ left: load.counts, rows: load.rooms.map(() => load.costs.map(() => 0)), worth: 0, slack: sumOf(load.rooms) - costOf(load.counts, load.costs) }];
  for (const room of order) {
    const next = new Map<string, Part>();
    for (const { left, rows, worth, slack } of parts) {
      const weighed = rowsOfFew(load, left, room, slack).map((row) => ({
        row,
        worth: row.reduce((sum, count, kind) => sum + (count === 0 ? 0 : (there[room]?.[kind] ? 0 : 1) - (count === at(left, kind) ? 1 : 0)), 0),
        spare: at(load.rooms, room) - costOf(row, load.costs),
      })).sort((a, b) => a.worth - b.worth || a.spare - b.spare);
      for (const each of weighed.slice(0, MOST_NEW)) {
        const rest = left.map((count, kind) => count - at(each.row, kind));
        const part = { left: rest, rows: rows.map((row, index) => (index === room ? each.row : row)), worth: worth + each.worth, slack: slack - each.spare };
        const key = rest.join();
        const known = next.get(key);
        if (!known || part.worth < known.worth) next.set(key, part);
      }
    }
    parts = [...next.values()].sort((a, b) => a.worth - b.worth || b.slack - a.slack).slice(0, WIDTH);
  }
  return parts.find(({ left }) => sumOf(left) === 0)?.rows ?? null;
}
