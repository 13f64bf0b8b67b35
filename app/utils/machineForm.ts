import type { Units } from '#shared/measure/units';
import { DEFAULT_OPTIONS } from '#shared/program/options';
import type { Holding, Machine } from '#shared/shop/machine';
import { figureIn, figureOrNull, figureText, rateAfter, sizeAfter, sizeIn, sizeOrNull, sizeText } from './formText';

/** A machine as its form holds it: figures as typed. */
export interface MachineForm {
  units: Units;
  name: string;
  workArea: Xyz;
  topFeed: Xyz;
  acceleration: string;
  slowest: string;
  fastest: string;
  spindle: Machine['spindle'];
  heavy: 'yes' | 'no';
  parking: Xyz;
  holdings: HoldingForm[];
  options: Omit<Machine['options'], 'chordTolerance' | 'programUnits'> & { chordTolerance: string };
}
interface Xyz {
  x: string;
  y: string;
  z: string;
}
export interface HoldingForm {
  kind: Holding['kind'];
  widest: string;
  height: string;
  reach: string;
}

const blank = (): Xyz => ({ x: '', y: '', z: '' });
const optionsOf = ({ programUnits: _, chordTolerance, ...options }: Machine['options']): MachineForm['options'] => ({ ...options, chordTolerance: String(chordTolerance) });

/** A way of holding to begin from: nothing stands in the way of the bit. */
export const newHolding = (): HoldingForm => ({ kind: 'fence and tape', widest: '', height: '0', reach: '0' });

export const newMachine = (): MachineForm => ({
  units: 'in', name: '', workArea: blank(), topFeed: blank(), acceleration: '', slowest: '', fastest: '', spindle: 'program', heavy: 'no',
  parking: blank(), holdings: [newHolding()], options: optionsOf(DEFAULT_OPTIONS),
});

/** A kept machine as text to edit. */
export function machineForm(machine: Machine): MachineForm {
  const { units, name, workArea, topFeed, acceleration, spindleRange, spindle, heavy, parking, holdings, options } = machine;
  const size = (value: number | null) => sizeText(value, units);
  return {
    units, name, spindle, heavy: heavy ? 'yes' : 'no',
    workArea: { x: size(workArea.x), y: size(workArea.y), z: size(workArea.z) },
    topFeed: { x: String(topFeed.x), y: String(topFeed.y), z: String(topFeed.z) },
    acceleration: figureText(acceleration), slowest: String(spindleRange[0]), fastest: String(spindleRange[1]),
    parking: parking ? { x: String(parking.x), y: String(parking.y), z: String(parking.z) } : blank(),
    holdings: holdings.map(({ kind, widest, height, reach }) => ({ kind, widest: size(widest), height: size(height), reach: size(reach) })),
    options: optionsOf(options),
  };
}

/** What the form asks the server to keep, for the machine's schema to judge. */
export function machineRequest(form: MachineForm): unknown {
  const { units, name, workArea, topFeed, acceleration, slowest, fastest, spindle, heavy, parking, holdings, options } = form;
  const parked = [parking.x, parking.y, parking.z].some((text) => text.trim() !== '');
  return {
    units, name, spindle, heavy: heavy === 'yes',
    workArea: { x: sizeIn(workArea.x), y: sizeIn(workArea.y), z: sizeIn(workArea.z) },
    topFeed: { x: figureIn(topFeed.x), y: figureIn(topFeed.y), z: figureIn(topFeed.z) },
    acceleration: figureOrNull(acceleration), spindleRange: [figureIn(slowest), figureIn(fastest)],
    parking: parked ? { x: figureIn(parking.x), y: figureIn(parking.y), z: figureIn(parking.z) } : null,
    // A field that the form does not show for a kind is not sent with what stood there before.
    holdings: holdings.map(({ kind, widest, height, reach }) => ({ kind, widest: sizeOrNull(widest), height: sizeIn(height), reach: kind === 'end clamps' ? sizeIn(reach) : 0 })),
    options: { ...options, chordTolerance: figureIn(options.chordTolerance) },
  };
}

/** The form in other units: every size, feed and place stays what it was. */
export function machineInUnits(form: MachineForm, to: Units): MachineForm {
  const from = form.units;
  const size = (text: string) => sizeAfter(text, from, to);
  const rate = (text: string) => rateAfter(text, from, to);
  const each = ({ x, y, z }: Xyz, turn: (text: string) => string): Xyz => ({ x: turn(x), y: turn(y), z: turn(z) });
  return {
    ...form, units: to, workArea: each(form.workArea, size), topFeed: each(form.topFeed, rate), acceleration: rate(form.acceleration), parking: each(form.parking, rate),
    holdings: form.holdings.map(({ kind, widest, height, reach }) => ({ kind, widest: size(widest), height: size(height), reach: size(reach) })),
    options: { ...form.options, chordTolerance: rate(form.options.chordTolerance) },
  };
}
