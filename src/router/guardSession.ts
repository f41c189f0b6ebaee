import { watch } from 'vue';
import type { RouteLocationNormalized, RouteLocationRaw, Router } from 'vue-router';
import { useSessionStore } from '../stores/useSessionStore';

const toSignIn = (asked: string): RouteLocationRaw => ({ path: '/sign-in', query: { to: asked } });

/** Where a visitor with these roles is sent instead; true where nothing stands in the way. */
function roleAllows(
  { meta, path }: RouteLocationNormalized,
  held: readonly string[],
): true | RouteLocationRaw {
  const { roles } = meta;
  if (!roles || roles.some((role) => held.includes(role))) return true;
  // Roles can be added in the settings, all but one: what belongs to administrators is not there for others.
  if (roles.some((role) => role !== 'admin')) return { path: '/settings', query: { role: roles[0] } };
  return { name: 'notFound', params: { rest: path.slice(1).split('/') } };
}

/** Sends whoever is not signed in to the sign-in, from where they come back; also when a session ends meanwhile. */
export function guardSession(router: Router): void {
  router.beforeEach(async (to) => {
    const session = useSessionStore();
    if (!to.meta.isOwn) {
      void session.look();
      return true;
    }
    let account;
    try {
      account = await session.require();
    } catch {
      // Without an answer a screen may still show what this browser keeps.
      if (to.meta.isKeptHere) return true;
    }
    return account ? roleAllows(to, account.roles) : toSignIn(to.fullPath);
  });
  router.isReady().then(
    () => {
      const session = useSessionStore();
      watch(
        () => session.hasEnded,
        (hasEnded) => {
          const { meta, fullPath } = router.currentRoute.value;
          if (hasEnded && meta.isOwn) void router.replace(toSignIn(fullPath));
        },
      );
    },
    () => undefined,
  );
}
