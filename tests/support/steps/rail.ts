import { type StepBuilder, buildSteps } from './steps';

/**
 * A stopped groove cut as a lap at each depth, entered along a ramp: 12 long, 3/8 wide, in a rail 14 × 1 1/4 × 3/4, with a
 * 1/4 bit. Written by hand, so that playback is tested without planner, writer or reader.
 */
export const RAIL = { x0: 0, x1: 14, y0: 0, y1: 1.25, z0: -0.75, z1: 0 } as const;
export const BIT = 0.25;
const [LEFT, RIGHT, FRONT, BACK] = [1.125, 12.875, 0.5625, 0.6875];

export function grooveSteps(depths: readonly number[] = [0.09375, 0.1875]): StepBuilder {
  const program = buildSteps({ x: NaN, y: NaN, z: NaN }, null);
  program.rapid({ z: 0.5 }).spindle('clockwise').rapid({ x: LEFT, y: FRONT }).rapid({ z: 0.02 });
  let above = 0.02;
  for (const depth of depths) {
    program.line({ x: LEFT + (above + depth) / Math.tan(Math.PI / 60), z: -depth }, 100).line({ x: RIGHT }).line({ y: BACK }).line({ x: LEFT }).line({ y: FRONT });
    above = -depth;
  }
  return program.line({ x: LEFT + 3 }).rapid({ z: 0.5 }).spindle('stopped').event('end');
}
