import { formatSize } from '../measure/length';
import { type Units, convertLength } from '../measure/units';
import { railLength } from '../slot/spec';
import { WOOD_FACTS } from '../wood/woods';
import type { BenchProgram } from './bench';
import type { Holding } from './machine';
import type { TouchOff } from './touchOff';

// What is fitted and done at the machine, in words: the same on the bench and on the printed sheet.

/** One line of a setup: what, and its figure. */
export interface SetupLine {
  readonly name: string;
  readonly value: string;
}

/** `26 1/4 × 1 1/4 × 3/4 in`: the unit once. */
export function sizesInRow(values: readonly number[], units: Units): string {
  return `${values.map((value) => formatSize(value, units).replace(/ (?:in|mm)$/, '')).join(' × ')} ${units}`;
}

/** How the rail is held, as a sentence's end. */
export function holdingWords(holding: Holding | null, units: Units): string {
  if (!holding) return "as the machine's record says";
  const height = holding.height > 0 ? `, ${formatSize(holding.height, units)} high above the rail` : '';
  if (holding.kind === 'end clamps') return `end clamps${height}, ${formatSize(holding.reach, units)} onto it from each end`;
  if (holding.kind === 'side vise') return `the side vise${height || ', jaws below the top'}`;
  return `tape, flat against the fence${height}`;
}

/** Seconds as a clock has them: `1:02`. */
function clock(seconds: number): string {
  const whole = Math.max(0, Math.round(seconds));
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
}

/** A speed with its thousands apart: `16 000`. */
export const grouped = (value: number): string => String(value).replaceAll(/(?<=\d)(?=(?:\d{3})+$)/g, '\u00a0');

/** The stock and all that is set before the program runs. */
export function setupLines({ spec, summary, bit, holding, machine }: BenchProgram): readonly SetupLine[] {
  const size = (value: number) => formatSize(value, spec.units);
  const written = convertLength(bit.diameter, bit.units, spec.units);
  const programmed = Math.abs(written - spec.bitDiameter) > 1e-6 ? `, programmed as ${size(spec.bitDiameter)}` : ''; // 1e-6: below any measure
  const perMinute = `${spec.units}/min`;
  return [
    { name: 'Stock', value: `${sizesInRow([railLength(spec), spec.railWidth, spec.railThickness], spec.units)}, ${WOOD_FACTS[spec.wood].words}` },
    { name: 'Groove', value: sizesInRow([spec.length, spec.width, spec.depth], spec.units) },
    { name: 'Machine', value: machine.name },
    { name: 'Held by', value: holdingWords(holding, machine.units) },
    { name: 'Bit', value: `${bit.name}: ${formatSize(bit.diameter, bit.units)}, ${bit.flutes} ${bit.flutes === 1 ? 'flute' : 'flutes'}, ${formatSize(bit.stickout, bit.units)} showing${programmed}` },
    { name: 'Spindle', value: `${grouped(spec.spindleSpeed)} rev/min, ${spec.spindle === 'hand' ? 'switched by hand' : 'switched by the program'}` },
    { name: 'Feed, plunge feed', value: `${spec.feed}, ${spec.plungeFeed} ${perMinute}` },
    { name: 'Passes', value: `${summary.passes.length}, down to ${summary.passes.map((depth) => size(Math.abs(depth))).join(', ')}` },
    { name: 'Safe height', value: `${size(spec.safeHeight)} above the rail` },
    { name: 'Time at the machine', value: clock(summary.seconds) },
  ];
}

/** What is done at the machine, in order: a line of the printed sheet each, with a box to tick. */
export function sheetSteps(program: BenchProgram, touch: TouchOff): readonly string[] {
  const { spec, bit, holding, machine, mark } = program;
  const [left, front] = touch.edges;
  const [x, y, z] = touch.check;
  const feel = touch.paper.feel === 'held' ? 'no longer moves' : 'just drags';
  return [
    'Lay the rail against the fence along its back, groove side up, supported under its middle.',
    `Hold it with ${holdingWords(holding, machine.units)}.`,
    `Fit the ${formatSize(bit.diameter, bit.units)} bit in a clean, tight collet, ${formatSize(bit.stickout, bit.units)} showing.`,
    touch.centre
      ? 'Bring the bit over the middle of the rail, marked beforehand. Set X to 0 and Y to 0.'
      : `Touch the left edge, set X to ${left.text}. Touch the front edge, set Y to ${front.text}.`,
    `Paper on the rail's top: lower until it ${feel}. Set Z to ${touch.paper.set.text}, the paper's thickness, not 0.`,
    `Raise. Over the front right corner, Z at the safe height, the display must read X ${x.text}, Y ${y.text}, Z ${z.text}.`,
    `Load the file. Its first line must say ${mark}.`,
    `Air run: on the paper set Z to ${touch.airRun.set.text} and run it all ${formatSize(touch.airRun.lift, touch.units)} up.`,
    `Set Z to ${touch.paper.set.text} on the paper again. The bit is never shifted in its collet.`,
    `Cut. Stay there, hand on the stop${spec.spindle === 'hand' ? '; the program stops for the spindle switch' : ''}.`,
  ];
}

/** What to do when a cut stops half-way. */
export const STOPPED_STEPS = [
  'Spindle off. Wait until it stands still.',
  'Raise the bit clear of the wood.',
  'Find out why it stopped, then check zero on X, Y and Z.',
  'Run the program again from the top. Never from the middle.',
] as const;
