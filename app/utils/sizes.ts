import { type WrittenLength, lengthIn, parseLength } from '#shared/measure/length';
import { type Units, convertLength } from '#shared/measure/units';
import { type Draft, type SizeKey, type TextKey, type Typed, SIZE_KEYS, follower, isRate, isSize, unitsOf } from './draft';

/** A typed size as written: the unit beside it, or else the drawing's at the time of typing. Null where it cannot be read. */
export function readSize(typed: Typed): WrittenLength | null {
  const written = parseLength(typed.text);
  return written && { value: written.value, units: written.units ?? typed.units };
}

/** Sums of decimals miss by a few units in the last binary place; a billionth is below anything that is cut. */
const tidy = (value: number) => Number(value.toFixed(9));

export type Sizes = Readonly<Record<SizeKey, number | null>>;

/** Every size in the drawing's units; null where nothing is typed or it cannot be read. The follower is worked out. */
export function sizesOf(draft: Draft): Sizes {
  const units = unitsOf(draft);
  const read = (key: SizeKey) => {
    const written = readSize(draft.texts[key]);
    return written && lengthIn(units, written);
  };
  const sizes = Object.fromEntries(SIZE_KEYS.map((key) => [key, read(key)])) as Record<SizeKey, number | null>;
  const { railLength, length, stopMargin } = sizes;
  const from = (a: number | null, b: number | null, sum: (a: number, b: number) => number) =>
    a === null || b === null ? null : tidy(sum(a, b));
  const key = follower(draft);
  if (key === 'railLength') sizes.railLength = from(length, stopMargin, (slot, margin) => slot + 2 * margin);
  if (key === 'length') sizes.length = from(railLength, stopMargin, (rail, margin) => rail - 2 * margin);
  if (key === 'stopMargin') sizes.stopMargin = from(railLength, length, (rail, slot) => (rail - slot) / 2);
  return sizes;
}

/** A plain number as typed, or NaN. A comma or blank inside a number is not guessed at. */
export function readNumber(text: string): number {
  return /^(?:\d+\.?\d*|\.\d+)$/.test(text.trim()) ? Number(text) : NaN;
}

/** A typed number in the drawing's units: rates follow the units, counts do not. */
export function numberIn(units: Units, key: TextKey, typed: Typed): number {
  const value = readNumber(typed.text);
  return isRate(key) ? tidy(convertLength(value, typed.units, units)) : value;
}

/** What stands in the box while it is edited: the text as typed, with its unit once the drawing's is another. */
export function editText(typed: Typed, key: TextKey, units: Units): string {
  if (typed.text.trim() === '' || typed.units === units) return typed.text;
  if (isRate(key)) {
    const value = numberIn(units, key, typed);
    return Number.isNaN(value) ? typed.text : String(Number(value.toFixed(4)));
  }
  if (!isSize(key)) return typed.text;
  const written = parseLength(typed.text);
  return written && written.units === null ? `${typed.text.trim()} ${typed.units}` : typed.text;
}
