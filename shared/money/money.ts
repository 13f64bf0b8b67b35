import { type Dinero, add, allocate, dinero, halfAwayFromZero, multiply, subtract, toSnapshot, transformScale } from 'dinero.js/bigint';
import { assert } from '../assert';
import { type CurrencyCode, decimalsOf, definitionOf } from './currency';

/** An amount in whole minor units (cents) of its currency. It is what is stored and sent: a number of cents, never a fraction of one. */
export type Money = {
  readonly amount: number;
  readonly currency: CurrencyCode;
};

/** Minor units either way that an amount may have: beyond any commission, and small enough that every cent is told apart when it is written out. */
export const LARGEST = 1e13;

/** Decimals that a quantity, a percentage or a weight is taken to: finer than any of them is ever given. */
const FACTOR_DECIMALS = 6;

export function money(amount: number, currency: CurrencyCode): Money {
  assert(Number.isInteger(amount) && Math.abs(amount) <= LARGEST, `an amount is a whole number of minor units, not ${amount}`);
  return { amount: amount === 0 ? 0 : amount, currency }; // no -0
}

export const zero = (currency: CurrencyCode): Money => money(0, currency);

const enter = ({ amount, currency }: Money) => dinero({ amount: BigInt(amount), currency: definitionOf(currency) });

function leave(value: Dinero<bigint>, currency: CurrencyCode): Money {
  const { amount, scale } = toSnapshot(value);
  assert(Number(scale) === decimalsOf(currency), 'money leaves in whole minor units');
  return money(Number(amount), currency);
}

/**
 * The one rounding rule of all money here: to the nearest minor unit, and a half away from zero, so that 0.5 cent is
 * 1 cent to pay and the refund of it the same. It is what a customer's calculator shows.
 */
const rounded = (value: Dinero<bigint>, currency: CurrencyCode) => leave(transformScale(value, definitionOf(currency).exponent, halfAwayFromZero), currency);

function sameCurrency(a: Money, b: Money): void {
  assert(a.currency === b.currency, `${a.currency} and ${b.currency} are not reckoned together`);
}

export function plus(a: Money, b: Money): Money {
  sameCurrency(a, b);
  return leave(add(enter(a), enter(b)), a.currency);
}

export function minus(a: Money, b: Money): Money {
  sameCurrency(a, b);
  return leave(subtract(enter(a), enter(b)), a.currency);
}

/** All amounts together; nothing at all is zero of the currency. */
export const sum = (amounts: readonly Money[], currency: CurrencyCode): Money => amounts.reduce(plus, zero(currency));

/** The smaller and the greater of two amounts. */
export function lesser(a: Money, b: Money): Money {
  sameCurrency(a, b);
  return a.amount <= b.amount ? a : b;
}
export function greater(a: Money, b: Money): Money {
  sameCurrency(a, b);
  return a.amount >= b.amount ? a : b;
}

/** A decimal as a whole number of millionths. */
function millionths(value: number): bigint {
  assert(Number.isFinite(value) && Math.abs(value) <= 1e12, `${value} is no quantity`);
  return BigInt(value.toFixed(FACTOR_DECIMALS).replace('.', ''));
}

/** An amount so many times: a rate by its quantity. Rounded once. */
export const times = (amount: Money, quantity: number): Money =>
  rounded(multiply(enter(amount), { amount: millionths(quantity), scale: BigInt(FACTOR_DECIMALS) }), amount.currency);

/** So many percent of an amount. Rounded once. */
export const percentOf = (amount: Money, percent: number): Money =>
  rounded(multiply(enter(amount), { amount: millionths(percent), scale: BigInt(FACTOR_DECIMALS + 2) }), amount.currency);

/** An amount by a ratio that need not be a decimal, as 100 / 80. Rounded once, by the same rule. */
export function byRatio(amount: Money, numerator: number, denominator: number): Money {
  const [n, d] = [millionths(numerator) * BigInt(amount.amount), millionths(denominator)];
  assert(d > 0n, 'a ratio has a denominator above zero');
  const size = ((n < 0n ? -n : n) * 2n + d) / (2n * d); // nearest, a half away from zero
  return money(Number(n < 0n ? -size : size), amount.currency);
}

/**
 * An amount in parts by their weights that together are the whole again: what is left over by rounding down goes a minor
 * unit at a time to the first parts that have a weight.
 */
export function share(amount: Money, weights: readonly number[]): Money[] {
  const whole = weights.map(millionths);
  assert(whole.every((weight) => weight >= 0n) && whole.some((weight) => weight > 0n), 'weights are not below zero and one is above');
  return allocate(enter(amount), whole).map((part) => leave(part, amount.currency));
}
