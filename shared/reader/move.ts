import type { Point3 } from '../geometry/point';
import { arcLength, centreArc, radiusArc } from './arc';
import { PLANES } from './planes';
import { readError } from './errors';
import type { Machine } from './machine';
import { DEFAULTS } from './modes';
import type { ArcPath, Motion, ReadError } from './motion';
import { type Letter, type Request, findWord, has, placeOf, shown, valueOf } from './request';
import { placeOfLine } from './scan';

/** Performs one motion (NISTIR 6556 3.5.1 to 3.5.3): item 20 of Table 8. The modes of the line are already in force. */
export function move(machine: Machine, request: Request, code: 0 | 1 | 2 | 3): ReadError | null {
  const { modes, point: from } = machine;
  const incremental = modes.distance === 91;
  const x = coordinate(request, 'X', from.x, incremental);
  const y = coordinate(request, 'Y', from.y, incremental);
  const z = coordinate(request, 'Z', from.z, incremental);
  const to: Point3 = { x, y, z };
  if (incremental && statesUnknown(request, to)) return refuseUnknown(request);
  machine.units ??= modes.units ?? machine.unstatedUnits;
  if (code >= 2) {
    const arc = arcPath(machine, request, to, code === 3 ? 1 : -1);
    if ('code' in arc) return arc;
    push(machine, request, 'arc', to, arc);
  } else push(machine, request, code === 0 ? 'rapid' : 'line', to, null);
  return null;
}

function push(machine: Machine, request: Request, kind: Motion['kind'], to: Point3, arc: ArcPath | null): void {
  const { modes, point: from } = machine;
  let feed = kind === 'rapid' ? null : modes.feed;
  if (feed !== null && modes.feedMode === 93) feed = inverseTimeFeed(machine, to, arc, feed);
  machine.steps.push({ kind, at: placeOfLine(request.line), from, to, arc, feed, modes });
  machine.point = to;
}

/** Inverse time (3.5.19): the motion takes 1/F minutes, so it runs at its length times F. */
function inverseTimeFeed({ point, modes }: Machine, to: Point3, arc: ArcPath | null, perMinute: number): number | null {
  const { normal } = PLANES[modes.plane ?? DEFAULTS.plane];
  const length = arc === null ? Math.hypot(to.x - point.x, to.y - point.y, to.z - point.z) : arcLength(arc, to[normal] - point[normal]);
  return Number.isNaN(length) ? null : length * perMinute;
}

/** Where an axis ends: its word, an increment under G91 (3.5.17), and its current value where it has none (3.5). */
function coordinate(request: Request, letter: 'X' | 'Y' | 'Z', current: number, incremental: boolean): number {
  if (!has(request, letter)) return current;
  return incremental ? current + valueOf(request, letter) : valueOf(request, letter);
}

/** An axis word whose end is NaN: an increment from nowhere. */
function statesUnknown(request: Request, { x, y, z }: Point3): boolean {
  return (has(request, 'X') && Number.isNaN(x)) || (has(request, 'Y') && Number.isNaN(y)) || (has(request, 'Z') && Number.isNaN(z));
}

/** An arc by either format; an error object tells itself by its `code`. */
function arcPath(machine: Machine, request: Request, to: Point3, turn: 1 | -1): ArcPath | ReadError {
  const { modes, point: from } = machine;
  const plane = PLANES[modes.plane ?? DEFAULTS.plane];
  const [firstOffset, secondOffset] = plane.offsets;
  const radius = has(request, 'R');
  const centre = has(request, firstOffset) || has(request, secondOffset);
  const at = placeOfLine(request.line);
  if (!has(request, axisLetter(plane.first)) && !has(request, axisLetter(plane.second))) return readError('arcEndMissing', at);
  if (radius && centre) return readError('arcFormats', at);
  if (!radius && !centre) return readError('arcCentreMissing', at);
  const unknown = Number.isNaN(from[plane.first]) || Number.isNaN(from[plane.second]);
  const unknownRise = has(request, axisLetter(plane.normal)) && Number.isNaN(from[plane.normal]);
  if (unknown || unknownRise) return refuseUnknown(request);
  const units = machine.units ?? machine.unstatedUnits;
  const arc = radius
    ? radiusArc(plane, from, to, valueOf(request, 'R'), turn, units)
    : centreArc(plane, from, to, offset(request, firstOffset), offset(request, secondOffset), turn, units);
  return typeof arc === 'string' ? readError(arc, at) : arc;
}

/** I, J and K are increments from the start under G90 and G91 alike (3.5.17); one left out is zero. */
const offset = (request: Request, letter: Letter): number => (has(request, letter) ? valueOf(request, letter) : 0);

const AXIS_LETTERS = { x: 'X', y: 'Y', z: 'Z' } as const;
const axisLetter = (axis: keyof Point3) => AXIS_LETTERS[axis];

/** Says which word starts from nowhere: the first axis word. */
function refuseUnknown(request: Request): ReadError {
  const word = findWord(request, ({ letter }) => letter === 'X' || letter === 'Y' || letter === 'Z');
  return readError('unknownStart', placeOf(request, word), word === null ? '' : shown(word));
}
