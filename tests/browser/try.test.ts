import { expect, it } from 'vitest';
import { contrastViolationsOn, openScreen, violationsOn } from '../support/browser';
import type { ConsoleService } from '../support/consoleService';
import { consoleVisits } from '../support/consoleVisits';
import { accountOf, button, field, followMail, heading, secret, signIn, tabTo } from '../support/peopleSteps';
import { serveService } from '../support/serveService';

let service: ConsoleService;
const { visiting, open } = consoleVisits(async () => {
  service = await serveService();
  return { url: service.url, close: () => service.stop() };
});

/** A developer with a key of that name. */
async function developer(name = 'Lantern'): Promise<{ email: string; keyId: string }> {
  const person = await service.person();
  const made = await person.browser.call('POST', '/api/keys', { name });
  const { key } = made.body as unknown as { key: { id: string } };
  return { email: person.email, keyId: key.id };
}

it('a stranger signs up, confirms the mail, makes a key, asks on the try page and sees the count rise', async () => {
  const email = service.newAddress();
  await visiting({}, async (page) => {
    await openScreen(page, '/sign-up');
    await field(page, 'E-mail address').fill(email);
    await field(page, 'Name').fill('Perrin Vale');
    await secret(page, 'Password').fill('seven lanterns on the upper terrace');
    await button(page, 'Make the account').click();
    await heading(page, 'Look into your mail').waitFor();
    await followMail(page, await service.mail.next(email), 'Confirm the address');
    await button(page, 'Confirm the address').click();
    await heading(page, 'Sign in').waitFor();
    await secret(page, 'Password').fill('seven lanterns on the upper terrace');
    await button(page, 'Sign in').click();
    await field(page, 'Name').fill('first');
    await button(page, 'Make the key').click();
    await page.getByRole('link', { name: 'Try it on a page' }).click();
    await heading(page, 'The question').waitFor();
    for (const count of ['1', '2']) {
      await button(page, 'Send the call').click();
      await page.getByText(`${count} of 10,000 units of this month are used.`).waitFor();
    }
    // f/8 at 1/125 s and ISO 100 suits EV 13, as the first example asks.
    await page.getByText('"ev100": 13').waitFor();
  });
}, 60_000);

it('a fault is told as the service tells it, costs nothing, and can be found in the key’s log', async () => {
  const { email, keyId } = await developer();
  await visiting({ refusals: [422] }, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/try');
    await page.getByRole('radio', { name: 'JSON' }).check();
    await field(page, 'Body').fill('{"aperture":0,"shutter":"1/125"}');
    await button(page, 'Send the call').click();
    await page.getByText('exposure/value gave 422.').waitFor();
    await page.getByText('A refused call costs nothing.').waitFor();
    expect(await page.locator('.answer').textContent()).toContain('/aperture');
    await expect
      .poll(
        async () => {
          await openScreen(page, `/keys/${keyId}`);
          await page.getByRole('radio', { name: 'Refused' }).check();
          await page.getByRole('heading', { name: 'Recent calls' }).waitFor();
          return page.getByRole('link', { name: 'invalid_input' }).count();
        },
        { timeout: 15_000 },
      )
      .toBe(1);
    const href = await page.getByRole('link', { name: 'invalid_input' }).getAttribute('href');
    const problem = await page.request.get(href ?? '');
    expect([problem.status(), await problem.text()]).toEqual([200, expect.stringContaining('invalid_input')]);
  });
}, 60_000);

it('earlier questions are put again, and several go out as one batch', async () => {
  const { email } = await developer();
  await visiting({}, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/try');
    await button(page, 'Send the call').click();
    await page.getByText('exposure/value gave 200.').waitFor();
    await page.getByLabel('Calculator', { exact: true }).selectOption('light/convert');
    await button(page, 'Send the call').click();
    await page.getByText('light/convert gave 200.').waitFor();
    for (const box of await page.locator('.earlier').getByRole('checkbox').all()) await box.check();
    await button(page, 'Ask these 2 as one batch').click();
    await page.getByText('batch gave 200.').waitFor();
    await page.getByText('4 of 10,000 units of this month are used.').waitFor();
    await button(page, 'Ask exposure/value again').click();
    await expect
      .poll(() => page.getByLabel('Calculator', { exact: true }).inputValue())
      .toBe('exposure/value');
  });
}, 40_000);

it('a pasted key is used and kept nowhere', async () => {
  const { email } = await developer();
  const other = await service.key({ units: 50 });
  await visiting({}, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/try');
    await page.getByRole('radio', { name: 'A key that I paste' }).check();
    expect(await button(page, 'Send the call').isDisabled()).toBe(true);
    await page.getByLabel('Key', { exact: true }).fill(other);
    await button(page, 'Send the call').click();
    await page.getByText('1 of 50 units of this month are used.').waitFor();
    const kept = await page.evaluate(() =>
      JSON.stringify([localStorage, sessionStorage, history.state, location.href]),
    );
    expect(kept).not.toContain(other);
    await page.reload();
    await page.getByRole('radio', { name: 'A key that I paste' }).check();
    expect(await page.getByLabel('Key', { exact: true }).inputValue()).toBe('');
  });
}, 40_000);

it('a call that gets no answer says so, can be given up and tried again', async () => {
  const { email } = await developer();
  const { page, end } = await open();
  await signIn(page, email);
  await openScreen(page, '/try');
  await page.route('**/v1/**', () => undefined);
  await button(page, 'Send the call').click();
  await button(page, 'Give up').click();
  await expect.poll(() => button(page, 'Give up').count()).toBe(0);
  await page.unroute('**/v1/**');
  await page.route('**/v1/**', (route) => route.abort());
  await button(page, 'Send the call').click();
  await page.getByText('The service can’t be reached.').waitFor();
  await page.unroute('**/v1/**');
  await button(page, 'Send the call').click();
  await page.getByText('exposure/value gave 200.').waitFor();
  await end();
}, 40_000);

it('usage adds up, can be taken along as a table, and another plan can be asked for', async () => {
  const { email } = await developer('Booking desk');
  await visiting({}, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/usage');
    await page.getByText('No call was made in these days.').waitFor();
    await openScreen(page, '/try');
    await button(page, 'Send the call').click();
    await page.getByText('exposure/value gave 200.').waitFor();
    await expect
      .poll(
        async () => {
          await openScreen(page, '/usage');
          return page.getByRole('link', { name: 'Booking desk' }).count();
        },
        { timeout: 15_000 },
      )
      .toBe(1);
    const saved = page.waitForEvent('download');
    await button(page, 'Save as CSV').click();
    expect((await saved).suggestedFilename()).toMatch(/^evenfall-usage-[\d-]+-to-[\d-]+\.csv$/);
    await page.getByRole('link', { name: 'Your plan' }).click();
    await heading(page, 'Ask for another plan').waitFor();
    await page.getByLabel('What it is needed for').fill('A course of sixty people starts in May.');
    await button(page, 'Ask').click();
    await heading(page, 'You asked for Studio').waitFor();
    await button(page, 'Take it back').click();
    await heading(page, 'Ask for another plan').waitFor();
  });
}, 60_000);

it('the keyboard alone is enough to make a call', async () => {
  const { email } = await developer();
  await visiting({}, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/try');
    await tabTo(page, 'Send the call');
    await page.keyboard.press('Enter');
    await page.getByText('exposure/value gave 200.').waitFor();
  });
}, 40_000);

it.each([
  ['/try', 'Send the call'],
  ['/usage', 'Save as CSV'],
  ['/plan', 'Ask'],
] as const)(
  '%s is free of faults that axe can find, at 1440 and 360 px, and legible in every appearance',
  async (path, there) => {
    const { email } = await accountOf(service);
    await visiting({ appearance: 'day' }, async (page) => {
      await signIn(page, email);
      await openScreen(page, path);
      await button(page, there).waitFor();
      expect(await violationsOn(page), 'at 1440 px').toEqual([]);
      await page.setViewportSize({ width: 360, height: 740 });
      await expect.poll(() => page.evaluate(() => document.documentElement.scrollWidth)).toBe(360);
      expect(await violationsOn(page), 'at 360 px').toEqual([]);
      for (const name of ['Dusk', 'Dark-adapted']) {
        await page.getByRole('radio', { name, exact: true }).check();
        expect(await contrastViolationsOn(page), name).toEqual([]);
      }
    });
  },
  60_000,
);
