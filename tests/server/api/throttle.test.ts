import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { delayAfterS, FROM_ANYWHERE, FROM_ONE_PLACE } from '../../../server/policies/signInDelay';
import { startConsole, type Browser, type ConsoleService } from '../../support/consoleService';

let service: ConsoleService;
beforeAll(async () => {
  service = await startConsole();
});
afterAll(() => service.stop());

const WRONG = 'not the password of anybody here';

async function failTimes(browser: Browser, email: string, times: number): Promise<number[]> {
  const statuses: number[] = [];
  for (let i = 0; i < times; i++) statuses.push((await browser.signIn(email, WRONG)).status);
  return statuses;
}

/** Lets time go by for the delays, not for the counts. */
const wait = (seconds: number) =>
  service.sql("UPDATE throttles SET expire = expire - $1 WHERE key LIKE 'gate%'", [seconds * 1000]);

describe('the delay after failures', () => {
  it('is none at first, then doubles, and never grows past its longest', () => {
    expect([0, 4, 5, 6, 7, 8].map((n) => delayAfterS(n, FROM_ONE_PLACE))).toEqual([0, 0, 1, 2, 4, 8]);
    expect(delayAfterS(1_000_000, FROM_ONE_PLACE)).toBe(900);
    expect(delayAfterS(29, FROM_ANYWHERE)).toBe(0);
    expect(delayAfterS(1_000_000, FROM_ANYWHERE)).toBe(60);
  });
});

describe('trying passwords', () => {
  it('is slowed down, and the right password works when the delay is over', async () => {
    const { email } = await service.person();
    const browser = service.newBrowser();
    expect(await failTimes(browser, email, 6)).toEqual([401, 401, 401, 401, 401, 401]);
    const refused = await browser.signIn(email);
    expect([refused.status, refused.body.code]).toEqual([429, 'too_many_attempts']);
    expect(Number(refused.headers['retry-after'])).toBeGreaterThanOrEqual(1);
    await wait(2);
    expect((await browser.signIn(email)).status).toBe(200);
    expect((await browser.signIn(email, WRONG)).status).toBe(401);
  });

  it('does not lengthen the delay by asking during it', async () => {
    const { email } = await service.person();
    const browser = service.newBrowser();
    await failTimes(browser, email, 6);
    const waits: number[] = [];
    for (let i = 0; i < 10; i++)
      waits.push(Number((await browser.signIn(email, WRONG)).headers['retry-after']));
    expect(Math.max(...waits)).toBeLessThanOrEqual(1);
    await wait(1);
    expect((await browser.signIn(email)).status).toBe(200);
  });

  it('lets no more through when all come at once', async () => {
    const { email } = await service.person();
    const browser = service.newBrowser();
    const answers = await Promise.all(Array.from({ length: 20 }, () => browser.signIn(email, WRONG)));
    const tried = answers.filter(({ status }) => status === 401).length;
    expect(tried).toBeGreaterThanOrEqual(5);
    expect(tried).toBeLessThanOrEqual(6);
  });

  it('from everywhere slows down strangers, and not the owner at a place of theirs', async () => {
    const { email, browser } = await service.person();
    for (let i = 0; i < 8; i++) await failTimes(service.newBrowser(), email, 4);
    const stranger = service.newBrowser();
    expect((await stranger.signIn(email)).status).toBe(429);
    const owner = service.newBrowser(browser.address);
    expect((await owner.signIn(email)).status).toBe(200);
    await wait(60);
    expect((await stranger.signIn(email)).status).toBe(200);
  });

  it('keeps the places of one IPv6 customer together', async () => {
    const { email } = await service.person();
    const statuses: number[] = [];
    for (let i = 0; i < 8; i++)
      statuses.push((await service.newBrowser(`2001:db8:0:100::${i + 1}`).signIn(email, WRONG)).status);
    expect(statuses.slice(0, 6)).toEqual([401, 401, 401, 401, 401, 401]);
    expect(statuses.slice(6)).toEqual([429, 429]);
    expect((await service.newBrowser('2001:db8:0:200::1').signIn(email, WRONG)).status).toBe(401);
  });

  it('again by who is signed in is slowed down too', async () => {
    const { browser } = await service.person();
    const statuses: number[] = [];
    for (let i = 0; i < 8; i++)
      statuses.push((await browser.call('POST', '/api/me/close', { password: WRONG })).status);
    expect(statuses.slice(0, 6)).toEqual([403, 403, 403, 403, 403, 403]);
    expect(statuses.slice(6)).toEqual([429, 429]);
    expect((await browser.call('GET', '/api/me')).status).toBe(200);
  });
});

describe('a flood of forgotten passwords', () => {
  it('gets the same answer each time, three mails an hour, and locks nobody out', async () => {
    const { email } = await service.person();
    const answers: string[] = [];
    for (let i = 0; i < 12; i++) {
      const { status, text } = await service.newBrowser().call('POST', '/api/password-reset', { email });
      answers.push(`${status} ${text}`);
    }
    expect(new Set(answers).size).toBe(1);
    const [waiting] = await service.sql<{ count: string }>(
      "SELECT count(*) FROM mail_outbox WHERE recipient = $1 AND kind = 'set_password'",
      [email],
    );
    expect(waiting?.count).toBe('3');
    expect((await service.newBrowser().signIn(email)).status).toBe(200);
  });
});

describe('one place', () => {
  it('may ask for so many mails, and is told how long to wait', async () => {
    const browser = service.newBrowser('203.0.113.200');
    let last = await browser.call('POST', '/api/password-reset', { email: service.newAddress() });
    for (let i = 1; i <= 30; i++)
      last = await browser.call('POST', '/api/password-reset', { email: service.newAddress() });
    expect([last.status, last.body.code]).toEqual([429, 'too_many_attempts']);
    expect(Number(last.headers['retry-after'])).toBeGreaterThan(3_000);
    const other = service.newBrowser('203.0.113.201');
    expect((await other.call('POST', '/api/password-reset', { email: service.newAddress() })).status).toBe(
      202,
    );
  });

  it('is told by its address behind the trusted proxy, not by what it claims itself', async () => {
    const claims = (i: number) => ({ 'X-Forwarded-For': `10.0.0.${i}, 203.0.113.210` });
    const browser = service.newBrowser();
    const statuses: number[] = [];
    for (let i = 0; i <= 30; i++) {
      const body = { email: service.newAddress() };
      statuses.push((await browser.call('POST', '/api/password-reset', body, claims(i))).status);
    }
    expect(statuses[30]).toBe(429);
  });
});
