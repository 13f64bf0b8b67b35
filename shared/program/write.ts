import { DECIMALS, formatDecimal } from '../measure/length';
import { type Units, convertLength } from '../measure/units';
import type { SlotPath } from '../slot/path';
import type { SlotRequest } from '../slot/request';
import { type SlotSpec, railLength } from '../slot/spec';
import { WOOD_FACTS } from '../wood/woods';
import { BLANK_MARK, markComment, programMark } from './mark';
import { commentLines, commentText } from './words';

/** What the header says that only a reading of the blocks can tell. */
export interface HeaderFacts {
  /** Estimated time of the whole program. */
  readonly seconds: number;
  /** One line each, already in words. */
  readonly cautions: readonly string[];
}

/** N words stay within the four digits that every controller takes, and begin again after them (NISTIR 6556 3.3.1 lets them repeat). */
const HIGHEST_NUMBER = 9999;

/**
 * The program's text: %, header, blocks, %; every option as asked.
 *
 * RS-274 in the NISTIR 6556 dialect, held to what any three-axis controller reads alike. The header is for whoever
 * stands at the machine.
 *
 * @param body the blocks, from `writeBody`.
 * @param facts null for a draft: the blocks alone, to be read for what the header says.
 */
export function writeProgram(request: SlotRequest, path: SlotPath, body: readonly string[], facts: HeaderFacts | null): string {
  const { spec, options } = request;
  const units = options.programUnits ?? spec.units;
  const header = options.comments && facts ? headerLines(spec, units, path, facts) : [];
  const lines = [...header, ...body];
  const numbered = options.lineNumbers ? numberLines(lines) : lines;
  const all = options.percent ? ['%', ...numbered, '%'] : numbered;
  const ending = options.lineEndings === 'crlf' ? '\r\n' : '\n';
  const text = all.join(ending) + ending;
  return facts ? text.replace(markComment(BLANK_MARK), () => markComment(programMark(text))) : text;
}

function numberLines(lines: readonly string[]): string[] {
  const step = lines.length * 10 <= HIGHEST_NUMBER ? 10 : 1;
  let number = 0;
  return lines.map((line) => {
    if (line.startsWith('(')) return line;
    number = number + step > HIGHEST_NUMBER ? step : number + step;
    return `N${number} ${line}`;
  });
}

function headerLines(spec: SlotSpec, units: Units, path: SlotPath, facts: HeaderFacts): string[] {
  const size = (value: number) => formatDecimal(convertLength(value, spec.units, units), units, DECIMALS[units]);
  const feed = (value: number) => String(Math.round(convertLength(value, spec.units, units) * 10) / 10);
  const deepest = Math.max(...path.levels.map((level, i) => level - (path.levels[i - 1] ?? 0)));
  const texts = [
    ...(commentText(spec.name) ? [`NAME ${spec.name}`] : []),
    units === 'in' ? 'ALL SIZES IN INCHES' : 'ALL SIZES IN MILLIMETRES',
    `RAIL ${size(railLength(spec))} LONG ${size(spec.railWidth)} WIDE ${size(spec.railThickness)} THICK`,
    `WOOD ${WOOD_FACTS[spec.wood].words}`,
    `SLOT ${size(spec.length)} LONG ${size(spec.width)} WIDE ${size(spec.depth)} DEEP ${spec.ends} ENDS`,
    `STOP MARGIN ${size(spec.stopMargin)} EACH END`,
    `BIT ${size(spec.bitDiameter)} ${spec.bitKind} ${spec.flutes} FLUTES, LET ${size(spec.stickout)} OR MORE SHOW`,
    `SPINDLE ${Math.round(spec.spindleSpeed)} REV PER MIN, FEED ${feed(spec.feed)} PLUNGE ${feed(spec.plungeFeed)}`,
    spec.workZero === 'corner' ? 'X AND Y ZERO AT FRONT LEFT CORNER OF RAIL' : 'X AND Y ZERO AT MIDDLE OF RAIL',
    'Z ZERO ON TOP OF RAIL',
    `CLAMPS UP TO ${size(spec.clampHeight)}, SAFE HEIGHT ${size(spec.safeHeight)}`,
    `PASSES ${path.levels.length}, EACH AT MOST ${size(deepest)} DEEP`,
    `TIME ABOUT ${timeWords(facts.seconds)}`,
    ...facts.cautions.map((caution) => `CAUTION ${caution}`),
  ];
  return [markComment(BLANK_MARK), ...texts.flatMap(commentLines)];
}

function timeWords(seconds: number): string {
  const whole = Math.round(seconds);
  return whole < 60 ? `${whole} S` : `${Math.floor(whole / 60)} MIN ${whole % 60} S`;
}

/** The file's name: what it is for, its mark, its ending; safe on every file system: `squad-rail-a_K74-QDM.nc`. */
export function programFileName(spec: SlotSpec, mark: string, ending: string): string {
  const name = commentText(spec.name).toLowerCase().replace(/[^a-z0-9]+/g, '-').replace(/^-+|-+$/g, '').slice(0, 40);
  return `${name || 'rail'}_${mark}.${ending}`;
}
