/**
 * A figure as text in its box: what is typed stands as typed, and the figure takes over only where another is given from
 * elsewhere. An empty box is undefined, what cannot be read is NaN, for the schema to name.
 */
export function useFigureText(value: () => number | null | undefined, give: (figure: number | undefined) => void, show: (figure: number) => string = String, read: (text: string) => number = Number) {
  const shown = () => { const now = value(); return typeof now === 'number' && Number.isFinite(now) ? show(now) : ''; };
  const text = ref(shown());
  const readText = (typed: string) => (typed.trim() === '' ? undefined : read(typed.trim()));
  const same = (a: number | null | undefined, b: number | null | undefined) => a === b || (!Number.isFinite(a ?? NaN) && !Number.isFinite(b ?? NaN));
  watch(value, (now) => { if (!same(readText(text.value), now)) text.value = shown(); });
  function type(typed: string): void {
    text.value = typed;
    give(readText(typed));
  }
  return { text, type };
}
