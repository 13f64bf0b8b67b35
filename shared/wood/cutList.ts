import type { Lane } from '../piece/kinds';
import { factsOf, lanesOf, unionOf } from '../piece/kinds';
import { placeRails } from '../piece/rails';
import type { PieceSpec } from '../piece/spec';
import type { Wood } from './woods';

/** Which way a part's grain runs: along its length, or no matter (sheet goods). */
export const GRAINS = ['along', 'any'] as const;
export type Grain = (typeof GRAINS)[number];

/** A part of the piece, finished sizes in the piece's units; like parts stand together. */
export interface Part {
  readonly name: string;
  readonly quantity: number;
  readonly length: number;
  readonly width: number;
  readonly thickness: number;
  readonly wood: Wood;
  readonly grain: Grain;
}

/** What wood is taken off between the rough part and the finished one; lengths in the piece's units. */
export interface Allowances {
  /** In length, for trimming square at both ends together. */
  readonly trimming: number;
  /** In width, for planing both edges together. */
  readonly edging: number;
  /** In thickness, for planing both faces together. */
  readonly planing: number;
}

/** Common practice, no source. A part whose wood is bought at its finished thickness needs no planing. */
export const USUAL_ALLOWANCES = { in: { trimming: 1, edging: 1 / 8, planing: 0 }, mm: { trimming: 25, edging: 3, planing: 0 } } as const;

export interface RoughPart extends Part {
  readonly rough: { readonly length: number; readonly width: number; readonly thickness: number };
}

/** A piece's woods and what is not in its own spec. */
export interface Build {
  readonly boardThickness: number;
  /** Odd stripes or planks (the first among them), even ones, and the union; a board of one wood names it thrice. */
  readonly odd: Wood;
  readonly even: Wood;
  readonly union: Wood;
  readonly rails: Wood;
  readonly battens: Wood;
  readonly batten: { readonly count: number; readonly width: number; readonly thickness: number; /** From the board's top and bottom edge to the batten's ends. */ readonly inset: number };
}

const sheet = (wood: Wood) => wood === 'plywood' || wood === 'mdf';
const grainOf = (wood: Wood): Grain => (sheet(wood) ? 'any' : 'along');

/** Parts of one size, wood and name together. */
function gatherParts(parts: readonly Part[]): Part[] {
  const like = new Map<string, Part>();
  for (const part of parts) {
    const key = JSON.stringify([part.name, part.length, part.width, part.thickness, part.wood]);
    like.set(key, { ...part, quantity: part.quantity + (like.get(key)?.quantity ?? 0) });
  }
  return [...like.values()];
}

/**
 * Every wooden part of a piece. Stripes and planks are whole strips; beside the union a stripe begins at its edge, and
 * the union is made of strips as high as the stripes beside it. A shelf is its lanes glued edge to edge, grooves cut
 * into them: it has no rails and no battens of its own.
 */
export function partsOf(piece: PieceSpec, build: Build): Part[] {
  const facts = factsOf(piece.kind);
  const lanes = lanesOf(piece.kind, piece);
  const union = unionOf(piece.kind, piece);
  const strip = (name: string, length: number, { height }: Lane, wood: Wood): Part => ({ name, quantity: 1, length, width: height, thickness: build.boardThickness, wood, grain: grainOf(wood) });
  const strips = lanes.map((lane, index) => strip(lane.left > 0 ? `short ${facts.lane}` : facts.lane, lane.right - lane.left, lane, index % 2 === 0 ? build.odd : build.even));
  const unionStrips = union ? lanes.slice(0, facts.lanesBesideUnion).map((lane) => strip('union strip', union.width, lane, build.union)) : [];
  if (facts.behind) return gatherParts(strips);
  const rails = placeRails(piece).map(({ length }): Part => ({ name: 'rail', quantity: 1, length, width: piece.section.width, thickness: piece.section.thickness, wood: build.rails, grain: grainOf(build.rails) }));
  const { batten } = build;
  const battens: Part = { name: 'batten', quantity: batten.count, length: piece.height - 2 * batten.inset, width: batten.width, thickness: batten.thickness, wood: build.battens, grain: grainOf(build.battens) };
  return gatherParts([...strips, ...unionStrips, ...rails, ...(batten.count > 0 ? [battens] : [])]);
}

/** The cut list: each part with the rough size it is sawn to first. */
export function cutList(parts: readonly Part[], { trimming, edging, planing }: Allowances): RoughPart[] {
  return parts.map((part) => ({ ...part, rough: { length: part.length + trimming, width: part.width + edging, thickness: part.thickness + planing } }));
}

/** A stretch of a board that cannot be used: a knot, a check, sapwood. */
export interface Defect {
  readonly from: number;
  readonly to: number;
}

/** What is left of a board's length between its defects once these are cut out, with a kerf lost at each cut. */
export function clearLengths(length: number, defects: readonly Defect[], kerf: number): number[] {
  const sorted = defects.filter(({ from, to }) => to > 0 && from < length).sort((a, b) => a.from - b.from);
  const clear: number[] = [];
  let start = 0;
  for (const { from, to } of sorted) {
    clear.push(from - kerf - start);
    start = Math.max(start, to + kerf);
  }
  clear.push(length - start);
  return clear.filter((each) => each > 0);
}

/** A board with defects as the clear pieces it gives: each is used like an offcut. */
export function clearPieces<Piece extends { readonly name: string; readonly length: number }>(board: Piece, defects: readonly Defect[], kerf: number): Piece[] {
  return clearLengths(board.length, defects, kerf).map((length, index) => ({ ...board, name: `${board.name}, clear piece ${index + 1}`, length }));
}
