import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { loadCalculators } from '../../../shared/calculators';
import { parseInput } from '../../../shared/contract/defineCalculator';
import { kitIn } from '../../../shared/contract/kit';
import { STARTING_KITS } from '../../../shared/contract/startingKits';
import { startConsole, type ConsoleService, type Person } from '../../support/consoleService';

interface Thing {
  id: string;
  kind: string;
  name: string;
  version: number;
  link: string | null;
  body: object;
}

let service: ConsoleService;
let owner: Person;
let recipe: object;
let evening: object;

const thingOf = (answer: { body: object }) => (answer.body as { thing: Thing }).thing;
const save = (more: object = {}) =>
  owner.browser.call('POST', '/api/saved', { kind: 'recipe', name: 'Harbour wall', body: recipe, ...more });

beforeAll(async () => {
  service = await startConsole();
  owner = await service.person({ roles: ['photographer'] });
  const calculators = await loadCalculators();
  const exampleOf = (id: string) => calculators.find((one) => one.id === id)?.examples[0]?.input as object;
  recipe = exampleOf('fill/recipes');
  evening = exampleOf('twilight/ladder');
});
afterAll(() => service.stop());

describe('a kit', () => {
  it('is empty at first, is kept, and is read again as it was kept', async () => {
    const first = await owner.browser.call('GET', '/api/kit');
    expect(first.body).toMatchObject({ version: 0, kit: { cameras: [], flashes: [] } });
    const { kit } = STARTING_KITS[1] ?? { kit: {} };
    const kept = await owner.browser.call('PUT', '/api/kit', { kit, version: 0 });
    expect(kept.body).toMatchObject({ version: 1, kit: { lenses: [{ name: 'Standard zoom' }] } });
    expect((await owner.browser.call('GET', '/api/kit')).body).toEqual(kept.body);
  });

  it('loses no change that another page made meanwhile', async () => {
    const late = await owner.browser.call('PUT', '/api/kit', { kit: {}, version: 0 });
    expect([late.status, late.body.code]).toEqual([409, 'changed_meanwhile']);
    expect((await owner.browser.call('PUT', '/api/kit', { kit: {}, version: 1 })).status).toBe(200);
    const both = await Promise.all(
      ['left', 'right'].map((name) =>
        owner.browser.call('PUT', '/api/kit', { kit: { filters: [{ name, ndStops: 3 }] }, version: 2 }),
      ),
    );
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('is refused with every fault at its place', async () => {
    const kit = { lenses: [{ name: '', focalLengthMm: 0, apertureMin: 'f/2', apertureMax: 'f/16' }] };
    const { status, body } = await owner.browser.call('PUT', '/api/kit', { kit, version: 3 });
    expect(status).toBe(422);
    expect(body.errors.map(({ pointer }) => pointer).sort()).toEqual([
      '/kit/lenses/0/focalLengthMm',
      '/kit/lenses/0/name',
    ]);
  });

  it('has starting kits that are good as they are', () => {
    expect(STARTING_KITS.length).toBeGreaterThan(2);
    for (const { title, kit } of STARTING_KITS) expect(kitIn.safeParse(kit).success, title).toBe(true);
  });
});

describe('a recipe or an evening', () => {
  it('is saved, listed, renamed, changed and removed', async () => {
    const saved = thingOf(await save());
    expect(saved).toMatchObject({ name: 'Harbour wall', version: 1, link: null, body: recipe });
    const dusk = thingOf(await save({ kind: 'evening', name: 'Dusk', body: evening }));
    const list = (await owner.browser.call('GET', '/api/saved')).body as unknown as { things: Thing[] };
    expect(list.things.map(({ name }) => name)).toEqual(['Dusk', 'Harbour wall']);
    const path = `/api/saved/${saved.id}`;
    const renamed = thingOf(await owner.browser.call('PATCH', path, { name: 'Quay', version: 1 }));
    expect(renamed).toMatchObject({ name: 'Quay', version: 2, body: recipe });
    const stale = await owner.browser.call('PATCH', path, { name: 'Pier', version: 1 });
    expect([stale.status, stale.body.code]).toEqual([409, 'changed_meanwhile']);
    const changed = thingOf(
      await owner.browser.call('PATCH', path, { body: { ...recipe, count: 2 }, version: 2 }),
    );
    expect(changed.body).toMatchObject({ count: 2 });
    expect((await owner.browser.call('DELETE', path)).status).toBe(204);
    expect((await owner.browser.call('GET', path)).status).toBe(404);
    await owner.browser.call('DELETE', `/api/saved/${dusk.id}`);
  });

  it('is refused where its calculator would refuse it, with the calculator’s own words', async () => {
    const { status, body } = await save({ kind: 'evening', body: { ...evening, latitude: 91 } });
    expect(status).toBe(422);
    expect(body.errors).toEqual([
      {
        pointer: '/body/latitude',
        code: 'out_of_range',
        detail: 'Latitude must be from −90 to 90 °, not 91 °.',
      },
    ]);
    expect((await save({ kind: 'evening', body: recipe })).status).toBe(422);
  });

  it('comes back as a question that its calculator answers', async () => {
    const { id } = thingOf(await save());
    const { body } = thingOf(await owner.browser.call('GET', `/api/saved/${id}`));
    const calculator = (await loadCalculators()).find((one) => one.id === 'fill/recipes');
    expect(calculator && 'input' in parseInput(calculator, body)).toBe(true);
  });
});

describe('a link', () => {
  const tokenOf = (link: string | null) => link?.split('/').pop() ?? '';
  const read = (token: string) => service.newBrowser().call('GET', `/api/shared/${token}`);

  it('lets anyone read the thing and nothing of its owner, until it is revoked', async () => {
    const { id } = thingOf(await save());
    const path = `/api/saved/${id}/link`;
    const { link } = thingOf(await owner.browser.call('POST', path, {}));
    expect(thingOf(await owner.browser.call('POST', path, {})).link).toBe(link);
    const shared = await read(tokenOf(link));
    expect(shared.body).toMatchObject({ kind: 'recipe', name: 'Harbour wall', body: recipe });
    for (const secret of [owner.id, owner.email, id]) expect(shared.text).not.toContain(secret);
    expect(thingOf(await owner.browser.call('DELETE', path)).link).toBeNull();
    expect((await read(tokenOf(link))).status).toBe(404);
    const again = thingOf(await owner.browser.call('POST', path, {})).link;
    expect(again).not.toBe(link);
  });

  it('stands in no table as it is, and ends with the thing and with the account', async () => {
    const other = await service.person({ roles: ['photographer'] });
    const body = { kind: 'recipe', name: 'Gone soon', body: recipe };
    const { id } = thingOf(await other.browser.call('POST', '/api/saved', body));
    const { link } = thingOf(await other.browser.call('POST', `/api/saved/${id}/link`, {}));
    const rows = await service.sql('SELECT * FROM saved_things WHERE id = $1', [id]);
    expect(JSON.stringify(rows)).not.toContain(tokenOf(link));
    expect((await read(tokenOf(link))).status).toBe(200);
    await service.sql('UPDATE accounts SET blocked_at = now() WHERE id = $1', [other.id]);
    expect((await read(tokenOf(link))).status).toBe(404);
    await service.sql('DELETE FROM saved_things WHERE id = $1', [id]);
    expect((await read(tokenOf(link))).status).toBe(404);
  });

  it.each(['x', 'A'.repeat(43), '%00'])('that was never given leads nowhere: %s', async (token) => {
    expect((await read(token)).status).toBe(404);
  });
});
