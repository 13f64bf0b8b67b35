import { decimalsOf } from './currency';
import { type MoneySettings, formatMoney, signsOf } from './format';
import { LARGEST, type Money, money } from './money';

/** An amount read, or what is wrong with it and what would work. */
export type ReadMoney = { readonly ok: true; readonly money: Money } | { readonly ok: false; readonly message: string };

const LONGEST = 40; // characters worth reading as one amount
const EXAMPLE = 125_050; // minor units of the amount that a message shows

const literal = (text: string) => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');

/** Signs that are typed for a locale's group sign: its own, and a blank of any width where that is one. */
function groupSigns(group: string): string {
  if (/\s/.test(group)) return '[\\s\\u00a0\\u202f]';
  return group === '’' ? '[’\']' : literal(group);
}

/**
 * Reads an amount as it is typed in a locale: `1,250.50`, `$1250.5`, `1.250,50 €`. Signs are never guessed at: groups
 * have three digits (in India two, then three) and there are no more decimals than the currency has, so that the comma
 * of one country is not taken for the other's.
 */
export function parseMoney(text: string, settings: MoneySettings): ReadMoney {
  const { currency, locale } = settings;
  const { decimal, group, currency: sign } = signsOf(settings);
  const help = `Try ${formatMoney(money(EXAMPLE, currency), locale)}.`;
  const refuse = (why: string): ReadMoney => ({ ok: false, message: `"${text.slice(0, LONGEST)}" ${why} ${help}` });
  if (text.length > LONGEST) return refuse('is too long for an amount.');

  // The currency may stand before or behind, by its sign or its code.
  const names = [sign, currency].filter((name) => name !== '').map(literal).join('|');
  const bare = text.trim().replace(new RegExp(`^(?:${names})\\s*|\\s*(?:${names})$`, 'iu'), '').trim();
  const by = groupSigns(group);
  const grouped = locale === 'en-IN' ? `\\d{1,2}(?:${by}\\d{2})*${by}\\d{3}` : `\\d{1,3}(?:${by}\\d{3})+`;
  const form = new RegExp(`^(?<whole>\\d+|${grouped})?(?:${literal(decimal)}(?<part>\\d*))?$`, 'u').exec(bare);
  const [whole, part] = [form?.groups?.whole, form?.groups?.part];
  if (!form || (whole === undefined && !part)) return refuse('cannot be read as an amount.');

  const decimals = decimalsOf(currency);
  if ((part ?? '').length > decimals) return refuse(`has more decimals than ${currency}, which has ${decimals === 0 ? 'none' : decimals}.`);
  const amount = Number(`${(whole ?? '0').replace(/\D/g, '')}${(part ?? '').padEnd(decimals, '0')}`);
  return amount > LARGEST ? refuse('is more than we can reckon with.') : { ok: true, money: money(amount, currency) };
}
