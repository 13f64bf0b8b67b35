import { type Filling, type Load, at, costOf, fillRooms, sparesOf, sumOf } from './packing';

/** Greatest common divisor (Euclid). */
function gcd(a: number, b: number): number {
  return b === 0 ? a : gcd(b, a % b);
}

/** Dearest coins first, each where most is left over: a filling that is near even, or null where a coin finds no room. */
export function spreadOut({ rooms, costs, counts, takes }: Load): number[][] | null {
  const filling = rooms.map(() => costs.map(() => 0));
  const spares = [...rooms];
  const kinds = costs.map((_, kind) => kind).sort((a, b) => at(costs, b) - at(costs, a));
  for (const kind of kinds) {
    for (let n = 0; n < at(counts, kind); n++) {
      let best = -1;
      spares.forEach((spare, room) => {
        if (takes[room]?.[kind] === true && spare >= at(costs, kind) && (best < 0 || spare > at(spares, best))) best = room;
      });
      const row = filling[best];
      if (!row) return null;
      row[kind] = at(row, kind) + 1;
      spares[best] = at(spares, best) - at(costs, kind);
    }
  }
  return filling;
}

interface Handful {
  readonly kinds: readonly number[];
  readonly cost: number;
}

/** Up to two coins of a row: what a swap may take from it. */
function handfuls(row: readonly number[], costs: readonly number[]): Handful[] {
  const singles = row.flatMap((count, kind) => (count > 0 ? [{ kinds: [kind], cost: at(costs, kind) }] : []));
  const list: Handful[] = [{ kinds: [], cost: 0 }, ...singles];
  singles.forEach(({ kinds: [a = 0], cost }, n) => {
    for (const { kinds: [b = 0], cost: other } of singles.slice(n)) if (a !== b || at(row, a) > 1) list.push({ kinds: [a, b], cost: cost + other });
  });
  return list;
}

/** Rounds of swaps: each raises the least spare or leaves fewer rooms at it, and this many are never met in practice. */
const MOST_ROUNDS = 200;

/** Swaps up to two coins against up to two between the fullest room and another, while that leaves both less full than it was and the bound is not reached. */
export function swapEven(load: Load, start: number[][], bound: number): number[][] {
  const { costs, takes } = load;
  const filling = start.map((row) => [...row]);
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const spares = sparesOf(load, filling);
    const worst = spares.indexOf(Math.min(...spares));
    const least = at(spares, worst);
    const full = filling[worst];
    if (!full || least >= bound) break;
    let best: { readonly other: number; readonly give: Handful; readonly get: Handful; readonly least: number } | null = null;
    const gives = handfuls(full, costs);
    for (const [other, row] of filling.entries()) {
      if (other === worst) continue;
      for (const get of handfuls(row, costs)) {
        if (!get.kinds.every((kind) => takes[worst]?.[kind])) continue;
        for (const give of gives) {
          const eased = give.cost - get.cost;
          if (eased <= 0) continue;
          const after = Math.min(least + eased, at(spares, other) - eased);
          if (after > (best?.least ?? least) && give.kinds.every((kind) => takes[other]?.[kind])) best = { other, give, get, least: after };
        }
      }
    }
    const row = best && filling[best.other];
    if (!best || !row) break;
    for (const kind of best.give.kinds) { full[kind] = at(full, kind) - 1; row[kind] = at(row, kind) + 1; }
    for (const kind of best.get.kinds) { full[kind] = at(full, kind) + 1; row[kind] = at(row, kind) - 1; }
  }
  return filling;
}

/**
 * The greatest least spare that sums allow: every room's load is a multiple of the costs' common divisor u, so with
 * spare s the rooms hold at most Σ ⌊(C − s) / u⌋ u, which must be the whole load.
 */
export function spareBound({ rooms, costs, counts }: Load): number {
  const total = costOf(counts, costs);
  const u = costs.reduce((sum, cost, kind) => (at(counts, kind) > 0 ? gcd(cost, sum) : sum), 0);
  if (u === 0 || rooms.length === 0) return Math.min(...rooms);
  const holds = (spare: number) => sumOf(rooms.map((room) => Math.floor((room - spare) / u) * u)) >= total;
  let [low, high] = [-Math.max(...rooms) - total, Math.min(...rooms) + 1];
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (holds(middle)) low = middle;
    else high = middle;
  }
  return low;
}

/** The evenest filling found, its least spare, and what no filling can exceed. */
export interface Even {
  readonly filling: Filling;
  readonly spare: number;
  readonly bound: number;
}

const leastOf = (load: Load, filling: Filling) => Math.min(...sparesOf(load, filling));

/** As even as swaps make it, from a filling that fits; with the bound that sums give. */
export function fillBySwaps(load: Load, start: Filling): Even {
  const spread = spreadOut(load);
  const bound = spareBound(load);
  const fillings = [start.map((row) => [...row]), ...(spread ? [spread] : [])].map((filling) => swapEven(load, filling, bound));
  const filling = fillings.reduce((a, b) => (leastOf(load, b) > leastOf(load, a) ? b : a));
  const spare = leastOf(load, filling);
  return { filling, spare, bound: Math.max(spare, bound) };
}

/**
 * Searches for a filling whose least spare is above what is known, halving between `above` and the bound. A proof that
 * there is none lowers the bound; a search that stops at its limit leaves it where it was.
 */
export function fillEvenly(load: Load, known: Even, above: number, limit: number): Even {
  let { filling, spare, bound } = known;
  let floor = Math.max(spare, above);
  let ceiling = bound; // above it nothing is searched any more
  while (floor < ceiling) {
    const middle = floor + Math.ceil((ceiling - floor) / 2);
    const { found, complete } = fillRooms({ ...load, rooms: load.rooms.map((room) => room - middle) }, limit);
    if (found) {
      filling = found;
      spare = floor = leastOf(load, found);
    } else {
      if (complete) bound = Math.min(bound, middle - 1);
      ceiling = middle - 1;
    }
  }
  return { filling, spare, bound: Math.max(bound, spare) };
}
