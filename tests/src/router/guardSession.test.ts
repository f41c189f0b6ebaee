import { createPinia, setActivePinia } from 'pinia';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { createMemoryHistory, createRouter, type Router } from 'vue-router';
import type { Account } from '../../../src/api/consoleApi';
import { afterSignIn } from '../../../src/router/afterSignIn';
import { guardSession } from '../../../src/router/guardSession';
import type { Role } from '../../../src/router/navigation';
import { useSessionStore } from '../../../src/stores/useSessionStore';

const component = { render: () => null };
const accountWith = (...roles: Role[]): Account => ({
  id: '1',
  email: 'iris@example.org',
  name: 'Iris Fen',
  roles,
  lengthUnit: 'metres',
});

let router: Router;

beforeEach(() => {
  vi.stubGlobal('addEventListener', () => undefined);
  setActivePinia(createPinia());
  router = createRouter({
    history: createMemoryHistory(),
    routes: [
      { path: '/', component },
      { path: '/sign-in', component },
      { path: '/settings', component, meta: { isOwn: true } },
      { path: '/usage', component, meta: { isOwn: true, roles: ['developer'] } },
      { path: '/recipes', component, meta: { isOwn: true, isKeptHere: true } },
      { path: '/admin/keys', component, meta: { isOwn: true, roles: ['admin'] } },
      { path: '/:rest(.*)*', name: 'notFound', component },
    ],
  });
  guardSession(router);
  const session = useSessionStore();
  vi.spyOn(session, 'look').mockResolvedValue(undefined);
  vi.spyOn(session, 'require').mockImplementation(() => Promise.resolve(session.account));
});

const pathOf = async (to: string) => {
  await router.push(to);
  return router.currentRoute.value.fullPath;
};

describe('the guard', () => {
  it('lets anyone see what is public', async () => {
    expect(await pathOf('/')).toBe('/');
  });

  it('asks strangers to sign in and knows where they wanted to go', async () => {
    expect(await pathOf('/settings?role=developer')).toBe('/sign-in?to=/settings?role=developer');
  });

  it('asks to sign in where the service gives no answer', async () => {
    vi.mocked(useSessionStore().require).mockRejectedValue(new Error('down'));
    expect(await pathOf('/settings')).toBe('/sign-in?to=/settings');
  });

  it('shows what this browser keeps where the service gives no answer, and to nobody else', async () => {
    expect(await pathOf('/recipes')).toBe('/sign-in?to=/recipes');
    vi.mocked(useSessionStore().require).mockRejectedValue(new Error('down'));
    expect(await pathOf('/recipes')).toBe('/recipes');
  });

  it('leads to the roles where one is missing, and shows nothing of what is for administrators', async () => {
    useSessionStore().take(accountWith('photographer'));
    expect(await pathOf('/usage')).toBe('/settings?role=developer');
    await router.push('/admin/keys');
    expect(router.currentRoute.value).toMatchObject({ name: 'notFound', path: '/admin/keys' });
    useSessionStore().take(accountWith('developer', 'admin'));
    expect(await pathOf('/usage')).toBe('/usage');
    expect(await pathOf('/admin/keys')).toBe('/admin/keys');
    expect(router.currentRoute.value.meta.roles).toEqual(['admin']);
  });

  it('asks to sign in again when a session ends on an own screen, and only then', async () => {
    const session = useSessionStore();
    session.take(accountWith('developer'));
    await router.push('/settings');
    await router.isReady();
    session.take(null);
    session.hasEnded = true;
    await vi.waitUntil(() => router.currentRoute.value.path === '/sign-in');
    expect(router.currentRoute.value.query.to).toBe('/settings');
  });
});

it.each([
  ['/keys/1?a=b', ['photographer'], '/keys/1?a=b'],
  [undefined, ['developer'], '/keys'],
  [undefined, ['photographer'], '/calculators'],
  ['//example.org', ['developer'], '/keys'],
  ['/\\example.org', ['developer'], '/keys'],
  ['https://example.org', ['developer'], '/keys'],
  [['/keys'], ['educator'], '/calculators'],
] as const)('after signing in on the way to %j, %j go to %s', (asked, roles, path) => {
  expect(afterSignIn(asked, roles)).toBe(path);
});
