import { callerOf } from '#server/access/person';
import { logCut } from '#server/services/cuts';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';
import { cutSchema } from '#shared/shop/cut';

/** Logs a cut from the bench. Sent again, it is answered again and logged once. */
export default defineEventHandler(async (event) => {
  const cut = await readBodyAs(event, cutSchema);
  const outcome = await logCut(callerOf(event), cut);
  if (outcome === 'unknown') throw problem(422, 'One thing needs changing.', { errors: [{ path: 'programId', message: 'The shop has no such program.' }] });
  if (outcome === 'taken') throw problem(409, 'That id belongs to another cut.');
  return { id: cut.id };
});
