import type { Point3 } from '../geometry/point';
import { type Timeline, isMotion } from '../time/index';

/**
 * Which steps are a finish lap: 1 for those that run along the walls at a depth where the wood inside has been cut
 * before. Read from the motions alone: a lap before it stays the allowance off the walls, a finish lap does not.
 *
 * @param allowance what earlier laps leave on the walls, in the program's units; 0 where nothing is left.
 */
export function finishSteps({ steps }: Timeline, allowance: number): Uint8Array {
  const finish = new Uint8Array(steps.length);
  if (!(allowance > 0)) return finish;
  let [x0, x1, y0, y1] = [Infinity, -Infinity, Infinity, -Infinity];
  const level = steps.map((step) => (isMotion(step) && step.kind !== 'rapid' && step.to.z < 0 && step.from.z === step.to.z ? step : null));
  for (const step of level) {
    for (const { x, y } of step ? [step.from, step.to] : []) {
      [x0, x1, y0, y1] = [Math.min(x0, x), Math.max(x1, x), Math.min(y0, y), Math.max(y1, y)];
    }
  }
  const near = allowance / 2;
  const onWall = ({ x, y }: Point3) => x < x0 + near || x > x1 - near || y < y0 + near || y > y1 - near;
  const reached = new Set<number>();
  let last = -1; // the one before on the wall, with nothing but level cuts since
  level.forEach((step, i) => {
    if (!step) {
      last = -1;
      return;
    }
    if (!onWall(step.from) || !onWall(step.to)) {
      // Between two places on the walls this may be a chord of a round end: the lap goes on there.
      if (!onWall(step.from) && !onWall(step.to) && last < 0) reached.add(step.to.z);
      return;
    }
    if (!reached.has(step.to.z)) return;
    finish.fill(1, last < 0 ? i : last, i + 1);
    last = i;
  });
  return finish;
}
