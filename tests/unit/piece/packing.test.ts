import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fillBySwaps, fillEvenly, spreadOut } from '#shared/piece/even';
import { type Filling, type Load, fillRooms, sparesOf } from '#shared/piece/packing';
import { keepTogether, pairsOf } from '#shared/piece/together';

/** Two or three rooms, up to eight coins of up to six kinds. */
const loads: fc.Arbitrary<Load> = fc.record({
  counts: fc.array(fc.integer({ min: 1, max: 2 }), { minLength: 2, maxLength: 6 }).filter((counts) => counts.reduce((a, b) => a + b, 0) <= 8),
  costs: fc.array(fc.integer({ min: 3, max: 17 }), { minLength: 6, maxLength: 6 }),
  rooms: fc.array(fc.integer({ min: 10, max: 60 }), { minLength: 2, maxLength: 3 }),
}).map(({ counts, costs, rooms }) => ({ counts, costs: costs.slice(0, counts.length), rooms, takes: rooms.map(() => counts.map(() => true)) }));

/** Every filling that holds all coins, by putting each coin into each room. */
function everyFilling({ rooms, costs, counts }: Load): Filling[] {
  const coins = counts.flatMap((count, kind) => Array.from({ length: count }, () => kind));
  const list: Filling[] = [];
  const filling = rooms.map(() => costs.map(() => 0));
  const left = [...rooms];
  const place = (n: number) => {
    const kind = coins[n];
    if (kind === undefined) {
      list.push(filling.map((row) => [...row]));
      return;
    }
    const cost = costs[kind] ?? NaN;
    filling.forEach((row, room) => {
      const spare = left[room] ?? 0;
      if (spare < cost) return;
      row[kind] = (row[kind] ?? 0) + 1;
      left[room] = spare - cost;
      place(n + 1);
      row[kind] = (row[kind] ?? 0) - 1;
      left[room] = spare;
    });
  };
  place(0);
  return list;
}

const least = (load: Load, filling: Filling) => Math.min(...sparesOf(load, filling));
const limits = fc.constantFrom(1, 3, 8, 20, 10_000);

describe('searches that may stop at their limit', () => {
  it('say there is no filling only where there is none', () => {
    let [none, stopped] = [0, 0];
    fc.assert(fc.property(loads, limits, (load, limit) => {
      const { found, complete } = fillRooms(load, limit);
      const every = everyFilling(load);
      if (found) expect(Math.min(...sparesOf(load, found))).toBeGreaterThanOrEqual(0);
      if (found) expect(every).toContainEqual(found);
      if (!found && complete) {
        none++;
        expect(every).toEqual([]);
      }
      if (!complete) stopped++;
    }), { numRuns: 500 });
    expect(Math.min(none, stopped)).toBeGreaterThan(20);
  });

  it('never put the bound of evenness below what can be reached', () => {
    let stopped = 0;
    fc.assert(fc.property(loads, limits, (load, limit) => {
      const start = spreadOut(load);
      fc.pre(start !== null);
      if (!start) return;
      const best = Math.max(...everyFilling(load).map((filling) => least(load, filling)));
      // From the start itself, without swaps, so that there is something left to search for.
      const known = { ...fillBySwaps(load, start), filling: start, spare: least(load, start) };
      const even = fillEvenly(load, known, known.spare, limit);
      expect(least(load, even.filling)).toBe(even.spare);
      expect(even.spare).toBeLessThanOrEqual(best);
      expect(even.bound).toBeGreaterThanOrEqual(best);
      if (limit === 10_000) expect([even.spare, even.bound]).toEqual([best, best]);
      if (even.spare < even.bound) stopped++;
    }), { numRuns: 500 });
    expect(stopped).toBeGreaterThan(5);
  });

  it('keep kinds together as well as can be, from any start, and claim no more', () => {
    fc.assert(fc.property(loads, limits, fc.nat(1000), (load, limit, pick) => {
      const every = everyFilling(load);
      fc.pre(every.length > 0);
      const none = load.rooms.map(() => load.costs.map(() => false));
      const best = Math.min(...every.map((filling) => pairsOf(filling, none)));
      const { filling, pairs, bound } = keepTogether(load, every[pick % every.length] ?? [], none, limit);
      expect(pairsOf(filling, none)).toBe(pairs);
      expect(every).toContainEqual(filling);
      expect(bound).toBeLessThanOrEqual(best);
      if (limit === 10_000) expect([pairs, bound]).toEqual([best, best]);
    }), { numRuns: 500 });
  });
});
