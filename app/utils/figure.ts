import { type InchFraction, DECIMALS, formatDecimal, formatFraction, nearestFraction } from '#shared/measure/length';
import { type Units, MM_PER_INCH } from '#shared/measure/units';
import type { Figures } from './draft';

/** A size as the drawing shows it: a fraction on a bar, or figures in a row; the other notation stands small below. */
export interface FigureFace {
  readonly fraction: InchFraction | null;
  readonly text: string;
  /** The other notation: decimals of a fraction, or the nearest sixty-fourth of a decimal. */
  readonly beside: string;
  readonly besideFraction: InchFraction | null;
  /** For screen readers: `26 and 1 quarter inches`. */
  readonly spoken: string;
}

const PARTS: Readonly<Record<number, string>> = { 2: 'half', 4: 'quarter', 8: 'eighth', 16: 'sixteenth', 32: 'thirty-second', 64: 'sixty-fourth' };

/** A fraction as it is said: `26 and 1 quarter`, `3 eighths`. */
export function sayFraction({ whole, numerator, denominator }: InchFraction): string {
  if (numerator === 0) return String(whole);
  const word = PARTS[denominator] ?? `over ${denominator}`;
  const plural = numerator === 1 ? word : denominator === 2 ? 'halves' : `${word}s`;
  return whole === 0 ? `${numerator} ${plural}` : `${whole} and ${numerator} ${plural}`;
}

const trimmed = (value: number, units: Units) => String(Number(value.toFixed(DECIMALS[units])));

/** How a length in `units` stands on the drawing. */
export function faceOf(value: number, units: Units, figures: Figures): FigureFace {
  const nearest = nearestFraction(Math.max(0, units === 'in' ? value : value / MM_PER_INCH));
  const near = `${nearest.exact ? '' : 'near '}${formatFraction(nearest)}${units === 'mm' ? ' in' : ''}`;
  if (units === 'mm') {
    return { fraction: null, text: trimmed(value, 'mm'), beside: near, besideFraction: nearest, spoken: `${trimmed(value, 'mm')} millimetres` };
  }
  const decimal = formatDecimal(value, 'in');
  if (figures === 'fractions' && nearest.exact && value > 0) {
    return { fraction: nearest, text: formatFraction(nearest), beside: decimal, besideFraction: null, spoken: `${sayFraction(nearest)} ${value === 1 ? 'inch' : 'inches'}` };
  }
  return { fraction: null, text: trimmed(value, 'in'), beside: near, besideFraction: nearest, spoken: `${trimmed(value, 'in')} inches` };
}

/** A worked-out size as text to edit: as short as it can be without losing the value. */
export function textOf(value: number, units: Units, figures: Figures): string {
  const face = faceOf(value, units, figures);
  return face.fraction ? face.text : trimmed(value, units);
}

/** One press of an arrow key: a sixteenth (with Shift a sixty-fourth), or half a millimetre (a tenth). */
export function nextSize(value: number, units: Units, figures: Figures, by: { readonly up: boolean; readonly fine: boolean }): string {
  const step = units === 'in' ? (by.fine ? 1 / 64 : 1 / 16) : by.fine ? 0.1 : 0.5;
  // From a value between two steps the first press goes to the step, so that the figure comes out even.
  const count = by.up ? Math.floor(value / step + 1e-6) + 1 : Math.ceil(value / step - 1e-6) - 1;
  return textOf(Math.max(0, count * step), units, figures);
}
