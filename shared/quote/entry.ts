import { z } from 'zod';
import { objectError } from '../measure/messages';
import { moneyField } from '../money/fields';
import { type MoneySettings, formatMoney } from '../money/format';
import type { Money } from '../money/money';
import { wrong } from '../shop/fields';

/** How money came in or went out. */
export const METHODS = ['card', 'cash', 'transfer'] as const;
export type Method = (typeof METHODS)[number];

/** What every entry has. `id` is the provider's for what the provider did, and our own for the rest: an id is one deed. */
type Deed = {
  readonly id: string;
  /** When it happened, milliseconds from 1970. */
  readonly at: number;
};

/** An entry of a commission's ledger. Nothing is changed or struck out: what was wrong is taken back by a further entry. */
export type Entry =
  /** A price approved, with the deposit on it. The greatest revision holds. */
  | Deed & { readonly kind: 'agreed'; readonly revision: number; readonly total: Money; readonly deposit: Money }
  | Deed & { readonly kind: 'depositAsked' }
  | Deed & { readonly kind: 'balanceAsked' }
  | Deed & { readonly kind: 'paid'; readonly method: Method; readonly amount: Money; readonly note: string }
  /** Paid back to the customer, from the payment `of`; null: from none in particular. */
  | Deed & { readonly kind: 'refunded'; readonly method: Method; readonly amount: Money; readonly of: string | null; readonly note: string }
  /** Asked of the customer beyond the price. */
  | Deed & { readonly kind: 'charge'; readonly amount: Money; readonly note: string }
  /** Let off the customer. */
  | Deed & { readonly kind: 'discount'; readonly amount: Money; readonly note: string }
  /** Kept by the payment provider: the shop's cost, not the customer's. */
  | Deed & { readonly kind: 'providerFee'; readonly amount: Money; readonly of: string | null }
  /** The entry `of` does not hold: a refund that failed, a payment charged back, a slip of the pen. */
  | Deed & { readonly kind: 'takenBack'; readonly of: string; readonly note: string };

export type EntryKind = Entry['kind'];

/** The amounts that an entry names. */
export function amountsIn(entry: Entry): readonly Money[] {
  if (entry.kind === 'agreed') return [entry.total, entry.deposit];
  return 'amount' in entry ? [entry.amount] : [];
}

const LONGEST_NOTE = 300;

/** What the owner records by hand: money by cash or transfer, a charge, a discount. A card is the provider's to record. */
export function recordedSchema(settings: MoneySettings) {
  const amount = moneyField('amount', settings, { least: 1 });
  const base = {
    /** Made by the form: sent twice, it is still one entry. */
    id: z.string({ error: wrong('id', 'Make one for the entry.') }).regex(/^[\w-]{16,64}$/, { error: 'The id is not one that the form makes.' }),
    amount,
    note: z.string({ error: wrong('note', 'Give it as text.') }).trim().max(LONGEST_NOTE, { error: `The note is too long. Use ${LONGEST_NOTE} characters or fewer.` }).default(''),
  };
  const method = z.enum(['cash', 'transfer'], { error: wrong('way of paying', 'Use cash or transfer; cards are recorded by the payment page.') });
  const why = base.note.refine((note) => note !== '', { error: `Say what it is for, as "Second coat" for ${formatMoney({ amount: 5000, currency: settings.currency }, settings.locale)}.` });
  return z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('paid'), method, ...base }, { error: objectError('kind, method, amount and note') }),
    z.strictObject({ kind: z.literal('refunded'), method, of: z.string().max(255).nullable().default(null), ...base }, { error: objectError('kind, method, amount and note') }),
    z.strictObject({ kind: z.literal('charge'), ...base, note: why }, { error: objectError('kind, amount and note') }),
    z.strictObject({ kind: z.literal('discount'), ...base, note: why }, { error: objectError('kind, amount and note') }),
  ], { error: 'Say what happened: paid, refunded, charge or discount.' });
}

export type RecordedInput = z.input<ReturnType<typeof recordedSchema>>;
