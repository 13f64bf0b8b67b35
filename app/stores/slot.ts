import { defineStore } from 'pinia';
import { useDebounceFn } from '@vueuse/core';
import { computed, ref, shallowRef, watch } from 'vue';
import { type MadeProgram, makeProgram } from '#shared/makeProgram';
import { type SlotRequest, slotRequestSchema } from '#shared/slot/request';
import { type Draft, type Figures, type PickKey, type TextKey, FIRST_DRAFT, follower, unitsOf, withPick, withText } from '~/utils/draft';
import { drawnRail } from '~/utils/drawn';
import { problemsOf } from '~/utils/problems';
import { rawRequestOf } from '~/utils/rawRequest';
import { sizesOf } from '~/utils/sizes';

/** Enough steps to take a whole afternoon back; a draft is a few hundred bytes. */
const MOST_STEPS = 300;
/** Longer than the gap between two keystrokes of a fast typist, shorter than anyone notices. */
const SETTLE_MS = 40;

/** One rail being drawn: what was typed, its history, and the program the browser makes of it while typing. */
export const useSlotStore = defineStore('slot', () => {
  const draft = shallowRef<Draft>(FIRST_DRAFT);
  const past = shallowRef<readonly Draft[]>([]);
  const future = shallowRef<readonly Draft[]>([]);
  /** The box being typed in: its keystrokes are one step back, until it is left. */
  let open: string | null = null;

  function change(next: Draft, key: string | null): void {
    if (key === null || key !== open) past.value = [...past.value, draft.value].slice(-MOST_STEPS);
    open = key;
    future.value = [];
    draft.value = next;
  }
  const type = (key: TextKey, text: string) => change(withText(draft.value, key, text), key);
  const pick = (key: PickKey, value: string) => change(withPick(draft.value, key, value), null);
  const setFigures = (figures: Figures) => change({ ...draft.value, figures }, null);
  const load = (next: Draft) => change(next, null);
  const seal = () => { open = null; };

  function undo(): void {
    const back = past.value.at(-1);
    if (!back) return;
    future.value = [draft.value, ...future.value];
    past.value = past.value.slice(0, -1);
    draft.value = back;
    open = null;
  }
  function redo(): void {
    const [next, ...rest] = future.value;
    if (!next) return;
    past.value = [...past.value, draft.value];
    future.value = rest;
    draft.value = next;
    open = null;
  }

  const units = computed(() => unitsOf(draft.value));
  const sizes = computed(() => sizesOf(draft.value));
  const follows = computed(() => follower(draft.value));
  const raw = computed(() => rawRequestOf(draft.value));
  const parsed = computed(() => slotRequestSchema.safeParse(raw.value));
  const problems = computed(() => problemsOf(draft.value, parsed.value.success ? [] : parsed.value.error.issues));
  const sound = computed(() => parsed.value.success && Object.keys(problems.value).length === 0);

  // The last good ones stay on the sheet while a size is being typed.
  const drawn = shallowRef(drawnRail(FIRST_DRAFT));
  const redrawn = computed(() => drawnRail(draft.value));
  watch(redrawn, (rail) => { if (rail) drawn.value = rail; }, { flush: 'sync' });

  const made = shallowRef<MadeProgram | null>(null);
  const request = shallowRef<SlotRequest | null>(null);
  /** True while `made` belongs to the sizes on the sheet. */
  const settled = ref(false);
  function remake(): void {
    if (parsed.value.success && sound.value) {
      request.value = parsed.value.data;
      made.value = makeProgram(parsed.value.data);
      settled.value = true;
    }
  }
  const remakeSoon = useDebounceFn(remake, SETTLE_MS);
  remake();
  watch(draft, () => {
    settled.value = false;
    void remakeSoon();
  }, { flush: 'sync' });

  return {
    // Computed, so that nothing of it is put into the page's payload: server and browser start from the same drawing.
    draft: computed(() => draft.value), type, pick, setFigures, load, seal, undo, redo,
    canUndo: computed(() => past.value.length > 0),
    canRedo: computed(() => future.value.length > 0),
    units, sizes, follows, raw, problems, sound, settled: computed(() => settled.value),
    drawn: computed(() => drawn.value),
    /** The drawing is older than what is typed. */
    superseded: computed(() => redrawn.value === null),
    /** Of the last sizes that worked. Only `current` may be taken away. */
    request: computed(() => request.value),
    made: computed(() => made.value),
    current: computed(() => (sound.value && settled.value && made.value?.ok ? made.value : null)),
  };
});
