// The characters of the language (NISTIR 6556 Appendix E.3), as codes: the scanner compares numbers.

export const TAB = 9;
export const NEWLINE = 10;
export const RETURN = 13;
export const SPACE = 32;
export const OPEN = 40;
export const CLOSE = 41;
export const PLUS = 43;
export const MINUS = 45;
export const POINT = 46;
export const SLASH = 47;
export const ZERO = 48;
export const NINE = 57;
export const PERCENT = 37;
export const SMALL = 32; // the bit between a capital and its small letter
export const SMALL_N = 110;

export const A = 65;
export const NO_LETTER = 255;

/** From a character code to its letter's number, 0 for A, where Table 3 lets a word start with it. N starts no word. */
export const LETTERS = new Uint8Array(128).fill(NO_LETTER);
for (const letter of 'ABCDFGHIJKLMPQRSTXYZ') {
  const capital = letter.charCodeAt(0);
  LETTERS[capital] = LETTERS[capital + SMALL] = capital - A;
}

/** C0 and C1 controls and Unicode's two line separators: a comment holds printable characters, spaces and tabs (E). */
export function isControl(code: number): boolean {
  return (code < SPACE && code !== TAB) || (code >= 0x7f && code < 0xa0) || code === 0x2028 || code === 0x2029;
}

/** A character as a sentence can show it. */
export function nameOf(character: string): string {
  const code = character.codePointAt(0) ?? 0;
  return isControl(code) || code > 0x7e ? `U+${code.toString(16).toUpperCase().padStart(4, '0')}` : `"${character}"`;
}
