import type { Point3 } from '../geometry/point';
import { type Units, convertLength } from '../measure/units';
import type { ReadProgram, Step } from './motion';

/** A program's steps in other units, for whoever measures or shows it beside a drawing; itself where they are the same. */
export function stepsIn(units: Units, program: ReadProgram): readonly Step[] {
  if (program.units === units) return program.steps;
  const scale = convertLength(1, program.units, units);
  return mapPlaces(program.steps, ({ x, y, z }) => ({ x: x * scale, y: y * scale, z: z * scale }), scale);
}

/** Steps with every point moved, and every length along the way scaled. */
export function mapPlaces(steps: readonly Step[], place: (point: Point3) => Point3, scale = 1): readonly Step[] {
  return steps.map((step): Step => {
    if (!('to' in step)) return step;
    const { arc, feed } = step;
    return {
      ...step,
      from: place(step.from),
      to: place(step.to),
      arc: arc && { ...arc, centre: place(arc.centre), radius: arc.radius * scale },
      feed: feed === null ? null : feed * scale,
    };
  });
}
