import { type WoodPlan, woodPlan } from '#shared/commission/wood';
import { type Work, kindsOf } from '#shared/commission/work';
import { arrange } from '#shared/piece/arrange';

/** What a piece comes to: where every coin stands, and the wood for it. */
export interface PieceWorkedOut {
  readonly arranged: ReturnType<typeof arrange>;
  readonly wood: WoodPlan;
}

export const workOutPiece = (work: Work): PieceWorkedOut => ({ arranged: arrange(work.piece, kindsOf(work), work.pins), wood: woodPlan(work) });
