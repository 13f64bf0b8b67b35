import { formatDecimal } from '../measure/length';
import { type Units, convertLength } from '../measure/units';
import type { SlotRequest, SlotRequestInput } from '../slot/request';
import { slotRequestSchema } from '../slot/request';
import { type KeptBit, diameterToUse } from './bit';
import type { ShopProblem } from './fields';
import { type Holding, type Machine, coarsestChord } from './machine';
import { machineProblems } from './machineProblems';
import { type OwnWood, kindOf, ownChipLoad } from './wood';

/** Everything that a rail is cut with. `wood` is the shop's own entry; null: the wood that the rail names. */
export interface CutWith {
  readonly machine: Machine;
  readonly holding: Holding;
  readonly bit: KeptBit;
  readonly wood: OwnWood | null;
}

/** The spindle speed that holds where nobody asks for another: as in the slot's own defaults. */
const USUAL_SPEED = 16_000;

/**
 * A rail's drawing on one machine: the request for its program, in the drawing's units. Machine, holding and bit
 * replace whatever the drawing said of them; each of their sizes is converted once, and not at all where its record is
 * in the drawing's units. The text is written in the machine's units.
 */
export function onMachine(rail: SlotRequestInput, { machine, holding, bit, wood }: CutWith): SlotRequestInput {
  const { units } = rail;
  const from = (own: Units) => (value: number) => convertLength(value, own, units);
  const ofMachine = from(machine.units);
  const ofBit = from(bit.units);
  const same = machine.units === units;
  // A conversion may miss by a few units in the last binary place: what fits exactly has to go on fitting.
  const reach = (value: number) => (same ? value : Number(ofMachine(value).toFixed(9)));
  // Feeds are written with one decimal; rounded down, so that none passes what the machine can do.
  const atMost = (value: number) => (same ? value : Math.floor(ofMachine(value) * 10 + 1e-6) / 10);
  const { workArea, topFeed, spindleRange, heavy, options } = machine;
  const [slowest, fastest] = spindleRange;
  return {
    ...rail,
    bitDiameter: ofBit(diameterToUse(bit)),
    flutes: bit.flutes,
    cuttingLength: ofBit(bit.cuttingLength),
    bitKind: bit.kind,
    centreCutting: bit.centreCutting,
    colletDiameter: ofBit(bit.colletDiameter),
    stickout: ofBit(bit.stickout),
    chipLoadRange: chipLoadOn(units, bit, wood),
    wood: wood === null ? rail.wood : kindOf(wood),
    clampHeight: ofMachine(holding.height),
    clampReach: ofMachine(holding.reach),
    spindle: machine.spindle,
    spindleSpeed: rail.spindleSpeed ?? Math.max(slowest, Math.min(USUAL_SPEED, fastest, bit.topSpeed ?? Infinity)),
    machine: {
      travel: { x: reach(workArea.x), y: reach(workArea.y), z: reach(workArea.z) },
      topFeed: atMost(Math.min(topFeed.x, topFeed.y)), // a lap runs along both; Z is held against the plunge feed
      ...(machine.acceleration === null ? {} : { acceleration: ofMachine(machine.acceleration) }),
      spindleRange: [slowest, fastest],
      heavy,
    },
    options: {
      ...options,
      // A chord finer than asked is never wrong: 0.0005 in is more than a metric drawing allows.
      chordTolerance: Math.min(ofMachine(options.chordTolerance), coarsestChord(units)),
      programUnits: machine.units,
    },
  };
}

/** The chip load that holds before the common chart, in the drawing's units: the bit maker's, else the shop's for its own wood. */
function chipLoadOn(units: Units, bit: KeptBit, wood: OwnWood | null): [number, number] | null {
  if (bit.chipLoadRange) return inUnits(bit.chipLoadRange, bit.units, units);
  const own = wood && ownChipLoad(wood, convertLength(diameterToUse(bit), bit.units, wood.units));
  return wood && own ? inUnits(own, wood.units, units) : null;
}

const inUnits = ([least, most]: readonly [number, number], from: Units, to: Units): [number, number] =>
  [convertLength(least, from, to), convertLength(most, from, to)];

/** A request that this machine can cut, or everything that stands against it. */
export type Prepared =
  | { readonly ok: true; readonly request: SlotRequest }
  | { readonly ok: false; readonly problems: readonly ShopProblem[] };

/** Puts a rail's drawing on a machine and checks it there, before any program is made. */
export function prepareRail(rail: SlotRequestInput, cutWith: CutWith): Prepared {
  const parsed = slotRequestSchema.safeParse(onMachine(rail, cutWith));
  if (parsed.success) {
    const problems = machineProblems(parsed.data.spec, cutWith);
    if (problems.length > 0) return { ok: false, problems };
    const note = unitsNote(rail.units, cutWith.machine.units);
    return { ok: true, request: note === null ? parsed.data : { ...parsed.data, notes: [...parsed.data.notes, note] } };
  }
  const said = parsed.error.issues.map(({ path, message }) => ({ field: path.join('.'), message }));
  // The drawing by itself may be sound where the machine is what stands against it.
  const drawn = slotRequestSchema.safeParse(rail);
  const more = drawn.success ? machineProblems(drawn.data.spec, cutWith).filter(({ field }) => said.every((problem) => problem.field !== field)) : [];
  return { ok: false, problems: [...said, ...more] };
}

function unitsNote(drawing: Units, machine: Units): string | null {
  if (drawing === machine) return null;
  const one = formatDecimal(convertLength(1, drawing, machine), machine);
  return `The drawing is in ${drawing} and the program in ${machine}: 1 ${drawing} is ${one} ${machine}.`;
}
