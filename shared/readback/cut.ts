import type { Point3 } from '../geometry/point';
import { type Units, byUnits, convertLength } from '../measure/units';
import { mapPlaces, stepsIn } from '../reader/inUnits';
import { type Motion, type Place, type ReadProgram, type Step, isMotion } from '../reader/motion';
import { type SlotSpec, railLength } from '../slot/spec';

/** Sizes agree within this: a tenth of what a shop can measure on wood (common practice, no source). */
export const TOLERANCE: Readonly<Record<Units, number>> = { in: 0.0005, mm: 0.01 };

/** A straight piece of the cutter's way, on the rail: X from its left end, Y from its front edge, Z from its top. */
export interface Piece {
  readonly x0: number;
  readonly y0: number;
  readonly z0: number;
  readonly x1: number;
  readonly y1: number;
  readonly z1: number;
  readonly motion: Motion;
}

/** A program laid on the rail that its spec describes, in the spec's units: what every rule measures. */
export interface Cut {
  readonly spec: SlotSpec;
  readonly tolerance: number;
  /** One step of the last decimal written in the program, in the spec's units: what rounding alone may do. */
  readonly step: number;
  readonly railLength: number;
  readonly steps: readonly Step[];
  readonly motions: readonly Motion[];
  /** All of the way that runs below the rail's top, cut off at the top, in time order; arcs as chords. */
  readonly pieces: readonly Piece[];
  /** The program's first line: where a reading of the whole program stands. */
  readonly whole: Place;
}

/** Chords stray from their arc by a quarter of the tolerance at most. */
const CHORD_SHARE = 0.25;

/** Lays a program as read on the rail: converts its units and shifts its work zero, once. */
export function layOnRail(program: ReadProgram, spec: SlotSpec): Cut {
  const rail = railLength(spec);
  const drawn = stepsIn(spec.units, program);
  const steps = spec.workZero === 'corner'
    ? drawn
    : mapPlaces(drawn, (point) => ({ x: point.x + rail / 2, y: point.y + spec.railWidth / 2, z: point.z }));

  const tolerance = TOLERANCE[spec.units];
  const motions = steps.filter(isMotion);
  return {
    spec,
    tolerance,
    step: convertLength(byUnits(program.units, 1e-4, 1e-3), program.units, spec.units),
    railLength: rail,
    steps,
    motions,
    pieces: motions.flatMap((motion) => piecesBelow(motion, tolerance * CHORD_SHARE)),
    whole: { line: 1, column: 1 },
  };
}

/** The straight pieces of a motion that lie below the rail's top; none while the machine's place is not known. */
export function piecesBelow(motion: Motion, sagitta: number): Piece[] {
  const { from, to } = motion;
  if (!(from.z < 0 || to.z < 0) || Number.isNaN(from.x + from.y)) return [];
  const pieces: Piece[] = [];
  let start = from;
  for (const end of pointsOf(motion, sagitta)) {
    const piece = below(start, end, motion);
    if (piece) pieces.push(piece);
    start = end;
  }
  return pieces;
}

function below(from: Point3, to: Point3, motion: Motion): Piece | null {
  if (from.z >= 0 && to.z >= 0) return null;
  const crossing = from.z / (from.z - to.z);
  const at = { x: from.x + crossing * (to.x - from.x), y: from.y + crossing * (to.y - from.y), z: 0 };
  const a = from.z > 0 ? at : from;
  const b = to.z > 0 ? at : to;
  return { x0: a.x, y0: a.y, z0: a.z, x1: b.x, y1: b.y, z1: b.z, motion };
}

/** Points along a motion after its start, such that chords between them stray by at most `sagitta`. */
export function pointsOf({ arc, from, to }: Motion, sagitta: number): Point3[] {
  if (!arc || arc.radius <= sagitta) return [to];
  const count = Math.max(1, Math.ceil(arc.sweep / (2 * Math.acos(1 - sagitta / arc.radius))));
  const start = Math.atan2(from.y - arc.centre.y, from.x - arc.centre.x);
  return Array.from({ length: count }, (_, i) => {
    if (i === count - 1) return to;
    const t = (i + 1) / count;
    const angle = start + arc.turn * arc.sweep * t;
    return {
      x: arc.centre.x + arc.radius * Math.cos(angle),
      y: arc.centre.y + arc.radius * Math.sin(angle),
      z: from.z + t * (to.z - from.z),
    };
  });
}
