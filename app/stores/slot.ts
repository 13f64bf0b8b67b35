import { defineStore } from 'pinia';
import { computed, ref, shallowRef, watch } from 'vue';
import { startCore } from '~/core';
import type { Answer, Reading } from '~/core/answer';
import { type Draft, type Figures, type PickKey, type TextKey, FIRST_DRAFT, follower, unitsOf, withPick, withText } from '~/utils/draft';
import { coinOf, coinProblems } from '~/utils/coin';
import { drawnRail } from '~/utils/drawn';
import { type Issue, problemsOf } from '~/utils/problems';
import { rawRequestOf } from '~/utils/rawRequest';
import { sizesOf } from '~/utils/sizes';

/** Enough steps to take a whole afternoon back; a draft is a few hundred bytes. */
const MOST_STEPS = 300;
/** What takes longer is said in words; what does not would only flicker. */
const NOTICED_MS = 150;

/** One rail being drawn: what was typed, its history, and the program that the core makes of it while typing. */
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
  /** Of the last request that was judged. */
  const issues = shallowRef<readonly Issue[]>([]);
  const problems = computed(() => problemsOf(draft.value, issues.value));
  const coin = computed(() => coinOf(draft.value));
  const coinFaults = computed(() => coinProblems(draft.value));
  const sound = computed(() => issues.value.length === 0 && Object.keys(problems.value).length === 0);

  // The last good ones stay on the sheet while a size is being typed.
  const drawn = shallowRef(drawnRail(FIRST_DRAFT));
  const redrawn = computed(() => drawnRail(draft.value));
  watch(redrawn, (rail) => { if (rail) drawn.value = rail; }, { flush: 'sync' });

  // The first drawing's program came with the page; those of others come from the core, which is fetched when asked.
  const reading = shallowRef<Reading | null>(useNuxtApp().payload.firstReading ?? null);
  const made = computed(() => reading.value?.made ?? null);
  /** True once the core has said all there is to say about what is on the sheet. */
  const settled = ref(reading.value !== null);
  const late = ref(false);
  const stopped = ref(false);
  let lateTimer: ReturnType<typeof setTimeout> | undefined;

  function hear(answer: Answer): void {
    stopped.value = answer.kind === 'stopped';
    if (answer.kind === 'judged') issues.value = answer.issues;
    if (answer.kind === 'made') reading.value = answer;
    if (answer.kind === 'judged' && answer.issues.length === 0) return; // its program follows
    settled.value = answer.kind !== 'stopped';
    late.value = false;
    clearTimeout(lateTimer);
  }
  const core = import.meta.client ? startCore(hear) : null;
  function ask(): void {
    settled.value = false;
    core?.ask(raw.value);
    clearTimeout(lateTimer);
    if (core) lateTimer = setTimeout(() => { late.value = !settled.value; }, NOTICED_MS);
  }
  if (!settled.value) ask();
  watch(draft, ask, { flush: 'sync' });

  return {
    // Computed, so that nothing of it is put into the page's payload: server and browser start from the same drawing.
    draft: computed(() => draft.value), type, pick, setFigures, load, seal, undo, redo,
    canUndo: computed(() => past.value.length > 0),
    canRedo: computed(() => future.value.length > 0),
    units, sizes, follows, raw, problems, sound, coin, coinProblems: coinFaults, settled: computed(() => settled.value),
    drawn: computed(() => drawn.value),
    /** The drawing is older than what is typed. */
    superseded: computed(() => redrawn.value === null),
    /** Of the last sizes that worked. Only `current` may be taken away. */
    request: computed(() => reading.value?.request ?? null),
    made,
    /** How `made` is drawn, where the core has worked it out. */
    ways: computed(() => reading.value?.ways ?? null),
    /** The core has been at work for long enough to say so, or could not be fetched. */
    late: computed(() => late.value), stopped: computed(() => stopped.value),
    current: computed(() => (sound.value && settled.value && made.value?.ok ? made.value : null)),
    /** The same, or the one before while its successor is being read back: to look at. */
    standing: computed(() => (sound.value && made.value?.ok ? made.value : null)),
  };
});
