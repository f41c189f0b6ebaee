import { shallowRef, watch, type Ref } from 'vue';
import './zodWithoutEval';
import { calculatorList } from '../../shared/calculators';
import type { Answer } from '../../shared/contract/answer';
import { answerFor, parseInput } from '../../shared/contract/defineCalculator';
import { encodeQuery } from '../../shared/contract/queryCodec';
import { clock } from './clock';

/** A saved question, wherever it came from. */
export interface Saved {
  readonly kind: 'recipe' | 'evening';
  readonly body: Readonly<Record<string, unknown>>;
}

const CALCULATORS = { recipe: 'fill/recipes', evening: 'twilight/ladder' } as const;
const PAGES = { recipe: '/fill', evening: '/evening' } as const;

/** The address of the page that works with a saved question. */
export const pageOf = ({ kind, body }: Saved) => ({
  path: PAGES[kind],
  query: Object.fromEntries(encodeQuery(body)),
});

/** The answer to a saved question, worked out anew in the browser; null until it is there, or where it has none. */
export function useSavedAnswer(saved: () => Saved | null): Ref<Answer<unknown> | null> {
  const answer = shallowRef<Answer<unknown> | null>(null);
  watch(
    saved,
    async (asked) => {
      answer.value = null;
      const entry = asked && calculatorList.find(({ id }) => id === CALCULATORS[asked.kind]);
      if (!entry) return;
      const calculator = await entry.load().catch(() => null);
      if (!calculator || saved() !== asked) return;
      const parsed = parseInput(calculator, asked.body);
      if ('input' in parsed) answer.value = answerFor(calculator, parsed.input, { now: clock.now() });
    },
    { immediate: true },
  );
  return answer;
}
