import { consoleApi, taken } from '../api/consoleApi';

export type Grace = 'none' | 'hour' | 'day' | 'week';

export interface KeyWish {
  readonly name: string;
  readonly scopes: string[];
  readonly monthlyCap: number | null;
  readonly expiresAt: string | null;
}

const at = (id: string) => ({ params: { path: { id } } });

/** What developers do with their keys; each gives what the service answers, or throws why it did not. */
export const keyCalls = {
  list: (signal?: AbortSignal) => taken(consoleApi.GET('/api/keys', { signal })),
  read: (id: string, signal?: AbortSignal) => taken(consoleApi.GET('/api/keys/{id}', { ...at(id), signal })),
  /** @param idempotencyKey one for each key that is wished for, so that trying again makes no second one */
  make: (body: KeyWish, idempotencyKey: string) =>
    taken(consoleApi.POST('/api/keys', { body, headers: { 'Idempotency-Key': idempotencyKey } })),
  change: (id: string, body: Partial<KeyWish>) =>
    taken(consoleApi.PATCH('/api/keys/{id}', { ...at(id), body })),
  rotate: (id: string, grace: Grace, password?: string) =>
    taken(consoleApi.POST('/api/keys/{id}/rotate', { ...at(id), body: { grace, password } })),
  revoke: (id: string) => taken(consoleApi.POST('/api/keys/{id}/revoke', { ...at(id), body: {} })),
  claim: (id: string) => taken(consoleApi.POST('/api/keys/{id}/claim', { ...at(id), body: {} })),
  pass: (id: string) => taken(consoleApi.POST('/api/keys/{id}/pass', { ...at(id), body: {} })),
};
