import { type Draft, type PickKey, type TextKey, type Typed, RATE_KEYS, COUNT_KEYS, SIZE_KEYS, TRIO, WORD_KEYS, follower, isCoin, unitsOf } from './draft';
import { editText, numberIn, sizesOf } from './sizes';

/** JSON as it is posted and hashed; the schema judges it, so that nothing is judged twice. */
export type Raw = string | number | boolean | null | Raw[] | { [key: string]: Raw };

const YES_NO: ReadonlySet<string> = new Set<PickKey>([
  'centreCutting', 'machine.heavy', 'options.lineNumbers', 'options.percent', 'options.comments', 'options.speedWord',
]);

/** Puts a value at a dotted path: `machine.travel.x`; a number in the path makes a list. */
function put(into: { [key: string]: Raw }, path: string, value: Raw): void {
  const [first = '', ...rest] = path.split('.');
  if (rest.length === 0) {
    into[first] = value;
    return;
  }
  const below = into[first];
  const branch: { [key: string]: Raw } = below !== null && typeof below === 'object' && !Array.isArray(below) ? below : {};
  put(branch, rest.join('.'), value);
  into[first] = branch;
}

/** `{ 0: low, 1: high }` becomes a list; one left open stays null, which the schema names. */
function pair(value: Raw | undefined): Raw | undefined {
  if (value === null || typeof value !== 'object' || Array.isArray(value)) return value;
  return [value['0'] ?? null, value['1'] ?? null];
}

/** The request a draft stands for: sizes as typed, with their unit where the drawing's is another by now. */
export function rawRequestOf(draft: Draft): { [key: string]: Raw } {
  const units = unitsOf(draft);
  const sizes = sizesOf(draft);
  const raw: { [key: string]: Raw } = { units };
  const each = <Key extends TextKey>(keys: readonly Key[], write: (key: Key, typed: Typed) => Raw | undefined) => {
    for (const key of keys) {
      const typed = draft.texts[key];
      if (typed.text.trim() === '') continue;
      const value = write(key, typed);
      if (value !== undefined) put(raw, key, value);
    }
  };
  const trio: ReadonlySet<string> = new Set(TRIO);
  each(SIZE_KEYS.filter((key) => !trio.has(key) && !isCoin(key)), (key, typed) => editText(typed, key, units).trim());
  each([...RATE_KEYS, ...COUNT_KEYS], (key, typed) => {
    const value = numberIn(units, key, typed);
    return Number.isNaN(value) ? typed.text.trim() : value;
  });
  each(WORD_KEYS, (key, typed) => typed.text.trim());

  for (const key of ['length', 'stopMargin'] as const) {
    const value = sizes[key];
    if (follower(draft) === key) {
      if (value !== null) raw[key] = value;
    } else if (draft.texts[key].text.trim() !== '') raw[key] = editText(draft.texts[key], key, units).trim();
  }
  for (const [key, value] of Object.entries(draft.picks)) {
    if (value === '' || key === 'coinBoard') continue;
    put(raw, key, YES_NO.has(key) ? value === 'true' : value);
  }
  const chipLoad = pair(raw.chipLoadRange);
  if (chipLoad !== undefined) raw.chipLoadRange = chipLoad;
  const { machine } = raw;
  if (machine !== null && typeof machine === 'object' && !Array.isArray(machine)) {
    const range = pair(machine.spindleRange);
    if (range !== undefined) machine.spindleRange = range;
  }
  return raw;
}
