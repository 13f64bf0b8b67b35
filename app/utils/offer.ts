import { DECIMALS } from '#shared/measure/length';
import { type Units, byUnits } from '#shared/measure/units';
import type { Finding } from '#shared/readback/finding';
import type { SlotSpec } from '#shared/slot/spec';
import { type CountKey, type Draft, type RateKey, type SizeKey, TEXT_KEYS, isSize, isTrio, unitsOf } from './draft';
import { textOf } from './figure';
import { sizeWords } from './problems';

/** One change of one box that cures what is wrong. */
export interface Offer {
  readonly field: SizeKey | RateKey | CountKey;
  readonly text: string;
  /** On the button: `Set the stop margin to 1/4`. */
  readonly words: string;
}

const SIZE = String.raw`(\d+ \d+\/\d+|\d+\/\d+|\d*\.?\d+) (?:in|mm)`;
/** Forms in which a refusal names the size that would do (shared/slot/rules.ts). */
const LIMITS = [
  [new RegExp(`Use (?:a stop margin of )?${SIZE} or less`), 'most'],
  [new RegExp(`Use (?:a stop margin of )?${SIZE} or more`), 'least'],
  [new RegExp(`take at most ${SIZE} a pass`), 'most'],
  [new RegExp(`room for ${SIZE} or less`), 'most'],
  [new RegExp(`Let at least ${SIZE} show`), 'least'],
  [new RegExp(`own width, ${SIZE} or more`), 'least'],
] as const;
const TOP_FEED = /the machine's ([\d.]+) (?:in|mm)\/min/;

const RATE_WORDS: Readonly<Partial<Record<SizeKey | RateKey | CountKey, string>>> = { feed: 'feed', plungeFeed: 'plunge feed' };

function offer(field: SizeKey | RateKey | CountKey, text: string): Offer {
  return { field, text, words: `Set the ${isSize(field) ? sizeWords(field) : RATE_WORDS[field] ?? field} to ${text}` };
}

/** A figure with all the decimals there are may have been rounded past the limit it names: one step of the last decimal stays within. */
function within(text: string, side: 'least' | 'most', units: Units): string {
  const places = text.split('.')[1]?.length ?? 0;
  if (places < DECIMALS[units]) return text;
  return String(Number((Number(text) + (side === 'least' ? 1 : -1) * 10 ** -places).toFixed(places)));
}

/** What a refused size can be set to, where its sentence says so. */
export function offerForProblem(draft: Draft, key: string, message: string): Offer | null {
  const field = TEXT_KEYS.find((one) => one === key);
  if (field === undefined || field === 'name' || field === 'options.fileEnding') return null;
  if (!isSize(field)) {
    const top = TOP_FEED.exec(message)?.[1];
    return top === undefined ? null : offer(field, top);
  }
  for (const [form, side] of LIMITS) {
    const found = form.exec(message)?.[1];
    if (found !== undefined) return offer(field, within(found, side, unitsOf(draft)));
  }
  return null;
}

/** The next mark of the rule at or above a size, or at or below it. */
function onRule(value: number, units: Units, up: boolean): number {
  const step = byUnits(units, 1 / 64, 0.1);
  const count = up ? Math.ceil(value / step - 1e-6) : Math.floor(value / step + 1e-6);
  return Number((count * step).toFixed(6));
}

const first = (figure: Finding['wanted']): number | null =>
  typeof figure === 'number' ? figure : Array.isArray(figure) && typeof figure[0] === 'number' ? figure[0] : null;
const second = (figure: Finding['wanted']): number | null => (Array.isArray(figure) && typeof figure[1] === 'number' ? figure[1] : null);

/** The one box, and its new value, that cures a reading of a program made from `spec`. */
function cure(finding: Finding, spec: SlotSpec): readonly [SizeKey | RateKey, number] | null {
  const { rule, reason, measured: figure } = finding;
  const [wanted, measured] = [first(finding.wanted), first(figure)];
  const on = (value: number, up: boolean) => onRule(value, spec.units, up);
  if (rule === 'chipLoad') {
    const rate = spec.flutes * spec.spindleSpeed;
    const [least, most] = [wanted, second(finding.wanted)];
    if (reason === 'rubs' && least !== null) return ['feed', Math.ceil(least * rate - 1e-6)];
    return reason === 'heavy' && most !== null ? ['feed', Math.floor(most * rate + 1e-6)] : null;
  }
  if (wanted === null || measured === null) return null;
  if (rule === 'width' && reason === 'oneBit') return ['width', spec.bitDiameter];
  if (rule === 'cuttingLength') return ['depth', on(spec.cuttingLength, false)];
  if (rule === 'clamps') return ['stopMargin', on(spec.stopMargin + wanted - measured + byUnits(spec.units, 1 / 64, 0.1), true)];
  if (rule === 'nut') return ['stickout', on(spec.stickout + wanted - measured, true)];
  if (rule === 'travel' && measured > wanted) return ['length', on(spec.length - (measured - wanted), false)];
  if (rule === 'passDepth') return ['stepdown', on(Math.min(wanted, spec.stepdown), false)];
  return null;
}

/** What a reading that is off offers to change, where one box cures it. */
export function offerForFinding(draft: Draft, finding: Finding, spec: SlotSpec): Offer | null {
  if (finding.severity !== 'disagrees' && finding.severity !== 'caution') return null;
  const found = cure(finding, spec);
  if (!found || spec.units !== unitsOf(draft) || !(found[1] > 0)) return null;
  const [field, value] = found;
  // One that stands so already would cure nothing.
  if (Math.abs((field in spec ? Number(spec[field as keyof SlotSpec]) : NaN) - value) < 1e-9) return null;
  return offer(field, isSize(field) ? textOf(value, spec.units, draft.figures) : String(value));
}

/** Said once a change is made: of the three sizes that hang together, which one gives way. */
export const offerSaid = ({ field, text }: Offer): string => `${isSize(field) ? sizeWords(field) : RATE_WORDS[field] ?? field} is now ${text}${isTrio(field) ? ', and another size follows' : ''}. Undo takes it back.`;
