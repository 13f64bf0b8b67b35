/** A day as a whole number, days from 1 January 1970: what a schedule reckons in, without a clock. */
export type Day = number;

const ISO = /^(\d{4})-(\d{2})-(\d{2})$/;
const MONTHS = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31] as const;

const isLeap = (year: number) => (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0; // Gregorian rule
const daysIn = (year: number, month: number) => (month === 2 && isLeap(year) ? 29 : MONTHS[month - 1] ?? 0);

/** Days from 1 January of year 1 to 1 January of a year (Gregorian rule throughout). */
const daysBefore = (year: number) => 365 * (year - 1) + Math.floor((year - 1) / 4) - Math.floor((year - 1) / 100) + Math.floor((year - 1) / 400);

const EPOCH = daysBefore(1970);

/** The day of a date `2026-12-18`; null where there is no such date. */
export function dayOf(iso: string): Day | null {
  const [, y, m, d] = ISO.exec(iso)?.map(Number) ?? [];
  if (y === undefined || m === undefined || d === undefined || m < 1 || m > 12 || d < 1 || d > daysIn(y, m)) return null;
  let days = daysBefore(y) - EPOCH + d - 1;
  for (let month = 1; month < m; month++) days += daysIn(y, month);
  return days;
}

/** A day's date, `2026-12-18`. */
export function dateOf(day: Day): string {
  let year = Math.floor((day + EPOCH) / 365.2425) + 1;
  while (daysBefore(year) - EPOCH > day) year--;
  while (daysBefore(year + 1) - EPOCH <= day) year++;
  let left = day - (daysBefore(year) - EPOCH);
  let month = 1;
  while (left >= daysIn(year, month)) left -= daysIn(year, month++);
  const two = (n: number) => String(n).padStart(2, '0');
  return `${String(year).padStart(4, '0')}-${two(month)}-${two(left + 1)}`;
}

/** 0 Monday to 6 Sunday: 1 January 1970 was a Thursday. */
export const weekdayOf = (day: Day): number => (((day + 3) % 7) + 7) % 7;

/** When a shop works: weekdays (0 Monday to 6 Sunday), hours of the day, and days it is closed all the same. */
export interface ShopHours {
  readonly weekdays: readonly number[];
  readonly opens: number;
  readonly closes: number;
  readonly closed: readonly Day[];
}

export const isOpenOn = ({ weekdays, closed }: ShopHours, day: Day): boolean => weekdays.includes(weekdayOf(day)) && !closed.includes(day);
