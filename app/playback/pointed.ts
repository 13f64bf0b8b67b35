import type { Point3 } from '#shared/geometry/point';
import { type Units, convertLength } from '#shared/measure/units';
import { type SlotSpec, railLength } from '#shared/slot/spec';

/**
 * Where a reading was measured, as the playback has it: readings count from the rail's front left corner, a program
 * from its work zero. Null where the program has not stated the whole place.
 */
export function placeInProgram({ x, y, z }: Point3, spec: SlotSpec, units: Units): Point3 | null {
  if (Number.isNaN(x + y + z)) return null;
  const [dx, dy] = spec.workZero === 'centre' ? [railLength(spec) / 2, spec.railWidth / 2] : [0, 0];
  const size = (value: number) => convertLength(value, spec.units, units);
  return { x: size(x - dx), y: size(y - dy), z: size(z) };
}
