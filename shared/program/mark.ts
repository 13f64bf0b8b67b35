import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';

/** Capitals and digits without look-alikes: of 0 and O, 1 and I, 5 and S, 8 and B at most one, and no Z beside 2. */
export const MARK_LETTERS = 'ACDEFGHJKLMNPQRTUVWXY2346789';

/** What stands in the first comment before the mark is known, and what the mark is blanked to for hashing. */
export const BLANK_MARK = '___-___';

/** The words before the mark in the program's first comment. */
const LABEL = 'PROGRAM MARK ';
const IN_TEXT = new RegExp(`^(\\(${LABEL})([${MARK_LETTERS}]{3}-[${MARK_LETTERS}]{3})(\\))$`, 'm');

/** The first comment of a program. */
export function markComment(mark: string): string {
  return `(${LABEL}${mark})`;
}

/** The mark that a program's text bears, or null. */
export function markIn(text: string): string | null {
  return IN_TEXT.exec(bareText(text))?.[2] ?? null;
}

/** A text without what may change on its way to a machine: N words, % lines, blanks outside comments, line endings. */
function bareText(text: string): string {
  return text.split(/\r\n?|\n/).map(bareLine).filter((line) => line !== '' && line !== '%').join('\n');
}

function bareLine(line: string): string {
  // The two lines of which nearly every program is made: one comment and nothing else, and words alone.
  if (line.startsWith('(') && line.indexOf(')') === line.length - 1) return line;
  if (!line.includes('(') && !line.includes('\t')) return line.replaceAll(' ', '').replace(/^N\d+/i, '');
  return line.replace(/\([^)]*\)|[ \t]+/g, (part) => (part.startsWith('(') ? part : '')).replace(/^N\d+/i, '');
}

/** The text that a mark stands for: bare, and with the mark blanked. Comments count. */
export function markedText(text: string): string {
  return bareText(text).replace(IN_TEXT, `$1${BLANK_MARK}$3`);
}

/**
 * The program mark: six letters of the text's SHA-256 (FIPS 180-4), shown `K74-QDM`. 28^6 marks are about 480 million:
 * two programs of one shop may share one, so a look-up lists every program that bears it.
 */
export function programMark(text: string): string {
  const hash = sha256(utf8ToBytes(markedText(text)));
  // 40 bits are taken, so that no letter is more likely than another by more than a part in two thousand.
  let number = hash.slice(0, 5).reduce((sum, byte) => sum * 256 + byte, 0);
  let letters = '';
  for (let i = 0; i < 6; i++) {
    letters += MARK_LETTERS[number % MARK_LETTERS.length];
    number = Math.floor(number / MARK_LETTERS.length);
  }
  return `${letters.slice(0, 3)}-${letters.slice(3)}`;
}

/** A mark as somebody typed it (`k74qdm`, `K74-QDM`) in its one form, or null where it cannot be a mark. */
export function readMark(text: string): string | null {
  const letters = text.toUpperCase().replace(/[\s-]/g, '');
  const form = new RegExp(`^[${MARK_LETTERS}]{6}$`);
  return form.test(letters) ? `${letters.slice(0, 3)}-${letters.slice(3)}` : null;
}

/** SHA-256 of the text's own bytes, hex: what a downloaded file is compared by. */
export function sha256Hex(text: string): string {
  return bytesToHex(sha256(utf8ToBytes(text)));
}
