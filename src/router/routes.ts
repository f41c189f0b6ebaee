import type { RouteRecordRaw } from 'vue-router';
import type { Role } from './navigation';

declare module 'vue-router' {
  interface RouteMeta {
    /** The document's title; a view may say a closer one. */
    title?: string;
    description?: string;
    /** Who may open it; everyone where nothing is said. */
    roles?: readonly Role[];
  }
}

const LANDING_DESCRIPTION =
  'Know the next exposure before the light gets there: exposure mathematics for photographs that mix the evening’s light with flash.';

export const routes: readonly RouteRecordRaw[] = [
  {
    path: '/',
    name: 'landing',
    component: () => import('../views/LandingView.vue'),
    meta: { description: LANDING_DESCRIPTION },
  },
  {
    path: '/calculators',
    name: 'calculators',
    component: () => import('../views/CalculatorListView.vue'),
    meta: {
      title: 'Calculators',
      description: 'Every calculator of Evenfall, computing in your browser.',
    },
  },
  {
    path: '/calculators/:group/:name',
    name: 'calculator',
    component: () => import('../views/CalculatorView.vue'),
    props: (route) => ({ id: `${String(route.params.group)}/${String(route.params.name)}` }),
    meta: { title: 'Calculator' },
  },
  {
    path: '/:rest(.*)*',
    name: 'notFound',
    component: () => import('../views/NotFoundView.vue'),
    meta: { title: 'Nothing here' },
  },
];
