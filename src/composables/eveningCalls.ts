import { consoleApi, taken } from '../api/consoleApi';
import type { Body } from '../form/body';

/** Saves an evening's question to the account; gives its id. */
export async function saveEvening(name: string, question: Body): Promise<string> {
  const saved = await taken(
    consoleApi.POST('/api/saved', { body: { kind: 'evening', name, body: { ...question } } }),
  );
  return saved.thing.id;
}
