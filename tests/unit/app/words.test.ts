import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Finding, Readback, Severity } from '#shared/readback/finding';
import { ROUTER_CAUTIONS, cautionsOf, clock, countWord, differing, plural, spokenClock, verdictOf } from '../../../app/utils/words';

const finding = (severity: Severity): Finding => ({ rule: 'depth', severity, at: { line: 1, column: 1 }, point: null, quantity: 'length', wanted: 1, measured: 1, reason: null });
const readback = (...severities: readonly Severity[]): Readback => ({ verdict: 'agrees', findings: severities.map(finding) });

describe('counts and times in words', () => {
  it.each([[0, 'No'], [1, 'One'], [10, 'Ten'], [11, '11']])('%i: %s', (count, word) => expect(countWord(count)).toBe(word));

  it('one is one, anything else is many', () => {
    expect([plural(1, 'pass', 'passes'), plural(2, 'pass', 'passes'), plural(0, 'line')]).toEqual(['1 pass', '2 passes', '0 lines']);
  });

  it.each([[62, '1:02', '1 minute 2 seconds'], [0, '0:00', '0 seconds'], [60, '1:00', '1 minute'], [3661.4, '1:01:01', '61 minutes 1 second'], [-5, '0:00', '0 seconds']])('%d s is %s', (seconds, shown, said) => {
    expect([clock(seconds), spokenClock(seconds)]).toEqual([shown, said]);
  });

  it('a clock keeps every second', () => {
    fc.assert(fc.property(fc.integer({ min: 0, max: 200_000 }), (seconds) => {
      const parts = clock(seconds).split(':').map(Number);
      expect(parts.reduce((sum, part) => sum * 60 + part, 0)).toBe(seconds);
      for (const part of parts.slice(1)) expect(part).toBeLessThan(60);
    }));
  });
});

describe('the readback in one sentence', () => {
  it('counts what stands out', () => {
    expect(verdictOf(readback('agrees', 'agrees'))).toBe('2 readings, all agree.');
    expect(verdictOf(readback('agrees', 'disagrees', 'caution', 'caution', 'not measured'))).toBe('5 readings, 1 differs from the drawing, 2 cautions, 1 not measured.');
    expect(verdictOf(readback('disagrees', 'disagrees'))).toBe('2 readings, 2 differ from the drawing.');
  });

  it('cautions and differences are picked out of the rest', () => {
    const all = readback('caution', 'agrees', 'disagrees');
    expect(cautionsOf(all)).toEqual([all.findings[0]]);
    expect(differing(all)).toEqual([all.findings[2]]);
  });
});

it('every router caution is said', () => {
  for (const word of ['Eye and ear', 'Dust extraction', 'respirator', 'gloves', 'sleeves', 'Clamps', 'in air', 'Hand on the stop']) expect(ROUTER_CAUTIONS.join(' ')).toContain(word);
});
