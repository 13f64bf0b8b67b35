import { type H3Event, getQuery } from 'h3';
import type { z } from 'zod';
import { problem } from './problem';
import { fieldErrors } from './readBodyAs';

/** What stands behind the question mark of the address, as the schema's output; else 422 with every field to change. */
export function readQueryAs<Schema extends z.ZodType>(event: H3Event, schema: Schema): z.output<Schema> {
  const result = schema.safeParse({ ...getQuery<Record<string, unknown>>(event) });
  if (result.success) return result.data;
  throw problem(422, 'The address asks for something that this list does not have.', { errors: result.error.issues.flatMap(fieldErrors) });
}
