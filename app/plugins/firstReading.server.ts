import { answer, type Reading } from '~/core/answer';
import { FIRST_DRAFT } from '~/utils/draft';
import { rawRequestOf } from '~/utils/rawRequest';

declare module '#app' {
  interface NuxtPayload {
    /** The program of the first drawing: a page shows it before it has fetched the code that makes one. */
    firstReading?: Reading;
  }
}

let first: Reading | undefined;

/** The first drawing is the same for everyone, so its program is made once. */
export default defineNuxtPlugin(({ payload, ssrContext }) => {
  if (ssrContext?.error) return;
  if (!first) for (const said of answer(rawRequestOf(FIRST_DRAFT))) if (said.kind === 'made') first = { request: said.request, made: said.made };
  if (first) payload.firstReading = first;
});
