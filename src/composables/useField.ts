import { computed } from 'vue';
import { fieldIds } from '../form/fieldIds';
import type { Path } from '../form/body';
import { useCalculatorForm } from './useCalculatorForm';

/** One field of the form that the component stands in: its value, its faults, and the ids that tie them. */
export function useField(path: () => Path) {
  const form = useCalculatorForm();
  const ids = computed(() => fieldIds(path()));
  const value = computed(() => form.valueAt(path()));
  const faults = computed(() => form.faultsAt(path()));
  const isFaulty = computed(() => faults.value.length > 0);
  const describedBy = (hasHint: boolean) =>
    [hasHint && ids.value.hint, isFaulty.value && ids.value.faults].filter(Boolean).join(' ') || undefined;
  const set = (next: unknown) => form.set(path(), next);
  return { form, ids, value, faults, isFaulty, describedBy, set };
}
