import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { changeCommission, findCommission } from '#server/services/commissions';
import { readBodyAs } from '#server/utils/readBodyAs';
import { today } from '#server/utils/today';
import { commissionPatchSchema } from '#shared/commission/commission';

/** Changes what is said of a commission, or moves it to another stage. */
export default defineEventHandler(async (event) => {
  const commission = await foundIn(event, findCommission);
  await changeCommission(callerOf(event), commission, await readBodyAs(event, commissionPatchSchema), today());
  return { id: commission.id };
});
