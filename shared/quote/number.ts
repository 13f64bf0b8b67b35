import { z } from 'zod';
import { objectError } from '../measure/messages';
import { figureField, wrong } from '../shop/fields';

/** How a shop numbers its quotes: `Q-0042`, `2026/042`. */
export const seriesSchema = z.strictObject({
  /** What stands before the number. */
  prefix: z.string({ error: wrong('start of the number', 'Give it as text.') }).trim()
    .regex(/^[A-Za-z0-9/._-]{0,12}$/, { error: 'The start of the number has letters, digits, / . _ and - only, 12 at most. Try Q- or 2026/.' }).default('Q-'),
  digits: figureField('digits', 1, 8, 'digits').int({ error: 'Digits are a whole number. Use 1 to 8 digits.' }).default(4),
  /** Where a shop goes on from that numbered quotes before. */
  first: figureField('first number', 1, 9_999_999, 'as a number').int({ error: 'The first number is a whole number.' }).default(1),
}, { error: objectError('the series as an object with prefix, digits and first') });

export type Series = z.output<typeof seriesSchema>;

const NUMBER = /^(.*?)(\d+)$/;

/** The count within its series that a quote's number has; null where it is of another series. */
export function countOf({ prefix }: Series, number: string): number | null {
  if (!number.startsWith(prefix)) return null;
  const [, before, digits] = NUMBER.exec(number.slice(prefix.length)) ?? [];
  return digits === undefined || before !== '' ? null : Number(digits);
}

export const numberOf = ({ prefix, digits }: Series, count: number): string => `${prefix}${String(count).padStart(digits, '0')}`;

/** The number that follows those taken: never one that was given out, even where a quote between was withdrawn. */
export function nextNumber(series: Series, taken: readonly string[]): string {
  const last = taken.reduce((greatest, number) => Math.max(greatest, countOf(series, number) ?? 0), series.first - 1);
  return numberOf(series, last + 1);
}
