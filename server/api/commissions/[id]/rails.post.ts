import { z } from 'zod';
import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { findCommission } from '#server/services/commissions';
import { makeRails } from '#server/services/pieceRails';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';
import { today } from '#server/utils/today';

/** Makes or revises the shop's rails from the piece's newest revision, all or none. */
export default defineEventHandler(async (event) => {
  const commission = await foundIn(event, findCommission);
  const { revision } = await readBodyAs(event, z.strictObject({ revision: z.number({ error: 'Give the number of the revision to make them from.' }).int().min(1, { error: 'Save the piece first.' }) }));
  const count = await makeRails(callerOf(event), commission, revision, today());
  if (!count) throw problem(409, 'Somebody saved this piece since you opened it. Load it, then make the rails.');
  return { id: commission.id, ...count };
});
