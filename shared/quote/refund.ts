import type { CurrencyCode } from '../money/currency';
import { type Money, greater, lesser, minus, sum, zero } from '../money/money';
import type { Entry } from './entry';
import { heldEntries, ledgerOf } from './ledger';

/** The most that can be paid back: of one payment what is not paid back of it yet, and never more than is kept in all. */
export function mostRefundable(entries: readonly Entry[], of: string | null, currency: CurrencyCode): Money {
  const kept = greater(ledgerOf(entries, currency).kept, zero(currency));
  if (of === null) return kept;
  const { held } = heldEntries(entries, currency);
  const all = (amounts: readonly Entry[]) => sum(amounts.flatMap((entry) => ('amount' in entry ? [entry.amount] : [])), currency);
  const left = minus(all(held.filter(({ kind, id }) => kind === 'paid' && id === of)), all(held.filter((entry) => entry.kind === 'refunded' && entry.of === of)));
  return greater(lesser(left, kept), zero(currency));
}
