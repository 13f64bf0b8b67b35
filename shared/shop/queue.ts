/** One rail that waits for the machine. `due` is a date as YYYY-MM-DD, null where none was set. */
export interface QueuedCut {
  readonly id: string;
  readonly name: string;
  readonly bit: string;
  readonly wood: string;
  readonly due: string | null;
}

/** What is in the collet and on the table now. */
export type Fitted = Pick<QueuedCut, 'bit' | 'wood'>;

export interface Changes {
  readonly bits: number;
  readonly woods: number;
}

/** How often bit and wood change along an order; fitting the first ones counts only where something else is known to be fitted. */
export function changesIn(order: readonly Fitted[], fitted: Fitted | null = null): Changes {
  let [bits, woods] = [0, 0];
  let last = fitted;
  for (const cut of order) {
    if (last && last.bit !== cut.bit) bits++;
    if (last && last.wood !== cut.wood) woods++;
    last = cut;
  }
  return { bits, woods };
}

/** More bits than this in one day's queue are taken one after the other as they come due: to try every order takes 2ⁿ steps. */
const MOST_BITS = 12;

/** Due first, then name, then id, so that equal rails stand the same way every time; undated rails come last. */
function compare(a: QueuedCut, b: QueuedCut): number {
  return compareText(a.due ?? '~', b.due ?? '~') || compareText(a.name, b.name) || compareText(a.id, b.id); // ~ sorts behind every digit
}

const compareText = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0);

/** All rails of one bit and wood, soonest due first: they are cut in one go. */
interface Block {
  readonly bit: number;
  readonly wood: number;
  readonly cuts: readonly QueuedCut[];
}

/**
 * The order with the fewest bit changes, among those the fewest wood changes, and among those the one whose rails come
 * due soonest from the front on. Exact for up to a dozen bits; above that bits go as they come due, and wood changes
 * within each are still the fewest.
 *
 * All rails of a bit go together, so only the order of bits, and the wood each begins and ends with, are open: the
 * least number of wood changes still to come is worked out for each set of bits done and wood on the table, and
 * blocks are then taken one by one, always the soonest due that keeps to it.
 */
export function queueOrder(queue: readonly QueuedCut[], fitted: Fitted | null = null): QueuedCut[] {
  const bits = [...new Set(queue.map(({ bit }) => bit))].sort(compareText);
  const woods = [...new Set([...queue.map(({ wood }) => wood), ...(fitted ? [fitted.wood] : [])])].sort(compareText);
  const blocks = makeBlocks(queue, bits, woods);
  const groups = bits.map((_, bit) => blocks.filter((block) => block.bit === bit));
  const onTable = fitted ? woods.indexOf(fitted.wood) : ANY;
  const inCollet = fitted ? bits.indexOf(fitted.bit) : -1;
  const toCome = bits.length <= MOST_BITS ? changesToCome(groups) : () => 0;

  const order: QueuedCut[] = [];
  let [done, wood] = [0, onTable];
  let open: readonly Block[] = [];
  const left = new Set(groups.keys());
  while (order.length < queue.length) {
    if (open.length === 0) {
      // The bit in the collet goes first: any other order changes bits once more.
      const first = left.size === groups.length && inCollet >= 0 ? [inCollet] : [...left];
      const group = pick(first.flatMap((bit) => (groups[bit] ?? []).map((block) => ({ block, cost: rest(block, bit) }))));
      if (!group) break;
      left.delete(group.bit);
      done += 2 ** group.bit;
      open = groups[group.bit] ?? [];
      take(group);
    } else {
      const next = pick(open.map((block) => ({ block, cost: after(open.filter((one) => one !== block), block.wood, done) })));
      if (!next) break;
      take(next);
    }
  }
  return order;

  function take(block: Block): void {
    order.push(...block.cuts);
    wood = block.wood;
    open = open.filter((one) => one !== block);
  }
  function rest(block: Block, bit: number): number {
    const others = (groups[bit] ?? []).filter((one) => one !== block);
    return (wood === ANY || wood === block.wood ? 0 : 1) + after(others, block.wood, done + 2 ** bit);
  }
  /** Wood changes from here on, with these blocks of the bit still to cut. */
  function after(others: readonly Block[], now: number, finished: number): number {
    if (others.length === 0) return toCome(finished, now);
    return others.length + Math.min(...others.map((last) => toCome(finished, last.wood)));
  }
}

/** No wood is known to be on the table: whichever comes first is no change. */
const ANY = -1;

function makeBlocks(queue: readonly QueuedCut[], bits: readonly string[], woods: readonly string[]): Block[] {
  return bits.flatMap((bit, b) => woods.flatMap((wood, w) => {
    const cuts = queue.filter((cut) => cut.bit === bit && cut.wood === wood).sort(compare);
    return cuts.length > 0 ? [{ bit: b, wood: w, cuts }] : [];
  }));
}

/** The cheapest, and of equals the one whose first rail is due soonest. */
function pick(choices: readonly { readonly block: Block; readonly cost: number }[]): Block | undefined {
  const least = Math.min(...choices.map(({ cost }) => cost));
  const [best] = choices.filter(({ cost }) => cost === least).map(({ block }) => block).sort((a, b) => {
    const [one, other] = [a.cuts[0], b.cuts[0]];
    return one && other ? compare(one, other) : 0;
  });
  return best;
}

/** Fewest wood changes still to come, by the set of bits that are done (as binary digits) and the wood on the table. */
function changesToCome(groups: readonly (readonly Block[])[]): (done: number, wood: number) => number {
  const all = 2 ** groups.length - 1;
  const known = new Map<number, number>();
  const least = (done: number, wood: number): number => {
    if (done === all) return 0;
    const key = wood * (all + 1) + done;
    const before = known.get(key);
    if (before !== undefined) return before;
    let best = Infinity;
    groups.forEach((group, bit) => {
      if (Math.floor(done / 2 ** bit) % 2 === 1) return;
      for (const first of group) {
        for (const last of group) {
          if (first === last && group.length > 1) continue;
          best = Math.min(best, (wood === first.wood ? 0 : 1) + group.length - 1 + least(done + 2 ** bit, last.wood));
        }
      }
    });
    known.set(key, best);
    return best;
  };
  return least;
}
