import './withoutEval';
import { type MadeProgram, makeProgram } from '#shared/makeProgram';
import { type SlotRequest, slotRequestSchema } from '#shared/slot/request';
import type { Issue } from '../utils/problems';
import type { Raw } from '../utils/rawRequest';

/** A request as the page writes it. */
export type RawRequest = { readonly [key: string]: Raw };

/** A request that was taken, and the program made of it. */
export interface Reading {
  readonly request: SlotRequest;
  readonly made: MadeProgram;
}

/** What the core says about a request, in this order: what is wrong with it, and where nothing is, its program. */
export type Answer =
  | { readonly kind: 'judged'; readonly issues: readonly Issue[] }
  | ({ readonly kind: 'made' } & Reading)
  /** The code could not be fetched. */
  | { readonly kind: 'stopped' };

/** The whole core, from a request to its program: zod, the plan, the reader. A chunk of its own. */
export function* answer(raw: RawRequest): Generator<Answer, void> {
  const parsed = slotRequestSchema.safeParse(raw);
  yield { kind: 'judged', issues: parsed.success ? [] : parsed.error.issues.map(({ path, message }) => ({ path, message })) };
  if (parsed.success) yield { kind: 'made', request: parsed.data, made: makeProgram(parsed.data) };
}
