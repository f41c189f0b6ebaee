import { ref } from 'vue';
import { clock } from './clock';
import { keyCalls } from './keyCalls';
import type { ApiKey } from './accountCalls';

/** What stands for "another key, pasted here". */
export const PASTED = 'pasted';

/** A pass is renewed while it still has this long, so that none ends on its way. */
const SPARE_MS = 30_000;

/**
 * With what the try page calls: a pass, good for minutes, that is charged to a key of the account; or a key that is
 * pasted, which is kept in this page's memory and nowhere else.
 */
export function useBearer() {
  const keys = ref<readonly ApiKey[] | null>(null);
  const chosen = ref('');
  const pasted = ref('');
  let pass: { readonly keyId: string; readonly text: string; readonly endsAtMs: number } | null = null;

  async function load(): Promise<void> {
    const all = (await keyCalls.list()).keys;
    keys.value = all.filter(({ state, kind }) => state === 'live' && kind === 'server');
    chosen.value ||= keys.value[0]?.id ?? PASTED;
  }

  async function bearer(): Promise<string> {
    if (chosen.value === PASTED) return pasted.value.trim();
    const isGood = pass?.keyId === chosen.value && pass.endsAtMs - SPARE_MS > clock.now().getTime();
    if (pass && isGood) return pass.text;
    const { pass: text, expiresAt } = await keyCalls.pass(chosen.value);
    pass = { keyId: chosen.value, text, endsAtMs: Date.parse(expiresAt) };
    return text;
  }

  /** Forgets a pass that was refused. */
  function forget(): void {
    pass = null;
  }

  return { keys, chosen, pasted, load, bearer, forget };
}
