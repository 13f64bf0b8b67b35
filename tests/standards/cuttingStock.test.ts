import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cutStock } from '#shared/wood/cutStock';
import type { CutPlan, CutProblem } from '#shared/wood/stock';

/** One stock length as often as wanted, each board at 1. */
const problem = (stock: number, pieces: readonly (readonly [number, number])[]): CutProblem => ({ stocks: [{ length: stock, price: 1, available: null }], pieces: pieces.map(([length, count]) => ({ length, count })) });
const single = (lengths: readonly number[]) => lengths.map((length) => [length, 1] as const);

/** Cutting-stock example of the general literature, 219 pieces: optimum 73 (FACTS.md G1, re-proved there by an integer program). */
const PAPER = [[1380, 22], [1520, 25], [1560, 12], [1710, 14], [1820, 18], [1880, 18], [1930, 20], [2000, 10], [2050, 12], [2100, 14], [2140, 16], [2150, 18], [2200, 20]] as const;
/** V. Chvátal, Linear Programming (1983), ch. 13: optimum 453 (FACTS.md G1). */
const CHVATAL = [[45, 97], [36, 610], [31, 395], [14, 211]] as const;
/** OR-Library binpack1, u120_00 (Falkenauer): capacity 150, optimum 48; first-fit decreasing needs 49 (FACTS.md G2). */
const U120 = '98 98 98 96 96 94 93 93 92 91 91 90 87 86 85 85 84 84 84 84 84 83 83 82 82 81 80 80 80 79 79 78 78 78 78 76 74 74 73 73 73 73 72 71 70 70 70 69 69 69 67 66 64 62 62 60 60 59 58 58 58 57 57 57 57 55 55 55 50 49 49 49 47 46 46 45 45 44 44 43 43 43 43 42 42 42 42 42 41 41 41 39 39 38 38 38 37 36 36 36 35 33 33 33 32 32 30 30 30 29 28 27 27 26 25 25 24 23 23 20'.split(' ').map(Number);
/** Scholl, Klein, Jürgens (1997), data set 1, N1C1W1_A: capacity 100, optimum 25 (FACTS.md G2). */
const N1C1W1A = '99 99 96 96 92 92 91 88 87 86 85 76 74 72 69 67 67 62 61 56 52 51 49 46 44 42 40 40 33 33 30 30 29 28 28 27 25 24 23 22 21 20 17 14 13 11 10 7 7 3'.split(' ').map(Number);

/** With kerf k, stock L and pieces l are as L + k and l + k; inches in sixteenths (FACTS.md G3, exact optima by integer program). */
const kerfed = (stock: number, kerf: number, pieces: readonly (readonly [number, number])[]) => problem((stock + kerf) * 16, pieces.map(([length, count]) => [(length + kerf) * 16, count] as const));

function expectSound({ stocks, pieces }: CutProblem, plan: CutPlan | null) {
  if (!plan) throw new Error('a plan was found');
  pieces.forEach(({ count }, piece) => expect(plan.boards.reduce((sum, board) => sum + board.times * (board.pieces[piece] ?? 0), 0)).toBe(count));
  for (const { stock, pieces: cut } of plan.boards) expect(cut.reduce((sum, count, piece) => sum + count * (pieces[piece]?.length ?? NaN), 0)).toBeLessThanOrEqual(stocks[stock]?.length ?? 0);
  stocks.forEach(({ available }, stock) => expect(plan.boards.filter((board) => board.stock === stock).reduce((sum, { times }) => sum + times, 0)).toBeLessThanOrEqual(available ?? Infinity));
  expect(plan.cost).toBe(plan.boards.reduce((sum, { stock, times }) => sum + times * (stocks[stock]?.price ?? NaN), 0));
  expect(plan.bound).toBeLessThanOrEqual(plan.cost);
}

describe('stock cutting', () => {
  it.each([
    ['219 pieces from 5600', problem(5600, PAPER), 73],
    ['Chvátal\'s rolls', problem(100, CHVATAL), 453],
    ['u120_00', problem(150, single(U120)), 48],
    ['N1C1W1_A', problem(100, single(N1C1W1A)), 25],
    ['mixed lengths from 96 in with kerf', kerfed(96, 0.125, [[37.0625, 13], [19.5, 2]]), 7],
    ['more mixed lengths from 96 in', kerfed(96, 0.125, [[31.875, 6], [19.5, 4], [12.25, 7]]), 4],
    ['lengths from 72 in that first-fit cuts from 7', kerfed(72, 0.125, [[23.875, 9], [17.9375, 8], [11.875, 6]]), 6],
  ])('of %s takes the known optimum', (_name, each, optimum) => {
    const plan = cutStock(each);
    expectSound(each, plan);
    expect(plan?.cost).toBe(optimum);
    expect(plan?.bound).toBe(optimum);
  });

  // FACTS.md G3: n = floor((L + k) / (l + k)), stock 96 in, kerf 1/8.
  it.each([[12, 7], [16, 5], [18, 5], [20, 4], [24, 3], [32, 2], [48, 1]])('of %d in pieces gets %d from one 96 in board', (length, n) => {
    expect(cutStock(kerfed(96, 0.125, [[length, n]]))?.cost).toBe(1);
    expect(cutStock(kerfed(96, 0.125, [[length, n + 1]]))?.cost).toBe(2);
  });

  const small: fc.Arbitrary<CutProblem> = fc.record({
    stocks: fc.array(fc.record({ length: fc.integer({ min: 10, max: 40 }), price: fc.integer({ min: 0, max: 30 }), available: fc.option(fc.nat(2), { nil: null }) }), { minLength: 1, maxLength: 3 }),
    pieces: fc.array(fc.record({ length: fc.integer({ min: 3, max: 25 }), count: fc.nat(2) }), { minLength: 1, maxLength: 4 }),
  }).filter(({ pieces }) => pieces.reduce((sum, { count }) => sum + count, 0) <= 5);

  /** The least cost over every way to put each piece into any of the boards, those already begun or new ones. */
  function bruteForce({ stocks, pieces }: CutProblem): number {
    const list = pieces.flatMap(({ length, count }) => Array.from({ length: count }, () => length));
    let best = Infinity;
    const place = (n: number, boards: readonly { readonly stock: number; readonly left: number }[], cost: number) => {
      const length = list[n];
      if (length === undefined) {
        best = Math.min(best, cost);
        return;
      }
      boards.forEach(({ left }, i) => { if (left >= length) place(n + 1, boards.map((board, j) => (i === j ? { ...board, left: left - length } : board)), cost); });
      stocks.forEach((stock, i) => {
        const used = boards.filter((board) => board.stock === i).length;
        if (stock.length >= length && used < (stock.available ?? Infinity)) place(n + 1, [...boards, { stock: i, left: stock.length - length }], cost + stock.price);
      });
    };
    place(0, [], 0);
    return best;
  }

  it('of small jobs is the cheapest of all ways, with several stocks, prices and offcuts, and says so', () => {
    let cut = 0;
    fc.assert(fc.property(small, (each) => {
      const plan = cutStock(each);
      const best = bruteForce(each);
      if (best === Infinity) {
        expect(plan).toBeNull();
        return;
      }
      expectSound(each, plan);
      expect(plan?.cost).toBe(best);
      expect(plan?.bound).toBe(best);
      cut++;
    }), { numRuns: 600 });
    expect(cut).toBeGreaterThan(200);
  });
});
