import { DECIMALS, formatFraction, nearestFraction, parseLength } from '#shared/measure/length';
import { type Units, convertLength } from '#shared/measure/units';

// Records stand in forms as text and are judged as figures: what cannot be read goes on as it was typed, so that the
// record's own schema names it.

/** A typed figure as a number, a blank as nothing, anything else as typed. Signs are read: places may lie below zero. */
export function figureIn(text: string): number | string | undefined {
  const typed = text.trim();
  if (typed === '') return undefined;
  return /^-?(?:\d+\.?\d*|\.\d+)$/.test(typed) ? Number(typed) : text;
}

/** The same of a figure that may be left out. */
export const figureOrNull = (text: string): number | string | null => figureIn(text) ?? null;
/** A typed size as typed, a blank as nothing. */
export const sizeIn = (text: string): string | undefined => (text.trim() === '' ? undefined : text);
export const sizeOrNull = (text: string): string | null => sizeIn(text) ?? null;

/** Sums and conversions miss by a few units in the last binary place; a billionth is below anything that is cut. */
const tidy = (value: number) => Number(value.toFixed(9));
const exact = (value: number, decimals: number) => Math.abs(value - Number(value.toFixed(decimals))) < 1e-9;

/** A kept size as text to edit that says the same size: a fraction, short decimals, the other unit's, or all its decimals. */
export function sizeText(value: number | null, units: Units): string {
  if (value === null) return '';
  const fraction = nearestFraction(Math.max(0, value));
  if (units === 'in' && fraction.exact && value > 0) return formatFraction(fraction);
  if (exact(value, DECIMALS[units])) return String(Number(value.toFixed(DECIMALS[units])));
  const other = units === 'in' ? 'mm' : 'in';
  const there = convertLength(value, units, other);
  return exact(there, DECIMALS[other]) ? `${Number(there.toFixed(DECIMALS[other]))} ${other}` : String(tidy(value));
}

export const figureText = (value: number | null): string => (value === null ? '' : String(value));

/** A typed size after the form's units changed: the same size, so a bare figure names the unit it was typed in. */
export function sizeAfter(text: string, from: Units, to: Units): string {
  const written = parseLength(text);
  return from === to || written === null || written.units !== null ? text : `${text.trim()} ${from}`;
}

/** A typed feed, chip load or place after the form's units changed. */
export function rateAfter(text: string, from: Units, to: Units): string {
  const value = figureIn(text);
  return typeof value === 'number' ? String(Number(convertLength(value, from, to).toPrecision(6))) : text;
}
