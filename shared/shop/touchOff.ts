import { formatDecimal, formatSize } from '../measure/length';
import { type Units, byUnits, convertLength } from '../measure/units';
import { type SlotSpec, railLength } from '../slot/spec';
import { type ShopProblem, sizeField } from './fields';

/** How the paper feels when Z is right: it drags for fine work, it no longer moves for grooves (common practice, no source). */
export const PAPER_FEELS = ['drags', 'held'] as const;
export type PaperFeel = (typeof PAPER_FEELS)[number];

/** A sheet of copy paper, where nobody measured it: 0.004 in, 0.1 mm (common practice, no source). */
export const usualPaper = (units: Units): number => byUnits(units, 0.004, 0.1);

const PAPER = { least: { in: 0.001, mm: 0.02 }, most: { in: 0.02, mm: 0.5 } } as const;
/** The paper's measured thickness, kept in `units`. */
export const paperField = (units: Units) => sizeField(units, 'paper thickness', PAPER);

export const AXES = ['x', 'y', 'z'] as const;

/** A figure as the machine's display has it: the number, and its digits in the display's units. */
export interface Reading {
  readonly axis: (typeof AXES)[number];
  readonly value: number;
  readonly text: string;
}

/** One way of setting a zero: bring the bit there, then set the axis to what is said. */
export interface SetAxis extends Reading {
  readonly touch: 'left edge' | 'front edge' | 'paper on the top';
}

/** Everything that is keyed in and read off while zero is set; every figure in `units`. */
export interface TouchOff {
  /** The program's and the display's. */
  readonly units: Units;
  /** The line over the check move. */
  readonly unitsLine: string;
  /** X and Y at the rail's edges. */
  readonly edges: readonly [SetAxis, SetAxis];
  /** X and Y over the rail's marked middle, where zero is there: both 0. Null where zero is the corner. */
  readonly centre: readonly [Reading, Reading] | null;
  readonly paper: { readonly thickness: number; readonly feel: PaperFeel; readonly set: SetAxis };
  /** Over the front right corner at the safe height: what the display must read there. */
  readonly check: readonly [Reading, Reading, Reading];
  /** The same with Z set so that the program runs in the air; Z is set again, as under `paper`, before the cut. */
  readonly airRun: {
    /** How far the whole program is lifted. */
    readonly lift: number;
    readonly set: SetAxis;
    /** Its lowest point above the rail's top. */
    readonly clear: number;
    /** Where the machine has no room for it; null where it has, or where nobody said. */
    readonly problem: ShopProblem | null;
  };
}

/** How high the air run goes, at least: 1 in, 25 mm. Higher where slot and clamps need it, so that nothing is met. */
const LIFT = { in: 1, mm: 25 } as const;
/** Lifts are whole steps of this, for a figure that is easy to key in. */
const LIFT_STEP = { in: 0.25, mm: 5 } as const;
/** Left between the lowest point and the clamps: as between safe height and clamps. */
const CLEAR = { in: 1 / 8, mm: 3 } as const;

/**
 * The figures for setting zero on the rail.
 *
 * The bit touches the left edge from the left: its middle stands half a bit outside the edge, and the edge is at X 0,
 * so X is set to −bit / 2; the front edge likewise for Y. On paper the tip stands one thickness above the rail's top, so
 * Z is set to that, not to 0. With zero in the rail's middle the edges lie half a rail further out.
 *
 * @param spec in the drawing's units.
 * @param units the machine's.
 * @param paper its thickness in `units`.
 */
export function touchOff(spec: SlotSpec, units: Units, paper: number = usualPaper(units), feel: PaperFeel = 'held'): TouchOff {
  const here = (value: number) => convertLength(value, spec.units, units);
  const reading = (axis: Reading['axis'], value: number): Reading => ({ axis, value: value === 0 ? 0 : value, text: formatDecimal(value, units) });
  const [long, wide, bit] = [here(railLength(spec)), here(spec.railWidth), here(spec.bitDiameter)];
  const corner = spec.workZero === 'corner';
  const [left, front] = corner ? [0, 0] : [-long / 2, -wide / 2];
  const lift = liftOf(here(spec.depth), here(spec.clampHeight), units);
  return {
    units,
    unitsLine: `program in ${units === 'in' ? 'INCHES' : 'MILLIMETRES'}: the display must read`,
    edges: [{ ...reading('x', left - bit / 2), touch: 'left edge' }, { ...reading('y', front - bit / 2), touch: 'front edge' }],
    centre: corner ? null : [reading('x', 0), reading('y', 0)],
    paper: { thickness: paper, feel, set: { ...reading('z', paper), touch: 'paper on the top' } },
    check: [reading('x', left + long), reading('y', front), reading('z', here(spec.safeHeight))],
    airRun: {
      lift,
      set: { ...reading('z', paper - lift), touch: 'paper on the top' },
      clear: lift - here(spec.depth),
      problem: roomFor(here(spec.railThickness) + lift + here(spec.safeHeight), spec, units),
    },
  };
}

function liftOf(depth: number, clamps: number, units: Units): number {
  const least = depth + clamps + CLEAR[units];
  const step = LIFT_STEP[units];
  return Math.max(LIFT[units], Math.ceil(least / step - 1e-9) * step);
}

/** The whole program lifted has to stay below the top of the work area. */
function roomFor(top: number, { machine, units: drawn }: SlotSpec, units: Units): ShopProblem | null {
  if (!machine?.travel) return null;
  const room = convertLength(machine.travel.z, drawn, units);
  if (top <= room + byUnits(units, 1e-9, 1e-8)) return null;
  return { field: 'airRun', message: `The air run goes ${formatSize(top, units)} above the table and the work area is ${formatSize(room, units)} high. Take rail and clamps off the table, and run it there with Z zero as for the cut.` };
}
