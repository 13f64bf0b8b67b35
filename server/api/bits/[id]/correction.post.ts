import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { acceptCorrection, acceptSchema, correctionOf } from '#server/services/bitCorrections';
import { problem } from '#server/utils/problem';
import { readBodyAs } from '#server/utils/readBodyAs';

/** Takes what the named measurements say of a bit for its diameter; 422 where they say too little, 409 where one is gone. */
export default defineEventHandler(async (event) => {
  const kept = await foundIn(event, correctionOf);
  const { measurements } = await readBodyAs(event, acceptSchema);
  const found = await acceptCorrection(callerOf(event), kept, measurements);
  if (!found) throw problem(409, 'The measurements have changed since you looked. Look again.');
  if (found.result !== 'offer') throw problem(422, found.sentence);
  return { id: kept.bit.id, diameter: found.diameter };
});
