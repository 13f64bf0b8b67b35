import { type MaybeRefOrGetter, computed, onScopeDispose, readonly, ref, shallowRef, toValue, watch } from 'vue';
import { findPasses, passAt } from '#shared/playback/index';
import { type Timeline, stepAt } from '#shared/time/index';

/** How many seconds of the program go by in one of the clock's. */
export const PLAYBACK_SPEEDS = [1, 5, 20, 60] as const;
export type PlaybackSpeed = (typeof PLAYBACK_SPEEDS)[number];

/** A longer gap between two frames is a pause of the page, not time that was watched. */
const LONGEST_FRAME = 0.25;
/** Two moments nearer than this are one: rounding of seconds. */
const SAME = 1e-6;

/** The clock of a playback: where it stands, and the ways to move it. Draws nothing. */
export function usePlayback(source: MaybeRefOrGetter<Timeline | null>) {
  const timeline = computed(() => toValue(source));
  const seconds = computed(() => timeline.value?.seconds ?? 0);
  const passes = computed(() => (timeline.value ? findPasses(timeline.value) : []));
  const passStarts = computed(() => passes.value.map((pass) => pass.start));
  const time = ref(0);
  const playing = ref(false);
  const speed = shallowRef<PlaybackSpeed>(5);

  /** A step that was asked for by itself: of several at one moment, such as a mode and the move after it, it stays the one. */
  const asked = shallowRef(-1);
  const step = computed(() => {
    if (!timeline.value) return -1;
    const start = timeline.value.start[asked.value];
    return start !== undefined && start === time.value ? asked.value : stepAt(timeline.value, time.value);
  });
  const line = computed(() => timeline.value?.steps[step.value]?.at.line ?? 0);
  /** Counted from 1; 0 before the first. */
  const pass = computed(() => passAt(passes.value, time.value));

  let frame = 0;
  let before = 0;

  function tick(now: number) {
    frame = requestAnimationFrame(tick);
    const gone = Math.min(LONGEST_FRAME, Math.max(0, (now - before) / 1000));
    before = now;
    const next = time.value + gone * speed.value;
    if (next >= seconds.value) pause();
    time.value = Math.min(next, seconds.value);
  }

  /** Goes on from here, or from the start where it had come to the end. */
  function play() {
    if (playing.value || seconds.value === 0) return;
    if (time.value >= seconds.value - SAME) time.value = 0;
    playing.value = true;
    before = performance.now();
    frame = requestAnimationFrame(tick);
  }

  function pause() {
    playing.value = false;
    cancelAnimationFrame(frame);
  }

  const toggle = () => (playing.value ? pause() : play());

  /** Plays without being asked, unless the person has asked for less motion. */
  function playIfWelcome() {
    if (!matchMedia('(prefers-reduced-motion: reduce)').matches) play();
  }

  function seek(to: number) {
    asked.value = -1;
    time.value = Math.min(seconds.value, Math.max(0, Number.isFinite(to) ? to : 0));
  }

  /** To the start of the next (1) or the one before (-1) of the steps that take time. */
  function stepBy(direction: 1 | -1) {
    pause();
    const start = timeline.value?.start;
    if (!start) return;
    let i = step.value;
    while (start[i] !== undefined && Math.abs((start[i] ?? 0) - time.value) <= SAME) i += direction;
    if (direction > 0) while (start[i] !== undefined && (start[i] ?? 0) <= time.value + SAME) i++;
    seek(start[i] ?? (direction > 0 ? seconds.value : 0));
  }

  function seekStep(index: number) {
    pause();
    seek(timeline.value?.start[index] ?? 0);
    asked.value = index;
  }

  const nextPass = () => seek(passStarts.value.find((start) => start > time.value + SAME) ?? seconds.value);
  const previousPass = () => seek(passStarts.value.findLast((start) => start < time.value - SAME) ?? 0);

  // A new program keeps the place as far as it goes.
  watch(timeline, () => seek(time.value), { flush: 'sync' });
  onScopeDispose(() => typeof window !== 'undefined' && pause());

  return {
    timeline, time: readonly(time), seconds, playing: readonly(playing), speed, step, line, pass, passes, passStarts,
    play, pause, toggle, playIfWelcome, seek, stepBy, seekStep, nextPass, previousPass,
  };
}

export type Playback = ReturnType<typeof usePlayback>;
