import { shallowRef, watch, type ShallowRef } from 'vue';
import './zodWithoutEval';
import { calculatorList } from '../../shared/calculators';
import type { AnyCalculator } from '../../shared/contract/defineCalculator';

export type CalculatorLoad =
  | { readonly state: 'loading' }
  | { readonly state: 'ready'; readonly calculator: AnyCalculator }
  | { readonly state: 'unknown' }
  | { readonly state: 'failed' };

/** Loads a calculator by its id, again whenever the id changes; a later answer never overtakes an earlier wish. */
export function useCalculator(id: () => string): { load: ShallowRef<CalculatorLoad>; again: () => void } {
  const load = shallowRef<CalculatorLoad>({ state: 'loading' });

  async function fetchIt(wanted: string): Promise<void> {
    const entry = calculatorList.find((one) => one.id === wanted);
    load.value = entry ? { state: 'loading' } : { state: 'unknown' };
    if (!entry) return;
    try {
      const calculator = await entry.load();
      if (id() === wanted) load.value = { state: 'ready', calculator };
    } catch {
      if (id() === wanted) load.value = { state: 'failed' };
    }
  }

  watch(id, fetchIt, { immediate: true });
  return { load, again: () => void fetchIt(id()) };
}
