import { NEWLINE, RETURN, SPACE, TAB } from './characters';
import { readError, type ReadErrorCode } from './errors';
import type { Comment, ReadError } from './motion';

/** NISTIR 6556 3.3, without the end of line marker. */
export const LONGEST_LINE = 256;

/** What `nextCode` gives at the end of a line. */
export const END = -1;

/** Where the scanner is. */
export interface Cursor {
  readonly text: string;
  i: number;
  line: number;
  lineStart: number;
  failure: ReadError | null;
  readonly comments: Comment[];
}

/** The character code at an index; the text ends as a line does, with or without a marker. */
export const codeAt = (text: string, i: number): number => (i < text.length ? text.charCodeAt(i) : NEWLINE);

/** The next character code that is no space or tab, left unread; END at the end of the line. */
export function nextCode(cursor: Cursor): number {
  const { text } = cursor;
  let code = codeAt(text, cursor.i);
  while (code === SPACE || code === TAB) code = codeAt(text, ++cursor.i);
  return code === NEWLINE || code === RETURN ? END : code;
}

/** Steps over the end of line marker to the next line; false where the text ends, with or without a marker. */
export function endLine(cursor: Cursor): boolean {
  const { text } = cursor;
  const both = codeAt(text, cursor.i) === RETURN && codeAt(text, cursor.i + 1) === NEWLINE;
  const next = cursor.i + (both ? 2 : 1);
  if (next >= text.length) return false;
  cursor.i = next;
  cursor.lineStart = next;
  cursor.line++;
  return true;
}

/** Keeps the first error. One past the 256th character is put down to the line's length: that comes first in the text. */
export function fail(cursor: Cursor, code: ReadErrorCode, index: number, saw = ''): void {
  if (cursor.failure !== null) return;
  const long = index - cursor.lineStart >= LONGEST_LINE;
  const column = long ? LONGEST_LINE + 1 : index - cursor.lineStart + 1;
  cursor.failure = readError(long ? 'lineTooLong' : code, { line: cursor.line, column }, saw);
}
