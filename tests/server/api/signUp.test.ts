import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { PASSWORD, startConsole, type ConsoleService } from '../../support/consoleService';

let service: ConsoleService;
beforeAll(async () => {
  service = await startConsole({ adminEmail: 'Keeper@maren-heights.example' });
});
afterAll(() => service.stop());

const wish = (email: string, more = {}) => ({
  email,
  name: 'Orla Wick',
  password: PASSWORD,
  roles: ['developer', 'educator'],
  ...more,
});

describe('signing up', () => {
  it('opens the account by the mailed link, with the roles chosen and no others', async () => {
    const email = service.newAddress();
    const browser = service.newBrowser();
    const asked = await browser.call('POST', '/api/sign-up', wish(email));
    expect([asked.status, asked.body]).toEqual([202, { sentTo: email }]);
    expect((await browser.signIn(email)).status).toBe(401);
    const mail = await service.mail.next(email);
    expect(mail.text).toContain(`http://127.0.0.1:4310/verify#${mail.token}`);
    expect(mail.html).toContain(`href="http://127.0.0.1:4310/verify#${mail.token}"`);
    const confirmed = await browser.call('POST', '/api/sign-up/confirm', { token: mail.token });
    expect([confirmed.status, confirmed.body]).toEqual([201, { email }]);
    expect(confirmed.cookies).toEqual([]);
    const signedIn = await browser.signIn(email);
    expect(signedIn.status).toBe(200);
    expect(signedIn.body.account).toMatchObject({ email, roles: ['developer', 'educator'] });
  });

  it('takes a link once', async () => {
    const email = service.newAddress();
    const browser = service.newBrowser();
    await browser.call('POST', '/api/sign-up', wish(email));
    const { token } = await service.mail.next(email);
    expect((await browser.call('POST', '/api/sign-up/confirm', { token })).status).toBe(201);
    const again = await browser.call('POST', '/api/sign-up/confirm', { token });
    expect([again.status, again.body.code]).toEqual([410, 'link_not_valid']);
  });

  it('takes no link of another purpose, nor one that is over', async () => {
    const { email, browser } = await service.person();
    await browser.call('POST', '/api/password-reset', { email });
    const reset = await service.mail.next(email, 1);
    const other = await browser.call('POST', '/api/sign-up/confirm', { token: reset.token });
    expect(other.status).toBe(410);
    const late = service.newAddress();
    await browser.call('POST', '/api/sign-up', wish(late));
    const { token } = await service.mail.next(late);
    await service.sql(
      "UPDATE sign_ups SET expires_at = service_now() - interval '1 second' WHERE email = $1",
      [late],
    );
    expect((await browser.call('POST', '/api/sign-up/confirm', { token })).status).toBe(410);
  });

  it('keeps the passwords of two who sign up with one address apart: each link has its own', async () => {
    const email = service.newAddress();
    const stranger = service.newBrowser();
    const owner = service.newBrowser();
    const foreign = 'a stranger chose this long phrase';
    await stranger.call('POST', '/api/sign-up', wish(email, { password: foreign }));
    await service.mail.next(email);
    await owner.call('POST', '/api/sign-up', wish(email));
    const { token } = await service.mail.next(email, 1);
    expect((await owner.call('POST', '/api/sign-up/confirm', { token })).status).toBe(201);
    expect((await stranger.signIn(email, foreign)).status).toBe(401);
    expect((await owner.signIn(email)).status).toBe(200);
    const first = service.mail.to(email)[0]?.token;
    expect((await stranger.call('POST', '/api/sign-up/confirm', { token: first })).status).toBe(410);
  });

  it('never grants admin by choice', async () => {
    const answer = await service
      .newBrowser()
      .call('POST', '/api/sign-up', wish(service.newAddress(), { roles: ['developer', 'admin'] }));
    expect(answer.status).toBe(422);
    expect(answer.body.errors).toMatchObject([{ pointer: '/roles/1', code: 'not_a_choice' }]);
  });

  it('makes the operator’s address an admin, whatever its case', async () => {
    const { browser } = await service.person({ email: 'keeper@Maren-Heights.example' });
    const me = await browser.call('GET', '/api/me');
    expect(me.body.account).toMatchObject({ roles: ['developer', 'admin'] });
  });

  it('tells every fault at its field, and repeats no password', async () => {
    const body = { email: 'nobody', name: '  ', password: 'hunter2', roles: [], admin: true };
    const answer = await service.newBrowser().call('POST', '/api/sign-up', body);
    expect(answer.status).toBe(422);
    const faults = answer.body.errors.map(({ pointer, code }) => `${pointer} ${code}`).sort();
    expect(faults).toEqual([
      '/admin unknown_field',
      '/email email_not_valid',
      '/name name_not_valid',
      '/password password_too_short',
      '/roles roles_not_valid',
    ]);
    expect(answer.text).not.toContain('hunter2');
  });

  it.each([
    ['123456789987654321', 'password_common'],
    ['evenfall-Orla-Wick', 'password_about_you'],
    ['short and sweet', null],
    ['ünïcödé ☾ dusk 夜', null],
    ['x'.repeat(129), 'password_too_long'],
  ])('judges the password %s', async (password, code) => {
    const answer = await service
      .newBrowser()
      .call('POST', '/api/sign-up', wish(service.newAddress(), { password }));
    if (code === null) expect(answer.status).toBe(202);
    else expect(answer.body.errors).toMatchObject([{ pointer: '/password', code }]);
  });
});
