import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { withClient } from '../../../server/scripts/cluster/prepareDatabase';
import { PASSWORD, startConsole, type ConsoleService } from '../../support/consoleService';
import { testSettings } from '../../support/testSettings';

const folder = mkdtempSync(join(tmpdir(), 'evenfall-log-'));
const logFile = join(folder, 'log');
let service: ConsoleService;
beforeAll(async () => {
  service = await startConsole({ logLevel: 'trace' }, logFile);
});
afterAll(() => rmSync(folder, { recursive: true }));

describe('the log', () => {
  it('has a line a request with its id, and no secret of any kind, through successes and failures', async () => {
    const { browser, email } = await service.person();
    const secrets = [PASSWORD, email, browser.cookie('evenfall_session'), browser.cookie('evenfall_refresh')];
    const made = (await browser.call('POST', '/api/keys', { name: 'Whispered name' })).body as unknown as {
      key: { id: string };
      secret: string;
    };
    secrets.push(made.secret, 'Whispered name');
    const pass = (await browser.call('POST', `/api/keys/${made.key.id}/pass`, {})).body as unknown as {
      pass: string;
    };
    secrets.push(pass.pass);
    await browser.call('POST', '/api/password-reset', { email });
    const { token } = await service.mail.next(email, 1);
    secrets.push(token);
    await browser.call('POST', '/api/password-reset/confirm', {
      token,
      password: 'wrong horse, wrong lantern',
    });
    secrets.push('wrong horse, wrong lantern');
    await browser.signIn(email, 'a mistyped but nearly right one');
    secrets.push('a mistyped but nearly right one');
    // A statement that fails carries its values in the driver's error.
    await service.sql('ALTER TABLE sign_ups RENAME COLUMN name TO other_name');
    const wish = {
      email: 'somebody-else@example.org',
      name: 'Ursel Dyke',
      password: PASSWORD,
      roles: ['educator'],
    };
    const failed = await service.newBrowser().call('POST', '/api/sign-up', wish);
    expect([failed.status, failed.body.code]).toEqual([500, 'internal_error']);
    expect(failed.text).not.toMatch(/other_name|column|INSERT/);
    await service.sql('ALTER TABLE sign_ups RENAME COLUMN other_name TO name');
    secrets.push('somebody-else@example.org', 'Ursel Dyke');
    await service.stop();
    const log = readFileSync(logFile, 'utf8');
    const lines = log
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line) as Record<string, unknown>);
    expect(lines.filter(({ operation }) => operation === 'MakeKey')).toMatchObject([{ status: 201 }]);
    expect(lines.filter(({ msg }) => msg === 'a call failed')).toHaveLength(1);
    const requests = lines.map(({ request }) => request);
    expect(requests).toContain(failed.headers['x-request-id']);
    for (const secret of secrets) {
      expect(secret).toBeTruthy();
      expect(log).not.toContain(secret);
    }
    expect(log).not.toMatch(/\$2[aby]\$/);
  });
});

describe('the audit trail', () => {
  let other: ConsoleService;
  beforeAll(async () => {
    other = await startConsole();
  });
  afterAll(() => other.stop());

  it('can be added to and read by the service’s role, never changed or taken back', async () => {
    const { id } = await other.person();
    const client = new pg.Client({ connectionString: other.database.serviceUrl });
    await client.connect();
    for (const sql of [
      "UPDATE audit_events SET event = 'nothing'",
      'DELETE FROM audit_events',
      'TRUNCATE audit_events',
      "SET evenfall.forgetting = 'on'; DELETE FROM audit_events",
      `SELECT audit_forget('${id}')`,
    ])
      await expect(client.query(sql), sql).rejects.toMatchObject({ code: '42501' });
    await client.end();
    const rows = await other.sql<{ event: string }>(
      'SELECT event FROM audit_events WHERE account_id = $1 ORDER BY id',
      [id],
    );
    expect(rows.map(({ event }) => event)).toEqual(['signed_up', 'signed_in']);
    await expect(other.sql("UPDATE audit_events SET event = 'nothing'")).rejects.toMatchObject({
      code: '42501',
    });
  });

  it('notes who, what, from where and by which request', async () => {
    const { browser, id, email } = await other.person();
    const failed = await other
      .newBrowser('203.0.113.77', 'Another browser')
      .signIn(email, 'not it, not at all, no');
    const rows = await other.sql(
      `SELECT event, actor_id, account_id, address, agent, request_id FROM audit_events
       WHERE account_id = $1 ORDER BY id DESC LIMIT 2`,
      [id],
    );
    expect(rows).toEqual([
      {
        event: 'sign_in_failed',
        actor_id: null,
        account_id: id,
        address: '203.0.113.77',
        agent: 'Another browser',
        request_id: failed.headers['x-request-id'],
      },
      expect.objectContaining({ event: 'signed_in', actor_id: id, address: browser.address }) as object,
    ]);
    const shown = (await browser.call('GET', '/api/me/events')).body as unknown as { events: object[] };
    expect(shown.events[0]).toMatchObject({ event: 'sign_in_failed', byYou: false, address: '203.0.113.77' });
  });
});

describe('without its database', () => {
  it('the console says so, and works again when it is back', async () => {
    const other = await startConsole();
    const { browser } = await other.person();
    const { name } = other.database;
    const allow = (isAllowed: boolean) =>
      withClient(testSettings().adminUrl, async (client) => {
        await client.query(`ALTER DATABASE ${name} ALLOW_CONNECTIONS ${isAllowed}`);
        const sql = 'SELECT pg_terminate_backend(pid) FROM pg_stat_activity WHERE datname = $1';
        if (!isAllowed) await client.query(sql, [name]);
      });
    await allow(false);
    const answer = await browser.call('GET', '/api/me');
    expect([answer.status, answer.body.code]).toEqual([503, 'unavailable']);
    expect(answer.headers['retry-after']).toBe('2');
    await allow(true);
    expect((await browser.call('GET', '/api/me')).status).toBe(200);
    await other.stop();
  });
});
