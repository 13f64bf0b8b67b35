import { parseStringSync } from 'gcode-parser';

/** A word as it stands in the text, beside the number the package read. */
export interface Word {
  readonly letter: string;
  /** The characters after the letter, as written. */
  readonly text: string;
  readonly value: number;
}

export interface TextLine {
  /** Counted from 1. */
  readonly line: number;
  /** Without its line ending. */
  readonly text: string;
  readonly words: readonly Word[];
  /** What is neither word, blank nor comment. */
  readonly rest: string;
  /** Text from each opening parenthesis on; `closed` is false where none closes it on the line. */
  readonly comments: readonly { readonly text: string; readonly closed: boolean }[];
  /** What gcode-parser read otherwise than this file did; empty when both agree. */
  readonly disagreement: string;
}

export interface ProgramText {
  readonly whole: string;
  readonly lines: readonly TextLine[];
}

const WORD = /([A-Za-z])\s*([-+.\d][-+.\dEe]*)?/g;
const COMMENT = /\(([^)]*)(\)?)/g;

/** Splits a program into lines and words; the numbers are gcode-parser's, the characters are the text's own. */
export function readText(whole: string): ProgramText {
  const parsed = parseStringSync(whole);
  let next = 0;
  const lines = whole.split('\n').map((raw, index): TextLine => {
    const text = raw.replace(/\r$/, '');
    const comments = [...text.matchAll(COMMENT)].map(found => ({ text: found[1] ?? '', closed: found[2] === ')' }));
    const code = text.replace(COMMENT, ' ');
    const seen = text.trim() === '' ? undefined : parsed[next++]; // the package skips blank lines
    const theirs = [...(seen?.ln === undefined ? [] : [['N', seen.ln] as const]), ...(seen?.words ?? [])];
    const mine = [...code.matchAll(WORD)].map(found => ({ letter: found[1] ?? '', text: found[2] ?? '' }));
    const same = theirs.length === mine.length
      && mine.every((word, at) => word.letter.toUpperCase() === theirs[at]?.[0] && Number(word.text) === theirs[at]?.[1]);
    return {
      line: index + 1,
      text,
      words: mine.map((word, at) => ({ ...word, value: Number(same ? theirs[at]?.[1] : word.text) })),
      rest: code.replace(WORD, '').trim(),
      comments,
      disagreement: same ? '' : `gcode-parser reads ${JSON.stringify(theirs)}`,
    };
  });
  if (lines.at(-1)?.text === '') lines.pop(); // the last line's own ending
  return { whole, lines };
}

/** The lines that hold words, each a block. */
export function blocksOf(program: ProgramText): readonly TextLine[] {
  return program.lines.filter(line => line.words.length > 0);
}

export function valueOf(block: TextLine, letter: string): number | undefined {
  return block.words.find(word => word.letter === letter)?.value;
}

export function hasWord(block: TextLine, letter: string, value: number): boolean {
  return block.words.some(word => word.letter === letter && word.value === value);
}

/** First member of the motion group that the block states (NISTIR 6556 Table 4, group 1; G80 ends motion). */
export function motionCode(block: TextLine): number | undefined {
  return block.words.find(word => word.letter === 'G' && [0, 1, 2, 3, 80].includes(word.value))?.value;
}

export const AXIS_LETTERS: readonly string[] = ['X', 'Y', 'Z'];

export function namesAxis(block: TextLine): boolean {
  return block.words.some(word => AXIS_LETTERS.includes(word.letter));
}
