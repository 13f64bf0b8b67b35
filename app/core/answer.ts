import './withoutEval';
import { type MadeProgram, makeProgram } from '#shared/makeProgram';
import type { Segments } from '#shared/playback/index';
import { type SlotRequest, slotRequestSchema } from '#shared/slot/request';
import { segmentsOf } from '../playback/workOut';
import { cutPath } from '../utils/planPath';
import type { Issue } from '../utils/problems';
import type { Raw } from '../utils/rawRequest';

/** A request as the page writes it. */
export type RawRequest = { readonly [key: string]: Raw };

/** The bit's way as it is drawn: worked out by the core, since a long program would hold the page up. */
export interface Ways {
  /** In playback. */
  readonly segments: Segments;
  /** On the plan. */
  readonly plan: string;
}

/** A request that was taken, and the program made of it. */
export interface Reading {
  readonly request: SlotRequest;
  readonly made: MadeProgram;
  /** What is drawn of it; left out of what comes with the page, where it is quickly worked out. */
  readonly ways?: Ways;
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
  if (!parsed.success) return;
  const made = makeProgram(parsed.data);
  yield { kind: 'made', request: parsed.data, made, ways: { segments: segmentsOf(made.timeline, made.spec), plan: cutPath(made.steps, made.spec) } };
}
