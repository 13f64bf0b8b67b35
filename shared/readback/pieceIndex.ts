import type { Piece } from './cut';

/** Cells along each side: enough that a long program's neighbours are few. */
const MOST_CELLS = 128;

/** From here on an account of the pieces between the same points is sooner made than neighbours are tried. */
const MANY = 200;

/** A part of the plan, by its sides. */
export interface Box {
  readonly left: number;
  readonly right: number;
  readonly front: number;
  readonly back: number;
}

/** The part of the plan within `reach` of the middle line of a piece's sides. */
export function boxAround({ x0, y0, x1, y1 }: Pick<Piece, 'x0' | 'y0' | 'x1' | 'y1'>, reach: number): Box {
  return { left: Math.min(x0, x1) - reach, right: Math.max(x0, x1) + reach, front: Math.min(y0, y1) - reach, back: Math.max(y0, y1) + reach };
}

/** Pieces by where they run, so that a place can ask which came near it before, newest first. */
export class PieceIndex {
  private readonly cells: number[][] = [];
  private readonly area: Box;
  private readonly columns: number;
  private readonly rows: number;
  /** For each piece the newest before it between the same two points, -1 without one; empty for few pieces. */
  private readonly before: readonly number[];

  constructor(private readonly pieces: readonly Piece[], radius: number) {
    let [left, right, front, back, along, across] = [Infinity, -Infinity, Infinity, -Infinity, 0, 0];
    for (const { x0, x1, y0, y1 } of pieces) {
      left = Math.min(left, x0, x1);
      right = Math.max(right, x0, x1);
      front = Math.min(front, y0, y1);
      back = Math.max(back, y0, y1);
      along += Math.abs(x1 - x0);
      across += Math.abs(y1 - y0);
    }
    this.area = { left, right, front, back };
    // Few pieces are sooner tried than filed; and a cell as long as the pieces are keeps each of them in few cells.
    const most = Math.min(MOST_CELLS, pieces.length >> 3);
    const count = (side: number, mean: number) => Math.max(1, Math.min(most, Math.floor(side / Math.max(2 * radius, mean)) || 1));
    this.columns = count(right - left, along / pieces.length);
    this.rows = count(back - front, across / pieces.length);
    this.before = pieces.length < MANY ? [] : sameWays(pieces);
    pieces.forEach((piece, order) => this.eachCell(boxAround(piece, 0), (cell) => (this.cells[cell] ??= []).push(order)));
  }

  /**
   * The newest piece before `order` that ran between the same two points, or null. Pass over pass that is nearly always
   * the one that settles a piece, and it is found without a look at its neighbours; few pieces are not worth the account.
   */
  sameWayBefore(order: number): Piece | null {
    return this.pieces[this.before[order] ?? -1] ?? null;
  }

  /** Visits the pieces before `order` whose cells a box touches, newest first, each once, until `visit` answers true. */
  newestFirst(box: Box, order: number, visit: (piece: Piece) => boolean): void {
    if (this.columns * this.rows === 1) {
      for (let i = order - 1; i >= 0; i--) {
        const piece = this.pieces[i];
        if (piece && visit(piece)) return;
      }
      return;
    }
    const queue = new NewestQueue();
    this.eachCell(box, (cell) => {
      const list = this.cells[cell];
      if (list) queue.add(list, countBelow(list, order) - 1);
    });
    let last = order;
    for (let next = queue.take(); next >= 0; next = queue.take()) {
      if (next === last) continue; // in several cells
      last = next;
      const piece = this.pieces[next];
      if (piece && visit(piece)) return;
    }
  }

  private eachCell(box: Box, visit: (cell: number) => void): void {
    const { left, right, front, back } = this.area;
    const place = (value: number, low: number, high: number, count: number) =>
      Math.min(count - 1, Math.max(0, Math.floor(((value - low) / (high - low || 1)) * count)));
    const [c0, c1] = [place(box.left, left, right, this.columns), place(box.right, left, right, this.columns)];
    const [r0, r1] = [place(box.front, front, back, this.rows), place(box.back, front, back, this.rows)];
    for (let c = c0; c <= c1; c++) for (let r = r0; r <= r1; r++) visit(c * this.rows + r);
  }
}

function sameWays(pieces: readonly Piece[]): number[] {
  const newest = new Map<string, number>();
  return pieces.map(({ x0, y0, x1, y1 }, order) => {
    const way = x0 < x1 || (x0 === x1 && y0 < y1) ? `${x0} ${y0} ${x1} ${y1}` : `${x1} ${y1} ${x0} ${y0}`; // whichever way it runs
    const before = newest.get(way) ?? -1;
    newest.set(way, order);
    return before;
  });
}

/** Several ascending lists, taken from their ends by the greatest of all: a binary heap of them. */
class NewestQueue {
  private readonly heap: { readonly list: readonly number[]; at: number; order: number }[] = [];

  /** A list that counts up to its place `at`. */
  add(list: readonly number[], at: number): void {
    const order = list[at];
    if (order === undefined) return;
    const { heap } = this;
    heap.push({ list, at, order });
    for (let i = heap.length - 1, up = (i - 1) >> 1; i > 0 && this.order(up) < this.order(i); i = up, up = (i - 1) >> 1) this.swap(i, up);
  }

  /** The greatest number left, or -1. */
  take(): number {
    const [top] = this.heap;
    if (!top) return -1;
    const { order } = top;
    top.at--;
    top.order = top.list[top.at] ?? -1;
    for (let i = 0; ;) {
      const child = this.order(2 * i + 2) > this.order(2 * i + 1) ? 2 * i + 2 : 2 * i + 1;
      if (this.order(child) <= this.order(i)) break;
      this.swap(i, child);
      i = child;
    }
    return order;
  }

  private order(i: number): number {
    return this.heap[i]?.order ?? -1;
  }

  private swap(i: number, j: number): void {
    const [a, b] = [this.heap[i], this.heap[j]];
    if (a && b) [this.heap[i], this.heap[j]] = [b, a];
  }
}

/** How many of an ascending list lie below a number. */
function countBelow(list: readonly number[], limit: number): number {
  let [low, high] = [0, list.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((list[middle] ?? Infinity) < limit) low = middle + 1;
    else high = middle;
  }
  return low;
}
