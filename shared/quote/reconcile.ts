import type { CurrencyCode } from '../money/currency';
import { type Money, minus, sum } from '../money/money';
import { canonical } from '../piece/stale';
import type { Entry } from './entry';
import { heldEntries } from './ledger';

/** What the ledger and the payment provider do not agree on. */
export interface Disagreement {
  readonly id: string;
  /** missing: the provider has it and the ledger does not; unknown: the other way round; differs: both, and not alike. */
  readonly what: 'missing' | 'unknown' | 'differs';
  readonly ours: Money | null;
  readonly theirs: Money | null;
}

type Moved = Extract<Entry, { kind: 'paid' | 'refunded' }>;

/** Card money that came in or went back; what is put in cash or by transfer the provider knows nothing of. */
const cardMoney = (entries: readonly Entry[]): Moved[] => entries.filter((entry): entry is Moved => (entry.kind === 'paid' || entry.kind === 'refunded') && entry.method === 'card');

/**
 * The ledger's card entries held against the provider's own list. `missing` ones are the webhooks that never arrived:
 * appending them makes the ledger what it would have been.
 */
export function reconcile(entries: readonly Entry[], provider: readonly Entry[], currency: CurrencyCode): { readonly disagreements: readonly Disagreement[]; readonly missing: readonly Entry[]; readonly apart: Money } {
  const ours = cardMoney(heldEntries(entries, currency).held);
  const theirs = cardMoney(heldEntries(provider, currency).held);
  const told = (entry: Moved) => canonical([entry.kind, entry.amount.amount, entry.amount.currency]);
  const disagreements = [...new Set([...ours, ...theirs].map(({ id }) => id))].sort().flatMap((id): Disagreement[] => {
    const [our, their] = [ours.find((entry) => entry.id === id), theirs.find((entry) => entry.id === id)];
    if (our && their && told(our) === told(their)) return [];
    return [{ id, what: !our ? 'missing' : !their ? 'unknown' : 'differs', ours: our?.amount ?? null, theirs: their?.amount ?? null }];
  });
  const known = new Set(entries.map(({ id }) => id));
  const total = (list: readonly Moved[]) => minus(sum(list.flatMap((e) => (e.kind === 'paid' ? [e.amount] : [])), currency), sum(list.flatMap((e) => (e.kind === 'refunded' ? [e.amount] : [])), currency));
  return { disagreements, missing: theirs.filter(({ id }) => !known.has(id)), apart: minus(total(theirs), total(ours)) };
}
