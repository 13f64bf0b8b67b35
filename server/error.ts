import { send, setResponseHeaders, setResponseStatus } from 'h3';
import { defineNitroErrorHandler } from 'nitropack/runtime';
import { isApi } from './utils/isApi';
import { type ProblemAnswer, problem, titleOf } from './utils/problem';

function isProblem(data: unknown): data is ProblemAnswer {
  return typeof data === 'object' && data !== null && 'problem' in data && 'headers' in data;
}

/** Every error under /api is answered as problem details; what we did not foresee is logged and told to nobody. */
export default defineNitroErrorHandler(async (error, event, { defaultHandler }) => {
  if (!isApi(event.path)) return;
  if (error.unhandled || error.fatal) await defaultHandler(error, event);
  const { problem: body, headers } = answerTo(error);
  setResponseStatus(event, body.status, body.title);
  setResponseHeaders(event, { 'content-type': 'application/problem+json', ...headers });
  await send(event, JSON.stringify(body));
});

function answerTo(error: { readonly data?: unknown; readonly statusCode: number; readonly unhandled: boolean }): ProblemAnswer {
  if (isProblem(error.data)) return error.data;
  const status = error.unhandled ? 500 : error.statusCode;
  const detail = status < 500 ? `${titleOf(status)}.` : 'Something went wrong on our side. It has been logged.';
  const made = problem(status, detail).data;
  return made ?? { problem: { type: 'about:blank', title: titleOf(status), status, detail }, headers: {} };
}
