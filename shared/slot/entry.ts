import { assert } from '../assert';
import type { Point2 } from '../geometry/point';
import { type Lap, pointAlong, slopeLength } from './lap';
import type { Layout } from './layout';
import type { CutMove, MoveRole } from './path';

/** Emits one cutting move: where to, how many steps of the grid deep, what for. */
export type Go = (to: Point2, steps: number, role: MoveRole, arc?: CutMove['arc']) => void;

/** The opening of each pass: how the bit gets from one depth to the next and cuts the first line or lap there. */
export interface Opening {
  /** Where the bit comes down. */
  readonly start: Point2;
  /** Cuts pass `index` down to `level` steps; answers where the bit stands, and on which side of its lap. */
  readonly pass: (index: number, level: number, last: boolean) => { readonly at: Point2; readonly side: number };
}

/** Two steps of rounding, so that a ramp written to the last decimal is never steeper than asked. */
const ROUNDING_STEPS = 2;

/** Steps of the grid that a ramp of some length may descend, or 0 where it is too short to descend at all. */
export function rampCapacity(length: number, slope: number, grid: number): number {
  return Math.max(0, Math.floor((length * slope) / grid - ROUNDING_STEPS));
}

/** The inverse: how long a ramp must be to descend some steps. */
function rampLength(steps: number, { slope, grid }: Layout): number {
  return ((steps + ROUNDING_STEPS) * grid) / slope;
}

/** A whole number shared out evenly in whole parts, the larger first. */
export function share(whole: number, parts: number): number[] {
  return Array.from({ length: parts }, (_, i) => Math.ceil((whole - i) / parts));
}

/**
 * Opens each pass of a one-bit slot along its line: there and back, descending, then on to the other end. The next
 * pass begins where that one ended, so that the passes run to and fro.
 */
export function openLine(layout: Layout, inset: number, go: Go): Opening {
  const { middle, halfLength } = layout.area;
  const half = Math.max(0, halfLength - inset);
  const along = (end: 1 | -1, distance: number): Point2 => ({ x: middle.x + end * (half - distance), y: middle.y });
  let end: 1 | -1 = -1;
  let depth = -Math.round(layout.entryHeight / layout.grid);

  const rampTo = (level: number) => {
    const drop = level - depth;
    const trips = Math.ceil(drop / rampCapacity(4 * half, layout.slope, layout.grid));
    const stroke = Math.min(2 * half, rampLength(drop / trips, layout) / 2);
    for (let trip = 0; trip < trips; trip++) {
      go(along(end, stroke), depth + Math.round((drop * (trip + 0.5)) / trips), 'ramp');
      go(along(end, 0), depth + Math.round((drop * (trip + 1)) / trips), 'ramp');
    }
  };

  return {
    start: along(end, 0),
    pass: (_index, level) => {
      if (layout.ramps) rampTo(level);
      else go(along(end, 0), level, 'plunge');
      depth = level;
      end = end === 1 ? -1 : 1;
      if (half > 0) go(along(end, 0), level, 'pass');
      return { at: along(end, 0), side: 0 };
    },
  };
}

/**
 * Opens each pass along the innermost lap: a ramp, the rest of the lap level, and at the last depth the ramp's place
 * once more. Each pass ramps where the one before did, so that it cuts one pass depth there as everywhere.
 */
export function openLap(layout: Layout, lap: Lap, go: Go): Opening {
  const start = lap.sides[0]?.from;
  assert(start, 'a lap has sides');
  if (!layout.ramps) return openPlunging(lap, start, go);

  const { passes, descents, grid, entryHeight } = layout;
  const around = slopeLength(lap);
  const drops = passes.flatMap((pass) => share(pass, descents));
  let sum = 0;
  const before = [0, ...drops.map((drop) => (sum += drop))];
  const greatest = Math.max(...drops);
  const ramp = Math.min(around, rampLength(greatest, layout));
  // The descent through the air has the ramp's own slope, so that both are one move.
  const air = (entryHeight * ramp) / (greatest * grid);

  /** Steps below the wood's top at a distance of descent counted from the start. */
  const depthAt = (distance: number): number => {
    const cut = distance - air;
    if (cut < 0) return Math.round((greatest * cut) / ramp);
    const turn = Math.min(Math.floor(cut / around), drops.length);
    return (before[turn] ?? 0) + Math.round((drops[turn] ?? 0) * Math.min(1, (cut - turn * around) / ramp));
  };
  /** Where the slope changes: the end of each ramp, and the start of the next where the lap between was level. */
  const bends = drops.flatMap((_, turn) => [...(turn > 0 ? [air + turn * around] : []), air + turn * around + ramp]);
  const walk = walker(lap, depthAt, bends, go);
  return {
    start,
    pass: (index, _level, last) => walk(air + (index + 1) * descents * around + (last ? ramp : 0)),
  };
}

function openPlunging(lap: Lap, start: Point2, go: Go): Opening {
  return {
    start,
    pass: (_index, level) => {
      go(start, level, 'plunge');
      for (const side of lap.sides) go(side.to, level, 'pass', side.centre && { centre: side.centre, turn: lap.turn });
      return { at: start, side: 0 };
    },
  };
}

/** Distances nearer than this are the same: far below the last decimal of any program, far above float noise. */
const SAME = 1e-9;

/** Goes round a lap as often as asked, emitting a move at each corner and at each bend of the descent. */
function walker(lap: Lap, depthAt: (distance: number) => number, bends: readonly number[], go: Go) {
  let index = 0;
  let sideStart = 0;
  let here = 0;
  let bend = 0;
  let depth = depthAt(0);

  return (until: number): { at: Point2; side: number } => {
    for (;;) {
      const side = lap.sides[index];
      assert(side, 'the index is held to the sides');
      const sideEnd = sideStart + (side.slopes ? side.length : 0);
      const arc = side.centre && { centre: side.centre, turn: lap.turn };
      const emit = (at: Point2, distance: number) => {
        const next = depthAt(distance);
        go(at, next, next === depth ? 'pass' : 'ramp', arc);
        [depth, here] = [next, distance];
      };
      const stop = Math.min(until, sideEnd);
      for (; (bends[bend] ?? Infinity) < stop - SAME; bend++) {
        const at = bends[bend] ?? 0;
        if (at > here + SAME) emit(pointAlong(side, at - sideStart), at);
      }
      if (until < sideEnd - SAME) {
        const at = pointAlong(side, until - sideStart);
        if (until > here + SAME) emit(at, until);
        return { at, side: index };
      }
      emit(side.to, sideEnd);
      const arrived = { at: side.to, side: index };
      index = (index + 1) % lap.sides.length;
      sideStart = sideEnd;
      if (until <= sideEnd + SAME) return arrived;
    }
  };
}

