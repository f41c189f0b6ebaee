import { afterEach, describe, expect, it, vi } from 'vitest';
import { openScreen } from '../support/browser';
import { PASSWORD, type ConsoleService } from '../support/consoleService';
import { consoleVisits } from '../support/consoleVisits';
import {
  accountOf,
  button,
  faultsAt,
  field,
  followMail,
  heading,
  secret,
  signIn,
} from '../support/peopleSteps';
import { serveService } from '../support/serveService';

let service: ConsoleService;
const { visiting, open } = consoleVisits(async () => {
  service = await serveService();
  return { url: service.url, close: () => service.stop() };
});

afterEach(() => vi.useRealTimers());

const CALL = { aperture: 8, shutter: '1/125', iso: 100 };
const computing = (key: string) => service.call('POST', '/v1/exposure/value', { key, body: CALL });

it('a newcomer signs up, opens the mail, confirms, signs in, and holds a key that works', async () => {
  await visiting({ widthPx: 360, appearance: 'dark-adapted' }, async (page, { context }) => {
    await context.grantPermissions(['clipboard-read', 'clipboard-write']);
    const email = service.newAddress();
    await openScreen(page, '/');
    await button(page, 'Menu').click();
    await page.getByRole('link', { name: 'Sign in', exact: true }).click();
    await page.getByRole('link', { name: 'Make an account' }).click();
    await field(page, 'E-mail address').fill(email);
    await field(page, 'Name').fill('Iris Fen');
    await secret(page, 'Password').fill(PASSWORD);
    expect(await page.getByRole('checkbox', { name: /^Developer/ }).isChecked()).toBe(true);
    await button(page, 'Make the account').click();
    await heading(page, 'Look into your mail').waitFor();
    await followMail(page, await service.mail.next(email), 'Confirm the address');
    expect(new URL(page.url()).pathname).toBe('/verify');
    await expect.poll(() => new URL(page.url()).hash).toBe('');
    expect(await page.evaluate(() => JSON.stringify(history.state))).not.toMatch(/[A-Za-z0-9_-]{43}/);
    await button(page, 'Confirm the address').click();
    await heading(page, 'Sign in').waitFor();
    expect(await field(page, 'E-mail address').inputValue()).toBe(email);
    await secret(page, 'Password').fill(PASSWORD);
    await button(page, 'Sign in').click();
    await heading(page, 'Make your first key').waitFor();
    await field(page, 'Name').fill('Terrace desk');
    await button(page, 'Make the key').click();
    await heading(page, 'Terrace desk: copy the key now').waitFor();
    const key = (await page.locator('.fresh code').first().textContent()) ?? '';
    await button(page, 'Copy the line').click();
    expect(await page.evaluate(() => navigator.clipboard.readText())).toBe(`EVENFALL_KEY=${key}`);
    expect((await computing(key)).status).toBe(200);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(360);
    await page.reload();
    await page.getByRole('list', { name: 'Keys' }).waitFor();
    const text = await page.locator('main').innerText();
    expect(text).toContain(`${key.slice(0, text.indexOf('…') - text.indexOf('evenfall_server_'))}…`);
    expect(text).toContain(`…${key.slice(-4)}`);
    expect(text).not.toContain(key);
  });
}, 40_000);

describe('sessions', () => {
  it('one browser ends the other, which then asks to sign in and goes on where it was', async () => {
    const { email } = await accountOf(service);
    const other = await open({ refusals: [401] });
    await signIn(other.page, email);
    await visiting({}, async (page) => {
      await signIn(page, email);
      await openScreen(page, '/settings');
      const items = page.getByRole('list', { name: 'Sessions' }).getByRole('listitem');
      await expect.poll(() => items.count()).toBe(2);
      await items.getByRole('button', { name: /^End the session of Chrome on Linux/ }).click();
      await expect.poll(() => items.count()).toBe(1);
      expect(await items.textContent()).toContain('this one');
    });
    await other.page.getByRole('link', { name: 'Orla Wick' }).click();
    await heading(other.page, 'Sign in').waitFor();
    expect(await other.page.locator('main').innerText()).toContain('Your session has ended');
    await field(other.page, 'E-mail address').fill(email);
    await secret(other.page, 'Password').fill(PASSWORD);
    await button(other.page, 'Sign in').click();
    await heading(other.page, 'Settings').waitFor();
    expect(other.complaints).toEqual([]);
    await other.end();
  }, 40_000);

  it('go on over the end of the access token, in two tabs at once', async () => {
    const { email } = await accountOf(service);
    await visiting({ refusals: [401] }, async (page, { context }) => {
      await signIn(page, email);
      const second = await context.newPage();
      vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 6 * 60_000 });
      await Promise.all([page, second].map((tab) => tab.goto('/settings')));
      for (const tab of [page, second])
        await tab.getByRole('list', { name: 'Sessions' }).getByRole('listitem').first().waitFor();
      const held = await service.sql<{ live: string }>(
        'SELECT count(*) AS live FROM sessions s JOIN accounts a ON a.id = s.account_id WHERE a.email = $1 AND s.ended_at IS NULL',
        [email],
      );
      expect(held).toEqual([{ live: '1' }]);
    });
  }, 40_000);

  it('end by signing out, in every tab; the appearance stays', async () => {
    const { email } = await accountOf(service);
    await visiting({ refusals: [401] }, async (page, { context }) => {
      await page.goto('/');
      await page.getByRole('radio', { name: 'Dusk' }).check();
      await signIn(page, email);
      const second = await context.newPage();
      await openScreen(second, '/keys');
      await button(page, 'Sign out').click();
      await page.getByRole('link', { name: 'Sign in', exact: true }).waitFor();
      await expect.poll(() => new URL(page.url()).pathname).toBe('/');
      await second.getByRole('link', { name: 'Orla Wick' }).or(heading(second, 'Sign in')).first().click();
      await heading(second, 'Sign in').waitFor();
      await page.goto('/keys');
      await heading(page, 'Sign in').waitFor();
      expect(await page.evaluate(() => document.documentElement.dataset.appearance)).toBe('dusk');
      expect(new URL(page.url()).searchParams.get('to')).toBe('/keys');
    });
  }, 40_000);
});

describe('a forgotten password', () => {
  it('is set anew by a mailed link, once', async () => {
    const { email } = await accountOf(service);
    await visiting({ refusals: [401, 410] }, async (page) => {
      const before = service.mail.to(email).length;
      await page.goto('/reset');
      await field(page, 'E-mail address').fill(email);
      await button(page, 'Send the link').click();
      await heading(page, 'Look into your mail').waitFor();
      const mail = await service.mail.next(email, before);
      await followMail(page, mail, 'Set a new password');
      await secret(page, 'New password').fill('a paper boat under the ridge');
      await button(page, 'Set the password').click();
      await page.getByText('The password is set.').waitFor();
      await secret(page, 'Password').fill(PASSWORD);
      await button(page, 'Sign in').click();
      await page.getByRole('alert').locator('p').waitFor();
      await secret(page, 'Password').fill('a paper boat under the ridge');
      await button(page, 'Sign in').click();
      await heading(page, 'Keys').waitFor();
      await followMail(page, mail, 'Set a new password');
      await secret(page, 'New password').fill('another boat under the ridge');
      await button(page, 'Set the password').click();
      await button(page, 'Ask for a new link').click();
      await heading(page, 'Forgot the password').waitFor();
    });
  }, 40_000);

  it('is asked for in the same words, whether or not the address has an account', async () => {
    const known = (await accountOf(service)).email;
    const unknown = service.newAddress();
    await visiting({}, async (page) => {
      const texts = [];
      for (const email of [known, unknown]) {
        await page.goto('/reset');
        await field(page, 'E-mail address').fill(email);
        await button(page, 'Send the link').click();
        await heading(page, 'Look into your mail').waitFor();
        texts.push((await page.locator('main').innerText()).replace(email, 'ADDRESS'));
      }
      expect(texts[0]).toBe(texts[1]);
    });
  });
});

describe('wrong input', () => {
  it('at sign-up stands at its fields with what was typed, and the first of them has the focus', async () => {
    await visiting({ refusals: [422] }, async (page) => {
      await page.goto('/sign-up');
      await field(page, 'E-mail address').fill('iris@');
      await field(page, 'Name').fill('Iris Fen');
      await secret(page, 'Password').fill('short');
      await page.getByRole('checkbox', { name: /^Developer/ }).uncheck();
      await button(page, 'Make the account').click();
      await expect.poll(() => faultsAt(page, 'E-mail address')).toContain('name@example.org');
      expect(await faultsAt(page, 'Name')).toBe('');
      expect(await faultsAt(page, 'Password')).toContain('at least 15 characters; 5 were given');
      expect(await page.getByRole('group', { name: 'What brings you here' }).textContent()).toContain(
        'Choose at least one',
      );
      expect(await field(page, 'E-mail address').inputValue()).toBe('iris@');
      expect(await secret(page, 'Password').inputValue()).toBe('short');
      const focused = page.locator(':focus');
      expect(await focused.getAttribute('autocomplete')).toBe('email');
    });
  });

  it('at sign-in says the same for a wrong password as for an unknown address', async () => {
    const { email } = await accountOf(service);
    await visiting({ refusals: [401] }, async (page) => {
      const texts = [];
      for (const address of [email, service.newAddress()]) {
        await page.goto('/sign-in');
        await field(page, 'E-mail address').fill(address);
        await secret(page, 'Password').fill('not the one that was chosen');
        await button(page, 'Sign in').click();
        await page.getByRole('alert').locator('p').waitFor();
        texts.push(await page.locator('main').innerText());
        expect(await field(page, 'E-mail address').inputValue()).toBe(address);
      }
      expect(texts[0]).toBe(texts[1]);
    });
  });

  it('stays where it was typed when the service is out of reach, and goes through once it is back', async () => {
    const { email } = await accountOf(service);
    const { page, end } = await open();
    await page.goto('/sign-in');
    await field(page, 'E-mail address').fill(email);
    await secret(page, 'Password').fill(PASSWORD);
    await page.route('**/api/session', (route) => route.abort());
    await button(page, 'Sign in').click();
    await page.getByRole('alert').getByText('can’t be reached').waitFor();
    await page.unroute('**/api/session');
    await button(page, 'Sign in').click();
    await heading(page, 'Keys').waitFor();
    await end();
  });

  it('an address that leads elsewhere is no way back after signing in', async () => {
    const { email } = await accountOf(service);
    await visiting({}, async (page) => {
      await page.goto('/sign-in?to=//example.org/');
      await field(page, 'E-mail address').fill(email);
      await secret(page, 'Password').fill(PASSWORD);
      await button(page, 'Sign in').click();
      await heading(page, 'Keys').waitFor();
      expect(page.url()).toBe(`${service.url}/keys`);
    });
  });
});
