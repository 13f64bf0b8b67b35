/**
 * The page's address holds the drawing. It follows what is typed once the typing rests, and opening one draws it; an
 * address that cannot be read says so and leaves the first drawing.
 *
 * @param options.follow false where the page has an address of its own: the drawing then only leaves as a copied link.
 */
export function useShare({ follow = true } = {}) {
  const slot = useSlotStore();
  const { announce } = useSaying();
  const damaged = ref(false);
  const copied = ref(false);
  const REST_MS = 400; // browsers limit how often an address may be rewritten

  function open(): void {
    const { hash } = window.location;
    // Places on the page have names without a dot; only a drawing has a version before one.
    if (!hash.includes('.')) return;
    const draft = draftFrom(hash);
    damaged.value = draft === null;
    if (draft && hash !== linkOf(slot.draft)) slot.load(draft);
  }
  let timer: ReturnType<typeof setTimeout> | undefined;
  function write(): void {
    clearTimeout(timer);
    timer = setTimeout(() => window.history.replaceState(window.history.state, '', linkOf(slot.draft)), REST_MS);
  }

  onMounted(() => {
    if (!follow) return;
    open();
    window.addEventListener('hashchange', open);
    watch(() => slot.draft, () => {
      damaged.value = false;
      copied.value = false;
      write();
    });
  });
  onUnmounted(() => {
    clearTimeout(timer);
    window.removeEventListener('hashchange', open);
  });

  async function share(): Promise<void> {
    const url = new URL(follow ? window.location.href : window.location.origin);
    url.hash = linkOf(slot.draft);
    copied.value = await copyText(url.href);
    if (!copied.value) window.history.replaceState(window.history.state, '', url.hash);
    announce(copied.value ? 'Link copied.' : 'The link stands in the address bar.');
  }
  return { damaged, copied, share };
}
