import { findByMark } from '#server/services/programs';
import { chooseType } from '#server/utils/chooseType';
import { problem } from '#server/utils/problem';
import { readMark } from '#shared/program/mark';

/** Every program that bears a mark. */
export default defineEventHandler(async (event) => {
  chooseType(event, ['application/json']);
  const typed = getRouterParam(event, 'mark', { decode: true }) ?? '';
  const mark = readMark(typed);
  if (!mark) throw problem(422, 'A program mark has six letters and digits, such as K74-QDM.', { errors: [{ path: 'mark', message: `"${typed.slice(0, 40)}" is not a program mark.` }] });
  const programs = await findByMark(mark);
  if (programs.length === 0) throw problem(404, `No program bears the mark ${mark}.`);
  return { mark, programs };
});
