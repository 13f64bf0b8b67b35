import { entry } from './stock';

/** The best filling found, its value, and what no filling exceeds (the value itself where the search ran to its end). */
export interface Knapsack {
  readonly counts: readonly number[];
  readonly value: number;
  readonly most: number;
}

const LIMIT = 200_000; // steps; shop jobs end after some hundreds

/**
 * Bounded knapsack by branch and bound: pieces by value per length, and at each the bound that the rest of the room
 * filled at the next rate cannot beat.
 */
export function fillBest(lengths: readonly number[], values: readonly number[], most: readonly number[], room: number): Knapsack {
  const order = lengths.map((_, i) => i).filter((i) => entry(values, i) > 1e-12 && entry(most, i) > 0 && entry(lengths, i) <= room)
    .sort((a, b) => entry(values, b) / entry(lengths, b) - entry(values, a) / entry(lengths, a));
  const counts = lengths.map(() => 0);
  let best = { counts: [...counts], value: 0 };
  let steps = 0;
  const choose = (n: number, left: number, value: number) => {
    if (value > best.value + 1e-12) best = { counts: [...counts], value };
    const piece = order[n];
    if (piece === undefined || ++steps > LIMIT) return;
    const rate = entry(values, piece) / entry(lengths, piece);
    if (value + left * rate <= best.value + 1e-12) return;
    const length = entry(lengths, piece);
    for (let count = Math.min(entry(most, piece), Math.floor(left / length)); count >= 0; count--) {
      counts[piece] = count;
      choose(n + 1, left - count * length, value + count * entry(values, piece));
    }
    counts[piece] = 0;
  };
  choose(0, room, 0);
  const first = order[0];
  const loose = first === undefined ? 0 : (room * entry(values, first)) / entry(lengths, first);
  return { ...best, most: steps > LIMIT ? loose : best.value };
}
