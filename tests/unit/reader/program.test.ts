import { describe, expect, it } from 'vitest';
import { READ_ERRORS, readError } from '#shared/reader/errors';
import { readProgram } from '#shared/reader/program';
import { readBlocks } from '#shared/reader/words';
import { accepted, motions, refusal, refused } from '../../standards/nistir-6556/reading';

describe('an unknown start', () => {
  const nowhere = {};

  it('leaves an axis NaN until it is stated', () => {
    const [first, second] = motions(accepted('G0 Z5\nX1\nM2', nowhere));
    expect(first).toMatchObject({ from: { x: NaN, y: NaN, z: NaN }, to: { x: NaN, y: NaN, z: 5 } });
    expect(second?.to).toEqual({ x: 1, y: NaN, z: 5 });
  });

  it('takes the axes that are given', () => {
    expect(motions(accepted('G0 X1\nM2', { start: { z: 20 } }))[0]?.from).toEqual({ x: NaN, y: NaN, z: 20 });
  });

  it('refuses an increment from nowhere', () => {
    expect(refusal('G91 G0 X1\nM2', nowhere)).toBe('unknownStart 1:8');
    expect(refusal('G0 X1\nG91 X1 Y1\nM2', nowhere)).toBe('unknownStart 2:5');
    expect(motions(accepted('G0 X1\nG91 X1\nM2', nowhere))[1]?.to.x).toBe(2);
  });

  it('refuses an arc from nowhere, and a helix from an unknown height', () => {
    expect(refusal('G0 X0\nG2 X2 I1\nM2', nowhere)).toBe('unknownStart 2:4');
    expect(refusal('G0 X0 Y0\nG2 X2 I1 Z1\nM2', nowhere)).toBe('unknownStart 2:4');
    expect(refusal('G0 X0\nG2 X2 R1\nM2', nowhere)).toBe('unknownStart 2:4');
    expect(motions(accepted('G0 X0 Y0\nG2 X2 I1\nM2', nowhere))[1]?.arc?.radius).toBe(1);
  });

  it('has no feed along a path of unknown length under G93', () => {
    expect(motions(accepted('G93 G1 X1 F2\nM2', nowhere))[0]?.feed).toBeNull();
  });
});

describe('options', () => {
  it('count a dwell in seconds or milliseconds', () => {
    const seconds = (dwellIn?: 'seconds' | 'milliseconds') => {
      const step = accepted('G4 P1500\nM2', { dwellIn }).steps[0];
      return step?.kind === 'dwell' ? step.seconds : NaN;
    };
    expect([seconds(), seconds('seconds'), seconds('milliseconds')]).toEqual([1500, 1500, 1.5]);
  });
});

describe('errors', () => {
  it('are the first in the text, whichever stage finds them', () => {
    expect(refusal('G0 G1 X1\n;\nM2')).toBe('modalGroup 1:4');
    expect(refusal(';\nG0 G1 X1\nM2')).toBe('character 1:1');
    expect(refusal('G0 X1 Y1 X2 Y2 M2')).toBe('repeatedLetter 1:10');
  });

  it('keep nothing of the text', () => {
    expect(Object.keys(readProgram('G0 X1\nG0\nM2'))).toEqual(['ok', 'error']);
  });

  it.each(READ_ERRORS)('%s says one sentence that shows what was seen', (code) => {
    const { reason } = readError(code, { line: 1, column: 1 }, 'Q7');
    expect(reason).toMatch(/^[A-Z].+\.$/);
    expect(reason).not.toMatch(/undefined|null|NaN/);
  });

  it('name the word or the character', () => {
    expect(refused('G0 X1 ;').reason).toContain('";"');
    expect(refused('G0 X1 \0').reason).toContain('U+0000');
    expect(refused('G0 X1 😀').reason).toContain('U+1F600');
    expect(refused('O1').reason).toContain('starts with O');
    expect(refused('G0 G1 X1').reason).toContain('G1');
    expect(refused('G41 X1').reason).toContain('G41 (cutter radius compensation, left)');
    expect(refused('T-1').reason).toContain('T-1');
  });
});

describe('the answer', () => {
  it('has the blocks of the lexical stage, made once', () => {
    const text = 'G0 X1 (a)\n/N5 M2\nX7\n';
    const program = accepted(text);
    expect({ ...program, steps: [] }).toEqual({
      ...readBlocks(text),
      ok: undefined,
      units: 'mm',
      steps: [],
    });
    expect(program.blocks).toBe(program.blocks);
    expect(program.blocks.map(({ number, deleted }) => [number, deleted])).toEqual([[null, false], [5, true], [null, false]]);
  });

  it('is the same for the same text', () => {
    const text = 'G0 X1 Y1\nG2 X2 I0.5 F100\nM3 S1\nM2';
    expect(readProgram(text)).toEqual(readProgram(text));
  });

  it('survives a structured clone: it is data', () => {
    const program = accepted('G0 X1\nM2');
    expect(structuredClone(program)).toEqual({ ...program });
  });

  it('places motions and events', () => {
    const { steps } = accepted('\n  N10 G0 X1 M3 S100\nM2');
    expect(steps.map(({ kind, at }) => [kind, at.line, at.column])).toEqual([['spindle', 2, 13], ['rapid', 2, 3], ['end', 3, 1]]);
  });

  it('chains motions: each starts where the one before ended', () => {
    const all = motions(accepted('G0 X1\nG1 Y2 F1\nG2 X3 I1\nG91 G0 Z1\nM2'));
    all.slice(1).forEach(({ from }, n) => expect(from).toBe(all[n]?.to));
  });
});
