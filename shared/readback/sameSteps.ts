import type { Step } from '../reader/motion';
import type { Readback } from './finding';

/**
 * Whether two readings do exactly the same, and how many lines further down the second does it.
 *
 * @returns the lines between them, the same for every step; null where any step differs in anything but its place.
 */
export function linesBetween(first: readonly Step[], second: readonly Step[]): number | null {
  const lines = (second[0]?.at.line ?? 0) - (first[0]?.at.line ?? 0);
  const same = first.length === second.length && first.every((step, i) => {
    const other = second[i];
    return other !== undefined && other.at.line - step.at.line === lines && sameStep(step, other);
  });
  return same ? lines : null;
}

function sameStep(a: Step, b: Step): boolean {
  if (a.kind !== b.kind || !sameData(a.modes, b.modes)) return false;
  if (!('to' in a) || !('to' in b)) return sameData({ ...a, at: null, modes: null }, { ...b, at: null, modes: null });
  return a.feed === b.feed && sameData(a.from, b.from) && sameData(a.to, b.to) && sameData(a.arc, b.arc);
}

/** Plain data, compared all the way down; NaN is NaN. */
function sameData(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  const [left, right] = [Object.entries(a), Object.entries(b)];
  return left.length === right.length && left.every(([key, value], i) => right[i]?.[0] === key && sameData(value, right[i]?.[1]));
}

/** A readback with its findings some lines further down; what is said of the whole program stays at its first line. */
export function movedDown(readback: Readback, lines: number): Readback {
  return {
    ...readback,
    findings: readback.findings.map((finding) => (finding.at.line === 1 ? finding : { ...finding, at: { ...finding.at, line: finding.at.line + lines } })),
  };
}
