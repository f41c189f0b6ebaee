import { defineStore } from 'pinia';
import { computed, ref } from 'vue';
import type * as Api from '../api/consoleApi';
import type { Role } from '../router/navigation';

/** Tells the next page, and other tabs, who was signed in here; strangers cost no request. */
const SEEN_AS = 'evenfall.signed-in';

function seen(): string | null {
  try {
    return localStorage.getItem(SEEN_AS);
  } catch {
    return 'unknown';
  }
}

function remember(id: string | undefined): void {
  try {
    // What was somebody's own goes with them.
    if (id === undefined) for (const name of [SEEN_AS, 'evenfall.saved']) localStorage.removeItem(name);
    else localStorage.setItem(SEEN_AS, id);
  } catch {
    // Storage may be closed to this page; then every page asks.
  }
}

/** Who is signed in. */
export const useSessionStore = defineStore('session', () => {
  const account = ref<Api.Account | null>(null);
  const roles = computed<readonly Role[]>(() => account.value?.roles ?? []);
  /** Whether a session ended in the middle of this visit, other than by signing out. */
  const hasEnded = ref(false);
  let asking: Promise<void> | null = null;
  let hasAsked = false;

  function take(next: Api.Account | null): void {
    account.value = next;
    if (next) hasEnded.value = false;
    remember(next?.id);
    // From now on the session may end.
    if (next) void client().catch(() => undefined);
  }

  function end(): void {
    if (account.value) hasEnded.value = true;
    take(null);
  }

  let fetching: Promise<typeof Api> | null = null;
  /** Comes with the first request, not with the first page. */
  async function client() {
    fetching ??= import('../api/consoleApi').then((api) => {
      api.onSessionEnd(end);
      return api;
    });
    try {
      return await fetching;
    } catch (error) {
      fetching = null;
      throw error;
    }
  }

  async function ask(): Promise<void> {
    const { consoleApi, taken } = await client();
    const state = await taken(consoleApi.GET('/api/session'));
    if (state.account) take(state.account);
    else end();
    hasAsked = true;
  }

  function askOnce(): Promise<void> {
    asking ??= ask().finally(() => (asking = null));
    return asking;
  }

  /** Asks who is signed in, where somebody may be. It delays nothing, and that no answer comes is no trouble. */
  async function look(): Promise<void> {
    if (account.value || hasAsked || seen() === null) return;
    await askOnce().catch(() => undefined);
  }

  /** Asks who is signed in, for screens that are somebody's own. */
  async function require(): Promise<Api.Account | null> {
    if (!account.value) await askOnce();
    return account.value;
  }

  async function signOut(): Promise<void> {
    const { consoleApi, taken } = await client();
    await taken(consoleApi.DELETE('/api/session'));
    take(null);
  }

  // Another tab signed in or out, and the cookies are shared: what stands here would be somebody else's.
  addEventListener('storage', ({ key }) => {
    if (key !== null && key !== SEEN_AS) return;
    if (seen() !== (account.value?.id ?? null)) void askOnce().catch(() => undefined);
  });

  return { account, roles, hasEnded, look, require, signOut, take };
});
