import { formatSize } from '#shared/measure/length';
import type { Units } from '#shared/measure/units';
import { type Bit, type KeptBit, diameterToUse } from '#shared/shop/bit';
import type { Holding, Machine } from '#shared/shop/machine';
import { type SlotSpec, railLength } from '#shared/slot/spec';
import { WOOD_FACTS } from '#shared/wood/woods';

/** A figure and what it is; `derived` ones were worked out and stand in italics, as on a drawing. */
export interface Fact {
  readonly name: string;
  readonly value: string;
  readonly derived?: boolean;
}

export const KIND_WORDS = { straight: 'straight', upcut: 'up-cut', downcut: 'down-cut', compression: 'compression' } as const satisfies Record<Bit['kind'], string>;
export const SPINDLE_WORDS = { program: 'by the program', hand: 'by hand' } as const satisfies Record<Machine['spindle'], string>;

const yesNo = (yes: boolean) => (yes ? 'yes' : 'no');
const size = (units: Units) => (value: number | null) => (value === null ? 'not given' : formatSize(value, units));
/** A chip load with its unit, to the places a shop reads. */
export const chipWords = ([least, most]: readonly [number, number], units: Units): string => `${Number(least.toFixed(4))} to ${Number(most.toFixed(4))} ${units} per tooth`;

/** `End clamps, 1/2 in high, 1/2 in onto the rail`. */
export function holdingWords({ kind, widest, height, reach }: Holding, units: Units): string {
  const of = size(units);
  const parts = [
    kind.charAt(0).toUpperCase() + kind.slice(1),
    widest === null ? 'any width' : `up to ${of(widest)} wide`,
    height === 0 ? 'nothing above the rail' : `${of(height)} above the rail`,
    ...(kind === 'end clamps' ? [`${of(reach)} onto the rail`] : []),
  ];
  return parts.join(', ');
}

/** A machine's figures in the order of its form; its ways of holding and program options apart. */
export function machineFacts({ units, workArea, topFeed, acceleration, spindleRange, spindle, heavy, parking }: Machine): Fact[] {
  const of = size(units);
  return [
    { name: 'Work area', value: `X ${of(workArea.x)}, Y ${of(workArea.y)}, Z ${of(workArea.z)}` },
    { name: 'Highest feed', value: `X ${topFeed.x}, Y ${topFeed.y}, Z ${topFeed.z} ${units}/min` },
    { name: 'Acceleration', value: acceleration === null ? 'not given' : `${acceleration} ${units}/s²` },
    { name: 'Spindle', value: `${spindleRange[0]} to ${spindleRange[1]} rev/min, switched ${SPINDLE_WORDS[spindle]}` },
    { name: 'Frame', value: heavy ? 'heavy, industrial' : 'light' },
    { name: 'Parking place', value: parking ? `X ${parking.x}, Y ${parking.y}, Z ${parking.z} ${units}` : 'not given' },
  ];
}

const ENDINGS = { lf: 'LF', crlf: 'CR LF' } as const;

/** How a machine's programs are written. */
export function optionFacts({ units, options }: Machine): Fact[] {
  const { lineNumbers, chordTolerance, lineEndings, percent, comments, speedWord, spindleWait, end, fileEnding } = options;
  return [
    { name: 'File ending', value: `.${fileEnding}` },
    { name: 'Line endings', value: ENDINGS[lineEndings] },
    { name: 'N words', value: yesNo(lineNumbers) },
    { name: 'Curves', value: chordTolerance === 0 ? 'arcs, G2 and G3' : `chords within ${chordTolerance} ${units}` },
    { name: '% lines', value: yesNo(percent) },
    { name: 'Comments', value: yesNo(comments) },
    { name: 'S word', value: yesNo(speedWord) },
    { name: 'Wait for the spindle', value: spindleWait === 'none' ? 'none' : `G4 P in ${spindleWait}` },
    { name: 'End', value: end },
  ];
}

/** A bit's figures in the order of its form. */
export function bitFacts(bit: Bit & Partial<Pick<KeptBit, 'acceptedDiameter'>>): Fact[] {
  const of = size(bit.units);
  const used = diameterToUse({ ...bit, acceptedDiameter: bit.acceptedDiameter ?? null });
  return [
    { name: 'Diameter as written', value: of(bit.diameter) },
    { name: 'Diameter measured', value: bit.measuredDiameter === null ? 'not measured' : of(bit.measuredDiameter) },
    { name: 'Diameter in use', value: of(used), derived: true },
    { name: 'Type', value: KIND_WORDS[bit.kind] + (bit.upcutLength === null ? '' : `, up-cut for ${of(bit.upcutLength)}`) },
    { name: 'Flutes', value: `${bit.flutes}${bit.centreCutting ? ', cutting to the centre' : ''}` },
    { name: 'Cutting length', value: of(bit.cuttingLength) },
    { name: 'Stickout', value: of(bit.stickout) },
    { name: 'Collet nut', value: of(bit.colletDiameter) },
    { name: "Maker's chip load", value: bit.chipLoadRange === null ? 'not given' : chipWords(bit.chipLoadRange, bit.units) },
    { name: "Maker's top speed", value: bit.topSpeed === null ? 'not given' : `${bit.topSpeed} rev/min` },
  ];
}

/** What a program was drawn as. */
export function specFacts(spec: SlotSpec): Fact[] {
  const of = size(spec.units);
  return [
    { name: 'Rail', value: `${of(railLength(spec))} × ${of(spec.railWidth)} × ${of(spec.railThickness)}` },
    { name: 'Groove', value: `${of(spec.length)} long, ${of(spec.width)} wide, ${of(spec.depth)} deep` },
    { name: 'Stop margin', value: of(spec.stopMargin) },
    { name: 'Wood', value: WOOD_FACTS[spec.wood].words },
    { name: 'Bit', value: `${of(spec.bitDiameter)}, ${spec.flutes} flutes` },
    { name: 'Spindle speed', value: `${spec.spindleSpeed} rev/min` },
    { name: 'Feed, plunge feed', value: `${Number(spec.feed.toFixed(1))}, ${Number(spec.plungeFeed.toFixed(1))} ${spec.units}/min` },
    { name: 'Stepdown', value: of(spec.stepdown) },
    { name: 'Safe height', value: of(spec.safeHeight) },
  ];
}

/** How long a bit has cut: `12 minutes`, `1 hour 5 minutes`. */
export function cuttingTime(minutes: number): string {
  const whole = Math.round(minutes);
  const [hours, rest] = [Math.floor(whole / 60), whole % 60];
  const words = (count: number, one: string) => `${count} ${count === 1 ? one : `${one}s`}`;
  return hours === 0 ? words(rest, 'minute') : rest === 0 ? words(hours, 'hour') : `${words(hours, 'hour')} ${words(rest, 'minute')}`;
}
