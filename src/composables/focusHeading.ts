import { nextTick } from 'vue';

/**
 * Starts the reader at the heading, as a fresh page would, once what is shown has changed: what had the focus may be
 * gone.
 */
export async function focusHeading(selector = 'main h1'): Promise<void> {
  await nextTick();
  document.querySelector<HTMLElement>(selector)?.focus();
}
