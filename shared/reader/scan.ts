import { A, CLOSE, LETTERS, MINUS, NEWLINE, NINE, NO_LETTER, OPEN, PERCENT, PLUS, POINT, RETURN, SLASH, SMALL, SMALL_N, SPACE, TAB, ZERO, isControl, nameOf } from './characters';
import { type Cursor, END, LONGEST_LINE, codeAt, endLine, fail, nextCode } from './cursor';
import { readError } from './errors';
import type { Comment, Place, ReadError, Word } from './motion';

/**
 * One line as the scanner hands it over, its words in columns: word n has letters[n] (0 for A), values[n] and columns[n].
 * One object is filled again for every line, which is what makes the reader fast; whoever keeps a word copies it.
 */
export interface Line {
  /** Number of the line in the text, from 1. */
  line: number;
  /** Column of its first printing character, from 1. */
  column: number;
  /** The N word. */
  number: number | null;
  /** It began with a slash. */
  deleted: boolean;
  count: number;
  readonly letters: Uint8Array;
  readonly values: Float64Array;
  readonly columns: Uint16Array;
}

/** What the scanner knows at the end of a text; an error is the first, the visitor's included. */
export type ScanResult =
  | {
      readonly ok: true;
      readonly comments: readonly Comment[];
      /** True where a pair of % lines holds the program. */
      readonly percent: boolean;
      /** Lines read: to the end of the text, or to the closing % line. */
      readonly lines: number;
    }
  | { readonly ok: false; readonly error: ReadError };

/** NISTIR 6556 3.3.1: `000009` is not OK. */
const LINE_NUMBER_DIGITS = 5;

/** Up to 15 digits a mantissa is exact in a double, and so is its power of ten: their quotient is correctly rounded. */
const EXACT_DIGITS = 15;
const POWERS_OF_TEN = Float64Array.from({ length: EXACT_DIGITS + 1 }, (_, n) => 10 ** n);

/** NISTIR 6556 3.3.2.4: recognised so that they can be refused by name. */
const FUNCTION = /^(?:abs|acos|asin|atan|cos|exp|fix|fup|ln|round|sin|sqrt|tan)(?=\[)/i;

/** The one line that every scan fills: a visitor keeps nothing of it and starts no scan, and making its columns anew costs as much as reading a short program. */
const SCRATCH = emptyLine();

/**
 * Scans a text line by line, strictly by NISTIR 6556 3.1, 3.3 and Appendix E: what is not allowed is an error.
 * `visit` is called for every line with a word, a number or a slash; it stops the scan by returning an error.
 *
 * A line ends with a carriage return, a line feed or both. Characters are counted as UTF-16 units.
 * What follows the second percent line is not read at all.
 */
export function scanLines(text: string, visit: (line: Line) => ReadError | null): ScanResult {
  const cursor: Cursor = { text, i: 0, line: 1, lineStart: 0, failure: null, comments: [] };
  const line = SCRATCH;
  let opened = false;
  let closed = false;
  let blank = true;
  let more = text.length > 0;
  while (more) {
    const code = nextCode(cursor);
    let held = false;
    if (code === PERCENT) {
      if (!opened && !blank) fail(cursor, 'percentPlace', cursor.i);
      readPercent(cursor);
      closed = opened;
      opened = true;
    } else if (code !== END) held = readLine(cursor, line, code);
    if (code !== END) blank = false;
    if (cursor.i - cursor.lineStart > LONGEST_LINE) fail(cursor, 'lineTooLong', cursor.lineStart + LONGEST_LINE);
    const error = cursor.failure ?? (held ? visit(line) : null);
    if (error !== null) return { ok: false, error };
    more = !closed && endLine(cursor);
  }
  if (opened && !closed) {
    const at = { line: cursor.line, column: cursor.i - cursor.lineStart + 1 };
    return { ok: false, error: readError('percentNotClosed', at) };
  }
  return { ok: true, comments: cursor.comments, percent: closed, lines: cursor.line };
}

export function emptyLine(): Line {
  return {
    line: 0,
    column: 0,
    number: null,
    deleted: false,
    count: 0,
    letters: new Uint8Array(LONGEST_LINE), // a word has two characters at least: never full
    values: new Float64Array(LONGEST_LINE),
    columns: new Uint16Array(LONGEST_LINE),
  };
}

/** The place of a line's first printing character. */
export const placeOfLine = ({ line, column }: Line): Place => ({ line, column });

/** A line's words, as copies that may be kept. */
export function wordsOf({ line, count, letters, values, columns }: Line): Word[] {
  return Array.from({ length: count }, (_, n) => ({
    letter: String.fromCharCode(A + (letters[n] ?? 0)),
    value: values[n] ?? 0,
    at: { line, column: columns[n] ?? 0 },
  }));
}

function readPercent(cursor: Cursor): void {
  const sign = cursor.i++;
  if (nextCode(cursor) !== END) fail(cursor, 'percentAlone', sign);
}

/** One line from its first printing character: `line = [block_delete] + [line_number] + {segment}` (E.2). False if only comments. */
function readLine(cursor: Cursor, line: Line, first: number): boolean {
  line.line = cursor.line;
  line.column = cursor.i - cursor.lineStart + 1;
  line.count = 0;
  line.number = null;
  let code = first;
  line.deleted = code === SLASH;
  if (line.deleted) {
    cursor.i++;
    code = nextCode(cursor);
  }
  if ((code | SMALL) === SMALL_N) {
    line.number = readLineNumber(cursor);
    code = nextCode(cursor);
  }
  while (code !== END && cursor.failure === null) {
    const letter = code < LETTERS.length ? (LETTERS[code] ?? NO_LETTER) : NO_LETTER;
    if (cursor.i - cursor.lineStart >= LONGEST_LINE) fail(cursor, 'lineTooLong', cursor.i);
    else if (letter !== NO_LETTER) readWord(cursor, line, letter);
    else if (code === OPEN) readComment(cursor);
    else failCharacter(cursor, code);
    code = nextCode(cursor);
  }
  return line.count > 0 || line.number !== null || line.deleted;
}

function readLineNumber(cursor: Cursor): number {
  const start = cursor.i++;
  let value = 0;
  let digits = 0;
  let code = nextCode(cursor);
  for (; code >= ZERO && code <= NINE; code = nextCode(cursor)) {
    value = value * 10 + code - ZERO;
    digits++;
    cursor.i++;
  }
  if (digits === 0 || digits > LINE_NUMBER_DIGITS || code === POINT) fail(cursor, 'lineNumberForm', start);
  return value;
}

/** A letter and its number (3.3.2.1); blanks between the digits change nothing (3.3). */
function readWord(cursor: Cursor, line: Line, letter: number): void {
  const { text } = cursor;
  const start = cursor.i++;
  let code = nextCode(cursor);
  const negative = code === MINUS;
  if (negative || code === PLUS) {
    cursor.i++;
    code = nextCode(cursor);
  }
  const first = cursor.i;
  let i = first; // the hot loop: a local, and a call only where a blank stands
  let mantissa = 0;
  let digits = 0;
  let point = -1; // digits before the point
  for (;;) {
    if (code >= ZERO && code <= NINE) {
      mantissa = mantissa * 10 + code - ZERO;
      digits++;
    } else if (code === POINT && point < 0) point = digits;
    else if (code === SPACE || code === TAB) {
      cursor.i = i;
      code = nextCode(cursor);
      i = cursor.i;
      if (code === END) break;
      continue;
    } else break;
    code = codeAt(text, ++i);
  }
  cursor.i = i;
  if (digits === 0) failNumber(cursor, start, letter);
  else if (code === POINT) fail(cursor, 'numberForm', i);
  const places = point < 0 ? 0 : digits - point;
  const size = digits > EXACT_DIGITS ? longNumber(cursor, first) : mantissa / (POWERS_OF_TEN[places] ?? 1);
  const n = line.count++;
  line.letters[n] = letter;
  line.values[n] = negative ? 0 - size : size; // 0 - 0 is 0: no word reads as minus zero
  line.columns[n] = start - cursor.lineStart + 1;
}

/** A number with more digits than the quick way can round correctly. */
function longNumber(cursor: Cursor, first: number): number {
  return Number(cursor.text.slice(first, cursor.i).replace(/[ \t]/g, ''));
}

/** Why no number follows a letter. */
function failNumber(cursor: Cursor, start: number, letter: number): void {
  const name = FUNCTION.exec(cursor.text.slice(cursor.i, cursor.i + LONGEST_LINE).replace(/[ \t]/g, ''))?.[0];
  if (name !== undefined) fail(cursor, 'functionNotRead', cursor.i, name.toUpperCase());
  else if (cursor.text[cursor.i] === '#' || cursor.text[cursor.i] === '[') failCharacter(cursor, cursor.text.charCodeAt(cursor.i));
  else fail(cursor, 'missingNumber', start, String.fromCharCode(A + letter));
}

/** Why a character starts no word and no comment. */
function failCharacter(cursor: Cursor, code: number): void {
  const character = String.fromCodePoint(cursor.text.codePointAt(cursor.i) ?? code);
  if (character === '#') fail(cursor, 'parameterNotRead', cursor.i);
  else if (character === '[') fail(cursor, 'expressionNotRead', cursor.i);
  else if (character === '/') fail(cursor, 'slashPlace', cursor.i);
  else if (character === '%') fail(cursor, 'percentAlone', cursor.i);
  else if (/[nN]/.test(character)) fail(cursor, 'lineNumberPlace', cursor.i);
  else if (/[a-zA-Z]/.test(character)) fail(cursor, 'letter', cursor.i, character.toUpperCase());
  else fail(cursor, 'character', cursor.i, nameOf(character));
}

/** A comment closes at the first right parenthesis, on its line, and holds no left one (3.3.4). */
function readComment(cursor: Cursor): void {
  const start = cursor.i++;
  for (;;) {
    const code = codeAt(cursor.text, cursor.i);
    if (code === CLOSE) break;
    if (code === NEWLINE || code === RETURN) return fail(cursor, 'commentNotClosed', start);
    if (code === OPEN) return fail(cursor, 'nestedComment', cursor.i);
    if (isControl(code)) return fail(cursor, 'commentCharacter', cursor.i, nameOf(String.fromCharCode(code)));
    cursor.i++;
  }
  const at = { line: cursor.line, column: start - cursor.lineStart + 1 };
  cursor.comments.push({ text: cursor.text.slice(start + 1, cursor.i), at });
  cursor.i++;
}
