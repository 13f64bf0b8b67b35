import type { Point3 } from '#shared/geometry/point';
import type { Motion, ReadProgram, Step } from '#shared/reader/motion';

/**
 * Steps as the canonical machining function calls of NISTIR 6556 section 4.3, written as its Table 10 prints them:
 * four decimals, arc ends in the plane's own axis order (4.3.6.1). An unknown coordinate is `?`.
 * The calls that set modes are left out: modes travel with the steps.
 */
export function canonicalCalls({ steps }: ReadProgram): string[] {
  return steps.map(call);
}

function call(step: Step): string {
  switch (step.kind) {
    case 'rapid':
      return `STRAIGHT_TRAVERSE(${point(step.to)})`;
    case 'line':
      return `STRAIGHT_FEED(${point(step.to)})`;
    case 'arc':
      return arcFeed(step);
    case 'dwell':
      return `DWELL(${number(step.seconds)})`;
    case 'toolChange':
      return `CHANGE_TOOL(${step.modes.selectedTool ?? '?'})`;
    case 'spindle': {
      const { spindle } = step.modes;
      return spindle === 'stopped' ? 'STOP_SPINDLE_TURNING()' : `START_SPINDLE_${String(spindle).toUpperCase()}()`;
    }
    case 'coolant':
      return `COOLANT(${step.modes.coolant})`; // the report has four calls; ours says what is on
    case 'stop':
      return step.optional ? 'OPTIONAL_PROGRAM_STOP()' : 'PROGRAM_STOP()';
    case 'end':
      return 'PROGRAM_END()';
  }
}

function arcFeed({ arc, to, modes }: Motion): string {
  if (arc === null) return 'ARC_FEED(no arc)';
  const { centre, turn } = arc;
  const values =
    modes.plane === 18
      ? [to.z, to.x, centre.z, centre.x, turn, to.y]
      : modes.plane === 19
        ? [to.y, to.z, centre.y, centre.z, turn, to.x]
        : [to.x, to.y, centre.x, centre.y, turn, to.z];
  return `ARC_FEED(${values.map((value, n) => (n === 4 ? String(value) : number(value))).join(', ')})`;
}

const point = ({ x, y, z }: Point3) => [x, y, z].map(number).join(', ');

function number(value: number): string {
  if (Number.isNaN(value)) return '?';
  const text = value.toFixed(4);
  return Number(text) === 0 ? '0.0000' : text;
}
