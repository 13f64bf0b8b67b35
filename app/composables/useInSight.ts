import type { Ref } from 'vue';

/** Turns true once an element has come near the window, and stays so. */
export function useInSight(element: Readonly<Ref<Element | null>>, near = '200px') {
  const seen = ref(false);
  let observer: IntersectionObserver | null = null;
  onMounted(() => {
    observer = new IntersectionObserver((entries) => {
      if (!entries.some(({ isIntersecting }) => isIntersecting)) return;
      seen.value = true;
      observer?.disconnect();
    }, { rootMargin: near });
    if (element.value) observer.observe(element.value);
  });
  onBeforeUnmount(() => observer?.disconnect());
  return seen;
}
