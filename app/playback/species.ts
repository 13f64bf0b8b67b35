import type { Wood } from '#shared/wood/woods';

/** The species whose tones stand for a wood that is only known by kind. */
const TONES: Readonly<Record<Wood, string>> = {
  'hardwood': 'white-oak', 'softwood': 'pine', 'plywood': 'pine', 'mdf': 'cherry',
  'white-oak': 'white-oak', 'walnut': 'walnut', 'cherry': 'cherry', 'poplar': 'poplar', 'pine': 'pine',
};

export const speciesOf = (wood: Wood): string => TONES[wood];
