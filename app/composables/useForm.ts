import { FetchError } from 'ofetch';
import type { z } from 'zod';

/** Problem details as the API answers them. */
interface Problem {
  readonly detail?: string;
  readonly errors?: readonly { readonly path: string; readonly message: string }[];
}

const isProblem = (data: unknown): data is Problem => typeof data === 'object' && data !== null && 'status' in data;

/** What went wrong in one sentence: the API's own, or that it could not be reached. */
export function problemOf(error: unknown): Problem {
  if (error instanceof FetchError) {
    if (isProblem(error.data)) return error.data;
    return { detail: error.status ? `The server said ${error.status}. Try again.` : 'The server cannot be reached. What you typed is still here: try again.' };
  }
  throw error;
}

/**
 * A form judged by the request's own schema before it is sent, and by the server after. What is wrong stands by its
 * field; what was typed stays.
 *
 * @param values what the fields hold; a path such as `travel.x` names one inside.
 * @param send gives the judged values away, and what to do once that went well.
 */
export function useForm<Schema extends z.ZodType>(schema: Schema, values: () => unknown, send: (request: z.output<Schema>) => Promise<void>) {
  const problems = ref<Readonly<Record<string, string>>>({});
  const failure = ref('');
  const busy = ref(false);

  function show(errors: readonly { readonly path: string; readonly message: string }[], detail: string): void {
    problems.value = Object.fromEntries(errors.map(({ path, message }) => [path, message]).reverse());
    failure.value = detail;
    void nextTick(() => document.querySelector<HTMLElement>('form [aria-invalid="true"]')?.focus());
  }
  async function submit(): Promise<void> {
    if (busy.value) return;
    const judged = schema.safeParse(values());
    if (!judged.success) {
      const errors = judged.error.issues.map(({ path, message }) => ({ path: path.join('.'), message }));
      show(errors, errors.length === 1 ? 'One thing needs changing.' : `${errors.length} things need changing.`);
      return;
    }
    show([], '');
    busy.value = true;
    try {
      await send(judged.data);
    } catch (error) {
      const { errors = [], detail = '' } = problemOf(error);
      show(errors, detail);
    } finally {
      busy.value = false;
    }
  }
  return { problems, failure, busy, submit };
}
