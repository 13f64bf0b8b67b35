import type { H3Event } from 'h3';
import type { z } from 'zod';
import { type FieldError, problem } from './problem';
import { readText } from './readText';

/** More than anyone puts right at once; a body of unknown keys could name thousands. */
const MOST_ERRORS = 100;

/**
 * The request's JSON body as the schema's output. Everything else about a body is answered here, so that no route can
 * forget it: 415, 413, 400, and 422 with every field that needs changing.
 */
export async function readBodyAs<Schema extends z.ZodType>(event: H3Event, schema: Schema): Promise<z.output<Schema>> {
  expectJson(event);
  const result = schema.safeParse(parseJson(await readText(event)));
  if (result.success) return result.data;
  const errors = result.error.issues.flatMap(fieldErrors);
  const count = errors.length === 1 ? 'One thing needs' : `${errors.length} things need`;
  throw problem(422, `${count} changing.`, { errors: errors.slice(0, MOST_ERRORS) });
}

function expectJson({ node: { req: { headers } } }: H3Event): void {
  const [type = '', ...parameters] = (headers['content-type'] ?? '').toLowerCase().split(';').map((part) => part.trim());
  const charset = parameters.find((parameter) => parameter.startsWith('charset='))?.slice('charset='.length).replaceAll('"', '');
  if (type !== 'application/json' || (charset ?? 'utf-8') !== 'utf-8') {
    throw problem(415, 'Send the body as JSON, with the header "Content-Type: application/json".', { headers: { 'accept-post': 'application/json' } });
  }
  if ((headers['content-encoding'] ?? 'identity') !== 'identity') {
    throw problem(415, 'Send the body uncompressed.', { headers: { 'accept-encoding': 'identity' } });
  }
}

/** JSON.parse and nothing more lenient: a key called __proto__ stays a key, for the schema to refuse. */
function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    const why = error instanceof SyntaxError ? error.message.slice(0, 120) : 'unreadable';
    throw problem(400, `The body is not JSON: ${why}`);
  }
}

/** An unknown key is named by its own path, like any other field. */
export function fieldErrors(issue: z.core.$ZodIssue): FieldError[] {
  const path = issue.path.map(String);
  if (issue.code !== 'unrecognized_keys') return [{ path: path.join('.'), message: issue.message }];
  return issue.keys.map((key) => {
    const name = key.slice(0, 64);
    return { path: [...path, name].join('.'), message: `There is no field called "${name}". Check its spelling.` };
  });
}
