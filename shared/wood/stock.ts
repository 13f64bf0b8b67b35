/** A length to be cut from, in whole steps, and its price in cents. `available` null: as many as one likes to buy. */
export interface StockLength {
  readonly length: number;
  readonly price: number;
  readonly available: number | null;
}

export interface PieceLength {
  readonly length: number;
  readonly count: number;
}

/** One way to cut a board, and how many are cut so. */
export interface CutBoard {
  readonly stock: number;
  readonly pieces: readonly number[];
  readonly times: number;
}

/** How to cut everything; `bound` is a cost that no plan is below, so a plan at its bound is proved cheapest. */
export interface CutPlan {
  readonly boards: readonly CutBoard[];
  readonly cost: number;
  readonly bound: number;
}

export interface CutProblem {
  readonly stocks: readonly StockLength[];
  readonly pieces: readonly PieceLength[];
}

export const entry = (list: ArrayLike<number>, index: number): number => list[index] ?? 0;

export function costOfBoards(boards: readonly CutBoard[], stocks: readonly StockLength[]): number {
  return boards.reduce((sum, { stock, times }) => sum + times * (stocks[stock]?.price ?? 0), 0);
}

function gcd(a: number, b: number): number {
  return b === 0 ? a : gcd(b, a % b);
}

/** The least cost that prices can make which is not below a bound: all costs are multiples of the prices' common divisor. */
export function roundUpCost(bound: number, stocks: readonly StockLength[]): number {
  const step = stocks.reduce((sum, { price }) => gcd(price, sum), 0);
  return step === 0 ? 0 : Math.max(0, Math.ceil(bound / step - 1e-6) * step); // the linear program's figures are good to a ten-millionth
}

/** Like boards once, with how many there are. */
export function gather(boards: readonly CutBoard[]): CutBoard[] {
  const like = new Map<string, CutBoard>();
  for (const board of boards) {
    const key = `${board.stock}:${board.pieces.join()}`;
    like.set(key, { ...board, times: board.times + (like.get(key)?.times ?? 0) });
  }
  return [...like.values()];
}
