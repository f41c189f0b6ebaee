import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoPeople } from '../../../server/services/demo/people';
import { passwordFault } from '../../../server/policies/passwordRules';
import { seedDemo } from '../../../server/services/demo/seed';
import { ownWords } from '../../../server/routes/api/signUp';
import { isCommonPassword } from '../../../server/services/passwords/commonPasswords';
import { startConsole, type ConsoleService } from '../../support/consoleService';

const NOW = new Date('2026-06-21T18:30:00Z');
let service: ConsoleService;
let lines: readonly string[] = [];
beforeAll(async () => {
  service = await startConsole();
  await service.setClock(NOW.toISOString());
  lines = (await seedDemo(service.database.ownerUrl, NOW))?.lines ?? [];
}, 60_000);
afterAll(() => service.stop());

describe('the demo scenario', () => {
  it.each(Object.entries(demoPeople))('lets the %s sign in with what is printed', async (_role, person) => {
    expect(lines.some((line) => line.includes(person.email) && line.includes(person.password))).toBe(true);
    const answer = await service.newBrowser().signIn(person.email, person.password);
    expect(answer.status).toBe(200);
    expect(answer.body.account).toMatchObject({ name: person.name, roles: person.roles });
  });

  it.each(Object.values(demoPeople))('gives $email a password that the rules take', (person) => {
    const words = ownWords('http://127.0.0.1:4310', person);
    expect(passwordFault(person.password, { isCommon: isCommonPassword, words })).toBeNull();
  });

  it('adds up: months equal the sums of the keys’ months, and those the hours’', async () => {
    const months = await service.sql<{ used: string; keys: string; hours: string }>(`
      SELECT q.used,
        (SELECT sum(p.used) FROM key_periods p JOIN api_keys k ON k.id = p.key_id
          WHERE k.account_id = q.account_id AND p.month = q.month) AS keys,
        (SELECT sum(u.units) FROM usage_hours u JOIN api_keys k ON k.id = u.key_id
          WHERE k.account_id = q.account_id AND month_of(u.hour) = q.month) AS hours
      FROM quota_periods q`);
    expect(months).toHaveLength(2);
    for (const { used, keys, hours } of months) {
      expect(Number(used)).toBeGreaterThan(1000);
      expect([keys, hours]).toEqual([used, used]);
    }
    const [logged] = await service.sql<{ held: string; lines: string; calls: string }>(`
      SELECT (SELECT sum(calls_held) FROM request_log) AS held,
        (SELECT sum(jsonb_array_length(calls)) FROM request_log) AS lines,
        (SELECT sum(calls) FROM usage_hours) AS calls`);
    expect(logged?.held).toBe(logged?.lines);
    expect(logged?.held).toBe(logged?.calls);
    const [late] = await service.sql<{ late: string }>(
      'SELECT count(*) AS late FROM request_log WHERE last_at > service_now()',
    );
    expect(late?.late).toBe('0');
  });

  it('shows the developer a plan with room, and keys in each state', async () => {
    const browser = service.newBrowser();
    await browser.signIn(demoPeople.developer.email, demoPeople.developer.password);
    const { standing } = (await browser.call('GET', '/api/me')).body as unknown as {
      standing: { quota: { used: number; limit: number } };
    };
    expect(standing.quota.limit).toBe(200_000);
    expect(standing.quota.used).toBeLessThan(100_000);
    const { keys } = (await browser.call('GET', '/api/keys')).body as unknown as {
      keys: { state: string }[];
    };
    expect(keys.map(({ state }) => state).sort()).toEqual(['live', 'live', 'revoked', 'unclaimed']);
  });

  it('leaves a database with anything in it alone', async () => {
    expect(await seedDemo(service.database.ownerUrl, NOW)).toBeNull();
  });
});
