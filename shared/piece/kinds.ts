/** Where coins may stand on a piece: a strip along its whole width, sizes in the piece's units from its top left corner. */
export interface Lane {
  /** What a person calls it: `stripe 9`, `plank 2`, `groove 1`. */
  readonly words: string;
  readonly top: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
}

export interface Rectangle {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

/** What a kind of piece is told of itself: outer size, number of its lanes, and width of the union where it has one. */
export interface Outline {
  readonly width: number;
  readonly height: number;
  readonly lanes: number;
  readonly unionWidth: number;
}

export interface PieceFacts {
  readonly words: string;
  readonly lane: string;
  /** A fixed number of lanes, or null: the maker says how many. */
  readonly lanes: number | null;
  /** Width over height where a rule fixes it; a shop may still use its own. */
  readonly proportion: number | null;
  /** Width of the union as a share of the piece's; null: it has none. */
  readonly unionShare: number | null;
  /** Lanes that the union takes part of, from the top. */
  readonly lanesBesideUnion: number;
  /** Lanes lie behind each other (a shelf) rather than below each other (a board on the wall). */
  readonly behind: boolean;
  /** A board stands behind the coins of every rail. */
  readonly backed: boolean;
}

/** Executive Order 10834 (21 August 1959), attachment, as shares of the hoist. The printed .5385 and .0769 are 7/13 and 1/13 rounded. */
export const FLAG_ORDER = { fly: 1.9, unionHoist: 7 / 13, unionFly: 0.76, stripe: 1 / 13, stripes: 13 } as const;

/** Every kind of piece. A new kind is a line here: nothing else lists them. */
export const PIECES = {
  'striped-flag': {
    words: 'striped flag board', lane: 'stripe', lanes: FLAG_ORDER.stripes, proportion: FLAG_ORDER.fly,
    unionShare: FLAG_ORDER.unionFly / FLAG_ORDER.fly, lanesBesideUnion: 7, behind: false, backed: true,
  },
  'plank-board': { words: 'plank board', lane: 'plank', lanes: null, proportion: null, unionShare: null, lanesBesideUnion: 0, behind: false, backed: true },
  'shelf': { words: 'shelf with grooves', lane: 'groove', lanes: null, proportion: null, unionShare: null, lanesBesideUnion: 0, behind: true, backed: false },
} as const satisfies Record<string, PieceFacts>;

export type PieceKind = keyof typeof PIECES;

const isKind = (name: string): name is PieceKind => name in PIECES;

/** The kinds' names, in the table's order. */
export const PIECE_KINDS: readonly PieceKind[] = Object.keys(PIECES).filter(isKind);

/** What a kind is, without the table's own narrow types. */
export function factsOf(kind: PieceKind): PieceFacts {
  return PIECES[kind];
}

/** The union in the top left corner, or null. It spans the whole lanes beside it. */
export function unionOf(kind: PieceKind, { width, height, lanes, unionWidth }: Outline): Rectangle | null {
  const facts = factsOf(kind);
  if (facts.unionShare === null) return null;
  return { left: 0, top: 0, width: Math.min(unionWidth, width), height: (height / lanes) * facts.lanesBesideUnion };
}

/** A piece's lanes from the top (a shelf's: from the front), all of one height; beside the union they are the shorter for it. */
export function lanesOf(kind: PieceKind, outline: Outline): Lane[] {
  const facts = factsOf(kind);
  const height = outline.height / outline.lanes;
  const union = unionOf(kind, outline);
  return Array.from({ length: outline.lanes }, (_, index) => ({
    words: `${facts.lane} ${index + 1}`,
    top: index * height,
    height,
    left: union && index < facts.lanesBesideUnion ? union.width : 0,
    right: outline.width,
  }));
}
