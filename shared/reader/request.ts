import { readError, type ReadErrorCode } from './errors';
import { AXIS_USING, NOT_READ, NO_GROUP, gGroup, groupOfG, groupOfM, isUnread } from './modalGroups';
import type { Place, ReadError, Word } from './motion';
import { type Line, emptyLine, placeOfLine, wordsOf } from './scan';

/** The letters a request can be asked for; G and M words are asked for by group. */
export type Letter = 'D' | 'F' | 'H' | 'I' | 'J' | 'K' | 'L' | 'P' | 'Q' | 'R' | 'S' | 'T' | 'X' | 'Y' | 'Z';

/**
 * What one line asks for, its words sorted by letter and modal group.
 * One object is filled again for every line: a set bit says that the value beside it belongs to this one.
 */
export interface Request {
  line: Line;
  /** Bit n: the nth letter of the alphabet is on the line. */
  letters: number;
  readonly values: Float64Array;
  /** Bit n: a code of the nth group is on the line. */
  gGroups: number;
  readonly gCodes: Float64Array;
  mGroups: number;
  readonly mCodes: Float64Array;
  /** A code on the line is one of those refused by name. */
  unread: boolean;
}

/** NISTIR 6556 3.3.2.1. */
const CLOSE_TO_INTEGER = 0.0001;

/** Double rounding of a value written with four decimals, far below the 0.0001 it is compared with. */
const ROUNDING = 1e-9;

/** NISTIR 6556 3.3.5. */
const MOST_M_WORDS = 4;

const NON_MODAL = gGroup('nonModal');
const MOTION = gGroup('motion');
const MOTION_USES_AXES = 800; // ten times G80: of the motion group the one code that uses no axis words (3.5.15)

const indexOf = (letter: string): number => letter.charCodeAt(0) - 65;
export const bitOf = (letter: string): number => 1 << indexOf(letter);
export const AXES = bitOf('X') | bitOf('Y') | bitOf('Z');
const G_LETTER = indexOf('G');
const M_LETTER = indexOf('M');
const ROTARY = bitOf('A') | bitOf('B') | bitOf('C');

export function emptyRequest(): Request {
  return {
    line: emptyLine(),
    letters: 0,
    values: new Float64Array(26),
    gGroups: 0,
    gCodes: new Float64Array(32),
    mGroups: 0,
    mCodes: new Float64Array(32),
    unread: false,
  };
}

export const has = (request: Request, letter: Letter): boolean => (request.letters & bitOf(letter)) !== 0;
export const valueOf = (request: Request, letter: Letter): number => request.values[indexOf(letter)] ?? 0;

/** The code of a modal group on this line, such as 59.1; null where the line has none. */
export const gCode = (request: Request, group: number): number | null =>
  (request.gGroups & (1 << group)) === 0 ? null : (request.gCodes[group] ?? null);
export const mCode = (request: Request, group: number): number | null =>
  (request.mGroups & (1 << group)) === 0 ? null : (request.mCodes[group] ?? null);

/** A word as its writer would know it: `G1`, `X-0.5`. */
export const shown = (word: Word): string => word.letter + String(word.value);

/** The first word of the line that fits; null where none does. */
export function findWord(request: Request, fits: (word: Word) => boolean): Word | null {
  return wordsOf(request.line).find(fits) ?? null;
}

export const placeOf = (request: Request, word: Word | null): Place => word?.at ?? placeOfLine(request.line);
export const isG = (group: number) => (word: Word) => word.letter === 'G' && groupOfG(Math.round(word.value * 10)) === group;
export const isM = (group: number) => (word: Word) => word.letter === 'M' && groupOfM(Math.round(word.value)) === group;

/** Sorts the words of a line into `request`, by the rules of NISTIR 6556 3.3.5 and 3.4. */
export function sortWords(line: Line, request: Request): ReadError | null {
  request.line = line;
  request.letters = 0;
  request.gGroups = 0;
  request.mGroups = 0;
  request.unread = false;
  let mWords = 0;
  for (let n = 0; n < line.count; n++) {
    const letter = line.letters[n] ?? 0;
    const value = line.values[n] ?? 0;
    let refusal: ReadErrorCode | null;
    if (letter === G_LETTER) refusal = sortG(request, value);
    else if (letter === M_LETTER) refusal = sortM(request, value) ?? (++mWords > MOST_M_WORDS ? 'tooManyM' : null);
    else refusal = sortLetter(request, letter, value);
    if (refusal !== null) return refuseNth(line, n, refusal);
  }
  return request.unread ? refuseUnread(request) : null;
}

function sortLetter(request: Request, letter: number, value: number): ReadErrorCode | null {
  const bit = 1 << letter;
  if ((bit & ROTARY) !== 0) return 'rotaryAxis';
  if ((bit & request.letters) !== 0) return 'repeatedLetter';
  request.letters |= bit;
  request.values[letter] = value;
  return null;
}

function sortG(request: Request, value: number): ReadErrorCode | null {
  const tenths = Math.round(value * 10);
  if (!isClose(value * 10, tenths)) return 'notAnInteger';
  const group = groupOfG(tenths);
  if (group === NO_GROUP) return 'unknownCode';
  if ((request.gGroups & (1 << group)) !== 0) return 'modalGroup';
  request.gGroups |= 1 << group;
  request.gCodes[group] = tenths / 10;
  request.unread ||= isUnread(tenths);
  return null;
}

function sortM(request: Request, value: number): ReadErrorCode | null {
  const code = Math.round(value);
  if (!isClose(value, code)) return 'notAnInteger';
  const group = groupOfM(code);
  if (group === NO_GROUP) return 'unknownCode';
  if ((request.mGroups & (1 << group)) !== 0) return 'modalGroup';
  request.mGroups |= 1 << group;
  request.mCodes[group] = code;
  return null;
}

function refuseNth(line: Line, n: number, code: ReadErrorCode): ReadError {
  const word = wordsOf(line)[n];
  return readError(code, word?.at ?? placeOfLine(line), word === undefined ? '' : shown(word));
}

/** Within 0.0001 of an integer (3.3.2.1). */
export const isClose = (value: number, integer: number): boolean => Math.abs(value - integer) <= CLOSE_TO_INTEGER + ROUNDING;

/** A clash over the axis words (3.4) first, for that is the report's own rule; then what only this reader does not run. */
function refuseUnread(request: Request): ReadError {
  const nonModal = gCode(request, NON_MODAL);
  const motion = gCode(request, MOTION);
  if (nonModal !== null && motion !== null && motion * 10 !== MOTION_USES_AXES && AXIS_USING.includes(nonModal)) {
    const word = findWord(request, isG(NON_MODAL));
    return readError('axisConflict', placeOf(request, word), `G${nonModal}`);
  }
  const word = findWord(request, ({ letter, value }) => letter === 'G' && isUnread(Math.round(value * 10)));
  const code = word === null ? 0 : Math.round(word.value * 10) / 10;
  return readError('codeNotRead', placeOf(request, word), `G${code} (${NOT_READ[code] ?? ''})`);
}
