import { fillBest } from './knapsack';
import { type CutProblem, entry } from './stock';

/** A way to cut one board that the linear program uses, and how often, in fractions. */
export interface Column {
  readonly stock: number;
  readonly pieces: readonly number[];
  readonly times: number;
}

export interface Relaxed {
  readonly columns: readonly Column[];
  /** No plan of whole boards costs less: from prices that are feasible whatever the arithmetic did. */
  readonly bound: number;
}

/** A column of the basis; `stock` null: a slack, a surplus, or a piece bought at a price that no plan wants to pay. */
interface Basic {
  readonly stock: number | null;
  readonly pieces: readonly number[];
  readonly column: readonly number[];
  readonly cost: number;
}

const MOST_PIVOTS = 3000; // met by no instance tried; the bound holds wherever it stops
const TINY = 1e-9; // below it a figure of the program is zero

/**
 * The cutting problem in fractions of boards, by column generation (Gilmore and Gomory, 1961): the simplex method over
 * few ways to cut, each next one made by a knapsack at the pieces' present prices.
 *
 * Rows: each piece's count (at least), then each limited stock (at most). Bound: with piece prices y ≥ 0 that buy no
 * unlimited board for more than it costs, and s the excess on limited ones, Σ d y − Σ available s (linear duality).
 */
export function relax({ stocks, pieces }: CutProblem): Relaxed {
  const limited = stocks.flatMap(({ available }, stock) => (available === null ? [] : [stock]));
  const rows = pieces.length + limited.length;
  const need = [...pieces.map(({ count }) => count), ...limited.map((stock) => stocks[stock]?.available ?? 0)];
  const dear = 1000 * Math.max(1, ...stocks.map(({ price }) => price)); // more than any board: no plan buys at it
  const unit = (row: number, sign = 1) => Array.from({ length: rows }, (_, r) => (r === row ? sign : 0));
  const basis: Basic[] = need.map((_, row) => ({ stock: null, pieces: [], column: unit(row), cost: row < pieces.length ? dear : 0 }));
  const inverse = need.map((_, row) => unit(row));
  const values = [...need];
  const lengths = pieces.map(({ length }) => length);
  const counts = pieces.map(({ count }) => count);
  let bound = 0;

  for (let pivot = 0; pivot < MOST_PIVOTS; pivot++) {
    // y = c B⁻¹
    const y = need.map((_, col) => basis.reduce((sum, { cost }, row) => sum + cost * (inverse[row]?.[col] ?? 0), 0));
    const prices = y.slice(0, pieces.length).map((price) => Math.max(0, price));
    const filled = stocks.map(({ length }) => fillBest(lengths, prices, counts, length));
    const ease = Math.min(1, ...stocks.map(({ available, price }, stock) => (available === null && (filled[stock]?.most ?? 0) > price ? price / (filled[stock]?.most ?? 1) : 1)));
    const excess = limited.reduce((sum, stock) => sum + (stocks[stock]?.available ?? 0) * Math.max(0, ease * (filled[stock]?.most ?? 0) - (stocks[stock]?.price ?? 0)), 0);
    bound = Math.max(bound, ease * counts.reduce((sum, count, i) => sum + count * entry(prices, i), 0) - excess);

    // The column that saves most: a way to cut, or a surplus or slack whose price has the wrong sign.
    let enter: Basic | null = null;
    let saves = 1e-7;
    filled.forEach((fill, stock) => {
      const row = limited.indexOf(stock);
      const gain = fill.value + (row < 0 ? 0 : entry(y, pieces.length + row)) - (stocks[stock]?.price ?? 0);
      if (gain <= saves) return;
      saves = gain;
      enter = { stock, pieces: fill.counts, column: [...fill.counts, ...limited.map((each) => (each === stock ? 1 : 0))], cost: stocks[stock]?.price ?? 0 };
    });
    y.forEach((price, row) => {
      const gain = row < pieces.length ? -price : price;
      if (gain <= saves) return;
      saves = gain;
      enter = { stock: null, pieces: [], column: unit(row, row < pieces.length ? -1 : 1), cost: 0 };
    });
    if (!enter) break;
    const entering: Basic = enter;
    const change = inverse.map((line) => line.reduce((sum, value, col) => sum + value * entry(entering.column, col), 0));
    let out = -1;
    let step = Infinity;
    change.forEach((rate, row) => {
      if (rate <= TINY) return;
      const ratio = entry(values, row) / rate;
      if (ratio < step - 1e-12 || (ratio < step + 1e-12 && rate > entry(change, out))) {
        step = ratio;
        out = row;
      }
    });
    const line = inverse[out];
    if (!line) break;
    const scale = entry(change, out);
    for (let col = 0; col < rows; col++) line[col] = entry(line, col) / scale;
    values[out] = step;
    inverse.forEach((other, row) => {
      const rate = entry(change, row);
      if (row === out || rate === 0) return;
      for (let col = 0; col < rows; col++) other[col] = entry(other, col) - rate * entry(line, col);
      values[row] = Math.max(0, entry(values, row) - rate * step);
    });
    basis[out] = entering;
  }
  const columns = basis.flatMap(({ stock, pieces: cut }, row) => (stock === null || entry(values, row) < TINY ? [] : [{ stock, pieces: cut, times: entry(values, row) }]));
  return { columns, bound };
}
