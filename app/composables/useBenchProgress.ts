import type { WatchState } from '~/bench/watch';
import { PROGRESS } from '~/utils/benchKept';

/** What was ticked, measured and timed of one rail so far: kept for this tab, so that a reload at the machine loses nothing. */
export interface BenchProgress {
  ticks: Record<string, boolean>;
  /** How the program came to the machine; null: not yet. */
  taken: string | null;
  paper: string;
  watch: WatchState;
  widths: [string, string, string];
  depths: [string, string, string];
}

const fresh = (): BenchProgress => ({
  ticks: {}, taken: null, paper: '', watch: { gathered: 0, since: null, stopsBehind: 0 }, widths: ['', '', ''], depths: ['', '', ''],
});

export function useBenchProgress(programId: string) {
  const name = `${PROGRESS}${programId}`;
  const kept = sessionStorage.getItem(name);
  const progress = reactive<BenchProgress>({ ...fresh(), ...(kept ? (JSON.parse(kept) as Partial<BenchProgress>) : {}) });
  watch(progress, (now) => sessionStorage.setItem(name, JSON.stringify(now)));
  /** A v-model for one tick, by its name. */
  const tick = (key: string) => ({ 'modelValue': progress.ticks[key] === true, 'onUpdate:modelValue': (value: boolean) => { progress.ticks[key] = value; } });
  /** The next of this rail begins anew: every caution is ticked again. */
  const clear = (): void => void Object.assign(progress, fresh());
  return { progress, tick, clear };
}
