import type { Point3 } from '#shared/geometry/point';
import type { ArcPath, Event, Modes, Motion, Step } from '#shared/reader/motion';

/** Steps as the reader would make them, built by hand: what a test of times or playback starts from. */
export interface StepBuilder {
  readonly steps: Step[];
  rapid(to: Partial<Point3>): StepBuilder;
  line(to: Partial<Point3>, feed?: number): StepBuilder;
  /** In XY, about an absolute centre. */
  arc(to: Partial<Point3>, centre: { x: number; y: number }, turn: 1 | -1, feed?: number): StepBuilder;
  dwell(seconds: number): StepBuilder;
  spindle(state: 'clockwise' | 'counterclockwise' | 'stopped'): StepBuilder;
  pathControl(code: 61 | 61.1 | 64): StepBuilder;
  event(kind: 'stop' | 'end' | 'toolChange' | 'coolant'): StepBuilder;
}

const MODES: Modes = {
  motion: null, plane: 17, distance: 90, feedMode: 94, units: 'mm', radiusCompensation: 40, lengthOffset: 49, workOffset: 54,
  pathControl: 64, spindle: 'stopped', spindleSpeed: 18000, selectedTool: null, coolant: 'off', overrides: 48, feed: null,
};

export function buildSteps(start: Point3 = { x: 0, y: 0, z: 0 }, firstFeed: number | null = 3000): StepBuilder {
  const steps: Step[] = [];
  let at = start;
  let modes = MODES;
  let feed = firstFeed;
  const place = () => ({ line: steps.length + 1, column: 1 });
  const move = (kind: Motion['kind'], to: Partial<Point3>, arc: ArcPath | null, wanted?: number) => {
    if (wanted !== undefined) feed = wanted;
    const from = at;
    at = { ...at, ...to };
    steps.push({ kind, at: place(), from, to: at, arc, feed: kind === 'rapid' ? null : feed, modes });
    return builder;
  };
  const happen = (event: Event) => {
    steps.push(event);
    return builder;
  };
  const builder: StepBuilder = {
    steps,
    rapid: (to) => move('rapid', to, null),
    line: (to, wanted) => move('line', to, null, wanted),
    arc: (to, centre, turn, wanted) => {
      const end = { ...at, ...to };
      const startAngle = Math.atan2(at.y - centre.y, at.x - centre.x);
      const endAngle = Math.atan2(end.y - centre.y, end.x - centre.x);
      const angle = turn * (endAngle - startAngle);
      const sweep = angle > 1e-12 ? angle : angle + 2 * Math.PI;
      const radius = Math.hypot(at.x - centre.x, at.y - centre.y);
      return move('arc', to, { centre: { ...centre, z: at.z }, radius, sweep, turn }, wanted);
    },
    dwell: (seconds) => happen({ kind: 'dwell', at: place(), seconds, modes }),
    spindle: (state) => {
      modes = { ...modes, spindle: state };
      return happen({ kind: 'spindle', at: place(), modes });
    },
    pathControl: (code) => {
      modes = { ...modes, pathControl: code };
      return builder;
    },
    event: (kind) => {
      if (kind === 'stop') return happen({ kind, at: place(), optional: false, modes });
      if (kind === 'end') return happen({ kind, at: place(), code: 30, modes });
      return happen({ kind, at: place(), modes });
    },
  };
  return builder;
}
