import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { findCommission, newestWork } from '#server/services/commissions';
import { saveWork } from '#server/services/pieceRevisions';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';
import { workRevisionSchema } from '#shared/commission/work';

/** Saves the work's next revision; one drawn from an older revision than the newest is refused, and nothing is lost. */
export default defineEventHandler(async (event) => {
  const commission = await foundIn(event, findCommission);
  const by = callerOf(event);
  const revision = await saveWork(by, commission, await readBodyAs(event, workRevisionSchema));
  if (revision === null) throw problem(409, 'Somebody saved this piece since you opened it. Load theirs, or save yours on top of it.', { newest: (await newestWork(by.shopId, commission.id))?.number ?? 0 });
  return { id: commission.id, revision };
});
