import type { Wood } from './woods';
import type { RoughPart } from './cutList';
import { cutStock } from './cutStock';
import { type BoardLayout, layBoard } from './layout';
import type { CutBoard, PieceLength } from './stock';

/** A board on sale: true sizes in the piece's units, price in cents for one board. */
export interface BoardOnSale {
  readonly name: string;
  readonly wood: Wood;
  readonly thickness: number;
  readonly width: number;
  readonly length: number;
  readonly price: number;
  /** Board feet that it is sold by; null where it is sold by the piece or by area. */
  readonly boardFeet: number | null;
}

/** A strip in the rack: used before anything is bought. */
export interface Offcut {
  readonly name: string;
  readonly wood: Wood;
  readonly thickness: number;
  readonly width: number;
  readonly length: number;
}

export interface BuyingPlan {
  readonly buy: readonly { readonly board: BoardOnSale; readonly count: number; readonly layouts: readonly BoardLayout[] }[];
  readonly offcuts: readonly { readonly offcut: Offcut; readonly parts: readonly string[] }[];
  readonly cost: number;
  /** No plan that rips first, one width a strip, costs less: the parts' area at the lowest price, or the cost itself where the plan is proved the cheapest of that sort. */
  readonly bound: number;
  /** Parts for which no board on sale is long, wide or thick enough. */
  readonly unplaced: readonly { readonly part: string; readonly reason: 'thickness' | 'width' | 'length' }[];
  /** Share of the bought boards' area that becomes no part. */
  readonly waste: number;
  /** Board feet bought, of the boards that are sold so. */
  readonly boardFeet: number;
}

const STEPS = 10_000; // whole steps in one unit: finer than any saw
const up = (length: number) => Math.ceil(length * STEPS - 1e-6);
const down = (length: number) => Math.floor(length * STEPS + 1e-6);
const SAME = 1e-9; // sizes that differ by less are one

/** Parts of one rough width: they are sawn from strips of that width. */
interface WidthClass {
  readonly width: number;
  readonly parts: readonly RoughPart[];
}

interface Strips {
  readonly boards: readonly CutBoard[];
  readonly offcuts: readonly { readonly offcut: Offcut; readonly parts: readonly string[] }[];
  readonly proved: boolean;
}

/** Strips of a class from boards of a length: as few as can be, offcuts first. Null where a part is too long. */
function stripsOf({ parts }: WidthClass, board: BoardOnSale, offcuts: readonly Offcut[], kerf: number): Strips | null {
  const stocks = [{ length: down(board.length + kerf), price: 1, available: null }, ...offcuts.map(({ length }) => ({ length: down(length + kerf), price: 0, available: 1 }))];
  const pieces: PieceLength[] = parts.map(({ rough, quantity }) => ({ length: up(rough.length + kerf), count: quantity }));
  const plan = cutStock({ stocks, pieces });
  if (!plan) return null;
  const names = (board: CutBoard) => board.pieces.flatMap((count, piece) => Array.from({ length: count }, () => parts[piece]?.name ?? ''));
  return {
    boards: plan.boards.filter(({ stock }) => stock === 0),
    offcuts: plan.boards.flatMap((each) => { const offcut = offcuts[each.stock - 1]; return offcut ? [{ offcut, parts: names(each) }] : []; }),
    proved: plan.cost === plan.bound,
  };
}

/** Boards of one size for the strips of some classes, ripped side by side. */
interface Ripped {
  readonly board: BoardOnSale;
  readonly layouts: readonly BoardLayout[];
  readonly count: number;
  readonly cost: number;
  readonly proved: boolean;
  readonly offcuts: Strips['offcuts'];
}

function ripped(classes: readonly WidthClass[], board: BoardOnSale, racks: readonly (readonly Offcut[])[], kerf: number): Ripped | null {
  const strips = classes.map((each, n) => (each.width > board.width + SAME ? null : stripsOf(each, board, racks[n] ?? [], kerf)));
  const cut = strips.flatMap((each) => (each ? [each] : []));
  if (cut.length < classes.length) return null;
  const across = cutStock({
    stocks: [{ length: down(board.width + kerf), price: 1, available: null }],
    pieces: classes.map(({ width }, n) => ({ length: up(width + kerf), count: cut[n]?.boards.reduce((sum, { times }) => sum + times, 0) ?? 0 })),
  });
  if (!across) return null;
  const queues = cut.map(({ boards }) => boards.flatMap(({ pieces, times }) => Array.from({ length: times }, () => pieces)));
  const layouts = across.boards.flatMap(({ pieces, times }) => Array.from({ length: times }, () => layBoard(pieces.flatMap((count, n) => (queues[n]?.splice(0, count) ?? []).map((lengths) => ({
    width: classes[n]?.width ?? 0,
    parts: lengths.flatMap((number, part) => Array.from({ length: number }, () => ({ name: classes[n]?.parts[part]?.name ?? '', length: classes[n]?.parts[part]?.rough.length ?? 0 }))),
  }))), kerf)));
  return { board, layouts, count: across.cost, cost: across.cost * board.price, proved: across.cost === across.bound && cut.every(({ proved }) => proved), offcuts: cut.flatMap((each) => each.offcuts) };
}

/** Offcuts to the width classes: each to the widest class it takes, so that none is promised twice. */
function racksFor(classes: readonly WidthClass[], offcuts: readonly Offcut[]): Offcut[][] {
  const racks: Offcut[][] = classes.map(() => []);
  for (const offcut of offcuts) {
    const takes = classes.map(({ width }, n) => ({ width, n })).filter(({ width }) => width <= offcut.width + SAME).sort((a, b) => b.width - a.width)[0];
    if (takes) racks[takes.n]?.push(offcut);
  }
  return racks;
}

/** Every way to share classes out among board sizes; a dozen classes by half a dozen sizes are beyond it, and then each goes by itself. */
function shares(classes: number, sizes: number): number[][] {
  const MOST = 5000; // ways that are priced
  if (sizes ** classes > MOST) return Array.from({ length: sizes }, (_, size) => Array.from({ length: classes }, () => size));
  let lists: number[][] = [[]];
  for (let n = 0; n < classes; n++) lists = lists.flatMap((list) => Array.from({ length: sizes }, (_, size) => [...list, size]));
  return lists;
}

/** Parts of one wood and rough thickness from the boards that are thick enough. */
function buyForGroup(parts: readonly RoughPart[], boards: readonly BoardOnSale[], offcuts: readonly Offcut[], kerf: number) {
  const widths = [...new Set(parts.map(({ rough }) => rough.width))].sort((a, b) => b - a);
  const classes = widths.map((width) => ({ width, parts: parts.filter(({ rough }) => rough.width === width) }));
  const racks = racksFor(classes, offcuts);
  const known = new Map<string, Ripped | null>();
  const price = (size: number, members: readonly number[]) => {
    const key = `${size}:${members.join()}`;
    const board = boards[size];
    if (!known.has(key)) known.set(key, board ? ripped(members.flatMap((n) => classes[n] ?? []), board, members.map((n) => racks[n] ?? []), kerf) : null);
    return known.get(key) ?? null;
  };
  let best: { readonly list: readonly Ripped[]; readonly cost: number } | null = null;
  for (const share of shares(classes.length, boards.length)) {
    const list = boards.flatMap((_, size) => {
      const members = share.flatMap((each, n) => (each === size ? [n] : []));
      return members.length > 0 ? [price(size, members)] : [];
    });
    const whole = list.flatMap((each) => (each ? [each] : []));
    const cost = whole.reduce((sum, each) => sum + each.cost, 0);
    if (whole.length === list.length && (best === null || cost < best.cost)) best = { list: whole, cost };
  }
  return best;
}

/**
 * Boards to buy for a cut list, and how to saw them: every board is ripped into strips first, each strip crosscut into
 * parts of its width. Strips per width are the fewest there can be for a board's length, boards the fewest for these
 * strips, and the widths are shared out among board sizes at the least cost; each of the three says its proof.
 * Parts lie along the board's grain; a part whose grain does not matter is turned where it only fits so.
 */
export function planBuying(list: readonly RoughPart[], boards: readonly BoardOnSale[], offcuts: readonly Offcut[], kerf: number): BuyingPlan {
  const unplaced: { part: string; reason: 'thickness' | 'width' | 'length' }[] = [];
  const groups = new Map<string, RoughPart[]>();
  for (const part of list) {
    const thick = boards.filter(({ wood, thickness }) => wood === part.wood && thickness >= part.rough.thickness - SAME);
    const turned = { ...part, rough: { ...part.rough, length: part.rough.width, width: part.rough.length } };
    const fits = ({ rough }: RoughPart) => thick.some(({ width, length }) => width >= rough.width - SAME && length >= rough.length - SAME);
    const placed = fits(part) ? part : part.grain === 'any' && fits(turned) ? turned : null;
    if (!placed) {
      const wide = thick.some(({ width }) => width >= part.rough.width - SAME);
      unplaced.push({ part: part.name, reason: thick.length === 0 ? 'thickness' : wide ? 'length' : 'width' });
      continue;
    }
    const key = `${part.wood}:${part.rough.thickness}`;
    groups.set(key, [...(groups.get(key) ?? []), placed]);
  }
  const buy: Ripped[] = [];
  let bound = 0;
  const rack = [...offcuts];
  for (const parts of groups.values()) {
    const [first] = parts;
    const fits = ({ wood, thickness }: BoardOnSale | Offcut) => wood === first?.wood && thickness >= first.rough.thickness - SAME;
    const sizes = boards.filter(fits);
    const plan = buyForGroup(parts, sizes, rack.filter(fits), kerf);
    if (!plan) {
      for (const { name } of parts) unplaced.push({ part: name, reason: 'length' });
      continue;
    }
    buy.push(...plan.list);
    const one = sizes.length === 1 && !rack.some(fits) && plan.list.every(({ proved }) => proved); // offcuts are shared out by a rule of thumb
    for (const { offcut } of plan.list.flatMap((each) => each.offcuts)) rack.splice(rack.indexOf(offcut), 1);
    const rate = Math.min(...sizes.map(({ price, width, length }) => price / (width * length)));
    const spared = plan.list.flatMap((each) => each.offcuts).reduce((sum, { offcut }) => sum + offcut.width * offcut.length, 0);
    const byArea = Math.max(0, parts.reduce((sum, { rough, quantity }) => sum + rough.length * rough.width * quantity, 0) - spared) * rate;
    bound += one ? plan.cost : Math.min(plan.cost, Math.ceil(byArea - 1e-6));
  }
  const area = buy.reduce((sum, { board, count }) => sum + board.width * board.length * count, 0);
  const used = buy.reduce((sum, { layouts }) => sum + layouts.reduce((inner, { strips }) => inner + strips.reduce((total, { width, parts }) => total + width * parts.reduce((length, part) => length + part.length, 0), 0), 0), 0);
  return {
    buy: buy.filter(({ count }) => count > 0).map(({ board, count, layouts }) => ({ board, count, layouts })),
    offcuts: buy.flatMap((each) => each.offcuts),
    cost: buy.reduce((sum, { cost }) => sum + cost, 0),
    bound,
    unplaced,
    boardFeet: buy.reduce((sum, { board, count }) => sum + (board.boardFeet ?? 0) * count, 0),
    waste: area > 0 ? 1 - used / area : 0,
  };
}
