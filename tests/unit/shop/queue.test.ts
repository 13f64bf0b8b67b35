import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Fitted, type QueuedCut, changesIn, queueOrder } from '#shared/shop/queue';

const cut = (name: string, bit: string, wood: string, due: string | null = null): QueuedCut => ({ id: name, name, bit, wood, due });
const names = (order: readonly QueuedCut[]) => order.map(({ name }) => name).join('');

function permutations<T>(items: readonly T[]): T[][] {
  return items.length === 0 ? [[]] : items.flatMap((item, i) => permutations([...items.slice(0, i), ...items.slice(i + 1)]).map((rest) => [item, ...rest]));
}

/** Fewest bit changes, then fewest wood changes, of all orders there are. */
function fewest(queue: readonly QueuedCut[], fitted: Fitted | null) {
  return permutations(queue).map((order) => changesIn(order, fitted)).sort((a, b) => a.bits - b.bits || a.woods - b.woods)[0];
}

describe('changes in an order', () => {
  it('are counted between neighbours', () => {
    expect(changesIn([cut('A', '1/4', 'oak'), cut('B', '1/4', 'walnut'), cut('C', '1/8', 'walnut'), cut('D', '1/4', 'oak')])).toEqual({ bits: 2, woods: 2 });
    expect(changesIn([])).toEqual({ bits: 0, woods: 0 });
  });

  it('count the first one only against what is known to be fitted', () => {
    expect(changesIn([cut('A', '1/4', 'oak')])).toEqual({ bits: 0, woods: 0 });
    expect(changesIn([cut('A', '1/4', 'oak')], { bit: '1/8', wood: 'oak' })).toEqual({ bits: 1, woods: 0 });
  });
});

/** Issue 4, "The bench": an order that saves bit changes and wood changes. */
describe("today's queue", () => {
  it('keeps a bit together before it keeps a wood together', () => {
    const queue = [cut('A', '1/4', 'oak'), cut('B', '1/8', 'oak'), cut('C', '1/4', 'walnut'), cut('D', '1/8', 'walnut')];
    expect(changesIn(queueOrder(queue))).toEqual({ bits: 1, woods: 2 });
  });

  it('lets one bit end with the wood that the next begins with', () => {
    // By due date alone B, A, C would change the wood twice.
    const queue = [cut('A', '1/4', 'oak', '2026-03-02'), cut('B', '1/4', 'walnut', '2026-03-01'), cut('C', '1/8', 'walnut', '2026-03-09')];
    expect(names(queueOrder(queue))).toBe('ABC');
  });

  it('takes the soonest due where changes are equal, undated ones last, then by name', () => {
    expect(names(queueOrder([cut('C', 'b', 'w'), cut('B', 'b', 'w', '2026-05-02'), cut('A', 'b', 'w', '2026-05-10'), cut('D', 'b', 'w', '2026-05-02')]))).toBe('BDAC');
    expect(names(queueOrder([cut('B', 'b2', 'w', '2026-05-02'), cut('A', 'b1', 'w', '2026-05-03')]))).toBe('BA');
  });

  it('begins with the bit that is in the collet', () => {
    const queue = [cut('A', '1/4', 'oak', '2026-01-01'), cut('B', '1/8', 'oak', '2026-02-01')];
    expect(names(queueOrder(queue, { bit: '1/8', wood: 'oak' }))).toBe('BA');
    expect(names(queueOrder(queue, { bit: '1/2', wood: 'oak' }))).toBe('AB');
  });

  it('of nothing is nothing', () => {
    expect(queueOrder([])).toEqual([]);
  });

  const some = fc.array(fc.record({ bit: fc.constantFrom('p', 'q', 'r'), wood: fc.constantFrom('x', 'y', 'z'), due: fc.constantFrom(null, '2026-01-01', '2026-01-02') }), { maxLength: 7 })
    .map((cuts) => cuts.map((one, i): QueuedCut => ({ id: String(i), name: `R${i % 3}`, ...one })));
  const fitted = fc.option(fc.record({ bit: fc.constantFrom('p', 'q', 's'), wood: fc.constantFrom('x', 'y', 'v') }));

  it('has the fewest changes of all orders, and every rail once', () => {
    fc.assert(fc.property(some, fitted, (queue, now) => {
      const order = queueOrder(queue, now);
      expect(order.map(({ id }) => id).sort()).toEqual(queue.map(({ id }) => id).sort());
      if (queue.length > 0) expect(changesIn(order, now)).toEqual(fewest(queue, now));
    }), { seed: 21, numRuns: 60 });
  });

  it('is the soonest due from the front on, of all orders with as few changes that cut each wood of a bit in one go', () => {
    const key = (order: readonly QueuedCut[]) => order.map(({ due, name, id }) => `${due ?? '9'} ${name} ${id}`);
    const inOneGo = (order: readonly QueuedCut[]) => {
      const runs = order.map(({ bit, wood }) => bit + wood).filter((block, i, all) => block !== all[i - 1]);
      return new Set(runs).size === runs.length;
    };
    fc.assert(fc.property(some, (queue) => {
      fc.pre(queue.length > 0);
      const order = queueOrder(queue);
      const least = changesIn(order);
      const rivals = permutations(queue).filter(inOneGo).filter((rival) => {
        const changes = changesIn(rival);
        return changes.bits === least.bits && changes.woods === least.woods;
      }).map((rival) => JSON.stringify(key(rival))).sort();
      expect(JSON.stringify(key(order))).toBe(rivals[0]);
    }), { seed: 22, numRuns: 40 });
  });

  it('does not depend on the order it was asked in', () => {
    fc.assert(fc.property(some, (queue) => {
      expect(queueOrder([...queue].reverse())).toEqual(queueOrder(queue));
    }), { seed: 23 });
  });

  it('is ready at once for a full day: 200 rails, 12 bits, 6 woods', () => {
    const queue = Array.from({ length: 200 }, (_, i) => cut(`R${i}`, `b${(i * 7) % 12}`, `w${(i * i + 3 * i) % 6}`, `2026-01-${String(1 + (i % 28)).padStart(2, '0')}`));
    const start = process.cpuUsage();
    const order = queueOrder(queue);
    expect(process.cpuUsage(start).user / 1000).toBeLessThan(1000); // of processor time, so that other work on the machine does not count
    expect(order).toHaveLength(200);
    expect(changesIn(order).bits).toBe(11);
  });

  it('still keeps each bit together where there are too many to try every order', () => {
    const queue = Array.from({ length: 60 }, (_, i) => cut(`R${i}`, `b${i % 20}`, `w${i % 3}`));
    expect(changesIn(queueOrder(queue)).bits).toBe(19);
  });
});
