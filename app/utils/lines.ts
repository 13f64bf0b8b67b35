import type { Step } from '#shared/reader/motion';

/**
 * The first step at a line of the program or after it; as many as there are steps where there is none. A program runs
 * from its first line to its last, so its steps stand in the order of their lines.
 */
export function stepFrom(steps: readonly Step[], line: number): number {
  let [low, high] = [0, steps.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((steps[middle]?.at.line ?? Infinity) < line) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** The lines that do something, in order: playback can stand at these. */
export function linesOf(steps: readonly Step[]): readonly number[] {
  const lines: number[] = [];
  for (const { at } of steps) if (at.line !== lines.at(-1)) lines.push(at.line);
  return lines;
}
