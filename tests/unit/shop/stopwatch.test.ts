import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { happeningAt, makeStopwatch } from '#shared/shop/stopwatch';
import { positionAt } from '#shared/time/index';
import { RAIL_A, asked } from '../slot/asking';

function watchOf(more: object = {}) {
  const request = asked({ ...RAIL_A, ...more });
  const made = makeProgram(request);
  if (!made.ok) throw new Error('the program disagrees');
  return { timeline: made.timeline, watch: makeStopwatch(made.timeline, request.spec.finishAllowance) };
}

describe('the stopwatch', () => {
  const { timeline, watch } = watchOf();
  const at = (seconds: number) => happeningAt(watch, seconds);
  const moments = Array.from({ length: 2000 }, (_, i) => (timeline.seconds * i) / 2000);

  it('marks two passes, 3/32 and 3/16 deep, and the end', () => {
    expect(watch.marks.map(({ kind, pass }) => [kind, pass])).toEqual([['pass', 1], ['pass', 2], ['end', 2]]);
    const [first, second, end] = watch.marks.map(({ seconds }) => seconds);
    expect(at(first ?? NaN)).toMatchObject({ pass: 1, of: 2 });
    expect(at((first ?? NaN) - 0.01)).toMatchObject({ pass: 0, depth: null });
    expect(at(second ?? NaN).depth).toBeCloseTo(0.1875, 4);
    expect(at((second ?? NaN) - 0.01).depth).toBeCloseTo(0.09375, 4);
    expect(end).toBe(timeline.seconds);
  });

  it('begins with the spindle and ends done', () => {
    expect(at(1)).toMatchObject({ role: 'spinning up', pass: 0, next: { kind: 'pass', pass: 1 } });
    expect(at(timeline.seconds)).toMatchObject({ role: 'done', pass: 2, next: null });
    expect(at(timeline.seconds + 100).role).toBe('done');
    expect(at(-1)).toMatchObject({ pass: 0, next: { pass: 1 } });
  });

  it('says of every moment what the bit does there', () => {
    const h = 1e-6;
    const seen = new Set<string>();
    for (const seconds of moments) {
      const { role } = at(seconds);
      seen.add(role);
      const [now, then] = [positionAt(timeline, seconds), positionAt(timeline, seconds + h)];
      if (at(seconds + h).role !== role) continue; // between two of them
      const rise = then.z - now.z;
      if (role === 'cutting') expect([now.z < 0, Math.abs(rise) < 1e-12]).toEqual([true, true]);
      if (role === 'entering') expect(rise).toBeLessThan(0);
      if (role === 'raising') expect(rise).toBeGreaterThan(0);
      if (role === 'moving clear') expect(now.z >= 0 || Number.isNaN(now.z)).toBe(true);
    }
    for (const role of ['spinning up', 'entering', 'cutting', 'raising']) expect(seen).toContain(role);
    expect(seen).not.toContain('finish lap');
  });

  it('never goes back a pass, and has the next mark ahead', () => {
    let pass = 0;
    for (const seconds of moments) {
      const now = at(seconds);
      expect(now.pass).toBeGreaterThanOrEqual(pass);
      expect(now.next?.seconds).toBeGreaterThan(seconds);
      pass = now.pass;
    }
  });
});

describe('a finish lap', () => {
  it('is marked behind the last pass and said while it is cut', () => {
    const { watch } = watchOf({ finishAllowance: 0.02 });
    expect(watch.marks.map(({ kind }) => kind)).toEqual(['pass', 'pass', 'finish lap', 'end']);
    const lap = watch.marks.find(({ kind }) => kind === 'finish lap');
    expect(happeningAt(watch, (lap?.seconds ?? NaN) + 0.5)).toMatchObject({ role: 'finish lap', pass: 2, of: 2 });
  });
});

describe('a spindle switched by hand', () => {
  it('has a mark at each stop, where the watch is held', () => {
    const { watch } = watchOf({ spindle: 'hand' });
    expect(watch.marks.map(({ kind }) => kind)).toEqual(['stop', 'pass', 'pass', 'stop', 'end']);
  });
});
