import { callerOf } from '#server/access/person';
import { preparedRailOf } from '#server/access/prepared';
import { keepRailProgram } from '#server/services/railPrograms';
import { programAnswer, withheld } from '#server/utils/answerProgram';
import { makeProgram } from '#shared/makeProgram';

/** Makes and keeps the program of a rail's newest revision: read back, or withheld with what disagrees. */
export default defineEventHandler(async (event) => {
  const { rail, chosen, records, request } = await preparedRailOf(event);
  const made = makeProgram(request);
  if (!made.ok) throw withheld(made);
  return { id: await keepRailProgram(callerOf(event), rail, made, chosen, records), ...programAnswer(made) };
});
