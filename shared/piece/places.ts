import type { CoinKind } from '../coin/tally';
import type { RailContents } from './assign';

/** One coin in a groove: its middle from the groove's left end, in the piece's units. */
export interface CoinPlace {
  readonly kind: string;
  readonly diameter: number;
  readonly middle: number;
  /** A place kept for a coin to come. */
  readonly toCome: boolean;
}

/**
 * Where the coins of a groove stand: kind by kind, those to come last, with one gap between all neighbours and at both
 * ends: (L − Σ D) / (n + 1). That is the asked gap or more wherever the coins fit; below zero they do not.
 */
export function coinPlaces(grooveLength: number, contents: RailContents, kinds: readonly Pick<CoinKind, 'name' | 'diameter'>[]): { readonly gap: number; readonly places: readonly CoinPlace[] } {
  const of = (toCome: boolean) => contents.kinds.flatMap(({ name, count, toCome: kept }) => {
    const diameter = kinds.find((kind) => kind.name === name)?.diameter ?? NaN;
    return Array.from({ length: toCome ? kept : count }, () => ({ kind: name, diameter, toCome }));
  });
  const coins = [...of(false), ...of(true)];
  const gap = (grooveLength - coins.reduce((sum, { diameter }) => sum + diameter, 0)) / (coins.length + 1);
  let end = 0; // right side of the coin before
  const places = coins.map((coin) => {
    const middle = end + gap + coin.diameter / 2;
    end = middle + coin.diameter / 2;
    return { ...coin, middle };
  });
  return { gap, places };
}
