import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { archiveCommission, findCommission } from '#server/services/commissions';

/** Puts a commission away; its revisions and rails stay. */
export default defineEventHandler(async (event) => {
  const commission = await foundIn(event, findCommission);
  await archiveCommission(callerOf(event), commission);
  return { id: commission.id };
});
