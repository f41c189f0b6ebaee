import { defineStore } from 'pinia';
import { computed, ref } from 'vue';
import { APPEARANCES, palettes, type Appearance } from '../styles/appearance';

/** Also read by `public/first-paint.js`. */
const STORED_AS = 'evenfall.appearance';

const isAppearance = (value: unknown): value is Appearance => APPEARANCES.includes(value as Appearance);

function stored(): Appearance | null {
  try {
    const value = localStorage.getItem(STORED_AS);
    return isAppearance(value) ? value : null;
  } catch {
    return null;
  }
}

/** Which appearance the console wears: the one chosen here, else what the system prefers. */
export const useAppearanceStore = defineStore('appearance', () => {
  const chosen = ref<Appearance | null>(stored());
  const prefersDark = matchMedia('(prefers-color-scheme: dark)');
  const systemIsDark = ref(prefersDark.matches);
  prefersDark.addEventListener('change', (event) => (systemIsDark.value = event.matches));

  const appearance = computed<Appearance>(() => chosen.value ?? (systemIsDark.value ? 'dusk' : 'day'));
  const palette = computed(() => palettes[appearance.value]);

  function choose(next: Appearance): void {
    chosen.value = next;
    document.documentElement.dataset.appearance = next;
    try {
      localStorage.setItem(STORED_AS, next);
    } catch {
      // Storage may be closed to this page; the choice then lasts for the visit.
    }
  }

  /** Stores the choice anew, after what this site had stored was cleared. */
  function keep(): void {
    if (chosen.value) choose(chosen.value);
  }

  return { appearance, palette, choose, keep };
});
