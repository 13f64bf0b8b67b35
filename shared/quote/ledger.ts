import type { CurrencyCode } from '../money/currency';
import { type Locale, formatMoney } from '../money/format';
import { type Money, greater, lesser, minus, plus, sum, zero } from '../money/money';
import { canonical } from '../piece/stale';
import type { ShopProblem } from '../shop/fields';
import { type Entry, amountsIn } from './entry';

/** What ought to be looked at in a ledger; sentences are made by `sayLedger`. */
export const LEDGER_FINDINGS = ['overpaid', 'refundAhead', 'beforeAgreed', 'otherCurrency', 'twoOfOneId'] as const;
export type LedgerFinding = (typeof LEDGER_FINDINGS)[number];

/** Where a commission's money stands. Every figure follows from the set of entries alone, whatever order they came in. */
export interface Ledger {
  readonly currency: CurrencyCode;
  /** The agreed total, charges and discounts. */
  readonly owed: Money;
  readonly received: Money;
  readonly refunded: Money;
  /** Received less refunded. */
  readonly kept: Money;
  /** Still to pay; never below zero. */
  readonly balance: Money;
  /** Paid beyond what is owed; nothing where there is a balance. owed − kept = balance − overpaid. */
  readonly overpaid: Money;
  /** What is asked for now: what is missing of the deposit once it is asked, of everything once the balance is. */
  readonly dueNow: Money;
  readonly deposit: Money;
  readonly depositPaid: boolean;
  /** A price is agreed and nothing of it is open. */
  readonly settled: boolean;
  readonly providerFees: Money;
  /** Kept less the provider's fees: what reached the shop. */
  readonly takings: Money;
  readonly findings: readonly LedgerFinding[];
}

const inOrder = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0);

/** What an entry says was done. The same deed told twice may differ in when it was heard of and how it was noted. */
export function deedOf(entry: Entry): string {
  const { at: _at, ...deed } = entry;
  return canonical('note' in deed ? { ...deed, note: '' } : deed);
}

/** One entry an id. Two that differ under one id are a fault somewhere: the same one of them holds, whichever came first. */
function onePerId(entries: readonly Entry[]): { readonly held: readonly Entry[]; readonly differing: boolean } {
  const held = new Map<string, Entry>();
  let differing = false;
  for (const entry of entries) {
    const other = held.get(entry.id);
    const order = other ? inOrder(deedOf(entry), deedOf(other)) : -1;
    if (other && order !== 0) differing = true;
    if (order < 0 || (other && order === 0 && (entry.at - other.at || inOrder(canonical(entry), canonical(other))) < 0)) held.set(entry.id, entry);
  }
  return { held: [...held.values()].sort((a, b) => a.at - b.at || inOrder(a.id, b.id)), differing };
}

/** Entries that hold, in order of time: each id once, in the ledger's currency, and not taken back. */
export function heldEntries(entries: readonly Entry[], currency: CurrencyCode): { readonly held: readonly Entry[]; readonly findings: readonly LedgerFinding[] } {
  const { held, differing } = onePerId(entries);
  const own = held.filter((entry) => amountsIn(entry).every((amount) => amount.currency === currency));
  const takenBack = new Set(own.flatMap((entry) => (entry.kind === 'takenBack' ? [entry.of] : [])));
  return {
    held: own.filter(({ id, kind }) => kind === 'takenBack' || !takenBack.has(id)),
    findings: [...(own.length < held.length ? ['otherCurrency' as const] : []), ...(differing ? ['twoOfOneId' as const] : [])],
  };
}

/** The ledger of a commission from all its entries. */
export function ledgerOf(entries: readonly Entry[], currency: CurrencyCode): Ledger {
  const { held, findings } = heldEntries(entries, currency);
  const none = zero(currency);
  const all = (kind: 'paid' | 'refunded' | 'charge' | 'discount' | 'providerFee') => sum(held.flatMap((entry) => (entry.kind === kind ? [entry.amount] : [])), currency);
  const agreed = held.flatMap((entry) => (entry.kind === 'agreed' ? [entry] : [])).reduce<Extract<Entry, { kind: 'agreed' }> | null>((last, entry) => (last && last.revision > entry.revision ? last : entry), null);
  const [received, refunded, providerFees] = [all('paid'), all('refunded'), all('providerFee')];
  const owed = minus(plus(agreed?.total ?? none, all('charge')), all('discount'));
  const kept = minus(received, refunded);
  const open = minus(owed, kept);
  const balance = greater(open, none);
  const overpaid = greater(minus(none, open), none);
  const deposit = lesser(agreed?.deposit ?? none, greater(owed, none));
  const asked = (kind: 'depositAsked' | 'balanceAsked') => agreed !== null && held.some((entry) => entry.kind === kind);
  const dueNow = asked('balanceAsked') ? balance : asked('depositAsked') ? lesser(balance, greater(minus(deposit, kept), none)) : none;
  return {
    currency, owed, received, refunded, kept, balance, overpaid, dueNow, deposit,
    depositPaid: agreed !== null && kept.amount >= deposit.amount,
    settled: agreed !== null && balance.amount === 0,
    providerFees, takings: minus(kept, providerFees),
    findings: [
      ...(overpaid.amount > 0 ? [agreed ? 'overpaid' as const : 'beforeAgreed' as const] : []),
      ...(kept.amount < 0 ? ['refundAhead' as const] : []),
      ...findings,
    ],
  };
}

/** The ledger's findings in words for the owner. */
export function sayLedger({ overpaid, kept, findings }: Ledger, locale: Locale): string[] {
  const words: Readonly<Record<LedgerFinding, string>> = {
    overpaid: `${formatMoney(overpaid, locale)} more was paid than is owed. Pay it back, or record what it is for.`,
    beforeAgreed: `${formatMoney(overpaid, locale)} was paid before a price is agreed. It counts towards the price.`,
    refundAhead: `${formatMoney(minus(zero(kept.currency), kept), locale)} more was paid back than came in. A payment is missing here: compare with the payment provider.`,
    otherCurrency: `An entry is not in ${kept.currency} and is not counted.`,
    twoOfOneId: 'Two entries that differ have one id, and one of them is counted. Compare with the payment provider.',
  };
  return findings.map((finding) => words[finding]);
}

/** One line of the statement: what an entry changed of what is open, and what was open after it. */
export interface StatementLine {
  readonly entry: Entry;
  readonly change: Money;
  readonly open: Money;
}

/** The entries in order of time with what was open after each; below zero is paid ahead. The last line is the ledger's own balance. */
export function statementOf(entries: readonly Entry[], currency: CurrencyCode): StatementLine[] {
  const { held } = heldEntries(entries, currency);
  const openAt = (n: number) => {
    const { balance, overpaid } = ledgerOf(held.slice(0, n), currency);
    return minus(balance, overpaid);
  };
  return held.flatMap((entry, n) => (entry.kind === 'providerFee' || entry.kind === 'takenBack' ? [] : [{ entry, change: minus(openAt(n + 1), openAt(n)), open: openAt(n + 1) }]));
}

/** An entry put to the others. The same one again changes nothing and is no fault; another under its id is refused. */
export function append(entries: readonly Entry[], entry: Entry, currency: CurrencyCode):
  | { readonly ok: true; readonly entries: readonly Entry[]; readonly added: boolean }
  | { readonly ok: false; readonly problem: ShopProblem } {
  const refuse = (field: string, message: string) => ({ ok: false as const, problem: { field, message } });
  if (amountsIn(entry).some((amount) => amount.currency !== currency)) return refuse('amount', `This commission is reckoned in ${currency}. Record the amount in ${currency}.`);
  if (amountsIn(entry).some(({ amount }) => amount < 0)) return refuse('amount', 'The amount is below zero. Give it as it is, and say whether it was paid or paid back.');
  const there = entries.find(({ id }) => id === entry.id);
  if (!there) return { ok: true, entries: [...entries, entry], added: true };
  return deedOf(there) === deedOf(entry) ? { ok: true, entries, added: false } : refuse('id', 'An entry with this id says something else. Nothing was changed: take that one back first.');
}
