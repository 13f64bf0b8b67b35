// Any text at all is answered or refused: never an exception, never longer than a floor and a little per byte.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { READ_ERRORS } from '#shared/reader/errors';
import { readProgram } from '#shared/reader/program';

const SEED = 6556; // fixed, so that a failure is the same for everybody

const LONGEST_MS = 50;
const MS_PER_BYTE = 0.005;

const byte = fc.integer({ min: 0, max: 255 });
const bytes = fc.array(byte, { maxLength: 600 }).map((codes) => String.fromCharCode(...codes));
const anyUnicode = fc.string({ unit: 'binary', maxLength: 300 });

const number = fc.oneof(
  fc.integer({ min: -99, max: 99 }).map(String),
  fc.double({ min: -1e3, max: 1e3, noNaN: true }).map((value) => value.toFixed(4)),
  fc.constantFrom('.5', '5.', '+0.25', '-0', '0', '1.2.3', '', '-', '1e3', '[1+2]', '#5', `9${'9'.repeat(200)}`),
);
const word = fc.oneof(
  { weight: 4, arbitrary: fc.tuple(fc.constantFrom(...'XYZIJKRFSTP'), number).map((parts) => parts.join('')) },
  { weight: 3, arbitrary: fc.constantFrom(...'G0 G1 G2 G3 G17 G18 G19 G20 G21 G90 G91 G93 G94 G80 G4 G54 G64 M3 M5 M6 M8 M0 M2 M30'.split(' ')) },
  { weight: 1, arbitrary: fc.tuple(fc.constantFrom(...'ABCDEGHLMNOQUVWgxyz%/;()'), number).map((parts) => parts.join('')) },
);
const line = fc.array(word, { maxLength: 7 }).map((words) => words.join(' '));
const almostProgram = fc.array(line, { maxLength: 40 }).map((lines) => `${lines.join('\n')}\nM2\n`);

const VALID = `%
(stopped groove)
N10 G21 G90 G17 G94
T1 M6
M3 S18000
G0 X6.0000 Y0.0000 Z5.0000
G1 Z0.0000 F300.0
/G1 X90.0000 Z-1.0000 F900.0
G3 X90.0000 Y-1.5000 I0.0000 J-0.7500
G2 X80.0000 Y-1.5000 R5.0
G0 Z5.0000 M5
M2
%
`;

/** A valid program with characters struck out, doubled, changed or swapped. */
const damaged = fc
  .array(fc.tuple(fc.nat(VALID.length - 1), fc.nat(3), byte), { minLength: 1, maxLength: 5 })
  .map((hits) =>
    hits.reduce((text, [place, how, code]) => {
      const [before, here, after] = [text.slice(0, place), text.charAt(place), text.slice(place + 1)];
      return [before + after, before + here + here + after, before + String.fromCharCode(code) + after, before + after.charAt(0) + here + after.slice(1)][how] ?? text;
    }, VALID),
  );

const codes: ReadonlySet<string> = new Set(READ_ERRORS);

/** Milliseconds of one reading; fails on an exception and on an answer without a place. */
function check(text: string): number {
  const begin = performance.now();
  const result = readProgram(text, { start: { x: 0, y: 0, z: 0 } });
  const elapsed = performance.now() - begin;
  if (!result.ok) {
    const { code, at, reason } = result.error;
    expect(codes.has(code)).toBe(true);
    expect(at.line).toBeGreaterThanOrEqual(1);
    expect(at.column).toBeGreaterThanOrEqual(1);
    expect(at.column).toBeLessThanOrEqual(257);
    expect(reason).not.toBe('');
    return elapsed;
  }
  for (const step of result.program.steps) {
    if ('to' in step) {
      for (const value of [step.to.x, step.to.y, step.to.z]) expect(Number.isFinite(value)).toBe(true);
      if (step.arc !== null) {
        expect(step.arc.radius).toBeGreaterThan(0);
        expect(step.arc.sweep).toBeGreaterThan(0);
        expect(step.arc.sweep).toBeLessThanOrEqual(2 * Math.PI);
      }
    }
  }
  return elapsed;
}

describe.each([
  ['random bytes', bytes, 2500],
  ['any Unicode', anyUnicode, 1500],
  ['almost a program', almostProgram, 3000],
  ['a damaged program', damaged, 3000],
] as const)('%s', (_, texts, numRuns) => {
  it(`is answered or refused in time, ${numRuns} times`, () => {
    fc.assert(
      fc.property(texts, (text) => {
        const limit = LONGEST_MS + MS_PER_BYTE * Buffer.byteLength(text);
        const elapsed = check(text);
        // A pause of the machine is not ours: a text over the limit has a second run.
        expect(elapsed <= limit || check(text) <= limit).toBe(true);
      }),
      { seed: SEED, numRuns },
    );
  });
});

describe('long texts', () => {
  it.each([
    ['one line of words', 'X1'.repeat(200_000)],
    ['one comment', `(${'-'.repeat(400_000)}`],
    ['one number', `X${'1'.repeat(400_000)}`],
    ['one number in blanks', `X${' 1'.repeat(200_000)}`],
    ['spaces', ' '.repeat(400_000)],
    ['brackets', `X${'['.repeat(400_000)}`],
    ['empty lines', '\n'.repeat(400_000)],
    ['slashes', '/\n'.repeat(200_000)],
    ['comments', '(a)\n'.repeat(100_000)],
    ['changing modes', 'G91 F1\nG90 F2\n'.repeat(30_000)],
    ['changing feeds', Array.from({ length: 40_000 }, (_, n) => `G1 X1 F${n}`).join('\n')],
  ])('%s', (_, text) => {
    const limit = LONGEST_MS + MS_PER_BYTE * text.length;
    expect(Math.min(check(text), check(text))).toBeLessThanOrEqual(limit);
  });
});

it('the damaged program is valid before the damage', () => {
  expect(readProgram(VALID).ok).toBe(true);
});
