import { formatSize } from '../measure/length';
import { byUnits, convertLength } from '../measure/units';
import { FIELDS } from '../slot/fields';
import type { Problem } from '../slot/rules';
import { type SlotSpec, railLength } from '../slot/spec';
import type { KeptBit } from './bit';
import type { Holding, Machine } from './machine';

/** What a spec is held against: the records, each in its own units. */
export interface MachineAndHolding {
  readonly machine: Machine;
  readonly holding: Holding;
  readonly bit: Pick<KeptBit, 'topSpeed'>;
}

/** A figure of a feed as a sentence shows it, without the binary tail of a conversion. */
const feed = (value: number) => Number(value.toFixed(1));

/**
 * What a machine, its holding and the bit's maker have against a slot, in the drawing's units: beyond what the slot's
 * own rules say, the rail as a whole has to lie within the work area and in the vise.
 */
export function machineProblems(spec: SlotSpec, { machine, holding, bit }: MachineAndHolding): Problem[] {
  const problems: Problem[] = [];
  const { units } = spec;
  const own = (value: number) => convertLength(value, machine.units, units);
  const size = (value: number) => formatSize(value, units);
  const hair = byUnits(units, 1e-9, 1e-8); // sums of decimals and conversions miss by a few units in the last binary place
  const refuse = (when: boolean, field: keyof SlotSpec, message: () => string) => {
    if (when) problems.push({ field, message: message() });
  };

  const area = { x: own(machine.workArea.x), y: own(machine.workArea.y), z: own(machine.workArea.z) };
  const long = railLength(spec);
  refuse(long > area.x + hair, 'length',
    () => `The rail is ${size(long)} long and the work area ${size(area.x)} along X. Use a rail of ${size(area.x)} or less, or a longer machine.`);
  refuse(spec.railWidth > area.y + hair, 'railWidth',
    () => `The rail is ${size(spec.railWidth)} wide and the work area ${size(area.y)} along Y. Use ${size(area.y)} or less, or a wider machine.`);
  const high = spec.railThickness + spec.safeHeight;
  refuse(high > area.z + hair, 'safeHeight',
    () => `The bit travels ${size(high)} above the table: rail ${size(spec.railThickness)}, safe height ${size(spec.safeHeight)}. The work area is ${size(area.z)} high. Use a thinner rail or a lower safe height.`);

  const widest = holding.widest === null ? Infinity : own(holding.widest);
  refuse(spec.railWidth > widest + hair, 'railWidth',
    () => `The rail is ${size(spec.railWidth)} wide and the ${holding.kind} grips ${size(widest)}. Use ${size(widest)} or less, or another way of holding.`);

  // Jaws that stand above the rail run beside the whole slot, where the nut comes down with the bit against a wall.
  const jaws = holding.kind === 'side vise' ? own(holding.height) : 0;
  const nutReach = Math.max(0, (spec.width - spec.bitDiameter) / 2) + spec.colletDiameter / 2;
  refuse(jaws > 0 && nutReach > spec.railWidth / 2 + hair && spec.stickout - spec.depth < jaws - hair, 'stickout',
    () => `With ${size(spec.stickout)} of bit showing, the collet nut comes down on jaws ${size(jaws)} above the rail. Let ${size(jaws + spec.depth)} or more show, or hold the rail lower.`);

  const perMinute = `${units}/min`;
  const slower = machine.topFeed.x <= machine.topFeed.y ? 'X' : 'Y';
  const level = own(Math.min(machine.topFeed.x, machine.topFeed.y));
  refuse(spec.feed > level + hair, 'feed',
    () => `The ${FIELDS.feed.words} is ${feed(spec.feed)} ${perMinute}, and the machine moves ${feed(level)} along ${slower}. Use ${feed(level)} or less.`);
  const down = own(machine.topFeed.z);
  refuse(spec.plungeFeed > down + hair, 'plungeFeed',
    () => `The ${FIELDS.plungeFeed.words} is ${feed(spec.plungeFeed)} ${perMinute}, and the machine moves ${feed(down)} along Z. Use ${feed(down)} or less.`);

  const [slowest, fastest] = machine.spindleRange;
  const most = Math.min(fastest, bit.topSpeed ?? Infinity);
  if (most < slowest) {
    refuse(true, 'spindleSpeed', () => `The bit's maker allows ${most} rev/min and the machine turns no slower than ${slowest}. Use another bit.`);
  } else {
    refuse(spec.spindleSpeed < slowest || spec.spindleSpeed > fastest, 'spindleSpeed',
      () => `The spindle speed is ${spec.spindleSpeed} rev/min and the machine turns ${slowest} to ${fastest}. Use ${slowest} to ${most}.`);
    refuse(spec.spindleSpeed <= fastest && spec.spindleSpeed > most, 'spindleSpeed',
      () => `The spindle speed is ${spec.spindleSpeed} rev/min and the bit's maker allows ${most}. Use ${slowest} to ${most}.`);
  }
  return problems;
}
