import { afterAll, beforeAll, expect, it } from 'vitest';
import { startConsole, type ConsoleService, type Person } from '../../support/consoleService';

let service: ConsoleService;
let owner: Person;

interface PlanPage {
  standing: { plan: { id: string }; quota: { remaining: number; limit: number } };
  plans: { id: string }[];
  requests: { id: string; planId: string; reason: string; state: string }[];
}
const wish = { planId: 'studio', reason: 'A course of sixty people starts in May.' };
const page = async () => (await owner.browser.call('GET', '/api/plan')).body as unknown as PlanPage;
const askFor = (body: object) => owner.browser.call('POST', '/api/plan/requests', body);

beforeAll(async () => {
  service = await startConsole();
  owner = await service.person();
});
afterAll(() => service.stop());

it('tells the plan, what is left of it, and the others', async () => {
  const { standing, plans, requests } = await page();
  expect(standing.plan.id).toBe('starter');
  expect(standing.quota.remaining).toBe(standing.quota.limit);
  expect(plans.map(({ id }) => id)).toEqual(['starter', 'studio', 'house']);
  expect(requests).toEqual([]);
});

it('takes one wish at a time, which can be taken back and asked anew', async () => {
  expect((await askFor(wish)).status).toBe(201);
  const second = await askFor(wish);
  expect([second.status, second.body.code]).toEqual([409, 'request_waiting']);
  const [waiting] = (await page()).requests;
  expect(waiting).toMatchObject({ ...wish, state: 'open' });
  const gone = await owner.browser.call('DELETE', `/api/plan/requests/${waiting?.id}`);
  expect(gone.status).toBe(204);
  expect((await page()).requests).toEqual([]);
  expect((await askFor(wish)).status).toBe(201);
});

it('does not take back what has its answer', async () => {
  const [waiting] = (await page()).requests;
  await service.sql(
    "UPDATE plan_requests SET state = 'declined', answer = 'Not now.', answered_at = now() WHERE id = $1",
    [waiting?.id],
  );
  expect((await owner.browser.call('DELETE', `/api/plan/requests/${waiting?.id}`)).status).toBe(404);
  expect((await page()).requests[0]).toMatchObject({ state: 'declined', answer: 'Not now.' });
});

it.each([
  ['the plan that one has', { ...wish, planId: 'starter' }, '/planId'],
  ['a plan that is none', { ...wish, planId: 'gold' }, '/planId'],
  ['no real reason', { ...wish, reason: '  more   ' }, '/reason'],
])('refuses %s', async (_, body, pointer) => {
  const answer = await askFor(body);
  expect(answer.status).toBe(422);
  expect(answer.body.errors.map((error) => error.pointer)).toEqual([pointer]);
});
