import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { PASSWORD, startConsole, type ConsoleService } from '../../support/consoleService';

const NEW_PASSWORD = 'paper boats under the mill bridge';
let service: ConsoleService;
beforeAll(async () => {
  service = await startConsole();
});
afterAll(() => service.stop());

const eventsOf = async (accountId: string) =>
  (
    await service.sql<{ event: string }>('SELECT event FROM audit_events WHERE account_id = $1 ORDER BY id', [
      accountId,
    ])
  ).map(({ event }) => event);

describe('the account', () => {
  it('shows its plan and where it stands this month', async () => {
    const { browser, id, email } = await service.person({ name: 'Maud Lintel' });
    await service.sql(
      `INSERT INTO quota_periods (account_id, month, used, tokens, refilled_at)
       VALUES ($1, month_of(now()), 1234, 40, now())`,
      [id],
    );
    const { body } = await browser.call('GET', '/api/me');
    expect(body).toMatchObject({
      account: { id, email, name: 'Maud Lintel', roles: ['developer'], lengthUnit: 'metres' },
      standing: {
        plan: { id: 'starter', unitsPerMonth: 10_000, ratePerSecond: 10, burst: 40 },
        quota: { used: 1234, limit: 10_000, remaining: 8766 },
      },
    });
    await service.sql('UPDATE accounts SET own_units_per_month = 99, own_rate_per_second = 3 WHERE id = $1', [
      id,
    ]);
    expect((await browser.call('GET', '/api/me')).body).toMatchObject({
      standing: { plan: { unitsPerMonth: 99, ratePerSecond: 3, burst: 12 }, quota: { remaining: 0 } },
    });
  });

  it('takes another name, other units and other roles, and nothing else', async () => {
    const { browser, id } = await service.person();
    const changed = await browser.call('PATCH', '/api/me', { name: 'Wilmot Ashgrove', lengthUnit: 'feet' });
    expect(changed.body.account).toMatchObject({ name: 'Wilmot Ashgrove', lengthUnit: 'feet' });
    for (const field of ['email', 'roles', 'planId', 'verifiedAt', 'id', 'passwordHash']) {
      const answer = await browser.call('PATCH', '/api/me', { [field]: 'x' });
      expect(answer.body.errors).toMatchObject([{ pointer: `/${field}`, code: 'unknown_field' }]);
    }
    const roles = await browser.call('PUT', '/api/me/roles', { roles: ['photographer'] });
    expect(roles.body.account).toMatchObject({ roles: ['photographer'] });
    for (const wish of [['admin'], [], ['educator', 'educator']])
      expect((await browser.call('PUT', '/api/me/roles', { roles: wish })).status).toBe(422);
    await service.sql("UPDATE accounts SET roles = '{photographer,admin}' WHERE id = $1", [id]);
    const kept = await browser.call('PUT', '/api/me/roles', { roles: ['educator'] });
    expect(kept.body.account).toMatchObject({ roles: ['educator', 'admin'] });
    expect(await eventsOf(id)).toEqual(
      expect.arrayContaining(['signed_up', 'signed_in', 'profile_changed', 'roles_changed']),
    );
  });
});

describe('changing the password', () => {
  it('needs the old one, ends the other sessions and says so by mail', async () => {
    const { browser, email, id } = await service.person();
    const other = service.newBrowser();
    await other.signIn(email);
    const wrong = { currentPassword: NEW_PASSWORD, newPassword: NEW_PASSWORD };
    expect((await browser.call('POST', '/api/me/password', wrong)).body.code).toBe('password_wrong');
    const weak = await browser.call('POST', '/api/me/password', {
      currentPassword: PASSWORD,
      newPassword: `${email} 12`,
    });
    expect(weak.body.errors).toMatchObject([{ pointer: '/newPassword', code: 'password_about_you' }]);
    const change = { currentPassword: PASSWORD, newPassword: NEW_PASSWORD };
    expect((await browser.call('POST', '/api/me/password', change)).status).toBe(204);
    expect((await browser.call('GET', '/api/me')).status).toBe(200);
    expect((await other.call('GET', '/api/me')).status).toBe(401);
    expect((await other.signIn(email)).status).toBe(401);
    expect((await other.signIn(email, NEW_PASSWORD)).status).toBe(200);
    expect((await service.mail.next(email, 1)).subject).toBe('Your Evenfall password was changed');
    expect(await eventsOf(id)).toContain('password_changed');
  });

  it('takes any spelling of the same characters', async () => {
    const { browser, email } = await service.person();
    const composed = 'the caf\u00e9 at the weir, nine o’clock';
    const change = { currentPassword: PASSWORD, newPassword: composed };
    expect((await browser.call('POST', '/api/me/password', change)).status).toBe(204);
    expect((await service.newBrowser().signIn(email, composed.normalize('NFD'))).status).toBe(200);
  });

  it('reads a long password to its last character', async () => {
    const { browser, email } = await service.person();
    const long = `${'a river of lanterns '.repeat(6)}end`;
    await browser.call('POST', '/api/me/password', { currentPassword: PASSWORD, newPassword: long });
    expect((await service.newBrowser().signIn(email, `${long.slice(0, -1)}t`)).status).toBe(401);
    expect((await service.newBrowser().signIn(email, long)).status).toBe(200);
  });
});

describe('a forgotten password', () => {
  it('is set anew by the link: once, ending all sessions, and signing nobody in', async () => {
    const { browser, email, id } = await service.person();
    const guest = service.newBrowser();
    await guest.call('POST', '/api/password-reset', { email: email.toUpperCase() });
    const { token, text } = await service.mail.next(email, 1);
    expect(text).toContain(`http://127.0.0.1:4310/reset#${token}`);
    const set = (password: string) => guest.call('POST', '/api/password-reset/confirm', { token, password });
    expect((await set('short')).body.errors).toMatchObject([{ code: 'password_too_short' }]);
    expect((await set(`${email}!!`)).body.errors).toMatchObject([{ code: 'password_about_you' }]);
    const answer = await set(NEW_PASSWORD);
    expect([answer.status, answer.body, answer.cookies]).toEqual([200, { email }, []]);
    expect((await browser.call('GET', '/api/me')).status).toBe(401);
    expect((await set('another phrase, long enough')).body.code).toBe('link_not_valid');
    expect((await guest.signIn(email, NEW_PASSWORD)).status).toBe(200);
    expect(await eventsOf(id)).toEqual(expect.arrayContaining(['password_asked', 'password_changed']));
    const rows = await service.sql<{ all: string }>('SELECT t::text AS all FROM email_tokens t');
    expect(rows.length).toBeGreaterThan(0);
    for (const row of rows) expect(row.all).not.toContain(token);
  });

  it('can be set once when the link is pressed twice at once', async () => {
    const { email } = await service.person();
    const guest = service.newBrowser();
    await guest.call('POST', '/api/password-reset', { email });
    const { token } = await service.mail.next(email, 1);
    const wishes = [`${NEW_PASSWORD} one`, `${NEW_PASSWORD} two`];
    const answers = await Promise.all(
      wishes.map((password) => guest.call('POST', '/api/password-reset/confirm', { token, password })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410]);
  });

  it('takes no link that is over', async () => {
    const { email } = await service.person();
    const guest = service.newBrowser();
    await guest.call('POST', '/api/password-reset', { email });
    const { token } = await service.mail.next(email, 1);
    await service.sql(
      `UPDATE email_tokens SET expires_at = now() WHERE account_id = (SELECT id FROM accounts WHERE email = $1)`,
      [email],
    );
    const answer = await guest.call('POST', '/api/password-reset/confirm', { token, password: NEW_PASSWORD });
    expect(answer.status).toBe(410);
  });
});

describe('changing the address', () => {
  it('holds when the new address is confirmed, and tells the old one', async () => {
    const { browser, email, id } = await service.person();
    const wanted = service.newAddress();
    const ask = (password: string) => browser.call('POST', '/api/me/email', { email: wanted, password });
    expect((await ask(NEW_PASSWORD)).body.code).toBe('password_wrong');
    const asked = await ask(PASSWORD);
    expect([asked.status, asked.body]).toEqual([202, { sentTo: wanted }]);
    expect((await service.mail.next(email, 1)).text).toContain(wanted);
    expect((await browser.call('GET', '/api/me')).body.account).toMatchObject({ email });
    const { token } = await service.mail.next(wanted);
    const guest = service.newBrowser();
    const confirmed = await guest.call('POST', '/api/email-change/confirm', { token });
    expect([confirmed.status, confirmed.body, confirmed.cookies]).toEqual([200, { email: wanted }, []]);
    expect((await service.mail.next(email, 2)).subject).toBe('Your Evenfall address was changed');
    expect((await guest.signIn(email)).status).toBe(401);
    expect((await guest.signIn(wanted)).status).toBe(200);
    expect((await guest.call('POST', '/api/email-change/confirm', { token })).status).toBe(410);
    expect(await eventsOf(id)).toEqual(expect.arrayContaining(['email_change_asked', 'email_changed']));
  });

  it('tells who asks nothing about another account’s address', async () => {
    const one = await service.person();
    const two = await service.person();
    const ask = (email: string) => one.browser.call('POST', '/api/me/email', { email, password: PASSWORD });
    const taken = await ask(two.email);
    const free = await ask(service.newAddress());
    expect([taken.status, Object.keys(taken.body)]).toEqual([free.status, Object.keys(free.body)]);
    expect((await service.mail.next(two.email, 1)).subject).toBe(
      'This address already has an Evenfall account',
    );
  });

  it('ends with a new password', async () => {
    const { browser } = await service.person();
    const wanted = service.newAddress();
    await browser.call('POST', '/api/me/email', { email: wanted, password: PASSWORD });
    const { token } = await service.mail.next(wanted);
    await browser.call('POST', '/api/me/password', { currentPassword: PASSWORD, newPassword: NEW_PASSWORD });
    const answer = await service.newBrowser().call('POST', '/api/email-change/confirm', { token });
    expect(answer.status).toBe(410);
  });
});

describe('taking one’s data along', () => {
  it('gives a file with everything, and no secret', async () => {
    const { browser, email } = await service.person();
    const made = await browser.call('POST', '/api/keys', { name: 'Mine' });
    const { secret } = made.body as unknown as { secret: string };
    const answer = await browser.call('GET', '/api/me/export');
    expect(answer.headers['content-disposition']).toBe('attachment; filename="evenfall-account.json"');
    const body = answer.body as unknown as Record<string, unknown[]>;
    expect(body).toMatchObject({
      account: { email },
      keys: [{ name: 'Mine' }],
      sessions: [{ isThisOne: true }],
    });
    expect(body.events?.length).toBeGreaterThan(2);
    expect(answer.text).not.toContain(secret);
    expect(answer.text).not.toMatch(/\$2[aby]\$/);
  });

  it('shows what happened a page at a time', async () => {
    const { browser, id } = await service.person();
    await service.sql(
      "INSERT INTO audit_events (event, account_id, actor_id) SELECT 'profile_changed', $1, $1 FROM generate_series(1, 120)",
      [id],
    );
    const seen: string[] = [];
    let next: string | null = '';
    while (next !== null) {
      const path: string = `/api/me/events${next === '' ? '' : `?before=${next}`}`;
      const page = (await browser.call('GET', path)).body as unknown as {
        events: { id: string }[];
        next: string | null;
      };
      seen.push(...page.events.map((event) => event.id));
      next = page.next;
    }
    expect(seen).toHaveLength(122);
    expect(new Set(seen).size).toBe(122);
    expect((await browser.call('GET', '/api/me/events?before=x')).status).toBe(422);
  });
});

describe('closing the account', () => {
  it('needs the password, revokes the keys and leaves nothing personal behind', async () => {
    const { browser, email, id } = await service.person({ name: 'Perpetua Quillfeather' });
    const made = await browser.call('POST', '/api/keys', { name: 'Perpetua’s desk' });
    const { secret } = made.body as unknown as { secret: string };
    const call = () =>
      service.call('POST', '/v1/exposure/value', { key: secret, body: { aperture: 8, shutter: 1 } });
    expect((await call()).status).toBe(200);
    await browser.call('POST', '/api/password-reset', { email });
    await service.mail.next(email, 1);
    expect((await browser.call('POST', '/api/me/close', { password: NEW_PASSWORD })).status).toBe(403);
    const kept = browser.copy();
    const answer = await browser.call('POST', '/api/me/close', { password: PASSWORD });
    expect([answer.status, answer.headers['clear-site-data']]).toEqual([
      204,
      '"cache", "cookies", "storage"',
    ]);
    expect((await call()).body).toMatchObject({ code: 'key_revoked' });
    expect((await kept.call('GET', '/api/me')).status).toBe(401);
    expect((await service.newBrowser().signIn(email)).status).toBe(401);
    expect((await service.mail.next(email, 2)).subject).toBe('Your Evenfall account is closed');
    const tables = await service.sql<{ name: string }>(
      "SELECT table_name AS name FROM information_schema.tables WHERE table_schema = 'public' AND table_type = 'BASE TABLE'",
    );
    expect(tables.length).toBeGreaterThan(12);
    for (const { name } of tables) {
      const found = await service.sql<{ all: string }>(
        `SELECT t::text AS all FROM ${name} t WHERE t::text ILIKE $1 OR t::text ILIKE '%Perpetua%' OR t::text LIKE $2`,
        [`%${email}%`, `%${browser.address}%`],
      );
      expect([name, found]).toEqual([name, []]);
    }
    const [period] = await service.sql<{ used: string }>(
      'SELECT used FROM quota_periods WHERE account_id = $1',
      [id],
    );
    expect(period?.used).toBe('1');
    expect(await eventsOf(id)).toEqual(expect.arrayContaining(['signed_up', 'key_made', 'account_closed']));
    const again = await service.person({ email });
    expect(again.id).not.toBe(id);
  });
});
