import type { RouteRecordRaw } from 'vue-router';
import type { Role } from './navigation';

declare module 'vue-router' {
  interface RouteMeta {
    /** The document's title; a view may say a closer one. */
    title?: string;
    description?: string;
    /** Whether it belongs to an account, so that one signs in first. */
    isOwn?: boolean;
    /** Whether it can be read from what this browser keeps, where the service gives no answer. */
    isKeptHere?: boolean;
    /** Roles of which one is needed; whoever is signed in where nothing is said. */
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
    path: '/fill',
    name: 'fill',
    component: () => import('../views/FillView.vue'),
    meta: {
      title: 'Flash and ambient light',
      description:
        'Settings that put background and subject where they shall land, or what stands in the way.',
    },
  },
  {
    path: '/evening',
    name: 'evening',
    component: () => import('../views/EveningView.vue'),
    meta: {
      title: 'Evening',
      description: 'The light of an evening, and the settings that follow it down from a test frame on.',
    },
  },
  {
    path: '/sign-in',
    name: 'signIn',
    component: () => import('../views/SignInView.vue'),
    meta: { title: 'Sign in' },
  },
  {
    path: '/sign-up',
    name: 'signUp',
    component: () => import('../views/SignUpView.vue'),
    meta: { title: 'Make an account' },
  },
  {
    path: '/verify',
    name: 'verify',
    component: () => import('../views/VerifyView.vue'),
    meta: { title: 'Confirm your address' },
  },
  {
    path: '/reset',
    name: 'reset',
    component: () => import('../views/ResetView.vue'),
    meta: { title: 'Password' },
  },
  {
    path: '/confirm-email',
    name: 'confirmEmail',
    component: () => import('../views/ConfirmEmailView.vue'),
    meta: { title: 'Confirm your new address' },
  },
  {
    path: '/settings',
    name: 'settings',
    component: () => import('../views/SettingsView.vue'),
    meta: { title: 'Settings', isOwn: true },
  },
  {
    path: '/keys',
    name: 'keys',
    component: () => import('../views/KeysView.vue'),
    meta: { title: 'Keys', isOwn: true },
  },
  {
    path: '/keys/:id',
    name: 'key',
    component: () => import('../views/KeyView.vue'),
    props: true,
    meta: { title: 'Key', isOwn: true },
  },
  {
    path: '/kit',
    name: 'kit',
    component: () => import('../views/KitView.vue'),
    meta: { title: 'Kit', description: 'Your cameras, lenses and flashes, as limits of what is worked out.' },
  },
  {
    path: '/recipes',
    name: 'recipes',
    component: () => import('../views/RecipesView.vue'),
    meta: { title: 'Recipes and evenings', isOwn: true, isKeptHere: true },
  },
  {
    path: '/recipes/:id',
    name: 'recipe',
    component: () => import('../views/RecipeView.vue'),
    props: true,
    meta: { title: 'Saved', isOwn: true, isKeptHere: true },
  },
  {
    path: '/shared/:token',
    name: 'shared',
    component: () => import('../views/SharedView.vue'),
    props: true,
    meta: { title: 'Shared with you' },
  },
  {
    path: '/usage',
    name: 'usage',
    component: () => import('../views/UsageView.vue'),
    meta: { title: 'Usage', isOwn: true, roles: ['developer'] },
  },
  {
    path: '/plan',
    name: 'plan',
    component: () => import('../views/PlanView.vue'),
    meta: { title: 'Plan', isOwn: true, roles: ['developer'] },
  },
  {
    path: '/try',
    name: 'try',
    component: () => import('../views/TryView.vue'),
    meta: { title: 'Try it', isOwn: true, roles: ['developer'] },
  },
  {
    path: '/:rest(.*)*',
    name: 'notFound',
    component: () => import('../views/NotFoundView.vue'),
    meta: { title: 'Nothing here' },
  },
];
