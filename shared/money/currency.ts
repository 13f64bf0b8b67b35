import * as iso from 'dinero.js/bigint/currencies';
import type { DineroCurrency } from 'dinero.js/bigint';

/** A currency's three letters in ISO 4217. */
export type CurrencyCode = keyof typeof iso;

/** Ouguiya and ariary are divided by five, but ISO 4217 gives both two decimals, and so do banks. */
const asWritten = (code: CurrencyCode): DineroCurrency<bigint> => ({ code, base: 10n, exponent: 2n });

const CURRENCIES: Readonly<Record<CurrencyCode, DineroCurrency<bigint>>> = { ...iso, MGA: asWritten('MGA'), MRU: asWritten('MRU') };

export const isCurrency = (code: string): code is CurrencyCode => Object.hasOwn(CURRENCIES, code);

/** Every currency that a shop may keep its money in, by code. */
export const CURRENCY_CODES: readonly CurrencyCode[] = Object.keys(CURRENCIES).filter(isCurrency).sort();

/** A currency as the money package takes it. */
export const definitionOf = (code: CurrencyCode) => CURRENCIES[code];

/** Decimals that ISO 4217 gives a currency: 2 for USD, 0 for JPY, 3 for KWD. */
export const decimalsOf = (code: CurrencyCode): number => Number(CURRENCIES[code].exponent);
