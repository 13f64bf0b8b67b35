import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readProgram } from '#shared/reader/index';
import { timeOf } from '#shared/time/index';

/**
 * NISTIR 6556, Appendix C.1, started at (0, 0, 50): lengths summed by hand from the printed program. At F20 without
 * acceleration the feed moves take length ÷ 20 minutes; rapids as fast as one likes.
 */
describe('the sample program of NISTIR 6556, C.1', () => {
  const text = readFileSync(new URL('../../../fixtures/reader/nistir-6556-c1.ngc', import.meta.url), 'utf8');
  const read = readProgram(text, { start: { x: 0, y: 0, z: 50 }, units: 'mm' });
  const timeline = timeOf(read.ok ? read.program.steps : [], { acceleration: Infinity, rapidFeed: Infinity, topFeed: Infinity, spinUp: 0, cornerTime: 0 });

  it('is read', () => {
    expect(read.ok).toBe(true);
  });
  it('feeds 183.4305 mm and goes 202.0528 mm in rapids', () => {
    expect(timeline.cutLength).toBeCloseTo(183.4305, 4);
    expect(timeline.rapidLength).toBeCloseTo(202.0528, 4);
  });
  it('cuts for 9.1715 minutes', () => {
    expect(timeline.seconds / 60).toBeCloseTo(9.1715, 4);
  });
  it('leaves nothing unmeasured', () => {
    expect(timeline.unmeasured).toBe(0);
  });
});
