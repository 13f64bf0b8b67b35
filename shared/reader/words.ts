import type { Block, Comment, ReadError } from './motion';
import { placeOfLine, scanLines, wordsOf } from './scan';

/** The lexical stage's answer. */
export type BlocksResult =
  | {
      readonly ok: true;
      readonly blocks: readonly Block[];
      readonly comments: readonly Comment[];
      /** True where a pair of % lines holds the program. */
      readonly percent: boolean;
      /** Lines read: to the end of the text, or to the closing % line. */
      readonly lines: number;
    }
  | { readonly ok: false; readonly error: ReadError };

/** Splits a text into blocks of words (NISTIR 6556 3.3): characters and numbers are checked, what the words ask for is not. */
export function readBlocks(text: string): BlocksResult {
  const blocks: Block[] = [];
  const scan = scanLines(text, (line) => {
    blocks.push({ at: placeOfLine(line), number: line.number, deleted: line.deleted, words: wordsOf(line) });
    return null;
  });
  return scan.ok ? { ...scan, blocks } : scan;
}
