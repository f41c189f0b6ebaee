import { ref, shallowRef } from 'vue';
import { publicCall, type PublicAnswer } from '../api/publicCall';
import { Refused } from '../api/Refused';

export type { PublicAnswer };

/** A question that was put during this visit, and how it went. */
export interface Question {
  readonly id: string;
  readonly body: string;
  readonly status: number;
}

const MOST_KEPT = 20;

/** Kept for the visit: leaving the page and coming back loses none, a reload does. */
const earlier = shallowRef<readonly Question[]>([]);

function keep(question: Question): void {
  const others = earlier.value.filter(({ id, body }) => id !== question.id || body !== question.body);
  earlier.value = [question, ...others].slice(0, MOST_KEPT);
}

/** Makes calls one at a time; a call under way can be given up. */
export function useTrial(bearer: () => Promise<string>, onRefusedPass: () => void) {
  const answer = shallowRef<PublicAnswer | null>(null);
  const answeredId = ref('');
  const trouble = ref<string | null>(null);
  const isAsking = ref(false);
  let underWay: AbortController | null = null;

  async function ask(id: string, body: string): Promise<void> {
    if (isAsking.value) return;
    underWay = new AbortController();
    isAsking.value = true;
    trouble.value = null;
    try {
      const got = await publicCall({ id, body, bearer: await bearer() }, underWay.signal);
      answer.value = got;
      answeredId.value = id;
      if (got.status === 401) onRefusedPass();
      if (id !== 'batch') keep({ id, body, status: got.status });
    } catch (error) {
      if (error instanceof Refused) trouble.value = error.message;
      else if (!underWay.signal.aborted) throw error;
    } finally {
      isAsking.value = false;
    }
  }

  const giveUp = () => underWay?.abort();
  return { answer, answeredId, trouble, isAsking, earlier, ask, giveUp };
}
