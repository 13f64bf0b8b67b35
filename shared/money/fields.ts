import { z } from 'zod';
import { figureField, wrong } from '../shop/fields';
import { type CurrencyCode, isCurrency } from './currency';
import { LOCALES, type MoneySettings, formatMoney } from './format';
import { type Money, money } from './money';
import { parseMoney } from './parse';

/** The most that one amount is typed as, in minor units: more is a slip of the finger. */
const MOST = 1e11;

/** A currency by its code. */
export const currencyField = z.string({ error: wrong('currency', 'Use three letters, as USD or EUR.') }).transform((text, context): CurrencyCode => {
  const code = text.trim().toUpperCase();
  if (isCurrency(code)) return code;
  context.addIssue({ code: 'custom', message: `Currency is "${text.slice(0, 40)}". Use its three letters of ISO 4217, as USD, EUR or GBP.` });
  return z.NEVER;
});

export const localeField = z.enum(LOCALES, { error: wrong('way of writing amounts', `Use one of ${LOCALES.join(', ')}.`) });

/** An amount: text as it is typed, or a number, which is whole minor units. Parsing answers `Money`. */
export function moneyField(words: string, settings: MoneySettings, { least = 0, most = MOST }: { readonly least?: number; readonly most?: number } = {}) {
  const show = (amount: number) => formatMoney(money(amount, settings.currency), settings.locale);
  const help = `Use ${show(least)} to ${show(most)}.`;
  return z.union([z.number(), z.string()], { error: wrong(words, help) }).transform((value, context): Money => {
    const fail = (message: string) => {
      context.addIssue({ code: 'custom', message });
      return z.NEVER;
    };
    const named = words.charAt(0).toUpperCase() + words.slice(1);
    if (typeof value === 'number' && !Number.isSafeInteger(value)) return fail(`${named} is ${value}. As a number it is whole cents, without decimals.`);
    const read = typeof value === 'string' ? parseMoney(value, settings) : null;
    if (read && !read.ok) return fail(`${named}: ${read.message}`);
    const amount = read ? read.money.amount : Number(value);
    return amount < least || amount > most ? fail(`${named} is ${typeof value === 'string' ? value.slice(0, 40) : value}. ${help}`) : money(amount, settings.currency);
  });
}

/** A percentage. */
export const percentField = (words: string, least: number, most: number) => figureField(words, least, most, 'percent');
