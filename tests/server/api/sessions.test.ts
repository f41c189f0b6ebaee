import jwt from 'jsonwebtoken';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { derivedKey } from '../../../server/services/console/derivedKey';
import { PASSWORD, startConsole, type Browser, type ConsoleService } from '../../support/consoleService';

const SECRET = 'a session secret for the tests, long enough';
let service: ConsoleService;
beforeAll(async () => {
  service = await startConsole({ sessionSecret: SECRET });
});
afterAll(() => service.stop());

const ACCESS = 'evenfall_session';
const REFRESH = 'evenfall_refresh';

function claimsOf(browser: Browser): jwt.JwtPayload {
  return jwt.decode(browser.cookie(ACCESS) ?? '') as jwt.JwtPayload;
}

/** The same claims with changes, signed as the service would, or as told. */
function forged(
  browser: Browser,
  changes: object,
  options: jwt.SignOptions = {},
  key?: string | Buffer,
): string {
  const signing = { algorithm: 'HS256', ...options } as const;
  return jwt.sign({ ...claimsOf(browser), ...changes }, key ?? derivedKey(SECRET, 'sessions'), signing);
}

const rowOf = async (browser: Browser) => {
  const [row] = await service.sql<{ end_reason: string | null }>(
    'SELECT end_reason FROM sessions WHERE id = $1',
    [claimsOf(browser).sid],
  );
  return row;
};

/** Lets as much time go by for a session as `interval` says. */
async function age(browser: Browser, interval: string): Promise<void> {
  await service.sql(
    `UPDATE sessions SET last_seen_at = last_seen_at - $2::interval, expires_at = expires_at - $2::interval WHERE id = $1`,
    [claimsOf(browser).sid, interval],
  );
}

const ageTokens = (browser: Browser, interval: string) =>
  service.sql(
    `UPDATE session_tokens SET used_at = used_at - $2::interval, created_at = created_at - $2::interval WHERE session_id = $1`,
    [claimsOf(browser).sid, interval],
  );

describe('the session’s cookies', () => {
  it('are out of reach of scripts and other sites; the refresh token goes to its own address only', async () => {
    const { browser, email } = await service.person();
    const { cookies } = await browser.signIn(email);
    expect(cookies).toHaveLength(2);
    expect(cookies[0]).toMatch(/^evenfall_session=[\w.-]+; Path=\/; Max-Age=\d+; HttpOnly; SameSite=Lax$/);
    expect(cookies[1]).toMatch(
      /^evenfall_refresh=[\w-]{43}; Path=\/api\/session\/refresh; Max-Age=\d+; HttpOnly; SameSite=Strict$/,
    );
  });

  it('are held to https by prefix and flag where the service is reached by it', async () => {
    const secure = await startConsole({ publicUrl: 'https://light.example.org' });
    const { browser, email } = await secure.person();
    const { cookies } = await browser.signIn(email);
    expect(cookies[0]).toMatch(
      /^__Host-evenfall_session=[^;]+; Path=\/; Max-Age=\d+; HttpOnly; Secure; SameSite=Lax$/,
    );
    expect(cookies[1]).toMatch(/^__Secure-evenfall_refresh=.*; HttpOnly; Secure; SameSite=Strict$/);
    expect((await browser.call('GET', '/api/me')).status).toBe(200);
    const mail = await secure.mail.next(email);
    expect(mail.text).toContain('https://light.example.org/verify#');
    await secure.stop();
  });

  it('keep only hashes of the refresh token in the database', async () => {
    const { browser } = await service.person();
    const token = browser.cookie(REFRESH) ?? '';
    const rows = await service.sql<{ hash: Buffer }>(
      'SELECT hash FROM session_tokens WHERE session_id = $1',
      [claimsOf(browser).sid],
    );
    expect(rows).toHaveLength(1);
    expect(rows[0]?.hash.toString('utf8')).not.toContain(token);
    expect(rows[0]?.hash.toString('base64url')).not.toBe(token);
  });
});

describe('the access token', () => {
  it('names a session for minutes, and nothing else of the person', async () => {
    const { browser, id } = await service.person();
    const claims = claimsOf(browser);
    expect(Object.keys(claims).sort()).toEqual(['aud', 'exp', 'iat', 'iss', 'sid', 'sub', 'typ']);
    expect(claims.sub).toBe(id);
    expect((claims.exp ?? 0) - (claims.iat ?? 0)).toBe(300);
  });

  it.each([
    ['of another key', {}, {}, Buffer.alloc(32, 1)],
    ['of the bare secret', {}, {}, SECRET],
    ['of another type', { typ: 'verify' }, {}, undefined],
    ['of another audience', { aud: 'evenfall-mail' }, {}, undefined],
    ['of another issuer', { iss: 'someone' }, {}, undefined],
    ['of another algorithm', {}, { algorithm: 'HS512' as const }, undefined],
    ['without a signature', {}, { algorithm: 'none' as const }, ''],
    ['without a session', { sid: undefined }, {}, undefined],
    ['of a session that never was', { sid: '00000000-0000-4000-8000-000000000000' }, {}, undefined],
  ])('is refused when it is one %s', async (_what, changes, options, key) => {
    const { browser } = await service.person();
    browser.setCookie(ACCESS, forged(browser, changes, options, key));
    const answer = await browser.call('GET', '/api/me');
    expect(answer.status).toBe(401);
    expect(answer.headers['www-authenticate']).toContain('Session');
  });

  it('of one account does not open another’s session', async () => {
    const one = await service.person();
    const two = await service.person();
    one.browser.setCookie(ACCESS, forged(one.browser, { sid: claimsOf(two.browser).sid }));
    expect((await one.browser.call('GET', '/api/me')).status).toBe(401);
  });

  it('is refused when its minutes are over, and a refresh helps', async () => {
    const { browser } = await service.person();
    browser.setCookie(ACCESS, forged(browser, { exp: 1_700_000_000 }));
    const answer = await browser.call('GET', '/api/me');
    expect([answer.status, answer.body.code]).toEqual([401, 'session_ended']);
    expect((await browser.call('GET', '/api/session')).body).toEqual({
      state: 'stale',
      account: null,
      accessEndsAt: null,
    });
    expect((await browser.call('POST', '/api/session/refresh', {})).status).toBe(200);
    expect((await browser.call('GET', '/api/me')).status).toBe(200);
  });
});

describe('a session', () => {
  it('begins anew at each sign-in, and the one that the browser came with ends', async () => {
    const { browser, email } = await service.person();
    const before = browser.copy();
    await browser.signIn(email);
    expect(claimsOf(browser).sid).not.toBe(claimsOf(before).sid);
    expect((await before.call('GET', '/api/me')).status).toBe(401);
    expect(await rowOf(before)).toEqual({ end_reason: 'replaced' });
  });

  it('can’t be planted: a stranger’s cookies in a browser do not become the session of who signs in', async () => {
    const stranger = await service.person();
    const owner = await service.person();
    const victim = service.newBrowser();
    victim.setCookie(ACCESS, stranger.browser.cookie(ACCESS) ?? '');
    await victim.signIn(owner.email);
    const me = await stranger.browser.call('GET', '/api/me');
    expect(me.status).toBe(401);
    const mine = await victim.call('GET', '/api/me');
    expect(mine.body.account).toMatchObject({ email: owner.email });
  });

  it('ends when nobody used it for a day, and is kept by use', async () => {
    const { browser } = await service.person();
    await age(browser, '23 hours');
    expect((await browser.call('GET', '/api/me')).status).toBe(200);
    await age(browser, '23 hours');
    expect((await browser.call('GET', '/api/me')).status).toBe(200);
    await age(browser, '25 hours');
    expect((await browser.call('GET', '/api/me')).status).toBe(401);
    expect((await browser.call('POST', '/api/session/refresh', {})).status).toBe(401);
  });

  it('ends after thirty days however much it is used', async () => {
    const { browser } = await service.person();
    await service.sql("UPDATE sessions SET expires_at = expires_at - interval '30 days' WHERE id = $1", [
      claimsOf(browser).sid,
    ]);
    expect((await browser.call('GET', '/api/me')).status).toBe(401);
    expect((await browser.call('POST', '/api/session/refresh', {})).status).toBe(401);
  });

  it('is listed with where it came from, and can be ended from another', async () => {
    const { browser, email } = await service.person();
    const phone = service.newBrowser('198.51.100.7', 'A phone at dusk');
    await phone.signIn(email);
    const { sessions } = (await browser.call('GET', '/api/sessions')).body as unknown as {
      sessions: { id: string; agent: string; address: string; isThisOne: boolean }[];
    };
    expect(sessions.map(({ isThisOne }) => isThisOne).sort()).toEqual([false, true]);
    const other = sessions.find(({ isThisOne }) => !isThisOne);
    expect(other).toMatchObject({ agent: 'A phone at dusk', address: '198.51.100.7' });
    expect((await browser.call('DELETE', `/api/sessions/${other?.id}`)).status).toBe(204);
    expect((await phone.call('GET', '/api/me')).status).toBe(401);
    expect((await browser.call('GET', '/api/me')).status).toBe(200);
    expect((await browser.call('DELETE', `/api/sessions/${other?.id}`)).status).toBe(404);
  });

  it('can end all others at once', async () => {
    const { browser, email } = await service.person();
    const others = [service.newBrowser(), service.newBrowser()];
    for (const other of others) await other.signIn(email);
    const answer = await browser.call('DELETE', '/api/sessions');
    expect([answer.status, answer.body]).toEqual([200, { ended: 2 }]);
    for (const other of others) expect((await other.call('GET', '/api/me')).status).toBe(401);
  });
});

describe('refreshing', () => {
  it('gives a new token each time, and the old one is used up', async () => {
    const { browser } = await service.person();
    const first = browser.cookie(REFRESH);
    expect((await browser.call('POST', '/api/session/refresh', {})).status).toBe(200);
    expect(browser.cookie(REFRESH)).not.toBe(first);
    expect((await browser.call('POST', '/api/session/refresh', {})).status).toBe(200);
  });

  it('serves two tabs that come at once, and gives one of them no token to go on with', async () => {
    const { browser } = await service.person();
    const tabs = [browser.copy(), browser.copy()];
    const answers = await Promise.all(tabs.map((tab) => tab.call('POST', '/api/session/refresh', {})));
    expect(answers.map(({ status }) => status)).toEqual([200, 200]);
    const given = answers.map(({ cookies }) => cookies.filter((line) => line.startsWith(REFRESH)).length);
    expect(given.sort()).toEqual([0, 1]);
    for (const tab of tabs) expect((await tab.call('GET', '/api/me')).status).toBe(200);
  });

  it('ends the session for both when a used token comes again later, and tells its owner', async () => {
    const { browser, email } = await service.person();
    const thief = browser.copy('203.0.113.9');
    expect((await thief.call('POST', '/api/session/refresh', {})).status).toBe(200);
    await ageTokens(browser, '11 seconds');
    const answer = await browser.call('POST', '/api/session/refresh', {});
    expect([answer.status, answer.body.code]).toEqual([401, 'session_ended']);
    expect(answer.cookies.every((line) => line.includes('Max-Age=0'))).toBe(true);
    expect((await thief.call('GET', '/api/me')).status).toBe(401);
    expect((await thief.call('POST', '/api/session/refresh', {})).status).toBe(401);
    expect((await service.mail.next(email, 1)).subject).toBe('We ended one of your Evenfall sessions');
  });

  it('takes no second use even within the grace once the token’s successor was used', async () => {
    const { browser } = await service.person();
    const thief = browser.copy();
    await browser.call('POST', '/api/session/refresh', {});
    await browser.call('POST', '/api/session/refresh', {});
    expect((await thief.call('POST', '/api/session/refresh', {})).status).toBe(401);
    expect((await browser.call('GET', '/api/me')).status).toBe(401);
  });

  it('can’t be prolonged through the grace', async () => {
    const { browser } = await service.person();
    const thief = browser.copy();
    await browser.call('POST', '/api/session/refresh', {});
    const first = await thief.call('POST', '/api/session/refresh', {});
    expect(first.cookies.some((line) => line.startsWith(REFRESH))).toBe(false);
    await ageTokens(browser, '11 seconds');
    expect((await thief.call('POST', '/api/session/refresh', {})).status).toBe(401);
  });

  it('knows nothing of a made-up token, and ends nothing by it', async () => {
    const { browser } = await service.person();
    const stranger = service.newBrowser();
    stranger.setCookie(REFRESH, 'A'.repeat(43));
    expect((await stranger.call('POST', '/api/session/refresh', {})).status).toBe(401);
    expect((await browser.call('GET', '/api/me')).status).toBe(200);
  });
});

describe('signing out', () => {
  it('ends the session, clears the browser, and leaves the token of it worthless', async () => {
    const { browser } = await service.person();
    const kept = browser.copy();
    const answer = await browser.call('DELETE', '/api/session');
    expect(answer.status).toBe(204);
    expect(answer.headers['clear-site-data']).toBe('"cache", "cookies", "storage"');
    expect(browser.cookie(ACCESS)).toBeNull();
    expect(await rowOf(kept)).toEqual({ end_reason: 'signed_out' });
    expect((await kept.call('GET', '/api/me')).status).toBe(401);
    expect((await kept.call('POST', '/api/session/refresh', {})).status).toBe(401);
  });

  it('works by an access token whose minutes are over', async () => {
    const { browser } = await service.person();
    const kept = browser.copy();
    browser.setCookie(ACCESS, forged(browser, { exp: 1_700_000_000 }));
    expect((await browser.call('DELETE', '/api/session')).status).toBe(204);
    expect((await kept.call('GET', '/api/me')).status).toBe(401);
  });
});

describe('a blocked account', () => {
  it('gets in neither by a session it has nor by a new one', async () => {
    const { browser, email, id } = await service.person();
    await service.sql('UPDATE accounts SET blocked_at = now() WHERE id = $1', [id]);
    const answers = [await browser.call('GET', '/api/me'), await service.newBrowser().signIn(email)];
    for (const { status, body } of answers) expect([status, body.code]).toEqual([403, 'account_blocked']);
    expect((await service.newBrowser().signIn(email, `${PASSWORD}?`)).body.code).toBe('credentials_wrong');
  });
});
