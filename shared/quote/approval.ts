import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import type { Day } from '../assembly/calendar';
import { type Data, canonical } from '../piece/stale';
import type { ShopProblem } from '../shop/fields';
import { type Quote, isValidOn, quoteTotals } from './quote';

/** SHA-256 (FIPS 180-4), hex, of a text that is the same for the same data whatever order its keys stand in. */
export const quoteHash = (data: Data): string => bytesToHex(sha256(utf8ToBytes(canonical(data))));

/** What of an approval may change afterwards, in the order it is named. */
export const APPROVED_PARTS = ['piece', 'price', 'terms', 'quote'] as const;
export type ApprovedPart = (typeof APPROVED_PARTS)[number];

/** Exactly what a customer approves: it is kept whole beside its hash, so that it can be shown again and a change named. */
export type Approved = Readonly<Record<ApprovedPart, Data>>;

/**
 * What is put before the customer: the alternative they chose, to the cent, the terms' every letter, and the piece as
 * it is drawn, with its coins. Null where the quote has no such alternative.
 */
export function approvedOf(quote: Quote, chosen: string, piece: Data): Approved | null {
  const alternative = quote.alternatives.find(({ id }) => id === chosen);
  if (!alternative) return null;
  const { amounts, net, tax, total, deposit } = quoteTotals(quote, alternative);
  const { number, revision, currency, issuedOn, validUntil } = quote;
  return {
    piece,
    price: {
      currency, alternative: alternative.name, net: net.amount, tax: { ...quote.tax, amount: tax.amount }, total: total.amount, deposit: deposit.amount,
      lines: alternative.lines.map(({ words, quantity, unit, rate, taxed }, n) => ({ words, quantity, unit, rate: rate.amount, taxed, amount: amounts[n]?.amount ?? 0 })),
    },
    terms: quote.terms,
    quote: { number, revision, issuedOn, validUntil, id: chosen },
  };
}

/** An approval as it is kept. */
export interface Approval {
  readonly hash: string;
  readonly approved: Approved;
  /** As the customer typed it. */
  readonly name: string;
  /** Milliseconds from 1970. */
  readonly at: number;
}

const LONGEST_NAME = 80;

/** An approval given now, or why it cannot be: `shown` is the hash of what the customer had before them. */
export function approve(quote: Quote, approved: Approved, shown: string, typed: string, at: number, today: Day):
  | { readonly ok: true; readonly approval: Approval }
  | { readonly ok: false; readonly problem: ShopProblem } {
  const refuse = (field: string, message: string) => ({ ok: false as const, problem: { field, message } });
  const name = typed.trim();
  const hash = quoteHash(approved);
  if (name === '') return refuse('name', 'Type your name to approve.');
  if (name.length > LONGEST_NAME) return refuse('name', `The name is too long. Use ${LONGEST_NAME} characters or fewer.`);
  if (!isValidOn(quote, today)) return refuse('quote', `This quote was open until ${quote.validUntil}. Ask the shop for a new one.`);
  if (shown !== hash) return refuse('quote', 'The quote was changed while you read it. Look at it again, then approve.');
  return { ok: true, approval: { hash, approved, name, at } };
}

/** Whether an approval still stands for what the piece and its quote are now. */
export type Coverage =
  | { readonly covers: true }
  | { readonly covers: false; readonly because: readonly ApprovedPart[]; readonly message: string };

const PART_WORDS: Readonly<Record<ApprovedPart, string>> = { piece: 'the piece', price: 'the price', terms: 'the terms', quote: 'the quote' };

/** A later change says that the approval no longer covers it, and what was changed. */
export function coverageOf({ hash, approved }: Pick<Approval, 'hash' | 'approved'>, now: Approved): Coverage {
  if (quoteHash(now) === hash) return { covers: true };
  const because = APPROVED_PARTS.filter((part) => canonical(approved[part]) !== canonical(now[part]));
  const words = because.map((part) => PART_WORDS[part]);
  const list = words.length > 1 ? `${words.slice(0, -1).join(', ')} and ${words[words.length - 1] ?? ''}` : words[0] ?? 'the record of it';
  const was = words.length > 1 || because[0] === 'terms' ? 'were' : 'was';
  return { covers: false, because, message: `The approval no longer covers this: ${list} ${was} changed after it was given. Send the quote again for approval.` };
}
