/** Coins and grooves in whole units: each coin of kind k costs `costs[k]` (its diameter and one gap), each room holds so much. */
export interface Load {
  readonly rooms: readonly number[];
  readonly costs: readonly number[];
  readonly counts: readonly number[];
  /** Whether a room takes a kind at all. */
  readonly takes: readonly (readonly boolean[])[];
}

/** How many of each kind stand in each room: `filling[room][kind]`. */
export type Filling = readonly (readonly number[])[];

/** What a search found; `complete` is false where it stopped at its limit, so that nothing found proves nothing. */
export interface Search {
  readonly found: Filling | null;
  readonly complete: boolean;
}

export const at = (list: readonly number[], index: number): number => list[index] ?? 0;
export const sumOf = (list: readonly number[]): number => list.reduce((sum, each) => sum + each, 0);
export const costOf = (counts: readonly number[], costs: readonly number[]): number => counts.reduce((sum, count, kind) => sum + count * at(costs, kind), 0);
const takesKind = (load: Load, room: number, kind: number) => load.takes[room]?.[kind] === true;

/** What is left of each room. */
export function sparesOf({ rooms, costs }: Pick<Load, 'rooms' | 'costs'>, filling: Filling): number[] {
  return rooms.map((room, index) => room - costOf(filling[index] ?? [], costs));
}

/** Whether sums alone forbid the load: all coins in all rooms, and each kind in the rooms that take it. */
export function cannotFit(load: Load): boolean {
  const { rooms, costs, counts } = load;
  if (costOf(counts, costs) > sumOf(rooms.map((room) => Math.max(0, room)))) return true;
  return counts.some((count, kind) => count > sumOf(rooms.map((room, index) => (takesKind(load, index, kind) ? Math.max(0, Math.floor(room / at(costs, kind))) : 0))));
}

/**
 * Places every coin, or proves that it cannot be done: rooms one after another, each filled so that no coin left would
 * still go in (any solution can be brought to that form by moving coins forwards), wasting no more than all rooms
 * together can spare. What is left for the later rooms and was found to fail is remembered.
 */
export function fillRooms(load: Load, limit: number): Search {
  const { rooms, costs, takes } = load;
  if (rooms.some((room) => room < 0) || cannotFit(load)) return { found: null, complete: true };
  const taken = takes.map((row) => row.filter(Boolean).length);
  const order = rooms.map((_, index) => index).sort((a, b) => at(taken, a) - at(taken, b) || at(rooms, a) - at(rooms, b));
  const kinds = costs.map((_, kind) => kind).sort((a, b) => at(costs, b) - at(costs, a));
  const left = [...load.counts];
  const filling = rooms.map(() => costs.map(() => 0));
  const failed = new Set<string>();
  let steps = 0;

  /** Fills the place-th room of the order and all after it. `slack`: what these rooms can waste in all. */
  const room = (place: number, slack: number): boolean => {
    const index = order[place];
    if (index === undefined) return left.every((count) => count === 0);
    const key = `${place}:${left.join()}`;
    if (failed.has(key)) return false;
    if (choose(place, index, 0, at(rooms, index), slack)) return true;
    if (steps <= limit) failed.add(key);
    return false;
  };

  /** Chooses how many of the n-th dearest kind stand in a room with `spare` left. */
  const choose = (place: number, index: number, n: number, spare: number, slack: number): boolean => {
    if (++steps > limit) return false;
    const row = filling[index];
    const kind = kinds[n];
    if (!row) return false;
    if (kind === undefined) {
      if (spare > slack) return false;
      for (let k = 0; k < costs.length; k++) if (at(left, k) > 0 && at(costs, k) <= spare && takesKind(load, index, k)) return false;
      return room(place + 1, slack - spare);
    }
    const cost = at(costs, kind);
    const most = takesKind(load, index, kind) ? Math.min(at(left, kind), Math.floor(spare / cost)) : 0;
    let rest = 0; // what the cheaper kinds could still fill
    for (let k = n + 1; k < kinds.length; k++) rest += at(left, kinds[k] ?? 0) * at(costs, kinds[k] ?? 0);
    const all = at(left, kind);
    for (let count = most; count >= 0 && steps <= limit; count--) {
      if (spare - count * cost - rest > slack) break;
      left[kind] = all - count;
      row[kind] = count;
      if (choose(place, index, n + 1, spare - count * cost, slack)) return true;
    }
    left[kind] = all;
    row[kind] = 0;
    return false;
  };

  const done = room(0, sumOf(rooms) - costOf(load.counts, costs));
  return done ? { found: filling, complete: true } : { found: null, complete: steps <= limit };
}
