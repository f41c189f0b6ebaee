import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fillRecipes } from '../../../shared/calculators/fill/recipes';
import { consoleRoutes } from '../../../server/routes/api/consoleRoutes';
import { startConsole, type Answer, type ConsoleService, type Person } from '../../support/consoleService';

const NOBODYS = '6f1c2a5e-0000-4000-8000-00000000000a';
let service: ConsoleService;
let owner: Person;
let stranger: Person;
const owned: Record<string, string> = {};

beforeAll(async () => {
  service = await startConsole();
  owner = await service.person();
  stranger = await service.person();
  const made = await owner.browser.call('POST', '/api/keys', { name: 'Mine' });
  owned['/api/keys'] = (made.body as unknown as { key: { id: string } }).key.id;
  const asked = await owner.browser.call('POST', '/api/plan/requests', {
    planId: 'studio',
    reason: 'Many calls.',
  });
  owned['/api/plan/requests'] =
    (asked.body as unknown as { requests: { id: string }[] }).requests[0]?.id ?? '';
  const saved = await owner.browser.call('POST', '/api/saved', {
    kind: 'recipe',
    name: 'Mine',
    body: fillRecipes.examples[0]?.input,
  });
  owned['/api/saved'] = (saved.body as unknown as { thing: { id: string } }).thing.id;
  const { sessions } = (await owner.browser.call('GET', '/api/sessions')).body as unknown as {
    sessions: { id: string }[];
  };
  owned['/api/sessions'] = sessions[0]?.id ?? '';
});
afterAll(() => service.stop());

/** What each route needs to be asked for something. */
const BODIES: Record<string, object> = {
  ChangeKey: { name: 'Yours now' },
  RotateKey: { grace: 'hour' },
  ChangeSaved: { name: 'Yours now', version: 1 },
};

/** An answer without what differs from request to request: its id, and with it its length, and the time. */
const bare = ({ status, headers, body }: Answer) => {
  const { 'x-request-id': _id, date: _date, 'content-length': _length, ...rest } = headers;
  const { instance: _instance, ...told } = (body ?? {}) as Record<string, unknown>;
  return { status, headers: rest, body: told };
};

const named = consoleRoutes.filter(({ path }) => path.includes(':id'));

describe('what belongs to another account', () => {
  it('covers every route that names something', () => {
    expect(named.length).toBe(14);
    for (const { path } of named) expect(owned[path.split('/:id')[0] ?? '']).toBeTruthy();
  });

  it.each(named.map(({ method, path, id }) => [method, path, id]))(
    '%s %s looks exactly like what is not there',
    async (method, path, id) => {
      const theirs = owned[path.split('/:id')[0] ?? ''] ?? '';
      const ask = (of: string) => stranger.browser.call(method, path.replace(':id', of), BODIES[id] ?? {});
      const answers = [await ask(theirs), await ask(NOBODYS)];
      expect(answers[0]?.status).toBe(404);
      expect(bare(answers[0] as Answer)).toEqual(bare(answers[1] as Answer));
    },
  );

  it('is untouched after all that', async () => {
    const { key } = (await owner.browser.call('GET', `/api/keys/${owned['/api/keys']}`)).body as unknown as {
      key: object;
    };
    expect(key).toMatchObject({ name: 'Mine', state: 'live', replacedBy: null });
    expect((await owner.browser.call('GET', '/api/me')).status).toBe(200);
  });

  it('shows in no list and in no export', async () => {
    const lists = ['/api/keys', '/api/sessions', '/api/me', '/api/me/events', '/api/me/export'];
    for (const path of [...lists, '/api/usage', '/api/plan', '/api/kit', '/api/saved']) {
      const { text, status } = await stranger.browser.call('GET', path);
      expect(status).toBe(200);
      for (const secret of [...Object.values(owned), owner.email, owner.id])
        expect(text).not.toContain(secret);
    }
  });

  it('is no key to ask the usage of', async () => {
    const ask = (id: string | undefined) => stranger.browser.call('GET', `/api/usage?keyId=${id}`);
    const answers = [await ask(owned['/api/keys']), await ask(NOBODYS)];
    expect(answers[0]?.status).toBe(404);
    expect(bare(answers[0] as Answer)).toEqual(bare(answers[1] as Answer));
  });

  it('is left alone when a stranger ends all other sessions or closes the account', async () => {
    await stranger.browser.call('DELETE', '/api/sessions');
    expect((await owner.browser.call('GET', '/api/me')).status).toBe(200);
  });
});
