import { onBeforeUnmount, onMounted, ref, type Ref } from 'vue';

/** The width of an element in pixels, followed while it changes; drawings are laid out for it. */
export function useWidth(element: Readonly<Ref<HTMLElement | null>>, initialPx = 320): Ref<number> {
  const widthPx = ref(initialPx);
  let observer: ResizeObserver | undefined;
  onMounted(() => {
    if (!element.value) return;
    widthPx.value = element.value.clientWidth || initialPx;
    observer = new ResizeObserver(([entry]) => {
      if (entry && entry.contentRect.width > 0) widthPx.value = entry.contentRect.width;
    });
    observer.observe(element.value);
  });
  onBeforeUnmount(() => observer?.disconnect());
  return widthPx;
}
