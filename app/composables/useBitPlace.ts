import { newMoment, positionAt } from '#shared/time/index';
import { railLength } from '#shared/slot/spec';
import type { BitPlace } from '~/utils/bitPlace';
import type { Playback } from './usePlayback';

/** Where the playing bit stands on the plan, from the rail's front left corner. */
export function useBitPlace(playback: Playback) {
  const slot = useSlotStore();
  const moment = newMoment();
  return computed<BitPlace | null>(() => {
    const timeline = playback.timeline.value;
    const spec = slot.made?.spec;
    if (!timeline || !spec || playback.time.value === 0) return null;
    positionAt(timeline, playback.time.value, moment);
    const { x, y } = moment;
    if (Number.isNaN(x) || Number.isNaN(y)) return null;
    return spec.workZero === 'centre' ? { x: x + railLength(spec) / 2, y: y + spec.railWidth / 2 } : { x, y };
  });
}
