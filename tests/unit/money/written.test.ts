import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CURRENCY_CODES } from '#shared/money/currency';
import { currencyField, moneyField } from '#shared/money/fields';
import { LOCALES, type Locale, formatMoney, plainAmount } from '#shared/money/format';
import { money } from '#shared/money/money';
import { parseMoney } from '#shared/money/parse';

const read = (text: string, locale: Locale = 'en-US', currency: 'USD' | 'EUR' | 'JPY' | 'KWD' | 'INR' | 'CHF' = 'USD') => {
  const answer = parseMoney(text, { currency, locale });
  return answer.ok ? answer.money.amount : answer.message;
};

/** As people of each country write: common practice (the runtime's CLDR data), no other source. */
describe('an amount as it is written', () => {
  it.each([
    [125_050, 'USD', 'en-US', '$1,250.50'], [125_050, 'EUR', 'de-DE', '1.250,50 €'], [-5, 'USD', 'en-US', '-$0.05'],
    [1250, 'JPY', 'en-US', '¥1,250'], [1_250_500, 'KWD', 'en-US', 'KWD 1,250.500'], [125_050, 'GBP', 'en-GB', '£1,250.50'],
  ] as const)('%i %s in %s is %s', (amount, currency, locale, text) => {
    expect(formatMoney(money(amount, currency), locale).replace(/[\u00a0\u202f]/g, ' ')).toBe(text);
  });

  it('is plain for a file', () => {
    expect([125_050, -5, 0, 7, 100].map((amount) => plainAmount(money(amount, 'USD')))).toEqual(['1250.50', '-0.05', '0.00', '0.07', '1.00']);
    expect(plainAmount(money(-12, 'JPY'))).toBe('-12');
    expect(plainAmount(money(12, 'KWD'))).toBe('0.012');
  });
});

describe('an amount as it is typed', () => {
  it.each<[string, Locale, 'USD' | 'EUR' | 'JPY' | 'KWD' | 'INR' | 'CHF', number]>([
    ['1,250.50', 'en-US', 'USD', 125_050], ['1250.50', 'en-US', 'USD', 125_050], ['$1,250.5', 'en-US', 'USD', 125_050], [' 1250 ', 'en-US', 'USD', 125_000],
    ['.5', 'en-US', 'USD', 50], ['12.', 'en-US', 'USD', 1200], ['USD 12', 'en-US', 'USD', 1200], ['12 usd', 'en-US', 'USD', 1200],
    ['1250,50', 'de-DE', 'EUR', 125_050], ['1.250,50 €', 'de-DE', 'EUR', 125_050], ['1.250', 'de-DE', 'EUR', 125_000],
    ['1 250,50', 'fr-FR', 'EUR', 125_050], ['1\u202f250,50\u00a0€', 'fr-FR', 'EUR', 125_050], ['1\'250.50', 'de-CH', 'CHF', 125_050],
    ['1250', 'ja-JP', 'JPY', 1250], ['1.234', 'en-US', 'KWD', 1234], ['12,34,567.89', 'en-IN', 'INR', 123_456_789], ['0', 'en-US', 'USD', 0],
  ])('%s in %s, %s, is read', (text, locale, currency, amount) => {
    expect(read(text, locale, currency)).toBe(amount);
  });

  it.each<[string, Locale, 'USD' | 'EUR' | 'JPY']>([
    ['1250,50', 'en-US', 'USD'], ['1.250,50', 'en-US', 'USD'], ['1,25', 'en-US', 'USD'], ['1,2500', 'en-US', 'USD'], ['1,250,5', 'en-US', 'USD'],
    ['1250.50', 'de-DE', 'EUR'], ['1,250.50', 'de-DE', 'EUR'], ['-5', 'en-US', 'USD'], ['', 'en-US', 'USD'], ['.', 'en-US', 'USD'], ['$', 'en-US', 'USD'],
    ['twelve', 'en-US', 'USD'], ['1e3', 'en-US', 'USD'], ['0x10', 'en-US', 'USD'], ['€12', 'en-US', 'USD'], ['12 34', 'en-US', 'USD'], ['１２', 'en-US', 'USD'],
  ])('%s in %s, %s, is not guessed at', (text, locale, currency) => {
    expect(read(text, locale, currency)).toMatch(/cannot be read as an amount. Try /);
  });

  it('says of decimals beyond the currency how many it has', () => {
    expect(read('1.005')).toMatch(/more decimals than USD, which has 2. Try \$1,250.50/);
    expect(read('12.5', 'en-US', 'JPY')).toMatch(/more decimals than JPY, which has none/);
    expect(read('9'.repeat(20))).toMatch(/more than we can reckon with/);
    expect(read('9'.repeat(60))).toMatch(/too long/);
  });

  it('is what was written, in every locale and currency', () => {
    const some = fc.oneof(fc.integer({ min: 0, max: 100_000 }), fc.integer({ min: 0, max: 1e13 }));
    fc.assert(fc.property(some, fc.constantFrom(...CURRENCY_CODES), fc.constantFrom(...LOCALES), (amount, currency, locale) => {
      const text = formatMoney(money(amount, currency), locale);
      expect(parseMoney(text, { currency, locale }), text).toEqual({ ok: true, money: money(amount, currency) });
    }), { numRuns: 2000, seed: 13 });
  });

  it('that is any text is read or refused, never more', () => {
    fc.assert(fc.property(fc.string({ maxLength: 50 }), fc.constantFrom(...LOCALES), (text, locale) => {
      const answer = parseMoney(text, { currency: 'EUR', locale });
      if (!answer.ok) expect(answer.message).toMatch(/ Try /);
      else expect(Number.isInteger(answer.money.amount)).toBe(true);
    }), { numRuns: 1000 });
  });
});

describe('a field of money', () => {
  const field = moneyField('board price', { currency: 'USD', locale: 'en-US' }, { least: 1, most: 100_000 });
  const said = (value: unknown) => field.safeParse(value).error?.issues[0]?.message ?? '';

  it('takes text as typed and numbers as cents', () => {
    expect(field.parse('12.50')).toEqual(money(1250, 'USD'));
    expect(field.parse(1250)).toEqual(money(1250, 'USD'));
  });

  it('says field, value and what would work', () => {
    expect(said(undefined)).toBe('Board price is missing. Use $0.01 to $1,000.00.');
    expect(said('0')).toBe('Board price is 0. Use $0.01 to $1,000.00.');
    expect(said(12.5)).toMatch(/Board price is 12.5. As a number it is whole cents/);
    expect(said('12,50')).toMatch(/Board price: "12,50" cannot be read as an amount. Try/);
    expect(said(null)).toMatch(/Board price is null/);
  });

  it('knows currencies', () => {
    expect(currencyField.parse(' eur ')).toBe('EUR');
    expect(currencyField.safeParse('dollars').error?.issues[0]?.message).toMatch(/Currency is "dollars". Use its three letters/);
  });
});
