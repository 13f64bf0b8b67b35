import { STATUS_CODES } from 'node:http';
import { createError, type H3Error } from 'h3';

/** One thing wrong with a request; `path` is dotted, and empty where the whole body is meant. */
export interface FieldError {
  readonly path: string;
  readonly message: string;
}

/** Problem details (RFC 9457); of type about:blank, so that the title is the status in words (4.2.1). */
export interface Problem {
  readonly type: 'about:blank';
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly errors?: readonly FieldError[];
  /** Extension members (RFC 9457, 3.2). */
  readonly [extension: string]: unknown;
}

/** What travels in an error's `data` to the error handler: the body, and headers that belong to the status. */
export interface ProblemAnswer {
  readonly problem: Problem;
  readonly headers: Readonly<Record<string, string>>;
}

/** Names that RFC 9110 has changed since Node.js took them. */
const TITLES: Readonly<Record<number, string>> = { 413: 'Content Too Large', 422: 'Unprocessable Content' };

/** The status in words. */
export function titleOf(status: number): string {
  return TITLES[status] ?? STATUS_CODES[status] ?? 'Error';
}

/** An error to throw from any route under /api; server/error.ts answers it as application/problem+json. */
export function problem(
  status: number,
  detail: string,
  { headers = {}, ...extensions }: { readonly headers?: Readonly<Record<string, string>>; readonly [extension: string]: unknown } = {},
): H3Error<ProblemAnswer> {
  const title = titleOf(status);
  const body: Problem = { type: 'about:blank', title, status, detail, ...extensions };
  return createError<ProblemAnswer>({ status, statusText: title, message: detail, data: { problem: body, headers } });
}
