import type { CountKey, RateKey, SizeKey } from '~/utils/draft';

/** What a box shows: typed by hand, worked out from others, left at its default, or missing. */
export type BoxState = 'entered' | 'derived' | 'needed';

/** What one press of an arrow changes where the figure is no length: coarse, and fine with Shift. */
const STEPS: Readonly<Partial<Record<RateKey | CountKey, readonly [number, number]>>> = {
  'feed': [5, 1], 'plungeFeed': [5, 1], 'flutes': [1, 1], 'spindleSpeed': [500, 100], 'rampAngle': [0.5, 0.1], 'stepover': [0.05, 0.01],
  'chipLoadRange.0': [0.001, 0.0001], 'chipLoadRange.1': [0.001, 0.0001], 'options.chordTolerance': [0.001, 0.0001],
};

/** A box of the drawing and its text in the store: the thin wrapper between UiSize and the pure functions. */
export function useSizeBox(field: () => SizeKey | RateKey | CountKey) {
  const slot = useSlotStore();
  const { announce } = useSaying();
  const focused = ref(false);
  let before = '';

  const typed = computed(() => slot.draft.texts[field()]);
  const follows = computed(() => slot.follows === field());
  const empty = computed(() => !follows.value && typed.value.text.trim() === '');
  /** The value on the sheet: typed, worked out, or the schema's default. */
  const size = computed(() => {
    const key = field();
    if (!isSize(key)) return null;
    if (isCoin(key)) return slot.sizes[key] ?? (empty.value ? coinDefault(slot.units, key) : null);
    const fallback = key === 'railLength' ? null : slot.request?.spec[key] ?? null;
    return slot.sizes[key] ?? (empty.value ? fallback : null);
  });
  const text = computed(() => {
    const key = field();
    if (follows.value && size.value !== null) return textOf(size.value, slot.units, slot.draft.figures);
    return editText(typed.value, key, slot.units);
  });
  const face = computed(() => {
    const key = field();
    if (isSize(key)) return size.value === null ? null : faceOf(size.value, slot.units, slot.draft.figures);
    const shown = empty.value ? defaultOf(key) : text.value;
    return shown === '' ? null : { fraction: null, text: shown, beside: '', besideFraction: null, spoken: shown };
  });
  /** What the schema filled in where a number was left open. */
  function defaultOf(key: RateKey | CountKey): string {
    const spec = slot.request?.spec;
    if (!spec) return '';
    const value = key === 'flutes' || key === 'spindleSpeed' || key === 'rampAngle' || key === 'stepover' || key === 'feed' || key === 'plungeFeed' ? spec[key] : null;
    return value === null ? '' : String(value);
  }
  const optional = computed(() => {
    const key = field();
    return key !== 'railLength' && FIELD_FACTS[key] !== null;
  });
  const state = computed<BoxState>(() => {
    if (follows.value) return 'derived';
    if (!empty.value) return 'entered';
    return optional.value ? 'derived' : 'needed';
  });
  const problem = computed(() => slot.problems[field()]?.[0] ?? slot.coinProblems[field()]?.[0] ?? null);
  const spoken = computed(() => {
    const now = face.value;
    if (!now) return '';
    const converted = typed.value.text !== '' && !follows.value && typed.value.units !== slot.units ? `, typed as ${text.value}` : '';
    const how = state.value === 'derived' ? (follows.value ? ', worked out' : ', assumed') : '';
    return `${now.spoken}${now.beside ? `, ${now.beside}` : ''}${converted}${how}`;
  });

  function type(next: string): void {
    const key = field();
    if (next === text.value) return;
    const wasFollowing = follows.value;
    slot.type(key, next);
    if (wasFollowing) announce(`${capital(sizeWords(slot.follows))} now follows.`);
  }
  function step(by: { readonly up: boolean; readonly fine: boolean }): void {
    const key = field();
    if (isSize(key)) {
      if (size.value !== null) type(nextSize(size.value, slot.units, slot.draft.figures, by));
      return;
    }
    const from = readNumber(empty.value ? defaultOf(key) : text.value);
    const [coarse, fine] = STEPS[key] ?? [1, 0.1];
    const change = (by.fine ? fine : coarse) * (by.up ? 1 : -1);
    if (!Number.isNaN(from)) type(String(Number(Math.max(0, from + change).toFixed(6))));
  }
  function enter(): void {
    focused.value = true;
    before = text.value;
    slot.seal();
  }
  function leave(): void {
    focused.value = false;
    slot.seal();
  }
  /** Escape: keystrokes in one box are one step, so a step back is the text it was entered with. */
  function restore(): void {
    if (text.value !== before) slot.undo();
  }
  return { text, face, state, problem, focused, spoken, type, step, enter, leave, restore };
}
