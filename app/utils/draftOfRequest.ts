import type { SlotRequestInput } from '#shared/slot/request';
import { type Draft, type PickKey, type TextKey, type Typed, PICK_KEYS, TEXT_KEYS, draftOf } from './draft';

/** What stands at a dotted path of a request: `machine.travel.x`, `chipLoadRange.0`. */
function at(value: unknown, path: string): unknown {
  return path.split('.').reduce<unknown>((inside, key) => (typeof inside === 'object' && inside !== null ? Object.entries(inside).find(([name]) => name === key)?.[1] : undefined), value);
}

/** The drawing of a request that no page has typed, such as one that came with a piece: every figure as it was given. */
export function draftOfRequest(request: SlotRequestInput): Draft {
  const { units } = request;
  const texts: { [Key in TextKey]?: Typed } = {};
  for (const key of TEXT_KEYS) {
    const value = at(request, key);
    if (typeof value === 'string' || typeof value === 'number') texts[key] = { text: String(value), units };
  }
  const picks: { [Key in PickKey]?: string } = {};
  for (const key of PICK_KEYS) {
    const value = at(request, key);
    if (typeof value === 'string' || typeof value === 'boolean') picks[key] = String(value);
  }
  return draftOf(texts, picks, units === 'mm' ? 'mm' : 'fractions', ['length', 'stopMargin']);
}
