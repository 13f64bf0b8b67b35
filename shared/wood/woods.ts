/** How a wood cuts: the three columns of the shop's chip load chart (common practice, no source), and sheet goods. */
export const WOOD_KINDS = ['hardwood', 'softwood', 'plywood', 'mdf'] as const;
export type WoodKind = (typeof WOOD_KINDS)[number];

/** Woods a spec may name: a kind where that is all anyone knows, or a species. */
export const WOODS = ['hardwood', 'softwood', 'plywood', 'mdf', 'white-oak', 'walnut', 'cherry', 'poplar', 'pine'] as const;
export type Wood = (typeof WOODS)[number];

/** Words and cutting kind of each wood; the botanical hardwoods and softwoods as in the Wood Handbook (FPL-GTR-190), ch. 2. */
export const WOOD_FACTS: Readonly<Record<Wood, { readonly words: string; readonly kind: WoodKind }>> = {
  'hardwood': { words: 'hardwood', kind: 'hardwood' },
  'softwood': { words: 'softwood', kind: 'softwood' },
  'plywood': { words: 'plywood', kind: 'plywood' },
  'mdf': { words: 'MDF', kind: 'mdf' },
  'white-oak': { words: 'white oak', kind: 'hardwood' },
  'walnut': { words: 'walnut', kind: 'hardwood' },
  'cherry': { words: 'cherry', kind: 'hardwood' },
  'poplar': { words: 'poplar', kind: 'hardwood' },
  'pine': { words: 'pine', kind: 'softwood' },
};
