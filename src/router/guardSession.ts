import type { Router } from 'vue-router';
import { watch } from 'vue';
import { useSessionStore } from '../stores/useSessionStore';

/** Sends whoever is not signed in to the sign-in, from where they come back; also when a session ends meanwhile. */
export function guardSession(router: Router): void {
  router.beforeEach(async (to) => {
    const session = useSessionStore();
    if (!to.meta.isOwn) {
      void session.load();
      return true;
    }
    await session.load(true).catch(() => undefined);
    return session.account ? true : { path: '/sign-in', query: { to: to.fullPath } };
  });
  router.isReady().then(
    () => {
      const session = useSessionStore();
      watch(
        () => session.account,
        (account) => {
          const { meta, fullPath } = router.currentRoute.value;
          if (!account && meta.isOwn) void router.replace({ path: '/sign-in', query: { to: fullPath } });
        },
      );
    },
    () => undefined,
  );
}
