import { factsOf, lanesOf, unionOf } from '../piece/kinds';
import { placeRails } from '../piece/rails';
import type { PieceSpec } from '../piece/spec';
import type { Build } from '../wood/cutList';

/** A mark on the storey rod: measured from the board's top edge (down) or left edge (across), in the piece's units. */
export interface RodMark {
  readonly along: 'down' | 'across';
  readonly at: number;
  readonly words: string;
}

/** Outer battens stand in from the board's ends by this share of its width: common practice, no source. */
const END_SHARE = 1 / 8;

/** Left edges of the battens across the board's back, seen from the front: the outer ones an eighth of the width in, the others evenly between. One stands in the middle. */
export function battenPlaces(width: number, { batten }: Pick<Build, 'batten'>): number[] {
  const { count, width: wide } = batten;
  if (count === 1) return [(width - wide) / 2];
  const first = width * END_SHARE;
  const step = (width - 2 * first - wide) / (count - 1);
  return Array.from({ length: count }, (_, n) => first + n * step);
}

/** Every mark from which a piece is put together, edge by edge, in order. */
export function storeyRod(piece: PieceSpec, build: Build): RodMark[] {
  const facts = factsOf(piece.kind);
  const union = unionOf(piece.kind, piece);
  const rails = facts.behind ? [] : placeRails(piece);
  const down: RodMark[] = [
    ...lanesOf(piece.kind, piece).slice(1).map(({ top, words }) => ({ along: 'down' as const, at: top, words: `${words} begins` })),
    ...rails.flatMap(({ name, top }) => [
      { along: 'down' as const, at: top, words: `rail ${name} top` },
      { along: 'down' as const, at: top + piece.section.thickness, words: `rail ${name} underside` },
    ]),
  ];
  const across: RodMark[] = [
    ...(union ? [{ along: 'across' as const, at: union.width, words: 'union ends' }] : []),
    ...rails.flatMap(({ name, left, length }) => [
      { along: 'across' as const, at: left, words: `rail ${name} left end` },
      { along: 'across' as const, at: left + length, words: `rail ${name} right end` },
    ]),
    ...(facts.behind ? [] : battenPlaces(piece.width, build).map((at, index) => ({ along: 'across' as const, at, words: `batten ${index + 1} left edge` }))),
  ];
  const inOrder = (marks: RodMark[]) => marks.sort((a, b) => a.at - b.at);
  return [...inOrder(down), ...inOrder(across)];
}
