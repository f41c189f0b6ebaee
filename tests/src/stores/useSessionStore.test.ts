import { createPinia, setActivePinia } from 'pinia';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import type { Account } from '../../../src/api/consoleApi';

const ACCOUNT: Account = {
  id: '1',
  email: 'iris@example.org',
  name: 'Iris Fen',
  roles: ['developer'],
  lengthUnit: 'metres',
};

const service = vi.hoisted(() => ({
  state: null as object | null,
  asked: 0,
  isDown: false,
  endings: [] as (() => void)[],
}));

vi.mock('../../../src/api/consoleApi', () => {
  const answer = (data?: object) => {
    if (service.isDown) return Promise.reject(new Error('down'));
    return Promise.resolve(data);
  };
  return {
    consoleApi: {
      GET: () => {
        service.asked += 1;
        return answer({ account: service.state });
      },
      DELETE: () => answer(),
    },
    taken: (asked: Promise<unknown>) => asked,
    onSessionEnd: (listener: () => void) => service.endings.push(listener),
  };
});

const { useSessionStore } = await import('../../../src/stores/useSessionStore');

let stored: Map<string, string>;
let onStorage: ((event: { key: string | null }) => void) | undefined;

beforeEach(() => {
  Object.assign(service, { state: null, asked: 0, isDown: false, endings: [] });
  stored = new Map();
  vi.stubGlobal('localStorage', {
    getItem: (key: string) => stored.get(key) ?? null,
    setItem: (key: string, value: string) => stored.set(key, value),
    removeItem: (key: string) => stored.delete(key),
  });
  vi.stubGlobal('addEventListener', (_: string, listener: typeof onStorage) => (onStorage = listener));
  setActivePinia(createPinia());
});

const signedInBefore = () => stored.set('evenfall.signed-in', ACCOUNT.id);

describe('public screens', () => {
  it('ask nothing for a stranger', async () => {
    await useSessionStore().look();
    expect(service.asked).toBe(0);
  });

  it('ask once for whoever was signed in here', async () => {
    signedInBefore();
    service.state = ACCOUNT;
    const session = useSessionStore();
    await Promise.all([session.look(), session.look()]);
    await session.look();
    expect([service.asked, session.account, session.roles]).toEqual([1, ACCOUNT, ['developer']]);
  });

  it('ask once more only where no answer came', async () => {
    signedInBefore();
    service.isDown = true;
    const session = useSessionStore();
    await session.look();
    service.isDown = false;
    await session.look();
    await session.look();
    expect([service.asked, session.account]).toEqual([2, null]);
    expect(stored.size).toBe(0);
  });
});

describe('own screens', () => {
  it('ask in any case, and say when no answer comes', async () => {
    service.isDown = true;
    const session = useSessionStore();
    await expect(session.require()).rejects.toThrow('down');
    service.isDown = false;
    service.state = ACCOUNT;
    expect(await session.require()).toEqual(ACCOUNT);
    expect(await session.require()).toEqual(ACCOUNT);
    expect(service.asked).toBe(2);
  });
});

describe('a session', () => {
  it('that ends by itself is told from one that was signed out of', async () => {
    const session = useSessionStore();
    session.take(ACCOUNT);
    expect(stored.get('evenfall.signed-in')).toBe('1');
    await vi.waitUntil(() => service.endings.length > 0);
    service.endings[0]?.();
    expect([session.account, session.hasEnded, stored.size]).toEqual([null, true, 0]);
    session.take(ACCOUNT);
    expect(session.hasEnded).toBe(false);
    await session.signOut();
    expect([session.account, session.hasEnded]).toEqual([null, false]);
  });

  it('stays where signing out fails', async () => {
    const session = useSessionStore();
    session.take(ACCOUNT);
    service.isDown = true;
    await expect(session.signOut()).rejects.toThrow('down');
    expect(session.account).toEqual(ACCOUNT);
  });

  it('follows what another tab does, and nothing else that is stored', async () => {
    const session = useSessionStore();
    session.take(ACCOUNT);
    onStorage?.({ key: 'evenfall.appearance' });
    onStorage?.({ key: 'evenfall.signed-in' });
    expect(service.asked).toBe(0);
    service.state = { ...ACCOUNT, id: '2', name: 'Orla Wick' };
    stored.set('evenfall.signed-in', '2');
    onStorage?.({ key: 'evenfall.signed-in' });
    await vi.waitUntil(() => session.account?.name === 'Orla Wick');
    service.state = null;
    stored.clear();
    onStorage?.({ key: null });
    await vi.waitUntil(() => session.account === null);
    expect(session.hasEnded).toBe(true);
  });
});
