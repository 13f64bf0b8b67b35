import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CURRENCY_CODES, decimalsOf, isCurrency } from '#shared/money/currency';
import { LARGEST, byRatio, minus, money, percentOf, plus, share, sum, times } from '#shared/money/money';

const usd = (amount: number) => money(amount, 'USD');
const cents = fc.integer({ min: -1e9, max: 1e9 });

describe('currencies', () => {
  // ISO 4217:2015, list one: minor units.
  it.each([['USD', 2], ['EUR', 2], ['GBP', 2], ['JPY', 0], ['KRW', 0], ['ISK', 0], ['KWD', 3], ['BHD', 3], ['TND', 3], ['CLF', 4], ['MRU', 2], ['MGA', 2], ['HUF', 2]] as const)('%s has %i decimals', (code, decimals) => {
    expect(decimalsOf(code)).toBe(decimals);
  });

  it('are known by code alone', () => {
    expect(CURRENCY_CODES.length).toBeGreaterThan(150);
    expect(CURRENCY_CODES.every((code) => /^[A-Z]{3}$/.test(code))).toBe(true);
    for (const text of ['usd', 'XXQ', '', 'constructor', 'toString']) expect(isCurrency(text)).toBe(false);
  });
});

describe('an amount', () => {
  it.each([0.5, NaN, Infinity, LARGEST + 1])('is never %d', (amount) => {
    expect(() => usd(amount)).toThrow(/whole number of minor units/);
  });

  it('is not added to one of another currency', () => {
    expect(() => plus(usd(1), money(1, 'EUR'))).toThrow(/not reckoned together/);
    expect(() => minus(usd(1), money(1, 'EUR'))).toThrow(/not reckoned together/);
  });

  it('is never minus zero', () => {
    expect(Object.is(times(usd(-1), 0).amount, 0)).toBe(true);
    expect(Object.is(usd(-0).amount, 0)).toBe(true);
  });
});

/** Half away from zero: worked by hand beside each. */
describe('rounding', () => {
  it.each([
    [times(usd(1), 0.5), 1], [times(usd(-1), 0.5), -1], [times(usd(5), 0.5), 3], [times(usd(-5), 0.5), -3], // 2.5
    [times(usd(5), 0.49), 2], [times(usd(5), 0.3), 2], [times(usd(5), 0.29), 1], // 2.45, 1.5, 1.45
    [times(usd(4500), 1.75), 7875], [times(usd(333), 3), 999],
    [times(money(7, 'JPY'), 0.5), 4], [times(money(1250, 'KWD'), 0.1), 125],
    // 1.005 is less than that as a double; as it is written, 1.005 × 100 cents are 100.5.
    [times(usd(100), 1.005), 101], [times(usd(100), 8.575), 858],
  ])('%j is %i', (got, amount) => expect(got.amount).toBe(amount));

  it.each([
    // Worked: 8.875 % of 1 234.56 = 109.5672; of 0.40 = 0.0355; of 4.00 = 0.355, a half.
    [123_456, 8.875, 10_957], [40, 8.875, 4], [400, 8.875, 36], [-400, 8.875, -36], [100_000, 0, 0], [199, 50, 100], [1, 19, 0],
  ])('%i cents by %d percent are %i', (amount, percent, part) => {
    expect(percentOf(usd(amount), percent).amount).toBe(part);
  });

  it.each([
    // 100 / 80 of 100.00 is 125.00; 100 / 70 of 1.00 is 1.428571; 1 / 2 of 0.05 is 0.025.
    [10_000, 100, 80, 12_500], [100, 100, 70, 143], [5, 1, 2, 3], [-5, 1, 2, -3], [-100, 100, 70, -143], [0, 3, 7, 0], [10_000, 100, 119, 8403],
  ])('%i cents by %d / %d are %i', (amount, n, d, part) => {
    expect(byRatio(usd(amount), n, d).amount).toBe(part);
  });

  it('is the same whole-number arithmetic at any size', () => {
    // Rival: thousandths in BigInt, rounded by hand.
    fc.assert(fc.property(fc.integer({ min: -1e9, max: 1e9 }), fc.integer({ min: 0, max: 1_000_000 }), (amount, thousandths) => {
      const exact = BigInt(amount) * BigInt(thousandths);
      const size = ((exact < 0n ? -exact : exact) + 500n) / 1000n;
      expect(times(usd(amount), thousandths / 1000).amount).toBe(Number(exact < 0n ? -size : size) + 0);
      expect(byRatio(usd(amount), thousandths, 1000).amount).toBe(times(usd(amount), thousandths / 1000).amount);
    }), { seed: 11 });
  });
});

describe('parts', () => {
  it.each([
    [100, [1, 1, 1], [34, 33, 33]], [-100, [1, 1, 1], [-34, -33, -33]], [5, [50, 50], [3, 2]], [1, [0, 1, 1], [0, 1, 0]],
    [101, [0.5, 0.25, 0.25], [51, 25, 25]], [0, [1, 2], [0, 0]], [7, [1], [7]],
  ])('of %i by %j are %j', (amount, weights, parts) => {
    expect(share(usd(amount), weights).map((part) => part.amount)).toEqual(parts);
  });

  it('are the whole again, each within a cent of its due and none for no weight', () => {
    const weights = fc.array(fc.integer({ min: 0, max: 10_000 }).map((n) => n / 100), { minLength: 1, maxLength: 12 }).filter((list) => list.some((weight) => weight > 0));
    fc.assert(fc.property(cents, weights, (amount, list) => {
      const parts = share(usd(amount), list);
      expect(sum(parts, 'USD').amount).toBe(usd(amount).amount);
      const all = list.reduce((a, b) => a + b, 0);
      parts.forEach((part, n) => {
        expect(Math.abs(part.amount - (amount * (list[n] ?? 0)) / all)).toBeLessThan(1 + 1e-3); // doubles at 10⁹ cents
        if (list[n] === 0) expect(part.amount).toBe(0);
      });
    }), { seed: 12 });
  });

  it.each([[[]], [[0, 0]], [[1, -1]]])('by %j are refused', (weights) => {
    expect(() => share(usd(10), weights)).toThrow(/weights/);
  });

  it('come back after being taken away', () => {
    fc.assert(fc.property(cents, cents, (a, b) => {
      expect(plus(minus(usd(a), usd(b)), usd(b))).toEqual(usd(a));
    }));
  });
});
