import type { Point2 } from '../geometry/point';
import type { Piece } from './cut';

/** Cells along each side: enough that a long program's neighbours are few, few enough that a long piece fills few. */
const MOST_CELLS = 64;

/** Pieces by where they run, so that a place can ask which came near it before, newest first. */
export class PieceIndex {
  private readonly cells: number[][] = [];
  private readonly columns: number;
  private readonly rows: number;
  private readonly left: number;
  private readonly front: number;
  private readonly width: number;
  private readonly height: number;

  constructor(private readonly pieces: readonly Piece[], radius: number) {
    let [left, right, front, back] = [Infinity, -Infinity, Infinity, -Infinity];
    for (const { x0, x1, y0, y1 } of pieces) {
      left = Math.min(left, x0, x1);
      right = Math.max(right, x0, x1);
      front = Math.min(front, y0, y1);
      back = Math.max(back, y0, y1);
    }
    [this.left, this.front] = [left, front];
    const most = Math.min(MOST_CELLS, pieces.length >> 3); // few pieces are sooner tried than filed
    this.columns = Math.max(1, Math.min(most, Math.floor((right - left) / (2 * radius))));
    this.rows = Math.max(1, Math.min(most, Math.floor((back - front) / (2 * radius))));
    this.width = (right - left) / this.columns || 1;
    this.height = (back - front) / this.rows || 1;
    pieces.forEach((piece, order) => {
      this.eachCell(
        Math.min(piece.x0, piece.x1), Math.max(piece.x0, piece.x1), Math.min(piece.y0, piece.y1), Math.max(piece.y0, piece.y1),
        (cell) => (this.cells[cell] ??= []).push(order),
      );
    });
  }

  /**
   * Visits the pieces before `order` that run through cells within `reach` + one radius of a place, newest first, each
   * once, until `visit` answers true.
   */
  newestFirst(at: Point2, order: number, reach: number, visit: (piece: Piece) => boolean): void {
    if (this.columns * this.rows === 1) {
      for (let i = order - 1; i >= 0; i--) {
        const piece = this.pieces[i];
        if (piece && visit(piece)) return;
      }
      return;
    }
    const lists: number[][] = [];
    this.eachCell(at.x - 2 * reach, at.x + 2 * reach, at.y - 2 * reach, at.y + 2 * reach, (cell) => {
      const list = this.cells[cell];
      if (list) lists.push(list);
    });
    const next = lists.map((list) => countBelow(list, order) - 1);
    for (let last = order; ;) {
      let newest = -1;
      for (let i = 0; i < lists.length; i++) {
        let at = next[i] ?? -1;
        while (at >= 0 && (lists[i]?.[at] ?? -1) >= last) at--;
        next[i] = at;
        if (at >= 0) newest = Math.max(newest, lists[i]?.[at] ?? -1);
      }
      const piece = this.pieces[newest];
      if (newest < 0 || !piece || visit(piece)) return;
      last = newest;
    }
  }

  private eachCell(x0: number, x1: number, y0: number, y1: number, visit: (cell: number) => void): void {
    const column = (x: number) => Math.min(this.columns - 1, Math.max(0, Math.floor((x - this.left) / this.width)));
    const row = (y: number) => Math.min(this.rows - 1, Math.max(0, Math.floor((y - this.front) / this.height)));
    const [c0, c1, r0, r1] = [column(x0), column(x1), row(y0), row(y1)];
    for (let c = c0; c <= c1; c++) for (let r = r0; r <= r1; r++) visit(c * this.rows + r);
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
