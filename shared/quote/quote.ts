import { z } from 'zod';
import { type Day, dayOf } from '../assembly/calendar';
import { objectError } from '../measure/messages';
import { currencyField, moneyField, percentField } from '../money/fields';
import type { MoneySettings } from '../money/format';
import { type Money, percentOf, sum, times } from '../money/money';
import { choiceField, figureField, nameField, wrong, yesNoField } from '../shop/fields';
import type { Costing } from './costing';
import { taxSchema } from './rates';

const MOST_LINES = 60; // lines of one page
const MOST_ALTERNATIVES = 4; // side by side on a sheet of paper
const LONGEST_TERMS = 6000; // characters: two pages
const MOST_REVISIONS = 999;

/** What a line is for: tax and rush are worked out, not typed. */
export const QUOTE_LINES = ['piece', 'rush', 'fee'] as const;

const day = (words: string) => z.string({ error: wrong(words, 'Use a date as 2026-12-18.') })
  .refine((text) => dayOf(text) !== null, { error: wrong(words, 'Use a date as 2026-12-18.') });

function lineSchema(settings: MoneySettings) {
  return z.strictObject({
    kind: choiceField('kind of line', QUOTE_LINES),
    words: nameField("the line's words"),
    quantity: figureField('quantity', 0.01, 100_000, 'pieces').refine((quantity) => Math.abs(quantity * 100 - Math.round(quantity * 100)) < 1e-6, { error: 'The quantity has more than two decimals. Use two or fewer.' }),
    unit: z.string({ error: wrong('unit', 'Give it as text.') }).trim().max(20, { error: 'The unit is too long. Use 20 characters or fewer.' }).default(''),
    /** Below zero is a discount. */
    rate: moneyField('price of one', settings, { least: -1e10, most: 1e10 }),
    taxed: yesNoField('taxed').default(true),
  }, { error: objectError('each line as an object with kind, words, quantity, rate and taxed') });
}

/** A quote as the customer gets it: no cost stands in it. Amounts are text as typed or whole minor units. */
export function quoteSchema(settings: MoneySettings) {
  return z.strictObject({
    number: z.string({ error: wrong('number', 'Give the next of the series.') }).trim().regex(/^[A-Za-z0-9/._-]{1,24}$/, { error: 'The number has letters, digits, / . _ and - only, 24 at most. Try Q-0042.' }),
    /** 1 for the first; a revised quote keeps its number and counts on. */
    revision: figureField('revision', 1, MOST_REVISIONS, 'as a whole number').int({ error: 'The revision is a whole number.' }).default(1),
    currency: currencyField,
    issuedOn: day('date of the quote'),
    /** The last day on which it can be approved. */
    validUntil: day('last day of validity'),
    terms: z.string({ error: wrong('terms', 'Give them as text.') }).trim().max(LONGEST_TERMS, { error: `The terms are too long. Use ${LONGEST_TERMS} characters or fewer.` }).default(''),
    depositPercent: percentField('deposit', 0, 100),
    tax: taxSchema,
    alternatives: z.array(z.strictObject({
      id: z.string({ error: wrong('id of the alternative', 'Make one.') }).regex(/^[\w-]{1,64}$/, { error: 'The id of an alternative has letters, digits, _ and - only.' }),
      name: nameField('name of the alternative'),
      lines: z.array(lineSchema(settings), { error: wrong('lines', 'Use a list.') })
        .min(1, { error: 'A quote has no line. Give what the customer pays for.' })
        .max(MOST_LINES, { error: `There are more than ${MOST_LINES} lines. Use ${MOST_LINES} or fewer.` }),
    }, { error: objectError('each alternative as an object with id, name and lines') }), { error: wrong('alternatives', 'Use a list.') })
      .min(1, { error: 'There is nothing to choose. Give one alternative or more.' })
      .max(MOST_ALTERNATIVES, { error: `There are more than ${MOST_ALTERNATIVES} alternatives. Use ${MOST_ALTERNATIVES} or fewer.` }),
  }, { error: objectError('the quote as one object') }).superRefine((quote, context) => {
    if (quote.currency !== settings.currency) context.addIssue({ code: 'custom', path: ['currency'], message: `The shop reckons in ${settings.currency} and the quote is in ${quote.currency}. Use ${settings.currency}.` });
    if ((dayOf(quote.validUntil) ?? 0) < (dayOf(quote.issuedOn) ?? 0)) context.addIssue({ code: 'custom', path: ['validUntil'], message: `The quote ends on ${quote.validUntil}, before it is made on ${quote.issuedOn}. Use a later day.` });
    quote.alternatives.forEach(({ id, lines }, n) => {
      if (quote.alternatives.findIndex((other) => other.id === id) !== n) context.addIssue({ code: 'custom', path: ['alternatives', n, 'id'], message: `Two alternatives have the id "${id}". Use another for one of them.` });
      if (lines.reduce((all, { rate, quantity }) => all + times(rate, quantity).amount, 0) < 0) context.addIssue({ code: 'custom', path: ['alternatives', n, 'lines'], message: 'The lines come to less than nothing. Make the discount smaller.' });
    });
  });
}

export type Quote = z.output<ReturnType<typeof quoteSchema>>;
export type QuoteInput = z.input<ReturnType<typeof quoteSchema>>;
export type Alternative = Quote['alternatives'][number];
export type QuoteLine = Alternative['lines'][number];

/** What one alternative comes to. */
export interface QuoteTotals {
  /** One for each line, rounded each. */
  readonly amounts: readonly Money[];
  readonly net: Money;
  readonly tax: Money;
  readonly total: Money;
  /** What is asked before the wood is bought. */
  readonly deposit: Money;
}

export function quoteTotals({ currency, tax, depositPercent }: Pick<Quote, 'currency' | 'tax' | 'depositPercent'>, { lines }: Pick<Alternative, 'lines'>): QuoteTotals {
  const amounts = lines.map(({ rate, quantity }) => times(rate, quantity));
  const net = sum(amounts, currency);
  const taxable = sum(amounts.filter((_, n) => lines[n]?.taxed), currency);
  const taxed = percentOf(taxable, tax.percent);
  const total = sum([net, taxed], currency);
  return { amounts, net, tax: taxed, total, deposit: percentOf(total, depositPercent) };
}

/** The customer's lines of a costing: the piece at its price, rush and fees, and nothing of what it costs. They come to its net. */
export function quoteLinesOf({ price, rush, lines }: Costing, piece: string): QuoteLine[] {
  const one = { quantity: 1, unit: '', taxed: true };
  return [
    { kind: 'piece', words: piece, rate: price, ...one },
    ...(rush.amount === 0 ? [] : [{ kind: 'rush' as const, words: 'Rush', rate: rush, ...one }]),
    ...lines.filter(({ group }) => group === 'fees').map(({ words, amount, taxed }) => ({ kind: 'fee' as const, words, rate: amount, ...one, taxed })),
  ];
}

/** Whether a quote can still be approved on a day. */
export const isValidOn = ({ validUntil }: Pick<Quote, 'validUntil'>, today: Day): boolean => today <= (dayOf(validUntil) ?? -Infinity);
