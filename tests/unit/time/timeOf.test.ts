import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Step } from '#shared/reader/motion';
import { type Dynamics, defaultDynamics, timeAssumes, timeOf } from '#shared/time/index';
import { buildSteps } from '../../support/steps/steps';

const MM: Dynamics = { acceleration: 500, rapidFeed: 6000, topFeed: Infinity, spinUp: 4, cornerTime: 0.01 };

/** Any continuous program of lines, rapids and arcs, a few of them very short. */
const anyProgram = fc
  .array(
    fc.record({
      kind: fc.constantFrom('rapid', 'line', 'arc', 'dwell'),
      x: fc.integer({ min: -4000, max: 4000 }), y: fc.integer({ min: -4000, max: 4000 }), z: fc.integer({ min: -300, max: 300 }),
      feed: fc.integer({ min: 100, max: 6000 }), turn: fc.constantFrom<1 | -1>(1, -1),
    }),
    { minLength: 1, maxLength: 40 },
  )
  .map((moves) => {
    const program = buildSteps();
    let [x, y] = [0, 0];
    for (const move of moves) {
      const to = { x: move.x / 100, y: move.y / 100, z: move.z / 100 };
      if (move.kind === 'dwell') program.dwell(move.feed / 1000);
      else if (move.kind === 'rapid') program.rapid(to);
      else if (move.kind === 'line' || (to.x === x && to.y === y)) program.line(to, move.feed);
      else program.arc(to, { x: (x + to.x) / 2, y: (y + to.y) / 2 }, move.turn, move.feed);
      if (move.kind !== 'dwell') [x, y] = [to.x, to.y];
    }
    return program.steps;
  });

const secondsOf = (steps: readonly Step[], dynamics: Partial<Dynamics> = {}) => timeOf(steps, { ...MM, ...dynamics }).seconds;

describe('timeOf', () => {
  it('takes a move split on its own line as long as the whole move', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 0.001, max: 1, noNaN: true }), { minLength: 1, maxLength: 30 }), (shares) => {
        const total = shares.reduce((sum, share) => sum + share, 0);
        const whole = buildSteps().line({ x: 30, y: 40, z: -2 }).steps;
        const split = buildSteps();
        let done = 0;
        for (const share of shares.slice(0, -1)) {
          done += share / total;
          split.line({ x: 30 * done, y: 40 * done, z: -2 * done });
        }
        split.line({ x: 30, y: 40, z: -2 });
        // 1e-4: at a joint the directions differ by rounding of the coordinates, which costs next to nothing.
        expect(secondsOf(split.steps)).toBeCloseTo(secondsOf(whole), 4);
      }),
    );
  });

  it('never takes longer with more acceleration, and never less than length ÷ feed', () => {
    fc.assert(
      fc.property(anyProgram, fc.integer({ min: 10, max: 5000 }), fc.double({ min: 1, max: 20, noNaN: true }), (steps, acceleration, factor) => {
        const slow = secondsOf(steps, { acceleration });
        const quick = secondsOf(steps, { acceleration: acceleration * factor });
        const least = secondsOf(steps, { acceleration: Infinity });
        expect(quick).toBeLessThanOrEqual(slow + 1e-9);
        expect(least).toBeLessThanOrEqual(quick + 1e-9);
      }),
    );
  });

  it('keeps every motion within its feed, and every pair of meeting speeds equal', () => {
    fc.assert(
      fc.property(anyProgram, (steps) => {
        const timeline = timeOf(steps, MM);
        let speed = 0;
        steps.forEach((step, i) => {
          const [entry = 0, peak = 0, exit = 0, length = 0] = [timeline.entry[i], timeline.peak[i], timeline.exit[i], timeline.length[i]];
          if (step.kind === 'dwell') expect(speed).toBe(0);
          if (length === 0) return;
          expect(entry).toBeCloseTo(speed, 9);
          expect(peak).toBeGreaterThanOrEqual(Math.max(entry, exit));
          const feed = step.kind === 'rapid' ? MM.rapidFeed : step.kind === 'line' || step.kind === 'arc' ? (step.feed ?? 0) : 0;
          expect(peak).toBeLessThanOrEqual(feed / 60 + 1e-9);
          expect(Math.abs(exit ** 2 - entry ** 2)).toBeLessThanOrEqual(2 * MM.acceleration * length + 1e-6);
          speed = exit;
        });
        expect(speed).toBeCloseTo(0, 9);
      }),
    );
  });

  it('slows at a square corner to where the velocity jumps by acceleration × corner time', () => {
    const timeline = timeOf(buildSteps().line({ x: 100 }, 3000).line({ y: 100 }).steps, MM);
    expect(timeline.exit[0]).toBeCloseTo((500 * 0.01) / Math.SQRT2, 12);
    expect(timeline.entry[1]).toBe(timeline.exit[0]);
  });

  it('runs straight from a line into an arc that leaves along it, at the pace the arc allows', () => {
    const timeline = timeOf(buildSteps().line({ x: 100 }, 3000).arc({ x: 100, y: 4 }, { x: 100, y: 2 }, 1).line({ x: 0 }).steps, MM);
    expect(timeline.exit[0]).toBeCloseTo(Math.sqrt(500 * 2), 9); // v² ÷ r = a
    expect(timeline.peak[1]).toBeCloseTo(Math.sqrt(500 * 2), 9);
  });

  it('reaches dwells, spindle switches, stops and exact stops standing, but not coolant', () => {
    const there = (with_: (program: ReturnType<typeof buildSteps>) => unknown) => {
      const program = buildSteps();
      program.line({ x: 100 });
      with_(program);
      program.line({ x: 200 });
      return timeOf(program.steps, MM).exit[0];
    };
    expect(there((p) => p.dwell(1))).toBe(0);
    expect(there((p) => p.spindle('clockwise'))).toBe(0);
    expect(there((p) => p.event('stop'))).toBe(0);
    expect(there((p) => p.event('toolChange'))).toBe(0);
    expect(there((p) => p.event('coolant'))).toBeCloseTo(50, 9);
    expect(timeOf(buildSteps().pathControl(61.1).line({ x: 100 }).line({ x: 200 }).steps, MM).exit[0]).toBe(0);
  });

  it('waits for a spindle that starts, once, and lets a dwell behind it count as that wait', () => {
    const wait = (...with_: ((p: ReturnType<typeof buildSteps>) => unknown)[]) => {
      const program = buildSteps();
      for (const add of with_) add(program);
      return secondsOf(program.steps);
    };
    expect(wait((p) => p.spindle('clockwise'))).toBe(4);
    expect(wait((p) => p.spindle('clockwise'), (p) => p.spindle('clockwise'))).toBe(4);
    expect(wait((p) => p.spindle('clockwise'), (p) => p.spindle('stopped'), (p) => p.spindle('clockwise'))).toBe(8);
    expect(wait((p) => p.spindle('clockwise'), (p) => p.spindle('counterclockwise'))).toBe(8);
    expect(wait((p) => p.spindle('clockwise'), (p) => p.dwell(3))).toBe(4);
    expect(wait((p) => p.spindle('clockwise'), (p) => p.dwell(6))).toBe(6);
    expect(wait((p) => p.dwell(3), (p) => p.spindle('clockwise'))).toBe(7);
  });

  it('counts stops, and nothing for them', () => {
    const timeline = timeOf(buildSteps().event('stop').event('stop').event('end').steps, MM);
    expect(timeline).toMatchObject({ stops: 2, seconds: 0 });
  });

  it('counts the way from an unknown place as nothing, and what follows in full', () => {
    const steps = buildSteps({ x: NaN, y: NaN, z: NaN }).rapid({ z: 5 }).rapid({ x: 10, y: 20 }).rapid({ z: 2 }).line({ x: 13, y: 24 }, 60).steps;
    const timeline = timeOf(steps, { ...MM, acceleration: Infinity });
    expect(timeline).toMatchObject({ unmeasured: 2, rapidLength: 3, cutLength: 5 });
    expect(timeline.seconds).toBeCloseTo(3 / 100 + 5, 12);
  });

  it('counts a Z move as known where X and Y are nowhere stated', () => {
    const timeline = timeOf(buildSteps({ x: NaN, y: NaN, z: 5 }).rapid({ z: 2 }).steps, MM);
    expect(timeline).toMatchObject({ unmeasured: 0, rapidLength: 3 });
  });

  it('counts a cut before any feed as nothing rather than for ever', () => {
    const timeline = timeOf(buildSteps({ x: 0, y: 0, z: 0 }, null).line({ x: 10 }).line({ x: 20 }, 600).steps, { ...MM, acceleration: Infinity });
    expect(timeline.unmeasured).toBe(1);
    expect(timeline.seconds).toBeCloseTo(1, 12);
  });

  it('cuts no faster than the machine can', () => {
    expect(secondsOf(buildSteps().line({ x: 100 }, 6000).steps, { acceleration: Infinity, topFeed: 3000 })).toBeCloseTo(2, 12);
  });
});

describe('defaultDynamics and its words', () => {
  const none = { unmeasured: 0, stops: 0 };
  it('names what nobody said, and only that', () => {
    expect(timeAssumes('in', null, none)).toBe('acceleration 20 in/s², rapids at 200 in/min, 4 s to spin up');
    expect(timeAssumes('mm', { acceleration: 800 }, { unmeasured: 2, stops: 2 }))
      .toBe('rapids at 5000 mm/min, 4 s to spin up, the way to the first point not counted, stops not counted');
    expect(timeAssumes('mm', { acceleration: 800, topFeed: 3000 }, none)).toBe('4 s to spin up');
  });
  it('takes the shop\'s figures', () => {
    expect(defaultDynamics('mm', { acceleration: 800, topFeed: 3000 })).toMatchObject({ acceleration: 800, topFeed: 3000, rapidFeed: 3000 });
  });
});
