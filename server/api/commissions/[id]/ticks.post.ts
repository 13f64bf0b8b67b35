import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { findCommission, ticksOf, tickStep } from '#server/services/commissions';
import { readBodyAs } from '#server/utils/readBodyAs';
import { tickSchema } from '#shared/commission/commission';

/** Ticks a bench step off, or takes the tick back: who and when are kept. */
export default defineEventHandler(async (event) => {
  const commission = await foundIn(event, findCommission);
  const by = callerOf(event);
  await tickStep(by, commission, await readBodyAs(event, tickSchema));
  return { ticks: await ticksOf(by.shopId, commission.id) };
});
