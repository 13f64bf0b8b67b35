import { programAnswer, programFile, withheld } from '#server/utils/answerProgram';
import { chooseType } from '#server/utils/chooseType';
import { limitRate } from '#server/utils/limitRate';
import { readBodyAs } from '#server/utils/readBodyAs';
import { keepProgram } from '#server/services/programs';
import { makeProgram } from '#shared/makeProgram';
import { slotRequestSchema } from '#shared/slot/request';

/** A slot spec in, a program that has been read back out. */
export default defineEventHandler(async (event) => {
  await limitRate(event, 'programs');
  const type = chooseType(event, ['application/json', 'text/plain']);
  const request = await readBodyAs(event, slotRequestSchema);
  const made = makeProgram(request);
  if (!made.ok) throw withheld(made);
  await keepProgram(made);
  return type === 'text/plain' ? programFile(event, made) : programAnswer(made);
});
