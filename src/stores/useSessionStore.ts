import { defineStore } from 'pinia';
import { computed, ref } from 'vue';
import type { Role } from '../router/navigation';

/** Who is signed in, as far as this page needs to know. */
export interface SessionAccount {
  readonly name: string;
  readonly roles: readonly Role[];
}

/** The account of this visit; nobody until a sign-in says otherwise. */
export const useSessionStore = defineStore('session', () => {
  const account = ref<SessionAccount | null>(null);
  const roles = computed<readonly Role[]>(() => account.value?.roles ?? []);
  return { account, roles };
});
