const KEPT_AS = 'tallyrail.drawing';

/** The drawing that somebody left on the one-groove page of this browser, as its link writes it; empty without one. */
export function useDrawingKept() {
  const drawing = ref('');
  onMounted(() => {
    try {
      drawing.value = sessionStorage.getItem(KEPT_AS) ?? '';
    } catch {
      // Storage may be shut: then nothing was kept.
    }
  });
  return drawing;
}

/** Keeps a drawing for as long as the browser's tab: `1.…`, without the number sign. */
export function keepDrawing(link: string): void {
  try {
    sessionStorage.setItem(KEPT_AS, link.replace(/^#/, ''));
  } catch {
    // Storage may be shut: the link in the address still has it.
  }
}
