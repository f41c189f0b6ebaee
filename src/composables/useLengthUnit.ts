import { computed, type ComputedRef } from 'vue';
import type { LengthUnit } from '../text/lengthUnit';
import { useSessionStore } from '../stores/useSessionStore';

/** How the reader measures: as their account says, else in metres. */
export function useLengthUnit(): ComputedRef<LengthUnit> {
  const session = useSessionStore();
  return computed(() => session.account?.lengthUnit ?? 'metres');
}
