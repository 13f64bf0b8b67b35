import { execute } from './execute';
import { readError } from './errors';
import { startMachine } from './machine';
import type { Block, ReadOptions, ReadResult } from './motion';
import { emptyRequest, sortWords } from './request';
import { scanLines } from './scan';
import { readBlocks } from './words';

/** Filled again for every line of every program, as the scanner's line is. */
const SCRATCH = emptyRequest();

/**
 * Reads a program in RS-274/NGC as NISTIR 6556 defines it: text to motions and events, in their order of execution.
 *
 * Answers for any text and throws for none. A refused text gives the error that stands first in it; nothing of it is kept.
 * The whole text must be readable, also after M2, though nothing there is executed; only what follows a closing % line is
 * not looked at. Lines with a slash are executed: the block delete switch is off (2.2.2).
 */
export function readProgram(text: string, options: ReadOptions = {}): ReadResult {
  const machine = startMachine(options);
  const request = SCRATCH;
  const scan = scanLines(text, (line) => (machine.ended ? null : (sortWords(line, request) ?? execute(machine, request))));
  if (!scan.ok) return scan;
  const { comments, percent, lines } = scan;
  if (!machine.ended && !percent) return { ok: false, error: readError('noEnd', { line: lines, column: 1 }) };
  const units = machine.units ?? machine.modes.units ?? machine.unstatedUnits;
  let blocks: readonly Block[] | null = null;
  return {
    ok: true,
    program: {
      // Made when first asked for: who only wants the motions does not pay for a million words.
      get blocks() {
        blocks ??= blocksOf(text);
        return blocks;
      },
      comments,
      steps: machine.steps,
      units,
      percent,
      lines,
    },
  };
}

function blocksOf(text: string): readonly Block[] {
  const read = readBlocks(text);
  return read.ok ? read.blocks : [];
}
