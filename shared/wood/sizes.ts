/** Dressed sizes of dry softwood boards by their nominal ones, inches: American Softwood Lumber Standard PS 20. */
export const PS20 = {
  thickness: [[0.5, 7 / 16], [0.75, 5 / 8], [1, 3 / 4], [1.25, 1], [1.5, 1.25], [2, 1.5], [3, 2.5], [4, 3.5]],
  width: [[2, 1.5], [3, 2.5], [4, 3.5], [5, 4.5], [6, 5.5], [7, 6.5], [8, 7.25], [10, 9.25], [12, 11.25]],
} as const;

/** Thickness of hardwood surfaced on two sides by its quarters, inches (hardwood grading standard). */
export const HARDWOOD_S2S = [[0.75, 9 / 16], [1, 13 / 16], [1.25, 17 / 16], [1.5, 21 / 16], [2, 1.75]] as const;

export type NominalTable = readonly (readonly [nominal: number, dressed: number])[];

const HAIR = 1e-9; // sums of decimals miss a size by a few binary places

/** The smallest nominal size whose dressed size is at least so much; null where none on sale is. */
export function nominalFor(dressed: number, table: NominalTable): { readonly nominal: number; readonly dressed: number } | null {
  const found = table.find(([, size]) => size >= dressed - HAIR);
  return found ? { nominal: found[0], dressed: found[1] } : null;
}

/** Board feet of a board, thickness and width nominal in inches, length in inches: 144 in³ are one. Thickness below 1 in counts as 1, as it is sold (common practice, no source). */
export function boardFeet(thickness: number, width: number, length: number): number {
  return (Math.max(thickness, 1) * width * length) / 144;
}
