import { nextTick } from 'vue';
import { createRouter, createWebHistory } from 'vue-router';
import { describePage } from './describePage';
import { guardSession } from './guardSession';
import { routes } from './routes';

export const router = createRouter({
  history: createWebHistory(),
  routes: [...routes],
  scrollBehavior(to, from, saved) {
    if (saved) return saved;
    // The token of a mailed link stands there too, and is no place on the page.
    if (to.hash && document.getElementById(to.hash.slice(1))) return { el: to.hash, top: 16 };
    return to.path === from.path ? false : { top: 0 };
  },
});

guardSession(router);

router.afterEach((to, from, failure) => {
  if (failure || (to.path === from.path && from.matched.length > 0)) return;
  describePage(to.meta.title, to.meta.description);
  // The first page is announced by the browser itself; later ones start at their heading, as a fresh page would.
  if (from.matched.length > 0) void nextTick(() => document.querySelector<HTMLElement>('main h1')?.focus());
});
