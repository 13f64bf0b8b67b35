import { type Units, convertLength } from '../measure/units';
import type { BoardOnSale } from './buying';
import { PS20, boardFeet } from './sizes';
import type { Wood } from './woods';

/** What a yard sells of one wood and thickness. */
export interface Yard {
  readonly wood: Wood;
  /** Nominal thickness in inches: one of PS 20's. */
  readonly quarters: (typeof PS20.thickness)[number][0];
  readonly centsPerBoardFoot: number;
  readonly lengthsFeet: readonly number[];
  readonly units: Units;
}

const INCHES_PER_FOOT = 12;

/** Every width of dressed board in every length, true sizes in the drawing's units, priced by the board foot of its nominal size (PS 20). */
export function boardsOnSale({ wood, quarters, centsPerBoardFoot, lengthsFeet, units }: Yard): BoardOnSale[] {
  const thick = PS20.thickness.find(([nominal]) => nominal === quarters);
  if (!thick) return [];
  const length = (inches: number) => convertLength(inches, 'in', units);
  return PS20.width.flatMap(([nominal, dressed]) => lengthsFeet.map((feet) => {
    const sold = boardFeet(quarters, nominal, feet * INCHES_PER_FOOT);
    return { name: `${quarters} × ${nominal} × ${feet} ft`, wood, thickness: length(thick[1]), width: length(dressed), length: length(feet * INCHES_PER_FOOT), price: Math.round(sold * centsPerBoardFoot), boardFeet: sold };
  }));
}
