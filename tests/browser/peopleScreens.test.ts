import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { contrastViolationsOn, openScreen, violationsOn } from '../support/browser';
import type { ConsoleService, Person } from '../support/consoleService';
import { consoleVisits } from '../support/consoleVisits';
import { accountOf, button, heading, signIn } from '../support/peopleSteps';
import { serveService } from '../support/serveService';

let service: ConsoleService;
let holder: Promise<{ email: string; keyId: string }> | undefined;
const { visiting } = consoleVisits(async () => {
  service = await serveService();
  return { url: service.url, close: () => service.stop() };
});

/** Somebody with keys in every state that a list may show. */
async function holderOfKeys(): Promise<{ email: string; keyId: string }> {
  const { browser, email, id }: Person = await service.person({ name: 'Tamsin Orchard-Wakefield' });
  const make = async (body: object) =>
    (await browser.call('POST', '/api/keys', body)).body as unknown as { key: { id: string } };
  const { key } = await make({ name: 'Upper Terrace Grip, booking page', scopes: ['exposure', 'flash'] });
  const old = await make({ name: 'Desk', monthlyCap: 1000, expiresAt: '2099-12-31T23:59:59Z' });
  await browser.call('POST', `/api/keys/${old.key.id}/rotate`, { grace: 'week' });
  const lost = await make({ name: 'Lost notebook' });
  await browser.call('POST', `/api/keys/${lost.key.id}/revoke`, {});
  await service.sql("INSERT INTO api_keys (account_id, kind, name) VALUES ($1, 'server', 'Issued')", [id]);
  return { email, keyId: key.id };
}

/** Controls under 24 by 24 CSS px (WCAG 2.2, 2.5.8), links in sentences aside. */
function tooSmallToTouch(page: Page): Promise<string[]> {
  return page.evaluate(() =>
    [...document.querySelectorAll('main button, main input, main summary, header a, header button')]
      .map((element) => ({ element, box: element.getBoundingClientRect() }))
      .filter(({ box }) => box.width > 0 && (box.height < 24 || box.width < 24))
      // In a sentence, or in a frame that is a target as a whole.
      .filter(({ element }) => !element.closest('p button, .ant-input-affix-wrapper'))
      .map(({ element }) => element.outerHTML),
  );
}

/** Looks for faults at both widths and in every appearance. */
async function lookAt(page: Page): Promise<void> {
  for (const width of [1440, 360]) {
    await page.setViewportSize({ width, height: 740 });
    expect(await violationsOn(page), `at ${width} px`).toEqual([]);
    await expect.poll(() => page.evaluate(() => document.documentElement.scrollWidth)).toBe(width);
  }
  expect(await tooSmallToTouch(page)).toEqual([]);
  for (const name of ['Dusk', 'Dark-adapted', 'Day']) {
    await page.evaluate((wanted) => {
      const radios = [...document.querySelectorAll<HTMLInputElement>('header input[type=radio]')];
      radios.find((radio) => radio.labels?.[0]?.textContent.trim() === wanted)?.click();
    }, name);
    expect(await contrastViolationsOn(page), name).toEqual([]);
  }
}

it.each([
  ['sign-in', '/sign-in'],
  ['sign-in on the way to an own screen', '/keys'],
  ['sign-up', '/sign-up'],
  ['the form for a forgotten password', '/reset'],
  ['a new password', `/reset#${'a'.repeat(43)}`],
  ['confirming an address', `/verify#${'a'.repeat(43)}`],
  ['confirming without a link', '/verify'],
  ['confirming a new address', `/confirm-email#${'a'.repeat(43)}`],
])(
  '%s is free of faults that axe can find, at both widths, and legible in every appearance',
  async (_, path) => {
    await visiting({ appearance: 'day' }, async (page) => {
      await openScreen(page, path);
      await lookAt(page);
    });
  },
  60_000,
);

it.each([
  ['the settings', '/settings'],
  ['the keys', '/keys'],
  ['a key', '/keys/KEY'],
])(
  '%s are free of faults that axe can find, at both widths, and legible in every appearance',
  async (_, path) => {
    const { email, keyId } = await (holder ??= holderOfKeys());
    await visiting({ appearance: 'day' }, async (page) => {
      await signIn(page, email);
      await openScreen(page, path.replace('KEY', keyId));
      await lookAt(page);
    });
  },
  60_000,
);

it('forms full of faults, a fresh key and a dialog are as free of faults', async () => {
  const { email } = await accountOf(service);
  await visiting({ appearance: 'day', refusals: [422] }, async (page) => {
    await page.goto('/sign-up');
    await button(page, 'Make the account').click();
    await page.locator('[aria-invalid=true]').first().waitFor();
    await lookAt(page);
    await page.setViewportSize({ width: 1440, height: 900 });
    await signIn(page, email);
    await page.getByText('Scopes, cap and expiry').click();
    await page.getByRole('radio', { name: 'Only some' }).check();
    await lookAt(page);
    await page.getByLabel('Name', { exact: true }).fill('Fresh');
    await button(page, 'Make the key').click();
    await heading(page, 'Fresh: copy the key now').waitFor();
    await lookAt(page);
    await page.getByRole('link', { name: 'Fresh' }).click();
    await button(page, 'Rotate…').click();
    await page.getByRole('dialog').waitFor();
    await page.locator('.ant-zoom-appear, .ant-zoom-enter').waitFor({ state: 'detached' });
    await lookAt(page);
  });
}, 90_000);
