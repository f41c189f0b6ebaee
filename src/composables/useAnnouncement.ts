import { onBeforeUnmount, ref, watch, type Ref } from 'vue';

/** A screen reader should hear where a slider came to rest, not every step on the way. */
const REST_MS = 700;

/** A text that follows another one once it has rested, for a live region. */
export function useAnnouncement(text: () => string): Ref<string> {
  const said = ref('');
  let timer: ReturnType<typeof setTimeout> | undefined;
  watch(text, (next) => {
    clearTimeout(timer);
    timer = setTimeout(() => (said.value = next), REST_MS);
  });
  onBeforeUnmount(() => clearTimeout(timer));
  return said;
}
