import { shallowRef, watch, type Ref } from 'vue';
import { kitIn, type Kit } from '../../shared/contract/kit';
import { useSessionStore } from '../stores/useSessionStore';

/** Whether there is anything in a kit to work with. */
const isUseful = ({ cameras, flashes }: Kit) => cameras.length > 0 || flashes.length > 0;

/** The kit of whoever is signed in; null for strangers, where nothing was kept yet, or where it does not come. */
export function useOwnKit(): Readonly<Ref<Kit | null>> {
  const session = useSessionStore();
  const kit = shallowRef<Kit | null>(null);

  async function fetchFor(accountId: string): Promise<void> {
    const { consoleApi, taken } = await import('../api/consoleApi');
    const answer = await taken(consoleApi.GET('/api/kit'));
    const parsed = kitIn.safeParse(answer.kit);
    if (session.account?.id === accountId)
      kit.value = parsed.success && isUseful(parsed.data) ? parsed.data : null;
  }

  watch(
    () => session.account?.id,
    (accountId) => {
      kit.value = null;
      // The starting kits and the form stay usable without it.
      if (accountId !== undefined) fetchFor(accountId).catch(() => undefined);
    },
    { immediate: true },
  );
  return kit;
}
