/** Turns true with the first sign of a hand on the page, or of a printer: what only then matters need not be fetched before. */
export function useTouched() {
  const touched = ref(false);
  const signs = ['pointerdown', 'pointermove', 'keydown', 'focusin', 'scroll', 'wheel', 'beforeprint', 'hashchange'] as const;
  let printing: MediaQueryList | null = null;
  function touch(): void {
    touched.value = true;
    leave();
  }
  function leave(): void {
    for (const sign of signs) window.removeEventListener(sign, touch);
    printing?.removeEventListener('change', touch);
  }
  onMounted(() => {
    printing = window.matchMedia('print');
    // An address that holds a drawing has been opened by someone; its sheet is not the one that came with the page.
    if (printing.matches || window.location.hash !== '') return touch();
    for (const sign of signs) window.addEventListener(sign, touch, { passive: true });
    printing.addEventListener('change', touch);
  });
  onUnmounted(leave);
  return touched;
}
