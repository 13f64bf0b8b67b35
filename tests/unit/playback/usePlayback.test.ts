import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { effectScope, shallowRef } from 'vue';
import { defaultDynamics, timeOf } from '#shared/time/index';
import { type Playback, usePlayback } from '../../../app/composables/usePlayback';
import { grooveSteps } from '../../support/steps/rail';

const DYNAMICS = defaultDynamics('in', null);
const LONG = timeOf(grooveSteps([0.0625, 0.125, 0.1875]).steps, DYNAMICS);
const SHORT = timeOf(grooveSteps([0.0625]).steps, DYNAMICS);

/** A clock and a frame that only the test moves. */
let now = 0;
let waiting: FrameRequestCallback | null = null;
function frameAfter(milliseconds: number) {
  now += milliseconds;
  const run = waiting;
  waiting = null;
  run?.(now);
}

const scope = effectScope();
function start(timeline = shallowRef(LONG)): Playback {
  const playback = scope.run(() => usePlayback(timeline));
  if (!playback) throw new Error('the scope has ended');
  return playback;
}

beforeEach(() => {
  [now, waiting] = [1000, null];
  vi.stubGlobal('requestAnimationFrame', (run: FrameRequestCallback) => (waiting = run, 1));
  vi.stubGlobal('cancelAnimationFrame', () => (waiting = null));
  vi.spyOn(performance, 'now').mockImplementation(() => now);
});
afterEach(() => {
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

describe('usePlayback', () => {
  it('lets the program go by at the chosen speed, and stops at its end', () => {
    const playback = start();
    playback.speed.value = 20;
    playback.play();
    frameAfter(100);
    expect(playback.time.value).toBeCloseTo(2, 9);
    for (let i = 0; i < 1000 && playback.playing.value; i++) frameAfter(200);
    expect(playback.playing.value).toBe(false);
    expect(playback.time.value).toBe(LONG.seconds);
    expect(waiting).toBeNull();
  });

  it('begins anew when played from the end', () => {
    const playback = start();
    playback.seek(Infinity);
    expect(playback.time.value).toBe(0); // no such moment
    playback.seek(1e9);
    playback.play();
    expect(playback.time.value).toBe(0);
  });

  it('does not count the time a page was hidden', () => {
    const playback = start();
    playback.speed.value = 1;
    playback.play();
    frameAfter(3_600_000);
    expect(playback.time.value).toBeLessThan(1);
  });

  it('goes from pass to pass, and to the end after the last', () => {
    const playback = start();
    expect(playback.passStarts.value).toHaveLength(3);
    const seen: number[] = [];
    for (let i = 0; i < 4; i++) {
      playback.nextPass();
      seen.push(playback.time.value);
    }
    expect(seen).toEqual([...playback.passStarts.value, LONG.seconds]);
    playback.previousPass();
    expect(playback.time.value).toBe(playback.passStarts.value[2]);
    expect(playback.pass.value).toBe(3);
  });

  it('steps to every step that takes time, forwards, and back the same way', () => {
    const playback = start();
    const moments = [...new Set([...LONG.start, LONG.seconds])];
    const forwards = [playback.time.value];
    while (playback.time.value < LONG.seconds) {
      playback.stepBy(1);
      forwards.push(playback.time.value);
    }
    expect(forwards).toEqual(moments);
    const back = [playback.time.value];
    while (playback.time.value > 0) {
      playback.stepBy(-1);
      back.push(playback.time.value);
    }
    expect(back).toEqual(moments.reverse());
  });

  it('goes back to the start of the step under way', () => {
    const playback = start();
    const begun = LONG.start[6] ?? NaN;
    playback.seek(begun + 0.01);
    playback.stepBy(-1);
    expect(playback.time.value).toBe(begun);
  });

  it('keeps its place when the program changes, as far as that goes', () => {
    const timeline = shallowRef(LONG);
    const playback = start(timeline);
    playback.seek(LONG.seconds);
    timeline.value = SHORT;
    expect(playback.time.value).toBe(SHORT.seconds);
    expect(playback.step.value).toBe(SHORT.steps.length - 1);
  });

  it('does not start on its own where less motion is asked for', () => {
    const playback = start();
    vi.stubGlobal('matchMedia', () => ({ matches: true }));
    playback.playIfWelcome();
    expect(playback.playing.value).toBe(false);
    vi.stubGlobal('matchMedia', () => ({ matches: false }));
    playback.playIfWelcome();
    expect(playback.playing.value).toBe(true);
  });
});
