import { shallowRef, watch } from 'vue';
import type { Finding } from '#shared/readback/finding';
import type { Pointing } from '~/utils/pointing';

/** Pointing at readings. One that was gone to stays shown until Escape, another reading or another drawing. */
export function usePointing(seekLine: (line: number) => void): Pointing {
  const slot = useSlotStore();
  const shown = shallowRef<Finding | null>(null);
  const kept = shallowRef<Finding | null>(null);
  watch(() => slot.draft, () => {
    shown.value = null;
    kept.value = null;
  });
  return {
    shown,
    point: (finding) => { shown.value = finding; },
    clear: (finding) => {
      if (finding === undefined) kept.value = null;
      else if (shown.value !== finding) return;
      shown.value = kept.value;
    },
    go: (finding) => {
      kept.value = shown.value = finding;
      seekLine(finding.at.line);
    },
  };
}
