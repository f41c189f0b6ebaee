import { defineStore } from 'pinia';
import { computed, ref } from 'vue';
import type { Account } from '../api/consoleApi';
import type { Role } from '../router/navigation';

/** Tells the next page that somebody was signed in here, so that strangers cost no request. */
const SEEN_AS = 'evenfall.signed-in';

function wasSeen(): boolean {
  try {
    return localStorage.getItem(SEEN_AS) !== null;
  } catch {
    return true;
  }
}

function remember(isSignedIn: boolean): void {
  try {
    if (isSignedIn) localStorage.setItem(SEEN_AS, '1');
    else localStorage.removeItem(SEEN_AS);
  } catch {
    // Storage may be closed to this page; then every page asks.
  }
}

/** Who is signed in. */
export const useSessionStore = defineStore('session', () => {
  const account = ref<Account | null>(null);
  const roles = computed<readonly Role[]>(() => account.value?.roles ?? []);
  let asking: Promise<void> | null = null;

  function take(next: Account | null): void {
    account.value = next;
    remember(next !== null);
  }

  let isListening = false;
  /** Comes with the first request, not with the first page. */
  async function client() {
    const api = await import('../api/consoleApi');
    if (!isListening) api.onSessionEnd(() => take(null));
    isListening = true;
    return api;
  }

  async function ask(): Promise<void> {
    const { consoleApi, taken } = await client();
    const state = await taken(consoleApi.GET('/api/session'));
    take(state.account);
  }

  /**
   * Asks who is signed in, once.
   * @param isCertain asks in any case, for screens that are somebody's own
   */
  async function load(isCertain = false): Promise<void> {
    if (!asking && !isCertain && !wasSeen()) return;
    asking ??= ask();
    try {
      await asking;
    } catch (error) {
      asking = null;
      if (isCertain) throw error;
    }
  }

  async function signIn(email: string, password: string): Promise<void> {
    const { consoleApi, taken } = await client();
    const answer = await taken(consoleApi.POST('/api/session', { body: { email, password } }));
    asking = Promise.resolve();
    take(answer.account);
  }

  async function signOut(): Promise<void> {
    const { consoleApi, taken } = await client();
    await taken(consoleApi.DELETE('/api/session'));
    take(null);
  }

  return { account, roles, load, signIn, signOut, take };
});
