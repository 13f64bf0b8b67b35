import type { FetchError } from 'ofetch';

/** What an own page shows, or the error page: nothing by that id, or a server that did not answer. */
export function foundOr404<Answer>(answer: Answer | null | undefined, error: Pick<FetchError, 'status'> | null | undefined): Answer {
  if (answer !== null && answer !== undefined) return answer;
  throw createError({ status: error?.status ?? 500, fatal: true });
}
