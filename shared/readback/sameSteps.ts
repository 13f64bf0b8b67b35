import type { Point3 } from '../geometry/point';
import type { Step } from '../reader/motion';
import type { Readback } from './finding';

/**
 * Whether two readings do exactly the same, and how many lines further down the second does it.
 *
 * @returns the lines between them, the same for every step; null where any step differs in anything but its place.
 */
export function linesBetween(first: readonly Step[], second: readonly Step[]): number | null {
  const lines = (second[0]?.at.line ?? 0) - (first[0]?.at.line ?? 0);
  let modes: readonly [Step['modes'], Step['modes']] | null = null; // a pair found equal: steps share them until a block changes them
  const same = first.length === second.length && first.every((step, i) => {
    const other = second[i];
    if (other === undefined || other.at.line - step.at.line !== lines) return false;
    if (modes?.[0] !== step.modes || modes[1] !== other.modes) {
      if (!sameData(step.modes, other.modes)) return false;
      modes = [step.modes, other.modes];
    }
    return sameAct(step, other);
  });
  return same ? lines : null;
}

/** Two steps but for their places and modes. */
function sameAct(a: Step, b: Step): boolean {
  if ('to' in a && 'to' in b) {
    return a.kind === b.kind && a.feed === b.feed && samePoint(a.from, b.from) && samePoint(a.to, b.to) && (a.arc === b.arc || sameData(a.arc, b.arc));
  }
  return sameData({ ...a, at: null, modes: null }, { ...b, at: null, modes: null });
}

function samePoint(a: Point3, b: Point3): boolean {
  return Object.is(a.x, b.x) && Object.is(a.y, b.y) && Object.is(a.z, b.z);
}

const isData = (value: unknown): value is Readonly<Record<string, unknown>> => typeof value === 'object' && value !== null;

/** Plain data, compared all the way down; NaN is NaN. */
function sameData(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (!isData(a) || !isData(b)) return false;
  const keys = Object.keys(a);
  return keys.length === Object.keys(b).length && keys.every((key) => key in b && sameData(a[key], b[key]));
}

/** A readback with its findings some lines further down; what is said of the whole program stays at its first line. */
export function movedDown(readback: Readback, lines: number): Readback {
  return {
    ...readback,
    findings: readback.findings.map((finding) => (finding.at.line === 1 ? finding : { ...finding, at: { ...finding.at, line: finding.at.line + lines } })),
  };
}
