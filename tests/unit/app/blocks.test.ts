import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { effectScope, shallowRef } from 'vue';
import { makeProgram } from '#shared/makeProgram';
import { slotRequestSchema } from '#shared/slot/request';
import { type Timeline, stepAt } from '#shared/time/index';
import { usePlayback } from '../../../app/composables/usePlayback';
import { FIRST_DRAFT, withText } from '../../../app/utils/draft';
import { linesOf, stepFrom } from '../../../app/utils/lines';
import { rawRequestOf } from '../../../app/utils/rawRequest';

const timelineOf = (depth: string) => makeProgram(slotRequestSchema.parse(rawRequestOf(withText(FIRST_DRAFT, 'depth', depth)))).timeline;
const first = timelineOf('3/16');

function playing<T>(run: (playback: ReturnType<typeof usePlayback>, source: { value: Timeline | null }) => T): T {
  const scope = effectScope();
  const source = shallowRef<Timeline | null>(first);
  const said = scope.run(() => run(usePlayback(source), source));
  scope.stop();
  if (said === undefined) throw new Error('nothing was run');
  return said;
}

// Nothing plays here: a pause only takes back a frame that was never asked for.
beforeEach(() => { vi.stubGlobal('cancelAnimationFrame', () => undefined); });
afterEach(() => { vi.unstubAllGlobals(); });

describe('a block that is asked for', () => {
  // Symptom: M5 could not be chosen, and Up from the last block stayed there. Cause: steps that take no time share a
  // moment with the next one, and the moment alone was kept.
  test('is the one that is shown, whether it takes time or not, forwards and back', () => {
    const lines = linesOf(first.steps);
    const shown = playing((playback) => [...lines, ...lines.toReversed()].map((line) => {
      playback.seekStep(stepFrom(first.steps, line));
      return playback.line.value;
    }));
    expect(shown).toEqual([...lines, ...lines.toReversed()]);
    expect(new Set(first.start).size).toBeLessThan(first.steps.length); // else nothing shares a moment here
  });

  test('gives way to any other place in time, and to another program', () => {
    playing((playback, source) => {
      const last = first.steps.length - 2;
      playback.seekStep(last);
      const at = playback.time.value;
      expect(playback.step.value).toBe(last);
      playback.seek(at);
      expect(playback.step.value).not.toBe(last);
      playback.seekStep(last);
      source.value = timelineOf('1/4');
      expect(playback.time.value).toBeLessThanOrEqual(playback.seconds.value);
      expect(playback.step.value).toBe(stepAt(source.value, playback.time.value));
      return true;
    });
  });
});
