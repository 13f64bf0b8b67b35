import { lengthIn, LENGTH_HELP, parseLength } from '#shared/measure/length';
import { type FirstOffReading, type ThreePlaces, firstOffSchema, firstOffVerdict } from '#shared/shop/firstOff';
import type { SlotSpec } from '#shared/slot/spec';

type Texts = readonly [string, string, string];

/** One size as keyed in at three places: nothing yet, something to put right, or three figures with their verdict. */
export type Measured =
  | { readonly state: 'empty' }
  | { readonly state: 'open'; readonly words: string; readonly wrong: readonly number[] }
  | { readonly state: 'read'; readonly values: ThreePlaces; readonly reading: FirstOffReading };

/** Reads what was keyed in of the width or the depth, and judges it against the drawing. */
export function measuredOf(spec: Pick<SlotSpec, 'units' | 'width' | 'depth'>, what: 'width' | 'depth', texts: Texts): Measured {
  const filled = texts.filter((text) => text.trim() !== '').length;
  if (filled === 0) return { state: 'empty' };
  const values = texts.map((text) => {
    const written = parseLength(text.replace(',', '.')); // a decimal keypad may have only a comma
    return written ? lengthIn(spec.units, written) : null;
  });
  const unread = texts.flatMap((text, i) => (text.trim() !== '' && values[i] === null ? [i] : []));
  if (unread.length > 0) return { state: 'open', words: `That is not a size we can read. ${LENGTH_HELP}`, wrong: unread };
  if (filled < 3) return { state: 'open', words: `${3 - filled === 1 ? 'One place is' : 'Two places are'} still to measure.`, wrong: [] };
  const [left = 0, middle = 0, right = 0] = values.map((value) => value ?? 0);
  const three: ThreePlaces = [left, middle, right];
  const drawn = { widths: [spec.width, spec.width, spec.width], depths: [spec.depth, spec.depth, spec.depth] };
  const judged = firstOffSchema.safeParse({ units: spec.units, ...drawn, [what === 'width' ? 'widths' : 'depths']: three });
  if (!judged.success) {
    const wrong = judged.error.issues.map(({ path }) => Number(path[1]));
    return { state: 'open', words: judged.error.issues[0]?.message ?? LENGTH_HELP, wrong };
  }
  const { widths, depths } = judged.data;
  return { state: 'read', values: what === 'width' ? widths : depths, reading: firstOffVerdict(spec, widths, depths)[what] };
}
