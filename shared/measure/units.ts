/** The two length units a drawing can be in, spelled as the trade abbreviates them. */
export const UNITS = ['in', 'mm'] as const;
export type Units = (typeof UNITS)[number];

/** Exact by definition: the international inch (1959 agreement; NIST SP 811, Appendix B.8). */
export const MM_PER_INCH = 25.4;

/** Converts a length between units; the identity where they are the same, so that no value makes a round trip. */
export function convertLength(value: number, from: Units, to: Units): number {
  if (from === to) return value;
  return from === 'in' ? value * MM_PER_INCH : value / MM_PER_INCH;
}

/** Picks the value that belongs to the units: the one home of every pair of an inch and a millimetre figure. */
export function byUnits<T>(units: Units, inch: T, millimetre: T): T {
  return units === 'in' ? inch : millimetre;
}
