import { describe, expect, test } from 'vitest';
import { findPasses } from '#shared/playback/index';
import { makeProgram } from '#shared/makeProgram';
import { slotRequestSchema } from '#shared/slot/request';
import { FIRST_DRAFT, withPick, withText } from '../../../app/utils/draft';
import { rawRequestOf } from '../../../app/utils/rawRequest';
import { type Track, MOST_LANES, doneOf, laneOf, lanePlaces, marksOf, momentAt, placeAt, shownPasses, trackOf } from '../../../app/utils/rodLanes';
import { rodView } from '../../../app/utils/rodView';

const RAIL = { units: 'in', railLength: 26.25, stopMargin: 0.875, length: 24.5 } as const;

describe('the rod is the rail to scale', () => {
  test('ends, stops and any place between stand in proportion', () => {
    const view = rodView(RAIL, { left: 60, right: 1110 });
    expect(view.at(0)).toBe(60);
    expect(view.at(26.25)).toBe(1110);
    expect(view.at(13.125)).toBe(585);
    expect(view.stops).toEqual([60 + 0.875 * 40, 60 + 25.375 * 40]);
  });

  test.each([[48, 16], [47.9, 8], [24, 8], [23.9, 4], [6, 4]])('at %d px to the inch the finest tick is 1/%d', (scale, finest) => {
    expect(rodView(RAIL, { left: 0, right: scale * 26.25 }).finest).toBe(finest);
  });
  test.each([[3, 1], [2.9, 5], [0.6, 5], [0.5, 10]])('at %d px to the millimetre ticks stand every %d', (scale, finest) => {
    expect(rodView({ units: 'mm', railLength: 600, stopMargin: 20, length: 560 }, { left: 0, right: scale * 600 }).finest).toBe(finest);
  });

  test('every tick stands where a rule has it, longer at wholes than at parts', () => {
    const { ticks, at, finest } = rodView(RAIL, { left: 0, right: 1300 });
    ticks.forEach(({ x }, i) => expect(x).toBeCloseTo(at((i + 1) / finest), 9));
    const high = (inches: number) => ticks.find(({ x }) => Math.abs(x - at(inches)) < 1e-6)?.high ?? 0;
    expect(high(3)).toBeGreaterThan(high(3.5));
    expect(high(3.5)).toBeGreaterThan(high(3.25));
    expect(high(3.25)).toBeGreaterThan(high(3.0625));
    expect(ticks.at(-1)?.x).toBeLessThan(1300);
  });

  test('numbers never run into each other; a short last inch has its number left of its tick', () => {
    const { ticks } = rodView(RAIL, { left: 0, right: 300 });
    const numbered = ticks.filter(({ number }) => number !== null);
    numbered.slice(1).forEach(({ x }, i) => expect(x - (numbered[i]?.x ?? 0)).toBeGreaterThanOrEqual(25.9));
    const last = rodView(RAIL, { left: 0, right: 1300 }).ticks.findLast(({ number }) => number !== null);
    expect(last).toMatchObject({ number: 26, side: 'left' });
    // Where the one before stands too near, the last goes without.
    expect(rodView(RAIL, { left: 0, right: 536 }).ticks.findLast(({ number }) => number !== null)).toMatchObject({ number: 24, side: 'right' });
  });
});

function made(draft = FIRST_DRAFT) {
  const { timeline, spec } = makeProgram(slotRequestSchema.parse(rawRequestOf(draft)));
  return { timeline, spec, passes: findPasses(timeline) };
}
const box = { at: (along: number) => 60 + along * 40, top: 10, bottom: 22 };
function tracks(draft = FIRST_DRAFT): { readonly all: readonly Track[] } & ReturnType<typeof made> {
  const program = made(draft);
  const all = program.passes.flatMap((_, i) => {
    const lane = laneOf(program.timeline, program.passes, i + 1, program.spec);
    return lane ? [trackOf(lane, box)] : [];
  });
  return { ...program, all };
}

describe('a lane is one pass of the program text', () => {
  test('one for each pass, end to start, as deep as the readback says', () => {
    const { all, passes } = tracks();
    expect(all.map(({ lane }) => lane.depth)).toEqual([-0.0938, -0.1875]);
    expect(all[0]?.lane.end).toBe(passes[1]?.start);
  });

  test.each(['corner', 'centre'])('its track runs between the stops, a bit inside them, work zero at the %s', (zero) => {
    const { all } = tracks(withPick(FIRST_DRAFT, 'workZero', zero));
    for (const { px, py } of all) {
      expect(Math.min(...px)).toBeCloseTo(box.at(0.875 + 0.125), 1);
      expect(Math.max(...px)).toBeCloseTo(box.at(26.25 - 0.875 - 0.125), 1);
      expect([Math.min(...py), Math.max(...py)]).toEqual([10, 22]);
    }
  });

  test('what is behind grows with the time, from nothing to the whole track', () => {
    const { all, timeline, spec } = tracks();
    for (const track of all) {
      let before = 0;
      for (let k = 0; k <= 200; k++) {
        const at = track.lane.start + ((track.lane.end - track.lane.start) * k) / 200;
        const place = placeAt(timeline, spec, at);
        const done = doneOf(track, at, place && box.at(place.x));
        expect(done).toBeGreaterThanOrEqual(before - 1e-6);
        before = done;
      }
      expect(before).toBe(track.far.at(-1));
      expect(doneOf(track, track.lane.start, null)).toBe(0);
    }
  });

  test('a place on the track means the moment at which the bit is there', () => {
    const { all, timeline, spec } = tracks();
    const track = all[1];
    if (!track) expect.fail('no second pass');
    for (const [x, y] of [[300, 22], [900, 22], [900, 10], [400, 10]] as const) {
      const at = momentAt(track, { x, y }, (track.lane.start + track.lane.end) / 2);
      expect(at).toBeGreaterThanOrEqual(track.lane.start);
      expect(at).toBeLessThanOrEqual(track.lane.end);
      const place = placeAt(timeline, spec, at);
      // A motion's ends, where the bit speeds up and slows down, are a few pixels off even time.
      expect(Math.abs(box.at(place?.x ?? NaN) - x)).toBeLessThan(6);
    }
    const out = momentAt(track, { x: 900, y: 22 }, 0);
    const back = momentAt(track, { x: 900, y: 10 }, 0);
    expect(back).toBeGreaterThan(out);
  });

  test('a drag along one side goes on in time and never jumps to another lap', () => {
    const { all } = tracks();
    const track = all[0];
    if (!track) expect.fail('no pass');
    let now = momentAt(track, { x: 500, y: 22 }, track.lane.end / 2);
    for (let x = 501; x <= 1000; x++) {
      const next = momentAt(track, { x, y: 22 }, now);
      expect(next).toBeGreaterThan(now);
      expect(next - now).toBeLessThan(0.5);
      now = next;
    }
  });

  test('entry and end are marked, and a finish lap where there is one', () => {
    const plain = made();
    const marks = marksOf(plain.timeline, plain.passes, plain.spec);
    expect(marks).toMatchObject({ entry: plain.passes[0]?.start, finish: null });
    const fine = made(withText(FIRST_DRAFT, 'finishAllowance', '1/64'));
    const found = marksOf(fine.timeline, fine.passes, fine.spec);
    expect(found?.finish).toBeGreaterThan(fine.passes.at(-1)?.start ?? Infinity);
    expect(found?.finish).toBeLessThan(found?.end ?? 0);
    const place = placeAt(fine.timeline, fine.spec, (found?.finish ?? 0) + 0.5);
    expect(Math.abs((place?.y ?? 0) - fine.spec.railWidth / 2)).toBeCloseTo((fine.spec.width - fine.spec.bitDiameter) / 2, 3);
    expect(marksOf(plain.timeline, [], plain.spec)).toBeNull();
  });

  test('a few passes have a lane each, more than eight share one', () => {
    expect(shownPasses(3, 2)).toEqual([1, 2, 3]);
    expect(shownPasses(MOST_LANES, 0)).toHaveLength(MOST_LANES);
    expect(shownPasses(MOST_LANES + 1, 5)).toEqual([5]);
    expect(shownPasses(40, 0)).toEqual([1]);
    for (let n = 1; n <= MOST_LANES; n++) {
      const { height, places } = lanePlaces(n);
      expect(height).toBeGreaterThanOrEqual(44);
      places.forEach((place, i) => expect(place.top).toBeGreaterThan(places[i - 1]?.bottom ?? -1));
    }
  });
});
