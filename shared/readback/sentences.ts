import { formatDecimal } from '../measure/length';
import type { Units } from '../measure/units';
import type { Figure, Finding, Quantity, RuleName } from './finding';

/** A finding in words: what was looked at, the two figures, and for one that is off, what to do. */
export interface Sentence {
  readonly text: string;
  readonly wanted: string;
  readonly measured: string;
  /** Null where nothing is to be done. */
  readonly cure: string | null;
  /** The same caution in the header's words; null unless it is one. */
  readonly header: string | null;
}

/** What each rule looks at, and what to do where it disagrees. */
const WORDS: Readonly<Record<RuleName, { readonly text: string; readonly cure: string }>> = {
  read: { text: 'The program can be read', cure: 'Correct that line, or write the program again.' },
  length: { text: 'Slot length', cure: 'Write the program again from the drawing.' },
  width: { text: 'Slot width', cure: 'Write the program again from the drawing, and measure the bit.' },
  depth: { text: 'Slot depth', cure: 'Write the program again from the drawing.' },
  stopMargin: { text: 'Stop margin at each end', cure: 'Write the program again, and check where its work zero is.' },
  outside: { text: 'Nothing cut outside the slot', cure: 'Write the program again from the drawing.' },
  cleared: { text: 'Every point of the slot reached, to the floor', cure: 'Some wood stays in the slot. Write the program again.' },
  floor: { text: 'Floor flat', cure: 'Cut the floor once more at full depth.' },
  under: { text: 'Wood left under the slot', cure: 'Use a thicker rail or a shallower slot.' },
  beside: { text: 'Wood left beside the slot, front and back', cure: 'Check the rail width and the work zero.' },
  railWidth: { text: 'Rail width', cure: 'Measure the rail and enter its width: Y is counted from its edge.' },
  passDepth: { text: 'Deepest single pass', cure: 'Use a smaller stepdown, or write the program again.' },
  cuttingLength: { text: 'Deepest cut along the flutes', cure: 'Use a bit with longer flutes.' },
  entry: { text: 'Steepest entry', cure: 'Ramp in more gently, or write the program again.' },
  laps: { text: 'Direction of the laps', cure: 'Write the program again with the direction you want.' },
  retracts: { text: 'Times the bit leaves the wood', cure: 'Write the program again as one continuous cut.' },
  start: { text: 'First motion is Z alone, to the safe height', cure: 'Raise Z to the safe height before anything else.' },
  rapids: { text: 'Lowest sideways rapid', cure: 'Raise Z to the safe height before each rapid.' },
  clamps: { text: 'Gap between bit and clamps', cure: 'Move the clamps outward, or widen the stop margin.' },
  nut: { text: "Collet nut above the rail's top at full depth", cure: 'Let more of the bit show, or lower the clamps.' },
  travel: { text: 'Travel used on X, Y and Z', cure: 'Use a machine with more travel, or a shorter slot.' },
  modes: { text: 'Every mode stated before the first motion', cure: 'State it before the first motion.' },
  spindle: { text: 'Spindle turns whenever the bit is below the safe height', cure: 'Start it before the bit comes down and stop it after it is up.' },
  spindleSpeed: { text: 'Spindle speed', cure: 'Write the speed of the drawing.' },
  feed: { text: 'Fastest feed in the wood', cure: 'Lower the feed.' },
  plungeFeed: { text: 'Fastest feed straight down', cure: 'Lower the feed on the way in, or ramp more gently.' },
  chipLoad: { text: 'Chip load', cure: 'Change the feed, the speed or the number of flutes.' },
  end: { text: 'Ends at the safe height with M2 or M30', cure: 'End with M30 on its own line, above the safe height.' },
};

/** What a reason adds, by rule and reason; `text` replaces the rule's own. */
const REASONS: Readonly<Record<string, { readonly text?: string; readonly cure?: string}>> = {
  'width oneBit': { text: 'Slot width, one bit wide', cure: 'The bit cuts this width. Use it if your coins fit, or change the bit.' },
  'railWidth assumed': { text: 'Rail width assumed, three times the slot width' },
  'cuttingLength shank': { text: "Slot deeper than the bit's cutting length", cure: 'The shank runs in the slot: it must be no thicker than the bit.' },
  'entry plunge': { text: 'Straight down into the wood', cure: 'No ramp fits. Watch the first plunge; only a bit that cuts at its centre can do this.' },
  'entry plungeWithoutCentre': { text: 'Straight down into the wood', cure: 'No ramp fits. Use a bit that cuts at its centre and say so, or make the slot longer.' },
  'rapids intoWood': { text: 'Rapid down into the wood', cure: 'Go down at the plunge feed.' },
  'travel noMachine': { text: 'Travel, not measured: no machine given' },
  'spindle byHand': { text: 'Spindle by hand: not measured' },
  'spindle stopsLow': { text: 'The program stops with the bit below the safe height' },
  'spindle changesLow': { text: 'The spindle changes while the bit is below the safe height' },
  'spindle byProgram': { text: 'The program starts a spindle that is switched by hand' },
  'spindle backwards': { text: 'The spindle turns counterclockwise' },
  'spindle stopped': { text: 'The bit goes below the safe height with the spindle stopped' },
  'spindle noStop': { text: 'No M0 to switch the spindle by hand' },
  'spindleSpeed noWord': { text: 'Spindle speed, not measured: set at the machine' },
  'feed noFeed': { text: 'A cutting motion without a feed' },
  'chipLoad rubs': { text: 'Chip load, too light: the bit rubs and burns', cure: 'Raise the feed or lower the speed.' },
  'chipLoad heavy': { text: 'Chip load, heavier than advised', cure: 'Lower the feed or raise the speed.' },
  'end noEnd': { text: 'The program has no end' },
  'nut beside': { text: 'Collet nut comes down beside the clamps' },
};

function figureWords(figure: Figure | null, quantity: Quantity, units: Units): string {
  if (figure === null) return '';
  if (typeof figure === 'string') return figure;
  if (typeof figure !== 'number') {
    const parts = figure.map((part) => figureWords(part, quantity, units));
    return parts.join(quantity === 'chipLoad' ? ' to ' : ', ');
  }
  switch (quantity) {
    case 'length': return formatDecimal(figure, units);
    case 'chipLoad': return formatDecimal(figure, units, units === 'in' ? 4 : 3);
    case 'angle': return `${figure.toFixed(1)}°`;
    case 'feed': return `${Number(figure.toFixed(1))} ${units}/min`;
    case 'speed': return `${Math.round(figure)} rev/min`;
    default: return String(figure);
  }
}

/** The one place where a finding becomes words; lengths are in `units`, the spec's own. */
export function sentenceOf(finding: Finding, units: Units): Sentence {
  const { rule, severity, quantity, wanted, measured, reason } = finding;
  const words = WORDS[rule];
  const more = reason === null ? undefined : REASONS[`${rule} ${reason}`];
  const text = rule === 'read' ? `Line ${finding.at.line}: ${reason ?? ''}` : (more?.text ?? words.text);
  const cure = severity === 'agrees' || severity === 'not measured' ? null : (more?.cure ?? words.cure);
  const figures = { wanted: figureWords(wanted, quantity, units), measured: figureWords(measured, quantity, units) };
  return { text, ...figures, cure, header: severity === 'caution' ? headerWords(finding, text, figures.measured) : null };
}

function headerWords({ rule }: Finding, text: string, figure: string): string {
  if (rule === 'railWidth') return `RAIL WIDTH ${figure} ASSUMED, MEASURE`;
  if (rule === 'width') return `SLOT WILL BE ${figure} WIDE, AS THE BIT CUTS`;
  return `${text} ${figure}`.trim();
}

/** One line that says how a whole readback stands. */
export function verdictSentence(findings: readonly Finding[]): string {
  const count = (severity: Finding['severity']) => findings.filter((finding) => finding.severity === severity).length;
  const parts = [
    [count('disagrees'), 'disagrees', 'disagree'], [count('caution'), 'caution', 'cautions'],
    [count('agrees'), 'agrees', 'agree'], [count('not measured'), 'not measured', 'not measured'],
  ] as const;
  return parts.filter(([n]) => n > 0).map(([n, one, many]) => `${n} ${n === 1 ? one : many}`).join(', ');
}
