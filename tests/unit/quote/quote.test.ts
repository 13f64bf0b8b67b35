import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dayOf } from '#shared/assembly/calendar';
import { money, sum } from '#shared/money/money';
import { type Approved, approve, approvedOf, coverageOf, quoteHash } from '#shared/quote/approval';
import { costPiece } from '#shared/quote/costing';
import { countOf, nextNumber, numberOf, seriesSchema } from '#shared/quote/number';
import { type QuoteInput, isValidOn, quoteLinesOf, quoteSchema, quoteTotals } from '#shared/quote/quote';

const schema = quoteSchema({ currency: 'USD', locale: 'en-US' });
const day = (iso: string) => dayOf(iso) ?? NaN;

const GOOD: QuoteInput = {
  number: 'Q-0042', currency: 'USD', issuedOn: '2026-12-01', validUntil: '2026-12-31', terms: 'Half before the wood is bought.', depositPercent: 50, tax: { name: 'Sales tax', percent: 8.875 },
  alternatives: [
    { id: 'walnut', name: 'Walnut and cherry', lines: [{ kind: 'piece', words: 'Board for 42 coins', quantity: 1, rate: '620.05' }, { kind: 'fee', words: 'Delivery', quantity: 1, rate: 4000, taxed: false }] },
    { id: 'oak', name: 'White oak', lines: [{ kind: 'piece', words: 'Board for 42 coins', quantity: 1, rate: '580' }] },
  ],
};
const quote = schema.parse(GOOD);
const PIECE = { width: 28, height: 16.25, coins: [['Squad', 8], ['Cadet', 11]] } as const;
const approvedNow = (more: Partial<QuoteInput> = {}, piece: typeof PIECE | { readonly width: number } = PIECE): Approved => {
  const found = approvedOf(schema.parse({ ...GOOD, ...more }), 'walnut', piece);
  if (!found) throw new Error('no such alternative');
  return found;
};

describe('a quote', () => {
  it('comes to its lines and tax, and asks a share as deposit', () => {
    const [walnut, oak] = quote.alternatives;
    if (!walnut || !oak) throw new Error('two alternatives');
    const { net, tax, total, deposit } = quoteTotals(quote, walnut);
    // Own arithmetic: 8.875 % of 620.05 is 55.0294; 660.05 + 55.03 = 715.08; half of it 357.54.
    expect([net, tax, total, deposit].map(({ amount }) => amount)).toEqual([66_005, 5503, 71_508, 35_754]);
    expect(quoteTotals(quote, oak).total.amount).toBe(63_148); // 580.00 + 51.475
  });

  it('adds up with any lines, discounts among them', () => {
    const line = fc.record({ kind: fc.constant('fee' as const), words: fc.constant('x'), unit: fc.constant(''), quantity: fc.integer({ min: 1, max: 100_000 }).map((n) => n / 100), rate: fc.integer({ min: -1e6, max: 1e6 }).map((n) => money(n, 'USD')), taxed: fc.boolean() });
    fc.assert(fc.property(fc.array(line, { maxLength: 20 }), fc.double({ min: 0, max: 50, noNaN: true }), fc.double({ min: 0, max: 100, noNaN: true }), (lines, percent, depositPercent) => {
      const totals = quoteTotals({ currency: 'USD', tax: { name: 'Tax', percent }, depositPercent }, { lines });
      expect(sum([...totals.amounts, totals.tax], 'USD')).toEqual(totals.total);
      expect(Math.abs(totals.deposit.amount)).toBeLessThanOrEqual(Math.abs(totals.total.amount));
    }));
  });

  it('made from a costing comes to the same and shows no cost', () => {
    const usd = (amount: number) => money(amount, 'USD');
    const costing = costPiece({
      currency: 'USD', wood: { buy: [], unplaced: [] }, machine: { hourly: usd(5000), programs: [{ words: 'rail A', seconds: 900 }], cuts: [] },
      labour: { hourly: usd(4500), steps: [{ step: 'gluing', minutes: 77, history: [] }] }, finish: [], hardware: [{ words: 'hanger', quantity: 2, unit: 'pieces', rate: usd(451) }],
      fees: [{ words: 'delivery', quantity: 3, unit: 'h', rate: usd(1333), taxed: false }, { words: 'engraving', quantity: 1, unit: '', rate: usd(2500), taxed: true }],
      overheadPercent: 12.5, marginPercent: 30, rushPercent: 15, asked: null, tax: { name: 'Tax', percent: 8.875 },
    });
    const lines = quoteLinesOf(costing, 'Board for 42 coins');
    expect(lines.map(({ words }) => words)).toEqual(['Board for 42 coins', 'Rush', 'delivery', 'engraving']);
    const totals = quoteTotals({ currency: 'USD', tax: { name: 'Tax', percent: 8.875 }, depositPercent: 0 }, { lines });
    expect([totals.net, totals.tax, totals.total]).toEqual([costing.net, costing.tax, costing.total]);
  });

  it.each<[string, unknown, string, RegExp]>([
    ['an end before its day', { validUntil: '2026-11-30' }, 'validUntil', /ends on 2026-11-30, before it is made on 2026-12-01/],
    ['no such date', { validUntil: '2026-02-30' }, 'validUntil', /is "2026-02-30". Use a date as 2026-12-18/],
    ['another currency', { currency: 'EUR' }, 'currency', /reckons in USD and the quote is in EUR/],
    ['no alternative', { alternatives: [] }, 'alternatives', /nothing to choose/],
    ['one id twice', { alternatives: [GOOD.alternatives[0], GOOD.alternatives[0]] }, 'alternatives.1.id', /Two alternatives have the id "walnut"/],
    ['less than nothing', { alternatives: [{ id: 'a', name: 'A', lines: [{ kind: 'fee', words: 'Discount', quantity: 2, rate: -500 }] }] }, 'alternatives.0.lines', /less than nothing/],
    ['half a cent of quantity', { alternatives: [{ id: 'a', name: 'A', lines: [{ kind: 'fee', words: 'x', quantity: 0.125, rate: 500 }] }] }, 'alternatives.0.lines.0.quantity', /more than two decimals/],
    ['a revision and a half', { revision: 1.5 }, 'revision', /whole number/],
    ['a number that is a path', { number: '../../x y' }, 'number', /The number has letters/],
  ])('with %s is refused', (_what, more, field, message) => {
    const issue = schema.safeParse({ ...GOOD, ...(more as object) }).error?.issues[0];
    expect(issue?.path.join('.')).toBe(field);
    expect(issue?.message).toMatch(message);
  });

  it('can be approved to the end of its last day', () => {
    expect(['2026-12-30', '2026-12-31', '2027-01-01'].map((today) => isValidOn(quote, day(today)))).toEqual([true, true, false]);
  });
});

describe('the number of a quote', () => {
  const series = seriesSchema.parse({});

  it('follows the greatest that was given out', () => {
    expect(nextNumber(series, [])).toBe('Q-0001');
    expect(nextNumber(series, ['Q-0001', 'Q-0009', 'Q-0003'])).toBe('Q-0010');
    expect(nextNumber(series, ['Q-9999'])).toBe('Q-10000');
    expect(nextNumber(seriesSchema.parse({ prefix: '2026/', digits: 3, first: 120 }), ['Q-0500', '2025/300', '2026/x1'])).toBe('2026/120');
  });

  it('is its own count, and no other series\'', () => {
    expect(countOf(series, numberOf(series, 42))).toBe(42);
    for (const other of ['R-0042', '0042', 'Q-', 'Q-12a', 'Q-a12', 'xQ-12']) expect(countOf(series, other)).toBeNull();
    fc.assert(fc.property(fc.uniqueArray(fc.integer({ min: 1, max: 1e6 }), { maxLength: 30 }), (counts) => {
      const taken = counts.map((count) => numberOf(series, count));
      expect(taken).not.toContain(nextNumber(series, taken));
    }));
  });

  it('begins with what an address and a file name can hold', () => {
    expect(seriesSchema.safeParse({ prefix: '<b>' }).error?.issues[0]?.message).toMatch(/Try Q- or 2026\//);
  });
});

describe('an approval', () => {
  const approved = approvedNow();
  const today = day('2026-12-02');

  it('is kept under the SHA-256 of what was approved', () => {
    // FIPS 180-4 by the runtime's own implementation, over the text written out by hand.
    expect(quoteHash({ b: [1, 'x'], a: null })).toBe(createHash('sha256').update('{"a":null,"b":[1,"x"]}').digest('hex'));
    expect(approve(quote, approved, quoteHash(approved), ' Halvard Prewitt ', 5, today)).toEqual({ ok: true, approval: { hash: quoteHash(approved), approved, name: 'Halvard Prewitt', at: 5 } });
  });

  it.each([
    [quoteHash(approved), ' ', today, 'name', /Type your name/], [quoteHash(approved), 'x'.repeat(81), today, 'name', /80 characters/],
    ['0'.repeat(64), 'H. Prewitt', today, 'quote', /changed while you read it/], [quoteHash(approved), 'H. Prewitt', day('2027-01-01'), 'quote', /open until 2026-12-31/],
  ])('of %s by "%s" on day %i is refused', (shown, name, on, field, message) => {
    const answer = approve(quote, approved, shown, name, 5, on);
    expect(answer).toMatchObject({ ok: false, problem: { field } });
    if (!answer.ok) expect(answer.problem.message).toMatch(message);
  });

  it('is of nothing where the alternative is not there', () => {
    expect(approvedOf(quote, 'ash', PIECE)).toBeNull();
  });

  it('covers what it was given for, through storage and back', () => {
    expect(coverageOf({ hash: quoteHash(approved), approved }, approvedNow())).toEqual({ covers: true });
    const stored: Approved = JSON.parse(JSON.stringify(approved));
    expect(coverageOf({ hash: quoteHash(approved), approved: stored }, approvedNow())).toEqual({ covers: true });
  });

  it.each<[string, Approved, string[], RegExp]>([
    ['the piece', approvedNow({}, { width: 29 }), ['piece'], /: the piece was changed/],
    ['a letter of the terms', approvedNow({ terms: 'Half before the wood is bought' }), ['terms'], /: the terms were changed/],
    ['the tax', approvedNow({ tax: { name: 'Sales tax', percent: 8.9 } }), ['price'], /the price/],
    ['the deposit', approvedNow({ depositPercent: 51 }), ['price'], /the price/],
    ['a revision', approvedNow({ revision: 2 }), ['quote'], /the quote/],
    ['several', approvedNow({ depositPercent: 0, revision: 2 }, { width: 29 }), ['piece', 'price', 'quote'], /the piece, the price and the quote were changed/],
  ])('no longer covers a change of %s', (_what, now, because, message) => {
    const coverage = coverageOf({ hash: quoteHash(approved), approved }, now);
    expect(coverage).toMatchObject({ covers: false, because });
    if (!coverage.covers) expect(coverage.message).toMatch(message);
  });

  it('covers nothing under a hash that is not its own', () => {
    expect(coverageOf({ hash: '0'.repeat(64), approved }, approvedNow())).toMatchObject({ covers: false, because: [], message: expect.stringMatching(/the record of it was changed/) });
  });
});
