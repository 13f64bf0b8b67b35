import type { Step } from '#shared/reader/motion';
import type { SlotSpec } from '#shared/slot/spec';
import { railLength } from '#shared/slot/spec';

/** More lines than this add nothing to a drawing this size and slow it down. */
const MOST = 4000;

/**
 * The bit's way seen from above, read from the program's motions, from the rail's front left corner, Y up: cutting
 * moves only. `steps` are in the spec's units, as `makeProgram` gives them.
 */
export function cutPath(steps: readonly Step[], spec: SlotSpec): string {
  const centred = spec.workZero === 'centre';
  const [x0, y0] = centred ? [railLength(spec) / 2, spec.railWidth / 2] : [0, 0];
  const seen = new Set<string>();
  const parts: string[] = [];
  let last = '';
  for (const step of steps) {
    if (parts.length >= MOST) break;
    if (!('from' in step) || step.kind === 'rapid') continue;
    const point = (at: { readonly x: number; readonly y: number }) => `${(at.x + x0).toFixed(4)} ${(at.y + y0).toFixed(4)}`;
    const [from, to] = [point(step.from), point(step.to)];
    if (from === to || from.includes('NaN')) continue;
    // Each pass runs over the last one: a line once drawn, in either direction, is not drawn again.
    const key = from < to ? `${from}|${to}` : `${to}|${from}`;
    if (seen.has(key)) continue;
    seen.add(key);
    const radius = step.arc ? step.arc.radius.toFixed(4) : '';
    const drawn = step.arc ? `A${radius} ${radius} 0 ${step.arc.sweep > Math.PI ? 1 : 0} ${step.arc.turn === 1 ? 1 : 0} ${to}` : `L${to}`;
    parts.push(from === last ? drawn : `M${from}${drawn}`);
    last = to;
  }
  return parts.join('');
}
