import { parseStringSync } from 'gcode-parser';
import { assert } from '#shared/assert';
import { readProgram } from '#shared/reader/program';

/**
 * A generated program of `lines` lines as a stopped groove is cut: ramps, straight passes, half circles, a retract per groove.
 * Every line has its number, as in the sample programs of NISTIR 6556.
 */
export function generateProgram(lines: number): string {
  const text = ['G21 G90 G17 G94', 'T1 M6', 'M3 S18000', 'G0 Z5.0000'];
  for (let groove = 0; text.length < lines - 1; groove++) {
    const [x, y] = [(groove % 80) / 7, (groove % 60) / 11];
    text.push('(groove)', `G0 X${x.toFixed(4)} Y${y.toFixed(4)}`, 'G0 Z1.0000', 'G1 Z0.0000 F300.0');
    for (let pass = 1; pass <= 12; pass++) {
      const z = (-pass / 9).toFixed(4);
      text.push(
        `G1 X${(x + 90).toFixed(4)} Y${y.toFixed(4)} Z${z} F900.0`,
        `G1 X${x.toFixed(4)} Y${y.toFixed(4)} F1800.0`,
        `G3 X${x.toFixed(4)} Y${(y - 1.5).toFixed(4)} I0.0000 J-0.7500`,
        `G1 X${(x + 90).toFixed(4)} Y${(y - 1.5).toFixed(4)}`,
        `G3 X${(x + 90).toFixed(4)} Y${y.toFixed(4)} I0.0000 J0.7500`,
        `G1 X${x.toFixed(4)} Y${y.toFixed(4)}`,
      );
    }
    text.push('G0 Z5.0000');
  }
  return [...text.slice(0, lines - 1), 'M2'].map((line, n) => `N${n % 100_000} ${line}\n`).join('');
}

/** What a race gives: medians in milliseconds, and how many times faster ours is. */
export interface RaceResult {
  readonly name: string;
  readonly ours: number;
  readonly theirs: number;
  readonly ratio: number;
}

const LINES = 100_000;
const RUNS = 7; // odd, so that the median is a run

/** Our whole interpretation against a popular parser that only splits the same text into words; runs alternate. */
export async function benchReader(): Promise<RaceResult> {
  const text = generateProgram(LINES);
  const read = readProgram(text);
  assert(read.ok, 'the generated program is read');
  const ours: number[] = [];
  const theirs: number[] = [];
  for (let run = 0; run < RUNS; run++) {
    ours.push(time(() => readProgram(text)));
    theirs.push(time(() => parseStringSync(text)));
  }
  const [our, their] = [median(ours), median(theirs)];
  return { name: 'read 100 000 lines: readProgram (interprets) vs gcode-parser (splits words)', ours: our, theirs: their, ratio: their / our };
}

function time(job: () => unknown): number {
  const start = performance.now();
  job();
  return performance.now() - start;
}

function median(times: readonly number[]): number {
  return [...times].sort((a, b) => a - b)[(times.length - 1) / 2] ?? NaN;
}
