import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { Browser } from '../../support/consoleService';
import { startService, type TestService } from '../../support/service';

let service: TestService;
beforeAll(async () => {
  service = await startService({ trustProxyHops: 1 });
});
afterAll(() => service.stop());

const page = (path: string) => request(service.url).get(path);

describe('the local mail page', () => {
  it('shows the mails of this machine as plain pages whose links open', async () => {
    const empty = await page('/mail');
    expect(empty.text).toContain('No mail yet');
    const email = 'reader@example.org';
    const wish = {
      email,
      name: '<i>Reader</i>',
      password: 'one more long phrase of words',
      roles: ['educator'],
    };
    const browser = new Browser(service.url);
    await browser.call('POST', '/api/sign-up', wish);
    const list = await vi.waitFor(
      async () => {
        const { text } = await page('/mail');
        expect(text).toContain(email);
        return text;
      },
      { timeout: 10_000 },
    );
    const path = /href="(\/mail\/\d+)"/.exec(list)?.[1] ?? '';
    const mail = await page(path);
    expect(mail.headers['content-security-policy']).toContain("default-src 'none'");
    expect(mail.text).not.toMatch(/<script|<i>Reader/);
    const link = /href="http:\/\/127\.0\.0\.1:4310\/verify#([\w-]{43})"/.exec(mail.text)?.[1];
    const html = await page(`${path}/html`);
    expect(html.text).toContain(`/verify#${link}`);
    expect((await browser.call('POST', '/api/sign-up/confirm', { token: link })).status).toBe(201);
    expect((await page('/mail/999')).status).toBe(404);
  });

  it.each([
    ['in production', { mode: 'production' as const }],
    ['where a mail server sends', { smtpUrl: 'smtp://127.0.0.1:9' }],
  ])('is not there %s', async (_where, overrides) => {
    const other = await startService(overrides);
    for (const path of ['/mail', '/mail/1', '/mail/1/html'])
      expect((await request(other.url).get(path)).status).toBe(404);
    await other.stop();
  });
});
