import type { Wood } from './woods';

/**
 * A wood's figures from the Wood Handbook (FPL-GTR-190, USDA Forest Service, 2010): shrinkage in % from green to
 * ovendry (Table 4-3), change of size per 1 % of moisture content within 6 to 14 % (Table 13-5), specific gravity at
 * 12 % (Table 5-3b). Side hardness is not needed here.
 */
export interface WoodFigures {
  readonly species: string;
  readonly shrinkageRadial: number;
  readonly shrinkageTangential: number;
  readonly radial: number;
  readonly tangential: number;
  readonly specificGravity: number;
}

const row = (species: string, shrinkageRadial: number, shrinkageTangential: number, radial: number, tangential: number, specificGravity: number): WoodFigures =>
  ({ species, shrinkageRadial, shrinkageTangential, radial, tangential, specificGravity });

/** Species by the handbook's names. */
export const SPECIES = {
  'white-oak': row('white oak', 5.6, 10.5, 0.0018, 0.00365, 0.68),
  'red-oak': row('northern red oak', 4, 8.6, 0.00158, 0.00369, 0.63),
  'walnut': row('black walnut', 5.5, 7.8, 0.0019, 0.00274, 0.55),
  'cherry': row('black cherry', 3.7, 7.1, 0.00126, 0.00248, 0.5),
  'poplar': row('yellow-poplar', 4.6, 8.2, 0.00158, 0.00289, 0.42),
  'hard-maple': row('sugar maple', 4.8, 9.9, 0.00165, 0.00353, 0.63),
  'ash': row('white ash', 4.9, 7.8, 0.00169, 0.00274, 0.6),
  'beech': row('American beech', 5.5, 11.9, 0.0019, 0.00431, 0.64),
  'pine': row('eastern white pine', 2.1, 6.1, 0.00071, 0.00212, 0.35),
} as const satisfies Record<string, WoodFigures>;

/** What a wood stands for where only its kind is known: the listed species of that kind that moves and weighs most, so that the answer errs on the safe side. Sheet goods have no such figures. */
const STANDS_FOR: Readonly<Record<Wood, keyof typeof SPECIES | null>> = {
  'hardwood': 'beech', 'softwood': 'pine', 'plywood': null, 'mdf': null,
  'white-oak': 'white-oak', 'walnut': 'walnut', 'cherry': 'cherry', 'poplar': 'poplar', 'pine': 'pine',
};

/** A wood's figures, or null for sheet goods. */
export function figuresOf(wood: Wood): WoodFigures | null {
  const name = STANDS_FOR[wood];
  return name === null ? null : SPECIES[name];
}

/** Density of sheet goods, g/cm³: common practice, no source. */
const SHEET = { plywood: 0.6, mdf: 0.75 } as const;

/**
 * Density in g/cm³ at about 12 % moisture content. Specific gravity is ovendry mass over volume at 12 %, so the water
 * comes on top: × 1.12 (Wood Handbook, ch. 4). A wood of unknown kind counts as the heaviest of its kind.
 */
export function densityOf(wood: Wood): number {
  if (wood === 'plywood' || wood === 'mdf') return SHEET[wood];
  if (wood === 'hardwood') return SPECIES['white-oak'].specificGravity * 1.12;
  return (figuresOf(wood)?.specificGravity ?? SPECIES['white-oak'].specificGravity) * 1.12;
}
