import { type Units, convertLength } from '../measure/units';

/** Where a catalogue coin's sizes were read. */
export const COIN_SOURCES = {
  usMint: 'United States Mint, Coin Specifications; 31 U.S.C. 5112',
  euro: 'Council Regulation (EC) 975/98 (diameter, mass); two independent lists (thickness)',
  euroLists: 'two independent lists of euro coin data',
  canada: 'Royal Canadian Mint',
  royalMint: 'secondary pages quoting Royal Mint data',
  trade: 'common practice, no source: measure the coin',
} as const;
export type CoinSource = keyof typeof COIN_SOURCES;

/** A coin whose sizes are known beforehand; millimetres and grams, thickness at the rim. */
export interface CatalogueCoin {
  readonly name: string;
  readonly diameter: number;
  readonly thickness: number;
  readonly mass: number | null;
  readonly source: CoinSource;
}

const coin = (source: CoinSource) => (name: string, diameter: number, thickness: number, mass: number | null): CatalogueCoin => ({ name, diameter, thickness, mass, source });
const us = coin('usMint');
const euro = coin('euro');
const euroCent = coin('euroLists');
const canada = coin('canada');
const britain = coin('royalMint');
const medal = coin('trade');

/** Official coins whose thickness a source gives, and the usual medal sizes. */
export const CATALOGUE: readonly CatalogueCoin[] = [
  us('US cent', 19.05, 1.52, 2.5),
  us('US nickel', 21.21, 1.95, 5),
  us('US dime', 17.91, 1.35, 2.268),
  us('US quarter', 24.26, 1.75, 5.67),
  us('US half dollar', 30.61, 2.15, 11.34),
  us('US dollar', 26.49, 2, 8.1),
  euro('2 euro', 25.75, 2.2, 8.5),
  euro('1 euro', 23.25, 2.33, 7.5),
  euro('50 euro cent', 24.25, 2.38, 7.8),
  euro('20 euro cent', 22.25, 2.14, 5.74),
  euro('10 euro cent', 19.75, 1.93, 4.1),
  euroCent('5 euro cent', 21.25, 1.67, 3.92),
  euroCent('2 euro cent', 18.75, 1.67, 3.06),
  euroCent('1 euro cent', 16.25, 1.67, 2.3),
  canada('Canadian 2 dollars, 2012 on', 28, 1.75, 6.92),
  canada('Canadian dollar, 2012 on', 26.5, 1.95, 6.27),
  britain('British 2 pounds', 28.4, 2.5, 12),
  britain('British pound, twelve-sided, point to point', 23.43, 2.8, 8.75),
  britain('British pound, round, 1983 to 2017', 22.5, 3.15, 9.5),
  britain('British 5 pence', 18, 1.7, 3.25),
  britain('British 5 pounds, crown', 38.61, 2.89, 28.28),
  medal('Medal 1 1/2 in', 38.1, 3, null),
  medal('Medal 1 3/4 in', 44.45, 3, null),
  medal('Medal 2 in', 50.8, 4, null),
];

/** A catalogue coin's sizes in the drawing's units. */
export function coinIn(units: Units, { name, diameter, thickness, mass }: CatalogueCoin) {
  return { name, diameter: convertLength(diameter, 'mm', units), thickness: convertLength(thickness, 'mm', units), mass } as const;
}
