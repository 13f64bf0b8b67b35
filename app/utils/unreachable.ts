import { FetchError } from 'ofetch';

/** Whether a call failed because the server could not be reached, and not by its answer. */
export const isUnreachable = (error: unknown): boolean => error instanceof FetchError && error.status === undefined;
