import { onScopeDispose, ref, type Ref } from 'vue';
import { Refused } from '../api/Refused';

export interface Loading {
  readonly isLoading: Readonly<Ref<boolean>>;
  /** Why nothing came. */
  readonly trouble: Readonly<Ref<string | null>>;
  readonly code: Readonly<Ref<string | null>>;
  load(): Promise<void>;
}

/**
 * Fetches what a screen shows. Asking again gives up what was asked before, so that an answer that comes late never
 * takes the place of a later one; leaving the screen gives it up too.
 */
export function useLoad(fetch: (signal: AbortSignal) => Promise<void>): Loading {
  const isLoading = ref(false);
  const trouble = ref<string | null>(null);
  const code = ref<string | null>(null);
  let current: AbortController | null = null;

  async function load(): Promise<void> {
    current?.abort();
    const own = new AbortController();
    current = own;
    isLoading.value = true;
    trouble.value = null;
    code.value = null;
    try {
      await fetch(own.signal);
    } catch (error) {
      if (own.signal.aborted) return;
      if (!(error instanceof Refused)) throw error;
      code.value = error.code;
      trouble.value = error.message;
    } finally {
      if (current === own) isLoading.value = false;
    }
  }

  onScopeDispose(() => current?.abort());
  return { isLoading, trouble, code, load };
}
