import { $fetch } from 'ofetch';

/** Asks the API from the browser: what it answers is said here, since the types of every route at once are too many to work out. */
export const call = <Answer = unknown>(path: string, options: { readonly method?: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'; readonly body?: object } = {}): Promise<Answer> =>
  $fetch<Answer>(path, options);
