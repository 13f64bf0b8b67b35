/** Ctrl+Z and Ctrl+Shift+Z (or Ctrl+Y) over everything on the sheet, boxes included: what was typed is in the history. */
export function useUndoKeys() {
  const slot = useSlotStore();
  function press(event: KeyboardEvent): void {
    if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
    const key = event.key.toLowerCase();
    if (key !== 'z' && key !== 'y') return;
    event.preventDefault();
    if (key === 'y' || event.shiftKey) slot.redo();
    else slot.undo();
  }
  onMounted(() => window.addEventListener('keydown', press));
  onUnmounted(() => window.removeEventListener('keydown', press));
}
