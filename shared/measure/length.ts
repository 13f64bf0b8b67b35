import { type Units, convertLength } from './units';

/** A length as somebody wrote it: `units` is null where the text names none and the drawing's units hold. */
export interface WrittenLength {
  readonly value: number;
  readonly units: Units | null;
}

/** Said wherever a length cannot be read, with forms that can. */
export const LENGTH_HELP = 'Try 26 1/4, 0.375 or 9 mm.';

/** Longest text worth reading as one length; "1234 63/64 inches" has 17 characters. */
const LONGEST = 32;

// Whole, fraction, unit. A whole and a fraction are parted by blanks or one hyphen, as on a cut list: 26 1/4, 26-1/4".
const NOTATION =
  /^(?:(?<decimal>\d+\.?\d*|\.\d+)|(?:(?<whole>\d+)(?:\s+|\s*-\s*))?(?<numerator>\d+)\s*\/\s*(?<denominator>\d+))\s*(?<unit>in|inch|inches|"|″|”|''|mm|millimetres?|millimeters?)?\.?$/i;

/**
 * Reads a length in the trade's notation: `26 1/4`, `26-1/4"`, `1 1/16 in`, `.375`, `9 mm`.
 *
 * @returns the value in the units written beside it (null: none written), or null where the text is no length.
 *   Signs, exponents and a denominator of zero are no length: a size on a drawing has none of them.
 */
export function parseLength(text: string): WrittenLength | null {
  if (text.length > LONGEST) return null;
  const parts = NOTATION.exec(text.trim())?.groups;
  if (!parts) return null;
  const denominator = Number(parts.denominator ?? 1);
  if (denominator === 0) return null;
  const fraction = Number(parts.numerator ?? 0) / denominator;
  const value = parts.decimal === undefined ? Number(parts.whole ?? 0) + fraction : Number(parts.decimal);
  const unit = parts.unit?.toLowerCase();
  if (unit === undefined) return { value, units: null };
  return { value, units: unit.startsWith('m') ? 'mm' : 'in' };
}

/** A written length in the drawing's units: exact, and untouched where no other unit was written. */
export function lengthIn(units: Units, written: WrittenLength): number {
  return convertLength(written.value, written.units ?? units, units);
}

/** Decimals a shop reads: a ten-thousandth of an inch, a thousandth of a millimetre. */
export const DECIMALS: Readonly<Record<Units, number>> = { in: 4, mm: 3 };

/** A length in decimals, fixed to the units' usual places, without "-0": `0.3750`, `9.000`. */
export function formatDecimal(value: number, units: Units, decimals: number = DECIMALS[units]): string {
  const text = value.toFixed(decimals);
  return Number(text) === 0 ? (0).toFixed(decimals) : text;
}

/** A length as whole inches and a fraction in lowest terms. `exact` is false where the fraction is only the nearest. */
export interface InchFraction {
  readonly whole: number;
  readonly numerator: number;
  readonly denominator: number;
  readonly exact: boolean;
}

/** Sixty-fourths: the finest division of a shop rule. */
const FINEST = 64;

/** A value this near to a sixty-fourth is that sixty-fourth: a millionth of an inch is below anything a shop measures. */
const SAME = 1e-6;

/** The nearest 1/64 in of a length in inches (not negative), in lowest terms. */
export function nearestFraction(inches: number): InchFraction {
  const sixtyFourths = Math.round(inches * FINEST);
  const whole = Math.floor(sixtyFourths / FINEST);
  let numerator = sixtyFourths - whole * FINEST;
  let denominator = FINEST;
  while (numerator % 2 === 0 && denominator > 1) {
    numerator /= 2;
    denominator /= 2;
  }
  return { whole, numerator, denominator, exact: Math.abs(inches - sixtyFourths / FINEST) <= SAME };
}

/** An inch fraction as it is typed: `26 1/4`, `3/8`, `2`, `0`. */
export function formatFraction({ whole, numerator, denominator }: InchFraction): string {
  if (numerator === 0) return String(whole);
  const fraction = `${numerator}/${denominator}`;
  return whole === 0 ? fraction : `${whole} ${fraction}`;
}

/** A size as a sentence shows it: the fraction where it is exact, decimals where not, the unit always: `3/8 in`, `9.5 mm`. */
export function formatSize(value: number, units: Units): string {
  if (units === 'mm') return `${Number(value.toFixed(DECIMALS.mm))} mm`;
  const fraction = nearestFraction(value);
  return fraction.exact && value > 0 ? `${formatFraction(fraction)} in` : `${Number(value.toFixed(DECIMALS.in))} in`;
}
