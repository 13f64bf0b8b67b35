import type { MadeProgram } from '#shared/makeProgram';
import type { Step } from '#shared/reader/motion';
import type { SlotRequest } from '#shared/slot/request';
import type { Timeline } from '#shared/time/index';
import type { Issue } from '../utils/problems';
import type { RawRequest, Reading, Ways } from './answer';

/** To the worker. */
export interface Order {
  readonly number: number;
  readonly raw: RawRequest;
}

type WithoutSteps<Made> = Made extends MadeProgram ? Omit<Made, 'steps' | 'timeline'> : never;

/** From the worker: a program's steps come in parcels, so that taking one in never holds the page up. */
export type Parcel = { readonly number: number } & (
  | { readonly kind: 'judged'; readonly issues: readonly Issue[] }
  | { readonly kind: 'steps'; readonly steps: readonly Step[] }
  | { readonly kind: 'made'; readonly request: SlotRequest; readonly made: WithoutSteps<MadeProgram>; readonly times: Omit<Timeline, 'steps'>; readonly ways?: Ways }
);

/** Steps to a parcel: about 5 ms of a page's time. */
const STEPS = 2000;

/** Sends a reading off; the arrays of its timeline and path are handed over, not copied. */
export function sendReading(number: number, { request, made, ways }: Reading, post: (parcel: Parcel, handed: Transferable[]) => void): void {
  const { steps, timeline: { steps: _same, ...times }, ...rest } = made;
  for (let at = 0; at < steps.length; at += STEPS) post({ number, kind: 'steps', steps: steps.slice(at, at + STEPS) }, []);
  const handed = [...Object.values(times), ...Object.values(ways?.segments ?? {})].flatMap((value) => (ArrayBuffer.isView(value) && value.buffer instanceof ArrayBuffer ? [value.buffer] : []));
  post({ number, kind: 'made', request, made: rest, times, ...(ways ? { ways } : {}) }, handed);
}

/** Puts it together again. */
export function readingOf({ request, made, times, ways }: Extract<Parcel, { readonly kind: 'made' }>, steps: readonly Step[]): Reading {
  return { request, made: { ...made, steps, timeline: { ...times, steps } }, ...(ways ? { ways } : {}) };
}
