import { type CutBoard, type CutProblem, entry } from './stock';

const LIMIT = 200_000; // steps: under a second; shop jobs end long before

/**
 * A plan cheaper than `below`, by branch and bound: the longest piece left goes into a board of each stock, filled so
 * that no piece left would still go in (any plan can be brought to that form by moving pieces forwards). Bound: what
 * is left at the lowest price per length. `complete`: nothing cheaper than what was found exists.
 */
export function searchCuts({ stocks, pieces }: CutProblem, below: number, floor: number): { readonly found: CutBoard[] | null; readonly complete: boolean } {
  const order = pieces.map((_, piece) => piece).sort((a, b) => (pieces[b]?.length ?? 0) - (pieces[a]?.length ?? 0));
  const lengths = order.map((piece) => pieces[piece]?.length ?? 0);
  const left = order.map((piece) => pieces[piece]?.count ?? 0);
  const available = stocks.map((stock) => stock.available ?? Infinity);
  const rate = Math.min(...stocks.map(({ price, length }) => price / length));
  const tried = stocks.map((_, stock) => stock).sort((a, b) => (stocks[a]?.price ?? 0) / (stocks[a]?.length ?? 1) - (stocks[b]?.price ?? 0) / (stocks[b]?.length ?? 1));
  const chosen: { stock: number; cut: readonly number[] }[] = [];
  const seen = new Map<string, number>();
  let best = below;
  let found: CutBoard[] | null = null;
  let steps = 0;

  const boards = () => chosen.map(({ stock, cut }) => ({ stock, times: 1, pieces: pieces.map((_, piece) => entry(cut, order.indexOf(piece))) }));

  const next = (cost: number) => {
    if (best <= floor || ++steps > LIMIT) return;
    const first = left.findIndex((count) => count > 0);
    if (first < 0) {
      if (cost < best) {
        best = cost;
        found = boards();
      }
      return;
    }
    if (cost + rate * left.reduce((sum, count, i) => sum + count * entry(lengths, i), 0) >= best - 1e-9) return;
    const key = `${left.join()};${available.join()}`;
    if ((seen.get(key) ?? Infinity) <= cost) return;
    seen.set(key, cost);
    for (const stock of tried) {
      const { length = 0, price = 0 } = stocks[stock] ?? {};
      if (entry(available, stock) === 0 || length < entry(lengths, first)) continue;
      available[stock] = entry(available, stock) - 1;
      fill(stock, left.map(() => 0), first, length, true, cost + price);
      available[stock] = entry(available, stock) + 1;
    }
  };

  const fill = (stock: number, cut: number[], i: number, room: number, must: boolean, cost: number) => {
    if (best <= floor || ++steps > LIMIT) return;
    if (i === lengths.length) {
      if (lengths.some((length, j) => length <= room && entry(left, j) > 0)) return;
      chosen.push({ stock, cut: [...cut] });
      next(cost);
      chosen.pop();
      return;
    }
    const all = entry(left, i);
    for (let count = Math.min(all, Math.floor(room / entry(lengths, i))); count >= (must ? 1 : 0); count--) {
      left[i] = all - count;
      cut[i] = count;
      fill(stock, cut, i + 1, room - count * entry(lengths, i), false, cost);
    }
    left[i] = all;
    cut[i] = 0;
  };

  next(0);
  return { found, complete: steps <= LIMIT || best <= floor };
}
