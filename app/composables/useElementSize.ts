import type { Ref } from 'vue';

/** An element's inner size as it changes; `first` until it has been measured, which `known` tells. */
export function useElementSize(element: Readonly<Ref<Element | null>>, first: { readonly width: number; readonly height: number }) {
  const width = ref(first.width);
  const height = ref(first.height);
  const known = ref(false);
  let observer: ResizeObserver | null = null;
  onMounted(() => {
    observer = new ResizeObserver(([entry]) => {
      if (!entry) return;
      known.value = true;
      width.value = entry.contentRect.width;
      height.value = entry.contentRect.height;
    });
    watch(element, (now, before) => {
      if (before) observer?.unobserve(before);
      if (now) observer?.observe(now);
    }, { immediate: true, flush: 'post' });
  });
  onBeforeUnmount(() => observer?.disconnect());
  return { width, height, known };
}
