import { convertLength } from '../measure/units';
import { type RoughPart, USUAL_ALLOWANCES, cutList, partsOf } from '../wood/cutList';
import { type BoardOnSale, type BuyingPlan, planBuying } from '../wood/buying';
import { boardsOnSale } from '../wood/onSale';
import { PS20, nominalFor } from '../wood/sizes';
import type { Wood } from '../wood/woods';
import type { Work } from './work';

/** A piece's wood: the list of parts, and what to buy for it. */
export interface WoodPlan {
  readonly parts: readonly RoughPart[];
  readonly plan: BuyingPlan;
}

/**
 * Every wood is planned at one price a board foot, since all boards of a wood cost the same a foot: which to buy does
 * not hang on what they cost, and who sees no prices gets the same plan.
 */
const PLANNED_AT = 1000; // cents a board foot

/** Cut list and buying plan of a piece, from boards of each thickness its parts need. */
export function woodPlan({ piece, build, yard }: Work): WoodPlan {
  const { units } = piece;
  const parts = cutList(partsOf(piece, build), USUAL_ALLOWANCES[units]);
  const wanted = new Map<string, { readonly wood: Wood; readonly quarters: (typeof PS20.thickness)[number][0] }>();
  for (const { wood, rough } of parts) {
    const nominal = nominalFor(convertLength(rough.thickness, units, 'in'), PS20.thickness)?.nominal;
    const [quarters] = PS20.thickness.find(([each]) => each === nominal) ?? [];
    if (quarters !== undefined) wanted.set(`${wood} ${quarters}`, { wood, quarters });
  }
  const boards = [...wanted.values()].flatMap(({ wood, quarters }) => boardsOnSale({ wood, quarters, centsPerBoardFoot: PLANNED_AT, lengthsFeet: yard.lengthsFeet, units }));
  return { parts, plan: planBuying(parts, boards, yard.offcuts, yard.kerf) };
}

/** What one board costs, in cents; null where its wood has no price. */
export function centsOf(board: BoardOnSale, prices: Work['yard']['centsPerBoardFoot']): number | null {
  const price = prices[board.wood];
  return price === undefined || board.boardFeet === null ? null : Math.round(board.boardFeet * price);
}

/** What the boards to buy cost together, in cents, and the woods that have no price. */
export function woodCost({ buy }: BuyingPlan, prices: Work['yard']['centsPerBoardFoot']): { readonly cents: number; readonly unpriced: readonly Wood[] } {
  const unpriced = new Set<Wood>();
  let cents = 0;
  for (const { board, count } of buy) {
    const each = centsOf(board, prices);
    if (each === null) unpriced.add(board.wood);
    else cents += each * count;
  }
  return { cents, unpriced: [...unpriced] };
}
