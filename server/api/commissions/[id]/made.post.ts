import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { commissionFor } from '#server/services/commissions';
import { makeStep } from '#server/services/pieceRevisions';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';
import { madeSchema } from '#shared/commission/commission';

/** Notes that the cut list or the assembly sheet is worked from as it stands: a later change says that it is stale. */
export default defineEventHandler(async (event) => {
  const by = callerOf(event);
  const commission = await foundIn(event, commissionFor(by.role));
  const { step } = await readBodyAs(event, madeSchema);
  if (commission.revision === 0) throw problem(422, 'There is no piece yet. Save one first.');
  await makeStep(by, commission, step);
  return { id: commission.id, revision: commission.revision };
});
