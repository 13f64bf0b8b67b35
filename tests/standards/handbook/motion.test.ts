import { describe, expect, it } from 'vitest';
import { type Dynamics, timeOf } from '#shared/time/index';
import { buildSteps } from '../../support/steps/steps';

/** No corner or spindle in these: acceleration alone. */
const machine = (acceleration: number): Dynamics => ({ acceleration, rapidFeed: 6000, topFeed: Infinity, spinUp: 0, cornerTime: 0.01 });

/**
 * Uniformly accelerated motion from rest to rest (any mechanics handbook): d ≥ v²/a takes d/v + v/a, a shorter move
 * 2 √(d/a) with the peak √(a d). Worked for v = 50 mm/s and a = 500 mm/s² by closed form and by time stepping.
 */
describe('move time with acceleration', () => {
  it.each([
    { distance: 100, seconds: 2.1, peak: 50 },
    { distance: 5, seconds: 0.2, peak: 50 }, // where the two branches meet
    { distance: 2, seconds: 0.126491, peak: 31.6228 },
  ])('$distance mm at 50 mm/s with 500 mm/s² takes $seconds s', ({ distance, seconds, peak }) => {
    const timeline = timeOf(buildSteps().line({ x: distance }, 50 * 60).steps, machine(500));
    expect(timeline.seconds).toBeCloseTo(seconds, 6);
    expect(timeline.peak[0]).toBeCloseTo(peak, 4);
  });

  it('takes length ÷ feed where acceleration has no limit', () => {
    expect(timeOf(buildSteps().line({ x: 100 }, 3000).line({ y: 50 }).steps, machine(Infinity)).seconds).toBeCloseTo(3, 12);
  });
});

/** NISTIR 6556, 5.3: 2000 segments of 0.1 mm at 1000 mm/min take 12 s. */
describe('speed remark of NISTIR 6556, 5.3', () => {
  it('2000 segments of 0.1 mm at 1000 mm/min take 12 s', () => {
    const program = buildSteps();
    for (let i = 1; i <= 2000; i++) program.line({ x: i / 10 }, 1000);
    const timeline = timeOf(program.steps, machine(Infinity));
    expect(timeline.seconds).toBeCloseTo(12, 9);
    expect(timeline.cutLength).toBeCloseTo(200, 9);
  });
});

/** Right triangle of an unrolled helix: radius 10, rise 3 in one turn is 62.90343 long. */
describe('helix length', () => {
  it('one turn of radius 10 that rises 3 is 62.90343 long', () => {
    const timeline = timeOf(buildSteps({ x: 10, y: 0, z: 0 }).arc({ z: 3 }, { x: 0, y: 0 }, 1).steps, machine(Infinity));
    expect(timeline.cutLength).toBeCloseTo(62.90343, 5);
  });
});

/** Uniform circular motion: pull v²/r; with a = 500 mm/s² and r = 2 mm no more than √1000 mm/s. */
describe('speed round an arc', () => {
  it('is held to where v²/r is the acceleration', () => {
    const timeline = timeOf(buildSteps({ x: 2, y: 0, z: 0 }).arc({}, { x: 0, y: 0 }, 1, 6000).steps, machine(500));
    expect(timeline.peak[0]).toBeCloseTo(Math.sqrt(1000), 9);
  });
});
