import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Money, money, sum } from '#shared/money/money';
import { correctionOf, timesOfCuts } from '#shared/quote/correction';
import { type CostingInput, costPiece } from '#shared/quote/costing';
import { USUAL_LABOUR, usualMinutes } from '#shared/quote/labour';
import { ratesSchema } from '#shared/quote/rates';
import { sideBySide } from '#shared/quote/sideBySide';
import { sourceWords } from '#shared/quote/sources';
import { planBuying } from '#shared/wood/buying';

const usd = (amount: number) => money(amount, 'USD');

const WALNUT = { name: '1 × 8 × 8 ft', wood: 'walnut', thickness: 0.75, width: 7.25, length: 96, price: 3200, boardFeet: null } as const;
const stripes = { name: 'stripe', quantity: 18, length: 30, width: 2.25, thickness: 0.75, wood: 'walnut', grain: 'along' } as const;
const rough = { length: 30, width: 2.25, thickness: 0.75 };

/** A small piece whose every figure is worked by hand below. */
function small(more: Partial<CostingInput> = {}): CostingInput {
  return {
    currency: 'USD',
    wood: planBuying([{ ...stripes, rough }], [WALNUT], [], 0.125), // two boards: see the buying plan's own test
    machine: { hourly: usd(5000), programs: [{ words: 'rail A', seconds: 78 }, { words: 'rail B', seconds: 96 }], cuts: [] },
    labour: { hourly: usd(4500), steps: [{ step: 'assembly', minutes: 45, history: [] }] },
    finish: [{ words: 'oil', quantity: 0.25, unit: 'l', rate: usd(3999) }],
    hardware: [{ words: 'hanger', quantity: 2, unit: 'pieces', rate: usd(450) }],
    fees: [{ words: 'delivery', quantity: 1, unit: 'trip', rate: usd(4000), taxed: false }],
    overheadPercent: 15, marginPercent: 20, rushPercent: 10, asked: null, tax: { name: 'Sales tax', percent: 8.875 },
    ...more,
  };
}

describe('a costing', () => {
  it('is the sum of its lines, each quantity by rate', () => {
    const costing = costPiece(small());
    // Own arithmetic: 2 × 32.00; 1.3 min at 50.00 an hour = 1.0833; 1.6 min = 1.3333; 45 min at 45.00 = 33.75; 0.25 × 39.99 = 9.9975; 2 × 4.50.
    expect(costing.lines.map(({ words, quantity, amount }) => [words, quantity, amount.amount])).toEqual([
      ['1 × 8 × 8 ft', 2, 6400], ['rail A', 1.3, 108], ['rail B', 1.6, 133], ['assembly', 45, 3375], ['oil', 0.25, 1000], ['hanger', 2, 900], ['delivery', 1, 4000],
    ]);
    // 119.16; 15 % = 17.874; (119.16 + 17.87) / 0.8 = 171.2875; 10 % = 17.129; tax 8.875 % of 188.42 = 16.722.
    const { cost, overhead, price, margin, rush, fees, net, taxable, tax, total } = costing;
    expect([cost, overhead, price, margin, rush, fees, net, taxable, tax, total].map(({ amount }) => amount)).toEqual([11_916, 1787, 17_129, 3426, 1713, 4000, 22_842, 18_842, 1672, 24_514]);
    expect(costing.problems).toEqual([]);
  });

  it('taxes a fee that bears tax', () => {
    const { taxable, tax } = costPiece(small({ fees: [{ words: 'delivery', quantity: 1, unit: 'trip', rate: usd(4000), taxed: true }] }));
    expect([taxable.amount, tax.amount]).toEqual([22_842, 2027]); // 8.875 % of 228.42 = 20.272
  });

  it('with a price set by hand leaves what is left, and says a loss', () => {
    const fair = costPiece(small({ asked: usd(20_000) }));
    expect([fair.price.amount, fair.margin.amount, fair.problems]).toEqual([20_000, 6297, []]);
    const loss = costPiece(small({ asked: usd(10_000) }));
    expect(loss.margin.amount).toBe(-3703);
    expect(loss.problems).toMatchObject([{ field: 'asked', message: expect.stringMatching(/less than the piece costs/) }]);
  });

  it('says what is not in the price', () => {
    const long = { ...stripes, name: 'long stripe', length: 100, rough: { ...rough, length: 100 } };
    const problems = costPiece(small({ wood: planBuying([long], [WALNUT], [], 0.125), machine: { hourly: usd(5000), programs: [], cuts: [] } })).problems;
    expect(problems.map(({ field }) => field)).toEqual(['wood', 'machine']);
    expect(problems[0]?.message).toMatch(/No board on sale gives long stripe/);
  });

  it('adds up whatever it is made of', () => {
    const rate = fc.integer({ min: 0, max: 1_000_000 }).map(usd);
    const quantity = fc.double({ min: 0, max: 500, noNaN: true });
    const item = fc.record({ words: fc.constant('x'), quantity, unit: fc.constant('u'), rate });
    const seconds = fc.double({ min: 0.1, max: 10_000, noNaN: true });
    const taken = fc.array(fc.record({ expected: seconds, took: seconds }), { maxLength: 6 });
    const input = fc.record({
      hourly: rate, programs: fc.array(fc.record({ words: fc.constant('rail'), seconds }), { maxLength: 5 }), cuts: taken,
      minutes: quantity, history: taken, finish: fc.array(item, { maxLength: 4 }), fees: fc.array(fc.record({ words: fc.constant('fee'), quantity, unit: fc.constant('u'), rate, taxed: fc.boolean() }), { maxLength: 3 }),
      overheadPercent: fc.double({ min: 0, max: 300, noNaN: true }), marginPercent: fc.double({ min: 0, max: 95, noNaN: true }), rushPercent: fc.double({ min: 0, max: 200, noNaN: true }), percent: fc.double({ min: 0, max: 50, noNaN: true }),
      asked: fc.option(rate),
    });
    fc.assert(fc.property(input, ({ hourly, programs, cuts, minutes, history, finish, fees, percent, ...rest }) => {
      const costing = costPiece(small({ ...rest, machine: { hourly, programs, cuts }, labour: { hourly, steps: [{ step: 'sawing', minutes, history }] }, finish, fees, tax: { name: 'Tax', percent } }));
      const parts: Money[] = [...costing.lines.map(({ amount }) => amount), costing.overhead, costing.margin, costing.rush, costing.tax];
      expect(sum(parts, 'USD')).toEqual(costing.total);
      for (const line of costing.lines) {
        expect(Math.abs(line.amount.amount - (line.quantity / line.per) * line.rate.amount)).toBeLessThanOrEqual(0.5 + 1e-6);
        expect(line.quantity * 100).toBeCloseTo(Math.round(line.quantity * 100), 6);
      }
      expect(costing.taxable.amount).toBeLessThanOrEqual(costing.net.amount);
      const { rows, totals } = sideBySide([{ name: 'one', costing }, { name: 'other', costing: costPiece(small()) }], 'USD');
      totals.forEach((total, n) => expect(sum(rows.flatMap(({ amounts }) => amounts[n] ?? []), 'USD')).toEqual(total));
    }), { numRuns: 300, seed: 21 });
  });
});

describe('alternatives', () => {
  it('stand side by side, and say how far apart they are', () => {
    const cherry = small({ wood: planBuying([{ ...stripes, rough }], [{ ...WALNUT, price: 2100 }], [], 0.125), rushPercent: 0 });
    const walnut = small({ rushPercent: 0 });
    const { names, rows, totals, above } = sideBySide([{ name: 'walnut', costing: costPiece(walnut) }, { name: 'cherry', costing: costPiece(cherry) }], 'USD');
    expect(names).toEqual(['walnut', 'cherry']);
    expect(rows.find(({ what }) => what === 'wood')?.amounts.map(({ amount }) => amount)).toEqual([6400, 4200]);
    expect(rows.some(({ what }) => what === 'rush')).toBe(false);
    expect(above[0]).toEqual(usd(0));
    // Own arithmetic: 22.00 less wood is 22.00 × 1.15 / 0.8 × 1.08875 = 34.43 less, give or take the roundings.
    expect(Math.abs((above[1]?.amount ?? 0) + 3443)).toBeLessThanOrEqual(2);
    expect((totals[0]?.amount ?? 0) + (above[1]?.amount ?? 0)).toBe(totals[1]?.amount);
  });
});

describe('a correction by what things took', () => {
  const took = (...ratios: number[]) => ratios.map((ratio) => ({ expected: 100, took: 100 * ratio }));

  it.each([
    // Median and quartiles on the line between neighbours, by hand.
    [[], 1, null], [[2, 2], 1, null],
    [[1.1, 1.3, 1.2], 1.2, [1.15, 1.25]],
    [[1, 1.2, 1.4, 9], 1.3, [1.15, 3.3]],
    [[1, 1.1, 1.2, 1.3, 1.4], 1.2, [1.1, 1.3]],
  ])('of ratios %j is %d', (ratios, ratio, spread) => {
    const found = correctionOf(took(...ratios));
    expect(found.ratio).toBeCloseTo(ratio, 12);
    expect(found.count).toBe(ratios.length);
    if (spread === null) expect(found.spread).toBeNull();
    else {
      expect(found.spread?.low).toBeCloseTo(spread[0] ?? NaN, 12);
      expect(found.spread?.high).toBeCloseTo(spread[1] ?? NaN, 12);
    }
  });

  it('leaves out what was not timed, was spoiled, or had no estimate', () => {
    const cut = (outcome: 'well' | 'spoiled', estimated: number, seconds: number | null) => ({ outcome, estimated, seconds });
    const cuts = [cut('well', 100, 120), cut('spoiled', 100, 9), cut('well', 100, null), cut('well', 0, 50), cut('well', 50, 60)];
    expect(correctionOf(timesOfCuts(cuts))).toEqual({ ratio: 1, spread: null, count: 2 });
    expect(correctionOf(timesOfCuts([...cuts, cut('well', 10, 12)]))).toMatchObject({ ratio: 1.2, count: 3 });
  });

  it('moves machine and labour lines, and each says where its figure comes from', () => {
    const input = small({
      machine: { hourly: usd(6000), programs: [{ words: 'rail A', seconds: 600 }], cuts: took(1.2, 1.2, 1.3) },
      labour: { hourly: usd(6000), steps: [{ step: 'gluing', minutes: 10, history: took(0.5, 0.5, 0.5) }, { step: 'sawing', minutes: 10, history: took(9) }] },
    });
    const lines = costPiece(input).lines.filter(({ group }) => group === 'machine' || group === 'labour');
    expect(lines.map(({ quantity, amount }) => [quantity, amount.amount])).toEqual([[12, 1200], [5, 500], [10, 1000]]);
    expect(lines.map(({ from }) => sourceWords(from))).toEqual([
      "The programs' own time × 1.2, as 3 timed cuts took; half of them 1.2 to 1.25 times.",
      "The shop's usual minutes × 0.5, as 3 timed pieces took; half of them 0.5 to 0.5 times.",
      "The shop's usual minutes, as it stands: 1 of 3 timed pieces that a correction takes.",
    ]);
  });

  it('does not depend on the order', () => {
    const times = fc.array(fc.record({ expected: fc.double({ min: 1, max: 1e4, noNaN: true }), took: fc.double({ min: 1, max: 1e4, noNaN: true }) }), { maxLength: 9 });
    fc.assert(fc.property(times, (list) => {
      expect(correctionOf([...list].reverse())).toEqual(correctionOf(list));
      const { ratio, spread } = correctionOf(list);
      if (spread) expect(ratio >= spread.low && ratio <= spread.high).toBe(true);
    }));
  });
});

describe('the shop\'s rates', () => {
  const schema = ratesSchema({ currency: 'USD', locale: 'en-US' });
  const good = { machineHourly: '50', labourHourly: 4500, overheadPercent: 15, marginPercent: 20, rushPercent: 10, depositPercent: 50, tax: { percent: 8.875 } };

  it('count minutes by what a piece has', () => {
    const rates = schema.parse(good);
    expect(rates.machineHourly).toEqual(usd(5000));
    expect(rates.labour).toEqual(USUAL_LABOUR);
    const minutes = usualMinutes([{ step: 'sawing', minutes: 4, per: 'part' }, { step: 'sawing', minutes: 10, per: 'piece' }, { step: 'packing', minutes: 30, per: 'rail' }], { piece: 1, part: 16, panel: 3, rail: 0, coat: 2 });
    expect(minutes).toEqual([{ step: 'sawing', minutes: 74 }]); // 16 × 4 + 10
  });

  it.each([
    [{ marginPercent: 100 }, 'marginPercent', 'Margin is 100. Use 0 to 95 percent.'],
    [{ overheadPercent: -1 }, 'overheadPercent', 'Overhead is -1. Use 0 to 300 percent.'],
    [{ machineHourly: 'much' }, 'machineHourly', 'Price of a machine hour: "much" cannot be read as an amount. Try $1,250.50.'],
    [{ tax: { percent: 60 } }, 'tax.percent', 'Tax is 60. Use 0 to 50 percent.'],
    [{ color: 1 }, '', 'There is no field called "color". Check its spelling.'],
  ])('%j are refused', (more, field, message) => {
    const issue = schema.safeParse({ ...good, ...more }).error?.issues[0];
    expect([issue?.path.join('.'), issue?.message]).toEqual([field, message]);
  });
});
