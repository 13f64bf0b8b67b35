import { relax } from './columns';
import { searchCuts } from './searchCuts';
import { type CutBoard, type CutPlan, type CutProblem, type PieceLength, type StockLength, costOfBoards, entry, gather, roundUpCost } from './stock';

/** What is left to be cut, and of what. */
class Rest {
  readonly counts: number[];
  readonly available: number[];
  constructor(private readonly problem: CutProblem) {
    this.counts = problem.pieces.map(({ count }) => count);
    this.available = problem.stocks.map(({ available }) => available ?? Infinity);
  }

  get done() {
    return this.counts.every((count) => count === 0);
  }

  /** As a problem of its own. */
  get problemLeft(): CutProblem {
    return {
      stocks: this.problem.stocks.map((stock, index) => ({ ...stock, available: stock.available === null ? null : entry(this.available, index) })),
      pieces: this.problem.pieces.map((piece, index) => ({ ...piece, count: entry(this.counts, index) })),
    };
  }

  /** Cuts boards so, leaving out pieces that are no longer wanted; null where no such board is left or nothing is wanted of it. */
  cut(stock: number, pieces: readonly number[], times: number): CutBoard[] {
    const boards: CutBoard[] = [];
    for (let n = 0; n < times && entry(this.available, stock) > 0; n++) {
      const wanted = pieces.map((count, piece) => Math.min(count, entry(this.counts, piece)));
      if (wanted.every((count) => count === 0)) break;
      wanted.forEach((count, piece) => { this.counts[piece] = entry(this.counts, piece) - count; });
      this.available[stock] = entry(this.available, stock) - 1;
      boards.push({ stock, pieces: wanted, times: 1 });
    }
    return boards;
  }
}

/** Longest pieces first, each into the first board it goes in; a new board is the one that costs least per length among those that take it. Null where none does. */
function firstFit({ stocks, pieces }: CutProblem): CutBoard[] | null {
  const boards: { stock: number; left: number; pieces: number[] }[] = [];
  const available = stocks.map((stock) => stock.available ?? Infinity);
  const cheapest = stocks.map((_, stock) => stock).sort((a, b) => rateOf(stocks[a]) - rateOf(stocks[b]));
  const order = pieces.map((_, piece) => piece).sort((a, b) => (pieces[b]?.length ?? 0) - (pieces[a]?.length ?? 0));
  for (const piece of order) {
    const { length, count } = pieces[piece] ?? { length: 0, count: 0 };
    for (let n = 0; n < count; n++) {
      let board = boards.find(({ left }) => left >= length);
      if (!board) {
        const stock = cheapest.find((each) => (stocks[each]?.length ?? 0) >= length && entry(available, each) > 0);
        if (stock === undefined) return null;
        available[stock] = entry(available, stock) - 1;
        board = { stock, left: stocks[stock]?.length ?? 0, pieces: pieces.map(() => 0) };
        boards.push(board);
      }
      board.left -= length;
      board.pieces[piece] = entry(board.pieces, piece) + 1;
    }
  }
  return boards.map(({ stock, pieces: cut }) => ({ stock, pieces: cut, times: 1 }));
}

const rateOf = (stock: StockLength | undefined) => (stock ? stock.price / stock.length : Infinity);

/** Whole boards from the fractions: what is whole is taken, else the way to cut that is nearest to whole; what is left is relaxed anew. */
function dive(problem: CutProblem): CutBoard[] | null {
  const rest = new Rest(problem);
  const boards: CutBoard[] = [];
  while (!rest.done) {
    const { columns } = relax(rest.problemLeft);
    const whole = columns.flatMap(({ stock, pieces, times }) => rest.cut(stock, pieces, Math.floor(times + 1e-9)));
    boards.push(...whole);
    if (whole.length > 0) continue;
    const best = columns.reduce<(typeof columns)[number] | null>((a, b) => (a && a.times >= b.times ? a : b), null);
    const one = best ? rest.cut(best.stock, best.pieces, 1) : [];
    if (one.length === 0) return null;
    boards.push(...one);
  }
  return boards;
}

const SEARCHED = 60; // pieces up to which the search for a proof is worth its time

/** Pieces that no stock takes, by index. */
export function tooLong({ stocks, pieces }: CutProblem): number[] {
  const longest = Math.max(0, ...stocks.filter(({ available }) => available !== 0).map(({ length }) => length));
  return pieces.flatMap(({ length, count }, index) => (count > 0 && length > longest ? [index] : []));
}

/** Pieces of one length as one kind: fewer rows for the program, and no order among likes for the search. */
function mergeLikes({ stocks, pieces }: CutProblem): { readonly merged: CutProblem; readonly apart: (boards: readonly CutBoard[]) => CutBoard[] } {
  const lengths = [...new Set(pieces.filter(({ count }) => count > 0).map(({ length }) => length))];
  const merged = { stocks, pieces: lengths.map((length) => ({ length, count: pieces.reduce((sum, piece) => sum + (piece.length === length ? piece.count : 0), 0) })) };
  const apart = (boards: readonly CutBoard[]) => {
    const left = pieces.map(({ count }) => count);
    return boards.flatMap(({ stock, pieces: cut, times }) => Array.from({ length: times }, () => {
      const own = pieces.map(() => 0);
      cut.forEach((count, kind) => {
        let want = count;
        pieces.forEach(({ length }, piece) => {
          if (length !== lengths[kind]) return;
          const take = Math.min(want, entry(left, piece));
          left[piece] = entry(left, piece) - take;
          own[piece] = entry(own, piece) + take;
          want -= take;
        });
      });
      return { stock, pieces: own, times: 1 };
    }));
  };
  return { merged, apart };
}

/**
 * The cheapest way found to cut all pieces: the better of first-fit and of rounded fractions, improved and proved by
 * search on small jobs. Null where the stock does not suffice.
 */
export function cutStock(asked: CutProblem): CutPlan | null {
  if (asked.pieces.every(({ count }) => count === 0)) return { boards: [], cost: 0, bound: 0 };
  if (tooLong(asked).length > 0) return null;
  const { merged: problem, apart } = mergeLikes(asked);
  const bound = roundUpCost(relax(problem).bound, problem.stocks);
  const first = firstFit(problem);
  const plan = (boards: CutBoard[] | null) => boards && { boards, cost: costOfBoards(boards, problem.stocks) };
  let best = plan(first);
  if (best === null || best.cost > bound) {
    const dived = plan(dive(problem));
    if (dived && (best === null || dived.cost < best.cost)) best = dived;
  }
  let proved = bound;
  const count = problem.pieces.reduce((sum: number, piece: PieceLength) => sum + piece.count, 0);
  if ((best === null || best.cost > bound) && count <= SEARCHED) {
    const { found, complete } = searchCuts(problem, best?.cost ?? Infinity, bound);
    if (found) best = plan(found);
    if (complete && best) proved = best.cost;
  }
  return best && { boards: gather(apart(best.boards)), cost: best.cost, bound: Math.min(proved, best.cost) };
}
