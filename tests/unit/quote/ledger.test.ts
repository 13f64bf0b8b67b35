import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Money, minus, money, plus, sum } from '#shared/money/money';
import { type Entry, recordedSchema } from '#shared/quote/entry';
import { append, ledgerOf, sayLedger, statementOf } from '#shared/quote/ledger';
import { reconcile } from '#shared/quote/reconcile';
import { mostRefundable } from '#shared/quote/refund';

const usd = (amount: number) => money(amount, 'USD');
const agreed = (total: number, deposit: number, revision = 1, id = `quote-${revision}`): Entry => ({ kind: 'agreed', id, at: revision, revision, total: usd(total), deposit: usd(deposit) });
const asked = (kind: 'depositAsked' | 'balanceAsked', at = 5): Entry => ({ kind, id: kind, at });
const paid = (id: string, amount: number, at = 10, method: 'card' | 'cash' | 'transfer' = 'card'): Entry => ({ kind: 'paid', id, at, method, amount: usd(amount), note: '' });
const refunded = (id: string, amount: number, of: string | null = null, at = 20): Entry => ({ kind: 'refunded', id, at, method: 'card', amount: usd(amount), of, note: '' });
const back = (of: string, at = 30): Entry => ({ kind: 'takenBack', id: `back-${of}`, at, of, note: '' });
const extra = (kind: 'charge' | 'discount', id: string, amount: number): Entry => ({ kind, id, at: 15, amount: usd(amount), note: 'x' });
const providerFee = (id: string, amount: number): Entry => ({ kind: 'providerFee', id, at: 11, amount: usd(amount), of: null });

const of = (...entries: Entry[]) => ledgerOf(entries, 'USD');
const cents = ({ owed, kept, balance, overpaid, dueNow }: ReturnType<typeof of>) => [owed, kept, balance, overpaid, dueNow].map(({ amount }) => amount);

/** Figures by hand: owed, kept, balance, overpaid, due now. */
describe('a ledger', () => {
  const price = agreed(71_508, 35_754);

  it.each<[string, Entry[], number[]]>([
    ['nothing yet', [], [0, 0, 0, 0, 0]],
    ['a price agreed', [price], [71_508, 0, 71_508, 0, 0]],
    ['a deposit asked', [price, asked('depositAsked')], [71_508, 0, 71_508, 0, 35_754]],
    ['a deposit asked before the price is agreed', [asked('depositAsked')], [0, 0, 0, 0, 0]],
    ['part of the deposit', [price, asked('depositAsked'), paid('p1', 10_000)], [71_508, 10_000, 61_508, 0, 25_754]],
    ['the deposit paid', [price, asked('depositAsked'), paid('p1', 35_754)], [71_508, 35_754, 35_754, 0, 0]],
    ['the balance asked', [price, asked('depositAsked'), paid('p1', 35_754), asked('balanceAsked')], [71_508, 35_754, 35_754, 0, 35_754]],
    ['all paid', [price, asked('balanceAsked'), paid('p1', 35_754), paid('p2', 35_754)], [71_508, 71_508, 0, 0, 0]],
    ['more than all', [price, paid('p1', 71_509)], [71_508, 71_509, 0, 1, 0]],
    ['some of it back', [price, asked('balanceAsked'), paid('p1', 71_508), refunded('r1', 5000, 'p1')], [71_508, 66_508, 5000, 0, 5000]],
    ['a charge and a discount', [price, extra('charge', 'c1', 4000), extra('discount', 'd1', 1508), asked('balanceAsked')], [74_000, 0, 74_000, 0, 74_000]],
    ['a revised price', [price, paid('p1', 35_754), agreed(60_000, 30_000, 2)], [60_000, 35_754, 24_246, 0, 0]],
    ['an older revision heard of last', [agreed(60_000, 30_000, 2), { kind: 'agreed', id: 'quote-1', at: 99, revision: 1, total: usd(71_508), deposit: usd(35_754) }], [60_000, 0, 60_000, 0, 0]],
    ['a revised price below what was paid', [price, paid('p1', 71_508), agreed(60_000, 30_000, 2), asked('balanceAsked')], [60_000, 71_508, 0, 11_508, 0]],
    ['a payment charged back', [price, asked('balanceAsked'), paid('p1', 71_508), back('p1')], [71_508, 0, 71_508, 0, 71_508]],
    ['a refund that failed', [price, paid('p1', 71_508), refunded('r1', 5000, 'p1'), back('r1')], [71_508, 71_508, 0, 0, 0]],
    ['a refund without its payment', [price, refunded('r1', 5000, 'p1')], [71_508, -5000, 76_508, 0, 0]],
    ['a discount of more than all', [price, extra('discount', 'd1', 80_000), paid('p1', 100)], [-8492, 100, 0, 8592, 0]],
    ['an agreement taken back', [price, paid('p1', 100), back('quote-1')], [0, 100, 0, 100, 0]],
  ])('with %s', (_what, entries, figures) => {
    expect(cents(of(...entries))).toEqual(figures);
  });

  it('knows when the deposit is paid and all is settled', () => {
    expect(of(paid('p1', 1))).toMatchObject({ depositPaid: false, settled: false });
    expect(of(price, paid('p1', 35_753))).toMatchObject({ depositPaid: false, settled: false });
    expect(of(price, paid('p1', 35_754))).toMatchObject({ depositPaid: true, settled: false });
    expect(of(agreed(500, 0))).toMatchObject({ depositPaid: true, settled: false });
    expect(of(price, paid('p1', 71_508))).toMatchObject({ settled: true });
  });

  it('keeps the provider\'s fee apart from what the customer owes', () => {
    const ledger = of(price, paid('p1', 71_508), providerFee('f1', 2104));
    expect([ledger.balance.amount, ledger.providerFees.amount, ledger.takings.amount]).toEqual([0, 2104, 69_404]);
  });

  it('says what ought to be looked at', () => {
    expect(sayLedger(of(price, paid('p1', 71_608)), 'en-US')).toEqual(['$1.00 more was paid than is owed. Pay it back, or record what it is for.']);
    expect(sayLedger(of(paid('p1', 100)), 'en-US')).toEqual(['$1.00 was paid before a price is agreed. It counts towards the price.']);
    expect(sayLedger(of(price, refunded('r1', 100)), 'en-US')[0]).toMatch(/\$1.00 more was paid back than came in/);
    const euros: Entry = { kind: 'paid', id: 'p1', at: 10, method: 'card', amount: money(5, 'EUR'), note: '' };
    expect(of(price, euros)).toMatchObject({ received: usd(0), findings: ['otherCurrency'] });
    expect(of(price, paid('p1', 1), paid('p1', 2)).findings).toEqual(['twoOfOneId']);
    expect(of(price, paid('p1', 1, 10), paid('p1', 1, 12)).findings).toEqual([]); // told twice
    expect(of(price).findings).toEqual([]);
  });

  it('takes an entry once, and refuses another under its id', () => {
    const first = append([], paid('p1', 100), 'USD');
    expect(first).toMatchObject({ ok: true, added: true });
    if (!first.ok) return;
    expect(append(first.entries, paid('p1', 100, 99), 'USD')).toEqual({ ok: true, entries: first.entries, added: false });
    expect(append(first.entries, paid('p1', 101), 'USD')).toMatchObject({ ok: false, problem: { field: 'id' } });
    expect(append(first.entries, paid('p2', -1), 'USD')).toMatchObject({ ok: false, problem: { field: 'amount' } });
    expect(append(first.entries, paid('p2', 1), 'EUR')).toMatchObject({ ok: false, problem: { field: 'amount' } });
  });

  it('pays back no more than is there', () => {
    const entries = [price, paid('p1', 10_000), paid('p2', 5000), refunded('r1', 4000, 'p1')];
    expect([null, 'p1', 'p2', 'p3'].map((id) => mostRefundable(entries, id, 'USD').amount)).toEqual([11_000, 6000, 5000, 0]);
    expect(mostRefundable([refunded('r1', 50)], null, 'USD').amount).toBe(0);
    expect(mostRefundable([paid('p1', 100), refunded('r1', 70)], 'p1', 'USD').amount).toBe(30);
  });

  it('takes by hand what the provider cannot know, with a reason where it is asked', () => {
    const schema = recordedSchema({ currency: 'USD', locale: 'en-US' });
    const id = 'made-by-the-form-1';
    expect(schema.parse({ kind: 'paid', id, method: 'cash', amount: '100' })).toMatchObject({ amount: usd(10_000), note: '' });
    const said = (value: unknown) => schema.safeParse(value).error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`) ?? [];
    expect(said({ kind: 'paid', id, method: 'card', amount: '100' })).toEqual(['method: Way of paying is "card". Use cash or transfer; cards are recorded by the payment page.']);
    expect(said({ kind: 'charge', id, amount: '50' })).toEqual(['note: Say what it is for, as "Second coat" for $50.00.']);
    expect(said({ kind: 'paid', id, method: 'cash', amount: '0' })[0]).toMatch(/amount: Amount is 0. Use \$0.01 to/);
    expect(said({ kind: 'gift', id, amount: '0' })).toEqual(['kind: Say what happened: paid, refunded, charge or discount.']);
  });
});

/** Histories such as a commission may have: any entries, any ids taken back, several prices. */
const amount = fc.integer({ min: 0, max: 200_000 });
const id = (letter: string) => fc.integer({ min: 1, max: 6 }).map((n) => `${letter}${n}`);
const anyEntry: fc.Arbitrary<Entry> = fc.oneof(
  fc.tuple(amount, fc.integer({ min: 0, max: 100 }), fc.integer({ min: 1, max: 4 })).map(([total, part, revision]) => agreed(total, Math.floor((total * part) / 100), revision)),
  fc.constantFrom(asked('depositAsked'), asked('balanceAsked')),
  fc.tuple(id('p'), amount, fc.integer({ min: 1, max: 50 }), fc.constantFrom('card' as const, 'cash' as const)).map(([name, cash, at, method]) => paid(name, cash, at, method)),
  fc.tuple(id('r'), amount, id('p'), fc.integer({ min: 1, max: 50 })).map(([name, cash, from, at]) => refunded(name, cash, from, at)),
  fc.tuple(fc.oneof(id('p'), id('r'))).map(([name]) => back(name)),
  fc.tuple(fc.constantFrom('charge' as const, 'discount' as const), id('x'), amount).map(([kind, name, cash]) => extra(kind, name, cash)),
  fc.tuple(id('f'), amount).map(([name, cash]) => providerFee(name, cash)),
);
const oneEach = fc.uniqueArray(anyEntry, { selector: (entry) => entry.id, maxLength: 14 });
const shuffled = <T>(list: readonly T[]) => fc.shuffledSubarray([...list], { minLength: list.length });

describe('any ledger', () => {
  it('is the same in whatever order, and however often, its entries come', () => {
    const story = oneEach.chain((entries) => fc.tuple(fc.constant(entries), fc.subarray(entries)).chain(([all, again]) => fc.tuple(fc.constant(all), shuffled([...all, ...again]))));
    fc.assert(fc.property(story, ([all, told]) => {
      expect(ledgerOf(told, 'USD')).toEqual(ledgerOf(all, 'USD'));
      expect(statementOf(told, 'USD')).toEqual(statementOf(all, 'USD'));
      const kept = told.reduce<readonly Entry[]>((list, entry) => {
        const answer = append(list, entry, 'USD');
        return answer.ok ? answer.entries : list;
      }, []);
      expect(kept).toHaveLength(all.length);
      expect(ledgerOf(kept, 'USD')).toEqual(ledgerOf(all, 'USD'));
    }), { numRuns: 500, seed: 31 });
  });

  it('is the same even where ids are used twice for different things, and says so', () => {
    const story = fc.array(anyEntry, { maxLength: 12 }).chain((entries) => fc.tuple(fc.constant(entries), shuffled(entries)));
    fc.assert(fc.property(story, ([one, other]) => {
      expect(ledgerOf(other, 'USD')).toEqual(ledgerOf(one, 'USD'));
    }), { numRuns: 500, seed: 32 });
  });

  it('adds up, and is never below zero without saying overpaid', () => {
    fc.assert(fc.property(oneEach, (entries) => {
      const ledger = ledgerOf(entries, 'USD');
      const { owed, received, refunded: out, kept, balance, overpaid, dueNow, deposit, takings, providerFees, findings } = ledger;
      expect(minus(owed, kept)).toEqual(minus(balance, overpaid));
      expect(plus(kept, out)).toEqual(received);
      expect(plus(takings, providerFees)).toEqual(kept);
      for (const figure of [balance, overpaid, dueNow, deposit]) expect(figure.amount).toBeGreaterThanOrEqual(0);
      expect(balance.amount === 0 || overpaid.amount === 0).toBe(true);
      expect(dueNow.amount).toBeLessThanOrEqual(balance.amount);
      expect(findings.some((finding) => finding === 'overpaid' || finding === 'beforeAgreed')).toBe(overpaid.amount > 0);
      // Rival: every held movement summed by itself.
      const gone = new Set(entries.flatMap((entry) => (entry.kind === 'takenBack' ? [entry.of] : [])));
      const moves: Money[] = entries.flatMap((entry) => (gone.has(entry.id) ? [] : entry.kind === 'paid' ? [entry.amount] : entry.kind === 'refunded' ? [minus(usd(0), entry.amount)] : []));
      expect(sum(moves, 'USD')).toEqual(kept);
      const statement = statementOf(entries, 'USD');
      expect(sum(statement.map(({ change }) => change), 'USD')).toEqual(minus(balance, overpaid));
      expect(statement.at(-1)?.open ?? usd(0)).toEqual(minus(balance, overpaid));
    }), { numRuns: 500, seed: 33 });
  });

  it('held against the provider names what is missing, and with it agrees to the cent', () => {
    const story = oneEach.chain((all) => fc.tuple(fc.constant(all), fc.subarray(all)));
    fc.assert(fc.property(story, ([all, lost]) => {
      const isCard = (entry: Entry) => (entry.kind === 'paid' || entry.kind === 'refunded') && entry.method === 'card';
      const never = new Set(lost.filter(isCard).map((entry) => entry.id));
      const ours = all.filter((entry) => !never.has(entry.id));
      const provider = all.filter((entry) => isCard(entry) || entry.kind === 'takenBack');
      const { missing, disagreements, apart } = reconcile(ours, provider, 'USD');
      const gone = new Set(all.flatMap((entry) => (entry.kind === 'takenBack' ? [entry.of] : [])));
      expect(new Set(missing.map((entry) => entry.id))).toEqual(new Set([...never].filter((name) => !gone.has(name))));
      expect(disagreements.every(({ what }) => what === 'missing')).toBe(true);
      const mended = [...ours, ...missing];
      expect(reconcile(mended, provider, 'USD')).toEqual({ disagreements: [], missing: [], apart: usd(0) });
      expect(ledgerOf(mended, 'USD')).toEqual(ledgerOf(all, 'USD'));
      expect(plus(minus(ledgerOf(ours, 'USD').kept, usd(0)), apart)).toEqual(ledgerOf(all, 'USD').kept);
    }), { numRuns: 300, seed: 34 });
  });

  it('that knows a payment the provider does not, or another amount of it, says so', () => {
    const { disagreements, apart } = reconcile([paid('p1', 100), paid('p2', 50), paid('c1', 9, 1, 'cash')], [paid('p2', 60)], 'USD');
    expect(disagreements).toEqual([{ id: 'p1', what: 'unknown', ours: usd(100), theirs: null }, { id: 'p2', what: 'differs', ours: usd(50), theirs: usd(60) }]);
    expect(apart).toEqual(usd(-90));
  });
});
