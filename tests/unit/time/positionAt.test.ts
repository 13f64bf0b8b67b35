import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Dynamics, newMoment, positionAt, stepAt, timeOf } from '#shared/time/index';
import { buildSteps } from '../../support/steps/steps';

const MM: Dynamics = { acceleration: 500, rapidFeed: 6000, topFeed: Infinity, spinUp: 4, cornerTime: 0.01 };

const PROGRAM = buildSteps()
  .spindle('clockwise').rapid({ z: 5 }).rapid({ x: 10, y: 10 }).line({ z: 0 }, 600).line({ x: 60, z: -2 }, 2400)
  .arc({ x: 60, y: 14 }, { x: 60, y: 12 }, 1).event('coolant').line({ x: 10 }).arc({ x: 10, y: 10, z: -4 }, { x: 10, y: 12 }, 1)
  .line({ x: 10.001 }).rapid({ z: 5 }).spindle('stopped').event('end').steps;
const TIMELINE = timeOf(PROGRAM, MM);
const somewhere = fc.double({ min: 0, max: TIMELINE.seconds, noNaN: true });

describe('positionAt', () => {
  it('stands exactly on each step\'s end', () => {
    for (const [i, step] of PROGRAM.entries()) {
      if (step.kind !== 'rapid' && step.kind !== 'line' && step.kind !== 'arc') continue;
      const { x, y, z } = positionAt(TIMELINE, TIMELINE.end[i] ?? NaN);
      expect({ x, y, z }).toEqual(step.to);
    }
  });

  it('never runs backwards', () => {
    fc.assert(
      fc.property(somewhere, somewhere, (a, b) => {
        const early = positionAt(TIMELINE, Math.min(a, b));
        const late = positionAt(TIMELINE, Math.max(a, b));
        expect(late.travel).toBeGreaterThanOrEqual(early.travel);
        expect(late.step).toBeGreaterThanOrEqual(early.step);
      }),
      { numRuns: 2000 },
    );
  });

  it('moves no faster than the fastest feed: no jump anywhere', () => {
    fc.assert(
      fc.property(somewhere, fc.double({ min: 1e-4, max: 0.05, noNaN: true }), (at, pause) => {
        const a = positionAt(TIMELINE, at);
        const b = positionAt(TIMELINE, at + pause);
        expect(Math.hypot(b.x - a.x, b.y - a.y, b.z - a.z)).toBeLessThanOrEqual(100 * pause + 1e-9);
        expect(b.travel - a.travel).toBeGreaterThanOrEqual(Math.hypot(b.x - a.x, b.y - a.y, b.z - a.z) - 1e-9);
      }),
      { numRuns: 1000 },
    );
  });

  it('agrees with time stepping: speed from differences never changes faster than the acceleration within a motion', () => {
    const i = 4; // the long ramp
    const [begun = 0, ended = 0] = [TIMELINE.start[i], TIMELINE.end[i]];
    const pause = (ended - begun) / 500;
    const speed = (t: number) => (positionAt(TIMELINE, t + pause / 2).travel - positionAt(TIMELINE, t - pause / 2).travel) / pause;
    for (let n = 2; n < 498; n++) {
      const t = begun + n * pause;
      expect(Math.abs(speed(t + pause) - speed(t)) / pause).toBeLessThanOrEqual(500 * 1.001);
    }
  });

  it('finds the step that a plain search finds', () => {
    fc.assert(
      fc.property(somewhere, (t) => {
        const plain = PROGRAM.findLastIndex((_, i) => (TIMELINE.start[i] ?? Infinity) <= t);
        expect(stepAt(TIMELINE, t)).toBe(plain);
      }),
    );
  });

  it('holds at both ends of the program', () => {
    expect(positionAt(TIMELINE, -5)).toMatchObject({ step: 0, travel: 0 });
    expect(positionAt(TIMELINE, TIMELINE.seconds + 5)).toMatchObject({ step: PROGRAM.length - 1, z: 5, fraction: 1 });
  });

  it('says where nothing is known that nothing is known', () => {
    const steps = buildSteps({ x: NaN, y: NaN, z: NaN }).rapid({ z: 5 }).dwell(1).rapid({ x: 1, y: 2 }).dwell(1).steps;
    const timeline = timeOf(steps, MM);
    expect(positionAt(timeline, 0.5)).toMatchObject({ x: NaN, y: NaN, z: 5, step: 1 });
    expect(positionAt(timeline, 1.5)).toMatchObject({ x: 1, y: 2, z: 5, step: 3 });
  });

  it('answers for a program without steps, and writes into what it is given', () => {
    const out = newMoment();
    expect(positionAt(timeOf([], MM), 0, out)).toBe(out);
    expect(out).toMatchObject({ step: -1, travel: 0 });
  });
});
