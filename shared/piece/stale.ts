import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';

/** The steps of a commission, each before those that follow from it. */
export const STEPS = ['coins', 'fit', 'piece', 'rails', 'programs', 'cutList', 'assembly', 'quote'] as const;
export type Step = (typeof STEPS)[number];

/** What each step is worked out from, besides its own inputs. A step stands after all that it follows from. */
export const FOLLOWS_FROM: Readonly<Record<Step, readonly Step[]>> = {
  coins: [],
  fit: ['coins'],
  piece: ['fit'],
  rails: ['piece'],
  programs: ['rails'],
  cutList: ['rails'],
  assembly: ['rails', 'cutList'],
  quote: ['programs', 'cutList', 'assembly'],
};

/** What a step's inputs may be: data that JSON can write. */
export type Data = null | boolean | number | string | readonly Data[] | { readonly [key: string]: Data | undefined };

/** A text that is the same for the same data, whatever order an object's keys were set in. Keys that hold nothing are not there. */
export function canonical(data: Data): string {
  if (data === null || typeof data !== 'object') return typeof data === 'number' && !Number.isFinite(data) ? `"${data}"` : JSON.stringify(data);
  if (isList(data)) return `[${data.map(canonical).join()}]`;
  const entries = Object.entries(data).flatMap(([key, value]) => (value === undefined ? [] : [`${JSON.stringify(key)}:${canonical(value)}`]));
  return `{${entries.sort().join()}}`;
}

const isList = (data: Data): data is readonly Data[] => Array.isArray(data);

export type Inputs = Readonly<Record<Step, Data>>;
export type Hashes = Readonly<Record<Step, string>>;

const hash = (text: string) => bytesToHex(sha256(utf8ToBytes(text)));

/** Each step's hash (SHA-256): of its own inputs and of the hashes of the steps it follows from. */
export function hashesOf(inputs: Inputs): Hashes {
  const hashes: Record<Step, string> = { coins: '', fit: '', piece: '', rails: '', programs: '', cutList: '', assembly: '', quote: '' };
  for (const step of STEPS) hashes[step] = hash(canonical([inputs[step], FOLLOWS_FROM[step].map((before) => hashes[before])]));
  return hashes;
}

/** A step made from inputs that are no longer these, and why. */
export interface Stale {
  readonly step: Step;
  /** Steps whose own inputs changed and that this one follows from, itself among them where its own changed. */
  readonly because: readonly Step[];
}

/** Everything that a step follows from, itself among it. */
function roots(step: Step): ReadonlySet<Step> {
  return new Set([step, ...FOLLOWS_FROM[step].flatMap((before) => [...roots(before)])]);
}

/**
 * What of a commission is stale: steps that were made (their hash was kept) and whose inputs, or those of a step they
 * follow from, are no longer what they were made from. A step never made is not stale.
 *
 * @param made the inputs that each step was last made from, as a whole, so that the change can be named.
 */
export function staleSteps(made: Readonly<Partial<Record<Step, Inputs>>>, now: Inputs): Stale[] {
  const hashes = hashesOf(now);
  return STEPS.flatMap((step) => {
    const from = made[step];
    if (!from || hashesOf(from)[step] === hashes[step]) return [];
    return [{ step, because: STEPS.filter((each) => roots(step).has(each) && canonical(from[each]) !== canonical(now[each])) }];
  });
}
