import { foundIn } from '#server/access/found';
import { findRailProgram } from '#server/services/railPrograms';
import { programFile } from '#server/utils/answerProgram';

/** A kept program as a file: the bytes that were read back when it was made. */
export default defineEventHandler(async (event) => {
  const { mark, fileName, text } = await foundIn(event, findRailProgram);
  return programFile(event, { mark, fileName, program: text });
});
