import { ref, shallowRef } from 'vue';
import { consoleApi, taken, type KitBody } from '../api/consoleApi';
import type { Body } from '../form/body';
import { useSessionStore } from '../stores/useSessionStore';

/** The kit as it is edited, in this browser, until the account has it. */
const DRAFT_AS = 'evenfall.kit';

function draft(): Body | null {
  try {
    const value: unknown = JSON.parse(localStorage.getItem(DRAFT_AS) ?? 'null');
    return typeof value === 'object' && value !== null ? (value as Body) : null;
  } catch {
    return null;
  }
}

/** Reads and keeps the kit: in the account where somebody is signed in, and in this browser in any case. */
export function useKitKeeping() {
  const session = useSessionStore();
  const body = shallowRef<Body | null>(null);
  const isDraft = ref(false);
  let version = 0;

  async function load(): Promise<void> {
    const own = draft();
    if (!session.account) {
      body.value = own ?? {};
      isDraft.value = own !== null;
      return;
    }
    const kept = await taken(consoleApi.GET('/api/kit'));
    version = kept.version;
    body.value = own ?? kept.kit;
    isDraft.value = own !== null;
  }

  /** Notes what was typed, so that a reload loses nothing. */
  function note(next: Body): void {
    isDraft.value = true;
    try {
      localStorage.setItem(DRAFT_AS, JSON.stringify(next));
    } catch {
      // Storage may be closed to this page; then only saving keeps it.
    }
  }

  /** Hands the kit to the account. */
  async function save(next: Body): Promise<void> {
    const kept = await taken(consoleApi.PUT('/api/kit', { body: { kit: next as KitBody, version } }));
    version = kept.version;
    isDraft.value = false;
    localStorage.removeItem(DRAFT_AS);
  }

  /** Drops what was typed for what the account has. */
  async function takeBack(): Promise<void> {
    localStorage.removeItem(DRAFT_AS);
    await load();
  }
  return { body, isDraft, load, note, save, takeBack };
}
