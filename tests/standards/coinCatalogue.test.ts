import { describe, expect, it } from 'vitest';
import { CATALOGUE, COIN_SOURCES, coinIn } from '#shared/coin/catalogue';

/** FACTS.md D1, row "Inch x 25.4 check": published inch diameters of US coins (United States Mint; 31 U.S.C. 5112), which the millimetres must round from. */
const INCHES = [['US cent', 0.75], ['US nickel', 0.835], ['US dime', 0.705], ['US quarter', 0.955], ['US half dollar', 1.205], ['US dollar', 1.043]] as const;

/** FACTS.md D1, row "Disc-density sanity": mass over the disc's volume, g/cm³, worked out apart from this code. */
const DENSITIES = [['US quarter', 7.009], ['US half dollar', 7.167], ['US dollar', 7.349], ['2 euro', 7.419], ['1 euro', 7.582], ['Canadian 2 dollars, 2012 on', 6.422], ['British 2 pounds', 7.577]] as const;

const named = (name: string) => {
  const coin = CATALOGUE.find((each) => each.name === name);
  if (!coin) throw new Error(`no ${name} in the catalogue`);
  return coin;
};

describe('catalogue of coins', () => {
  it.each(INCHES)('%s is %d in across', (name, inches) => {
    expect(Math.abs(coinIn('in', named(name)).diameter - inches)).toBeLessThan(0.0003); // half of 0.01 mm is 0.0002 in
  });

  it.each(DENSITIES)('%s has %d g/cm³ as a disc', (name, density) => {
    const { diameter, thickness, mass } = named(name);
    expect((mass ?? NaN) / ((Math.PI / 4) * diameter ** 2 * thickness / 1000)).toBeCloseTo(density, 3);
  });

  it('holds no coin denser than cupronickel (8.9 g/cm³): faces are hollowed', () => {
    for (const { diameter, thickness, mass } of CATALOGUE) {
      if (mass !== null) expect(mass / ((Math.PI / 4) * diameter ** 2 * thickness / 1000)).toBeLessThan(8.9);
    }
  });

  it('names a source for every coin, and no coin twice', () => {
    for (const { source } of CATALOGUE) expect(COIN_SOURCES[source]).not.toBe('');
    expect(new Set(CATALOGUE.map(({ name }) => name)).size).toBe(CATALOGUE.length);
  });
});
