import { onBeforeUnmount, onMounted, reactive } from 'vue';
import './zodWithoutEval';
import { calculatorList } from '../../shared/calculators';

/**
 * The calculators' summaries by id, filled in one by one once the page rests. They stand in the calculators' own
 * files, which the browser then has at hand for the next page, and where there is no network.
 */
export function useCalculatorSummaries(): Readonly<Record<string, string>> {
  const summaries = reactive<Record<string, string>>({});
  let isLeft = false;

  async function fetchAll(): Promise<void> {
    for (const entry of calculatorList) {
      if (isLeft) return;
      try {
        summaries[entry.id] = (await entry.load()).summary;
      } catch {
        // The title stands without its summary; opening the calculator says what is wrong.
      }
    }
  }

  onMounted(() => void fetchAll());
  onBeforeUnmount(() => (isLeft = true));
  return summaries;
}
