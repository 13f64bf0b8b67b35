import { FIELDS } from '#shared/slot/fields';

/** Where each field's default comes from; null where it has none. */
export const FIELD_FACTS: Readonly<Record<string, string | null>> = Object.fromEntries(
  Object.entries(FIELDS).map(([field, { defaultSource }]) => [field, defaultSource]),
);

export const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);

/** Enter goes on to the next box in reading order, as on a form; after the last it stays. */
export function nextBox(from: HTMLInputElement | null): void {
  if (!from) return;
  const boxes = [...document.querySelectorAll<HTMLInputElement>('[data-size] input')].filter((box) => box.offsetParent !== null);
  boxes[boxes.indexOf(from) + 1]?.focus();
}
