import { computed, ref, shallowRef, watch } from 'vue';
import type { Body } from '../form/body';
import { useCalculator } from './useCalculator';

/** JSON as a person reads it. */
const printed = (body: unknown) => JSON.stringify(body, null, 2);

function objectIn(text: string): Body | null {
  try {
    const value: unknown = JSON.parse(text);
    return typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Body) : null;
  } catch {
    return null;
  }
}

/** A question of the try page: a calculator and a body, edited as a form or as JSON. */
export function useQuestion(first: string) {
  const id = ref(first);
  const text = ref('');
  const isJson = ref(false);
  const { load, again } = useCalculator(() => id.value);
  const calculator = computed(() => (load.value.state === 'ready' ? load.value.calculator : null));
  /** What the text means; null where it is no JSON object, which only the JSON view can show. */
  const body = computed(() => objectIn(text.value));
  const wanted = shallowRef<string | null>(null);

  watch(
    calculator,
    (next) => {
      if (!next) return;
      text.value = wanted.value ?? printed(next.examples[0]?.input ?? {});
      wanted.value = null;
    },
    { immediate: true },
  );

  /** Puts a question of before. */
  function put(nextId: string, nextText: string): void {
    const pretty = objectIn(nextText);
    const shown = pretty ? printed(pretty) : nextText;
    if (nextId === id.value) {
      text.value = shown;
      return;
    }
    wanted.value = shown;
    id.value = nextId;
  }

  /** As it goes out: without the spaces that are for people, where it is JSON at all. */
  const sent = computed(() => (body.value ? JSON.stringify(body.value) : text.value));

  return {
    id,
    text,
    isJson,
    load,
    again,
    calculator,
    body,
    sent,
    put,
    setBody: (next: Body) => (text.value = printed(next)),
  };
}
