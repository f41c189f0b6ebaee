import { effectScope } from 'vue';
import { expect, it } from 'vitest';
import { Refused } from '../../../src/api/Refused';
import { useLoad } from '../../../src/composables/useLoad';

/** Fetches that the test lets arrive in any order; one that is given up throws, as the browser's does. */
function held() {
  const waiting: { resolve(): void; reject(error: Error): void; signal: AbortSignal }[] = [];
  const fetch = (signal: AbortSignal) =>
    new Promise<void>((resolve, reject) => {
      signal.addEventListener('abort', () => reject(signal.reason as Error));
      waiting.push({ resolve, reject, signal });
    });
  return { waiting, fetch };
}

it('asking again gives up what was asked before', async () => {
  const { waiting, fetch } = held();
  const scope = effectScope();
  const { load, isLoading, trouble } = scope.run(() => useLoad(fetch)) as ReturnType<typeof useLoad>;
  const first = load();
  const second = load();
  await first;
  expect([waiting[0]?.signal.aborted, isLoading.value, trouble.value]).toEqual([true, true, null]);
  waiting[1]?.resolve();
  await second;
  expect(isLoading.value).toBe(false);
});

it('a refusal is told until it is asked again, and leaving gives up', async () => {
  const { waiting, fetch } = held();
  const scope = effectScope();
  const { load, trouble, code } = scope.run(() => useLoad(fetch)) as ReturnType<typeof useLoad>;
  const first = load();
  waiting[0]?.reject(new Refused('Nothing is there.', 404, 'not_found'));
  await first;
  expect([trouble.value, code.value]).toEqual(['Nothing is there.', 'not_found']);
  const second = load();
  expect([trouble.value, code.value]).toEqual([null, null]);
  scope.stop();
  await second;
  expect([waiting[1]?.signal.aborted, trouble.value]).toEqual([true, null]);
});

it('what is no refusal is a fault of the program and thrown', async () => {
  const scope = effectScope();
  const { load } = scope.run(() => useLoad(() => Promise.reject(new TypeError('bug')))) as ReturnType<
    typeof useLoad
  >;
  await expect(load()).rejects.toThrow('bug');
});
