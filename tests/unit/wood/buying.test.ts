import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type BoardOnSale, planBuying } from '#shared/wood/buying';
import { boardsOnSale } from '#shared/wood/onSale';
import { type Build, type Part, clearLengths, clearPieces, cutList, partsOf } from '#shared/wood/cutList';
import { THIRTEEN, pieceOf } from '../piece/thirteenStripes';

const part = (name: string, quantity: number, length: number, width: number, more: Partial<Part> = {}): Part => ({ name, quantity, length, width, thickness: 0.75, wood: 'walnut', grain: 'along', ...more });
const board = (name: string, width: number, length: number, price: number, more: Partial<BoardOnSale> = {}): BoardOnSale => ({ name, wood: 'walnut', thickness: 0.75, width, length, price, boardFeet: null, ...more });
const bare = { trimming: 0, edging: 0, planing: 0 };

/** Every board's sawing from its own coordinates: strips within its width and a kerf apart, parts within its length and a kerf apart, every part once. */
function expectSawn(parts: readonly Part[], plan: ReturnType<typeof planBuying>, kerf: number) {
  const sawn = new Map<string, number>();
  for (const { board: { width, length }, count, layouts } of plan.buy) {
    expect(layouts).toHaveLength(count);
    for (const { strips } of layouts) {
      let across = -kerf;
      for (const strip of strips) {
        expect(strip.at).toBeGreaterThanOrEqual(across + kerf - 1e-9);
        across = strip.at + strip.width;
        let along = -kerf;
        for (const each of strip.parts) {
          expect(each.at).toBeGreaterThanOrEqual(along + kerf - 1e-9);
          along = each.at + each.length;
          sawn.set(each.name, (sawn.get(each.name) ?? 0) + 1);
          expect(strip.width).toBeGreaterThanOrEqual(Math.min(...parts.filter(({ name }) => name === each.name).map((own) => own.width)) - 1e-9);
        }
        expect(along).toBeLessThanOrEqual(length + 1e-9);
      }
      expect(across).toBeLessThanOrEqual(width + 1e-9);
    }
  }
  for (const { parts: names } of plan.offcuts) for (const name of names) sawn.set(name, (sawn.get(name) ?? 0) + 1);
  for (const { name, quantity } of parts) if (!plan.unplaced.some((each) => each.part === name)) expect(sawn.get(name) ?? 0).toBe(quantity);
}

describe('boards to buy', () => {
  it('are ripped into strips, and these crosscut, with a kerf at every cut', () => {
    // Own arithmetic: 96 in holds three 30 in parts and two kerfs, 7 1/4 in three 2 1/4 in strips and two kerfs; 18 parts fill two boards.
    const parts = [part('slat', 18, 30, 2.25)];
    const plan = planBuying(cutList(parts, bare), [board('1 × 8 × 8 ft', 7.25, 96, 3200)], [], 0.125);
    expectSawn(parts, plan, 0.125);
    expect(plan).toMatchObject({ cost: 6400, bound: 6400, unplaced: [] });
    expect(plan.buy[0]?.layouts[0]?.strips.map(({ at, width }) => [at, width])).toEqual([[0, 2.25], [2.375, 2.25], [4.75, 2.25]]);
    expect(planBuying(cutList(parts, bare), [board('1 × 8 × 8 ft', 7.25, 96, 3200)], [], 0.5).cost).toBe(3200 * 3); // at half an inch of kerf a board holds two strips
  });

  it('come from the sizes on sale, priced by the board foot', () => {
    // FACTS.md C4: a 1 × 6 is 3/4 × 5 1/2 in dressed (PS 20); 1 × 6 × 10 ft is 5 board feet.
    const sale = boardsOnSale({ wood: 'walnut', quarters: 1, centsPerBoardFoot: 1200, lengthsFeet: [8, 10], units: 'mm' });
    const six = sale.find(({ name }) => name === '1 × 6 × 10 ft');
    expect(six).toMatchObject({ boardFeet: 5, price: 6000 });
    expect(six?.thickness).toBeCloseTo(19.05, 9);
    expect(six?.width).toBeCloseTo(139.7, 9);
    expect(six?.length).toBeCloseTo(3048, 9);
    const plan = planBuying(cutList([part('stripe', 4, 2900, 100, { thickness: 19 })], bare), sale, [], 3);
    expect(plan.cost).toBeLessThan(4 * 6000);
    expect(plan.cost).toBe(Math.round(plan.boardFeet * 1200));
  });

  it('share widths out among sizes at the least cost', () => {
    const parts = [part('wide', 1, 40, 9), part('narrow', 4, 40, 1.5)];
    const plan = planBuying(cutList(parts, bare), [board('10 in', 9.25, 48, 4000), board('4 in', 3.5, 96, 1500)], [], 0.125);
    expectSawn(parts, plan, 0.125);
    expect(plan.cost).toBe(5500); // 9 in once and four narrow strips from one narrow board
  });

  it('are bought only for what the offcuts do not give', () => {
    const parts = [part('rail', 3, 26, 1.25)];
    const rack = [{ name: 'left of the last job', wood: 'walnut' as const, thickness: 0.75, width: 1.5, length: 54 }];
    const plan = planBuying(cutList(parts, bare), [board('4 in', 3.5, 48, 1500)], rack, 0.125);
    expectSawn(parts, plan, 0.125);
    expect(plan.offcuts).toHaveLength(1);
    expect(plan.offcuts[0]?.parts).toEqual(['rail', 'rail']);
    expect(plan.cost).toBe(1500);
  });

  it.each([
    [part('thick', 1, 10, 2, { thickness: 1 }), 'thickness'], [part('wide', 1, 10, 12), 'width'], [part('long', 1, 99, 2), 'length'], [part('other wood', 1, 10, 2, { wood: 'cherry' }), 'thickness'],
  ] as const)('leave out what no board on sale gives: %j', (each, reason) => {
    expect(planBuying(cutList([each], bare), [board('1 × 8', 7.25, 96, 3200)], [], 0.125).unplaced).toEqual([{ part: each.name, reason }]);
  });

  it('are turned for a part only where its grain does not matter', () => {
    const sheet = part('back', 1, 20, 40, { wood: 'plywood', grain: 'any' });
    const sale = [board('half sheet', 24, 48, 2000, { wood: 'plywood' })];
    expect(planBuying(cutList([sheet], bare), sale, [], 0.125).unplaced).toEqual([]);
    expect(planBuying(cutList([{ ...sheet, grain: 'along' }], bare), sale, [], 0.125).unplaced).toEqual([{ part: 'back', reason: 'width' }]);
  });

  it('hold every part and cost no less than the bound, whatever the list', () => {
    const lists = fc.array(fc.record({ quantity: fc.integer({ min: 1, max: 6 }), length: fc.integer({ min: 4, max: 90 }), width: fc.integer({ min: 1, max: 7 }) }), { minLength: 1, maxLength: 5 })
      .map((parts) => parts.map(({ quantity, length, width }, n) => part(`p${n}`, quantity, length, width)));
    fc.assert(fc.property(lists, fc.constantFrom(0, 0.125), (parts, kerf) => {
      const plan = planBuying(cutList(parts, bare), [board('8', 7.25, 96, 3200), board('4', 3.5, 72, 1400)], [], kerf);
      expect(plan.unplaced).toEqual([]);
      expectSawn(parts, plan, kerf);
      expect(plan.bound).toBeLessThanOrEqual(plan.cost);
      expect(plan.waste).toBeGreaterThanOrEqual(-1e-9);
    }), { numRuns: 60 });
  });
});

describe('a cut list', () => {
  const build: Build = { boardThickness: 0.75, odd: 'walnut', even: 'cherry', union: 'walnut', rails: 'white-oak', battens: 'poplar', batten: { count: 4, width: 1.5, thickness: 0.75, inset: 1 } };

  it('has every part of a flag board: their faces cover it exactly', () => {
    const piece = pieceOf(THIRTEEN);
    const parts = partsOf(piece, build);
    const of = (name: string) => parts.filter((each) => each.name === name);
    expect(of('short stripe').reduce((sum, { quantity }) => sum + quantity, 0)).toBe(7);
    expect(of('stripe').map(({ wood, quantity }) => [wood, quantity])).toEqual([['cherry', 3], ['walnut', 3]]);
    expect(of('rail').map(({ quantity }) => quantity)).toEqual([1, 2]);
    expect(of('batten')).toMatchObject([{ quantity: 4, length: 17.5 }]);
    const face = parts.filter(({ name }) => name !== 'rail' && name !== 'batten').reduce((sum, { quantity, length, width }) => sum + quantity * length * width, 0);
    expect(face).toBeCloseTo(37 * 19.5, 9);
  });

  it('says rough sizes with what comes off them', () => {
    expect(cutList([part('rail', 1, 26.25, 1.25)], { trimming: 1, edging: 0.125, planing: 0.0625 })[0]?.rough).toEqual({ length: 27.25, width: 1.375, thickness: 0.8125 });
  });

  it('leaves out the stretches with defects, and a kerf at each cut', () => {
    expect(clearLengths(96, [], 0.125)).toEqual([96]);
    expect(clearLengths(96, [{ from: 40, to: 42 }], 0.5)).toEqual([39.5, 53.5]);
    expect(clearLengths(96, [{ from: -1, to: 3 }, { from: 94, to: 99 }], 0)).toEqual([91]);
    expect(clearLengths(96, [{ from: 10, to: 60 }, { from: 20, to: 30 }], 0)).toEqual([10, 36]);
    expect(clearLengths(20, [{ from: 0, to: 20 }], 0.125)).toEqual([]);
    expect(clearPieces({ name: 'plank', length: 96, width: 7 }, [{ from: 40, to: 42 }], 0.5).map(({ length, width }) => [length, width])).toEqual([[39.5, 7], [53.5, 7]]);
  });
});
