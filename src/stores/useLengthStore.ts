import { defineStore } from 'pinia';
import { computed, ref, watch } from 'vue';
import type { LengthUnit } from '../text/lengthUnit';
import { useSessionStore } from './useSessionStore';

const STORED_AS = 'evenfall.lengthUnit';

function stored(): LengthUnit | null {
  try {
    const value = localStorage.getItem(STORED_AS);
    return value === 'metres' || value === 'feet' ? value : null;
  } catch {
    return null;
  }
}

/** How lengths are shown: as chosen in place, until the account says otherwise; else in metres. */
export const useLengthStore = defineStore('length', () => {
  const session = useSessionStore();
  const chosen = ref<LengthUnit | null>(stored());
  const lengthUnit = computed<LengthUnit>(() => chosen.value ?? session.account?.lengthUnit ?? 'metres');

  watch(
    () => session.account?.lengthUnit,
    (ofAccount) => {
      if (ofAccount) chosen.value = null;
    },
  );

  function choose(next: LengthUnit): void {
    chosen.value = next;
    try {
      localStorage.setItem(STORED_AS, next);
    } catch {
      // Storage may be closed to this page; the choice then lasts for the visit.
    }
  }

  return { lengthUnit, choose };
});
