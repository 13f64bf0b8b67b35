import { type MaybeRefOrGetter, computed, toValue } from 'vue';
import type { SlotSpec } from '#shared/slot/spec';
import type { DrawnRail } from '~/utils/drawn';
import { doneOf, lanePlaces, laneOf, marksOf, momentAt, placeAt, shownPasses, trackOf } from '~/utils/rodLanes';
import { rodView } from '~/utils/rodView';
import type { Playback } from './usePlayback';

/** Room left and right of the rod for a lane's name and its depth. */
const [NAME, DEPTH] = [62, 62];

interface Source {
  readonly rail: DrawnRail;
  readonly spec: SlotSpec | null;
  readonly width: number;
}

/** The storey rod and its lanes at a moment of the playback; draws nothing. */
export function useRod(source: MaybeRefOrGetter<Source>, playback: Playback) {
  const rail = computed(() => toValue(source).rail);
  const view = computed(() => rodView(rail.value, { left: NAME, right: toValue(source).width - DEPTH }));
  const spec = computed(() => toValue(source).spec);
  const count = computed(() => (spec.value ? playback.passes.value.length : 0));
  const numbers = computed(() => shownPasses(count.value, playback.pass.value).join());
  const lanes = computed(() => {
    const [timeline, of] = [playback.timeline.value, spec.value];
    if (!timeline || !of || numbers.value === '') return [];
    return numbers.value.split(',').flatMap((number) => laneOf(timeline, playback.passes.value, Number(number), of) ?? []);
  });
  const layout = computed(() => lanePlaces(Math.max(1, lanes.value.length)));
  const tracks = computed(() => lanes.value.map((lane, i) => trackOf(lane, { at: view.value.at, ...(layout.value.places[i] ?? { top: 16, bottom: 28 }) })));

  const along = (seconds: number): number | null => {
    const [timeline, of] = [playback.timeline.value, spec.value];
    const place = timeline && of ? placeAt(timeline, of, seconds) : null;
    return place && view.value.at(place.x);
  };
  const firstPass = computed(() => along(playback.passes.value[0]?.start ?? 0));
  /** Where the bit stands along the rod; before the program has said, where it will go in. */
  const bit = computed(() => along(playback.time.value) ?? firstPass.value);
  const done = computed(() => tracks.value.map((track) => doneOf(track, playback.time.value, bit.value)));
  /** The lane under way; before the first pass the first. */
  const current = computed(() => Math.max(0, lanes.value.findLastIndex(({ pass }) => pass <= Math.max(1, playback.pass.value))));

  const marks = computed(() => {
    const [timeline, of] = [playback.timeline.value, spec.value];
    const found = timeline && of ? marksOf(timeline, playback.passes.value, of) : null;
    const [first, last] = [layout.value.places[0], layout.value.places[lanes.value.length - 1]];
    if (!found || !first || !last) return null;
    const at = (seconds: number | null, y: number) => {
      const x = seconds === null ? null : along(seconds);
      return x === null ? null : { x, y };
    };
    return { entry: at(found.entry, first.top), finish: at(found.finish, last.middle), end: at(found.end, last.middle) };
  });
  /** A share of the program's time at which each pass starts: for many passes in one lane. */
  const starts = computed(() => {
    const { left, right } = view.value;
    const whole = playback.seconds.value;
    return count.value > lanes.value.length && whole > 0 ? playback.passStarts.value.map((start) => left + ((right - left) * start) / whole) : [];
  });
  const timeX = computed(() => view.value.left + (playback.seconds.value > 0 ? (playback.time.value / playback.seconds.value) * (view.value.right - view.value.left) : 0));

  /** Moves the playback to what a place on the lanes means; a drag stays in the lane it began in. */
  function scrub(place: { readonly x: number; readonly y: number }, lane: number): void {
    const track = tracks.value[lane];
    if (track) playback.seek(momentAt(track, place, playback.time.value));
  }
  function laneUnder(y: number): number {
    const { places } = layout.value;
    const near = places.map(({ middle }) => Math.abs(middle - y));
    return near.indexOf(Math.min(...near));
  }
  return { view, lanes, tracks, layout, done, current, bit, marks, starts, timeX, count, scrub, laneUnder };
}
