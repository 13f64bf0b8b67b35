import { type CurrencyCode, decimalsOf } from './currency';
import type { Money } from './money';

/** Ways of writing amounts that a shop may choose: all in the ten digits that amounts are typed with. */
export const LOCALES = ['en-US', 'en-CA', 'en-GB', 'en-IE', 'en-AU', 'en-NZ', 'en-IN', 'en-ZA', 'da-DK', 'de-AT', 'de-CH', 'de-DE', 'es-ES', 'es-MX', 'fi-FI', 'fr-CA', 'fr-FR', 'it-IT', 'ja-JP', 'nb-NO', 'nl-NL', 'pl-PL', 'pt-BR', 'pt-PT', 'sv-SE'] as const;
export type Locale = (typeof LOCALES)[number];

/** What a shop reckons in and how it writes it. */
export interface MoneySettings {
  readonly currency: CurrencyCode;
  readonly locale: Locale;
}

const writer = (locale: Locale, currency: CurrencyCode) => {
  const decimals = decimalsOf(currency);
  return new Intl.NumberFormat(locale, { style: 'currency', currency, minimumFractionDigits: decimals, maximumFractionDigits: decimals });
};

/** Minor units as the decimal number they stand for; exact to the cent for every amount there may be. */
const inUnits = ({ amount, currency }: Money) => amount / 10 ** decimalsOf(currency);

/** An amount as the shop writes it, with its currency: `$1,250.50`, `1.250,50 €`. */
export const formatMoney = (amount: Money, locale: Locale): string => writer(locale, amount.currency).format(inUnits(amount));

/** An amount for a file that a program reads, as plain as can be: `1250.50`, `-0.05`. */
export function plainAmount({ amount, currency }: Money): string {
  const decimals = decimalsOf(currency);
  const digits = String(Math.abs(amount)).padStart(decimals + 1, '0');
  const at = digits.length - decimals;
  return `${amount < 0 ? '-' : ''}${digits.slice(0, at)}${decimals > 0 ? `.${digits.slice(at)}` : ''}`;
}

/** The signs that a locale writes an amount of a currency with. */
export interface AmountSigns {
  readonly decimal: string;
  readonly group: string;
  /** Its own sign for the currency: `$`, `CA$`, `kr`. */
  readonly currency: string;
}

/** They are taken from an amount of money: Austria, for one, groups other figures by a sign of its own. */
export function signsOf({ locale, currency }: MoneySettings): AmountSigns {
  const parts = new Intl.NumberFormat(locale, { style: 'currency', currency, minimumFractionDigits: 1, maximumFractionDigits: 1 }).formatToParts(1_234_567.5);
  const sign = (kind: 'decimal' | 'group' | 'currency') => parts.find(({ type }) => type === kind)?.value ?? '';
  return { decimal: sign('decimal'), group: sign('group'), currency: sign('currency') };
}
