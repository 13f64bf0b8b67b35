import { FIELDS } from '#shared/slot/fields';

/** One thing that two drawings have differently, in words. */
export interface Difference {
  readonly field: string;
  readonly words: string;
  readonly before: string;
  readonly after: string;
}

/** What differs between two requests, in the order of a drawing; what only one of them states is empty in the other. */
export function differences(before: object, after: object): Difference[] {
  const [old, now] = [flatten(before), flatten(after)];
  const order = Object.keys(FIELDS);
  const place = (field: string) => {
    const i = order.indexOf(field.split('.')[0] ?? '');
    return i < 0 ? order.length : i;
  };
  return [...new Set([...old.keys(), ...now.keys()])]
    .filter((field) => old.get(field) !== now.get(field))
    .sort((a, b) => place(a) - place(b) || a.localeCompare(b))
    .map((field) => ({ field, words: wordsOf(field), before: old.get(field) ?? '', after: now.get(field) ?? '' }));
}

function flatten(value: object, prefix = ''): Map<string, string> {
  const flat = new Map<string, string>();
  for (const [key, inside] of Object.entries(value)) {
    const name = prefix ? `${prefix}.${key}` : key;
    if (typeof inside === 'object' && inside !== null) for (const [path, text] of flatten(inside, name)) flat.set(path, text);
    else if (inside !== undefined && inside !== null) flat.set(name, String(inside));
  }
  return flat;
}

function wordsOf(field: string): string {
  const [first = '', ...rest] = field.split('.');
  const facts = Object.entries(FIELDS).find(([name]) => name === first)?.[1];
  return [facts?.words ?? first, ...rest].join(', ');
}
