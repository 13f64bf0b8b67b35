import { LENGTH_HELP, parseLength } from '#shared/measure/length';
import { FIELDS } from '#shared/slot/fields';
import { capital } from './boxes';
import { type Draft, type SizeKey, type TrioKey, SIZE_KEYS, follower, isCoin } from './draft';

/** What the schema's issues have in common with a problem+json answer. */
export interface Issue {
  readonly path: readonly PropertyKey[];
  readonly message: string;
}

/** Sentences by the box they stand beside; the key is the field's dotted path. */
export type Problems = Readonly<Record<string, readonly string[]>>;

export const sizeWords = (key: SizeKey): string => {
  if (isCoin(key)) return key === 'coinDiameter' ? 'coin diameter' : 'coin thickness';
  return key === 'railLength' ? 'rail length' : FIELDS[key].words;
};


/** Beside a box its text is in sight, so the sentence need not quote it. */
const UNREADABLE = `That is not a size we can read. ${LENGTH_HELP}`;

function boxMessage(draft: Draft, key: SizeKey): string | null {
  const { text } = draft.texts[key];
  if (text.trim() !== '' && parseLength(text) === null) return UNREADABLE;
  return null;
}

/**
 * The schema's issues by box. A size that follows is never called missing: the one it follows is what is missing, and
 * the rail length, which the schema does not know, is judged here.
 */
export function problemsOf(draft: Draft, issues: readonly Issue[]): Problems {
  const problems: Record<string, string[]> = {};
  const add = (key: string, message: string) => {
    const list = (problems[key] ??= []);
    if (!list.includes(message)) list.push(message);
  };
  for (const key of SIZE_KEYS) {
    const message = boxMessage(draft, key);
    if (message && key !== follower(draft) && !isCoin(key)) add(key, message);
  }
  const holds = (key: TrioKey) => draft.held.includes(key);
  if (holds('railLength') && draft.texts.railLength.text.trim() === '') add('railLength', `Rail length is missing. ${LENGTH_HELP}`);

  const stuck = draft.held.some((key) => parseLength(draft.texts[key].text) === null);
  for (const { path, message } of issues) {
    const key = path.map(String).join('.');
    if (key === follower(draft) && stuck) continue;
    if (problems[key]?.includes(UNREADABLE)) continue;
    add(key, message);
  }
  return problems;
}

/** A sentence away from its box: the short one gets the box's name before it. */
export function namedProblem(key: string, message: string): string {
  const size = SIZE_KEYS.find((one) => one === key);
  return message === UNREADABLE && size ? `${capital(sizeWords(size))}: ${message}` : capital(message);
}

/** Every sentence once, for the list under the drawing. */
export function allProblems(problems: Problems): readonly { readonly key: string; readonly message: string }[] {
  return Object.entries(problems).flatMap(([key, messages]) => messages.map((message) => ({ key, message: namedProblem(key, message) })));
}
