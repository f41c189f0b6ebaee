import { expect, it } from 'vitest';
import { openScreen } from '../support/browser';
import { PASSWORD, type ConsoleService } from '../support/consoleService';
import { consoleVisits } from '../support/consoleVisits';
import { accountOf, button, faultsAt, field, heading, secret, signIn, tabTo } from '../support/peopleSteps';
import { serveService } from '../support/serveService';
import type { Page } from 'playwright-core';

let service: ConsoleService;
const { visiting, open } = consoleVisits(async () => {
  service = await serveService();
  return { url: service.url, close: () => service.stop() };
});

const CALL = { aperture: 8, shutter: '1/125', iso: 100 };
const statusOf = async (key: string) =>
  (await service.call('POST', '/v1/exposure/value', { key, body: CALL })).status;
const shownKey = async (page: Page) => (await page.locator('.fresh code').first().textContent()) ?? '';
const dialog = (page: Page) => page.getByRole('dialog');
const focusedText = (page: Page) => page.evaluate(() => document.activeElement?.textContent.trim());

async function makeKey(page: Page, name: string): Promise<string> {
  await openScreen(page, '/keys');
  await field(page, 'Name').fill(name);
  await button(page, 'Make the key').click();
  await heading(page, `${name}: copy the key now`).waitFor();
  return shownKey(page);
}

it('faults of a new key stand at their fields, and no key is made', async () => {
  const { email, id } = await accountOf(service);
  await visiting({ refusals: [422] }, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/keys');
    await page.getByText('Scopes, cap and expiry').click();
    await page.getByRole('radio', { name: 'Only some' }).check();
    for (const box of await page.getByRole('checkbox').all()) await box.uncheck();
    await page.getByLabel('Monthly cap optional').fill('plenty');
    await page.getByLabel('Last day optional').fill('2020-01-31');
    await button(page, 'Make the key').click();
    await expect.poll(() => faultsAt(page, 'Name')).toContain('1 to 100 characters');
    expect(await faultsAt(page, 'Monthly cap optional')).toMatch(/cap/i);
    expect(await page.getByText('Give "*" alone').count()).toBe(1);
    expect(await page.getByLabel('Monthly cap optional').inputValue()).toBe('plenty');
    await field(page, 'Name').fill('Boat house');
    await page.getByLabel('Monthly cap optional').fill('1,000');
    await page.getByRole('checkbox', { name: 'Exposure' }).check();
    await button(page, 'Make the key').click();
    await expect.poll(() => faultsAt(page, 'Last day optional')).toContain('future');
    await page.getByLabel('Last day optional').fill('2099-12-31');
    await button(page, 'Make the key').click();
    await heading(page, 'Boat house: copy the key now').waitFor();
    const keys = await service.sql('SELECT scopes, monthly_cap FROM api_keys WHERE account_id = $1', [id]);
    expect(keys).toEqual([{ scopes: ['exposure'], monthly_cap: '1000' }]);
  });
}, 40_000);

it('an answer that is lost on its way makes no second key', async () => {
  const { email, id } = await accountOf(service);
  const { page, end } = await open();
  await signIn(page, email);
  await openScreen(page, '/keys');
  await field(page, 'Name').fill('Once');
  await page.route('**/api/keys', async (route) => {
    if (route.request().method() === 'POST') await route.fetch();
    await route.abort();
  });
  await button(page, 'Make the key').click();
  await page.locator('form').getByRole('alert').getByText('can’t be reached').waitFor();
  expect(await field(page, 'Name').inputValue()).toBe('Once');
  await page.unroute('**/api/keys');
  await button(page, 'Make the key').click();
  await page.locator('form').getByRole('alert').getByText("can't be shown again").waitFor();
  await page.getByRole('link', { name: 'Once' }).waitFor();
  const rows = await service.sql('SELECT name FROM api_keys WHERE account_id = $1', [id]);
  expect(rows).toEqual([{ name: 'Once' }]);
  await end();
});

it('a key is renamed, rotated with grace and revoked, and calls heed it', async () => {
  const { email } = await accountOf(service);
  await visiting({}, async (page) => {
    await signIn(page, email);
    const first = await makeKey(page, 'Desk');
    await button(page, 'I have it').click();
    await page.getByRole('link', { name: 'Desk' }).click();
    await field(page, 'Name').fill('Upper desk');
    await button(page, 'Save').click();
    await page.getByText('Saved.').waitFor();
    await heading(page, 'Upper desk').waitFor();
    await button(page, 'Rotate…').click();
    await dialog(page).getByRole('radio', { name: '1 hour' }).check();
    await button(page, 'Make the new key').click();
    await heading(page, 'Upper desk: copy the key now').waitFor();
    await expect.poll(() => focusedText(page)).toBe('Upper desk: copy the key now');
    const second = await shownKey(page);
    expect(second).not.toBe(first);
    expect([await statusOf(first), await statusOf(second)]).toEqual([200, 200]);
    await page.getByText('replaced, still works').waitFor();
    expect(await button(page, 'Save').count()).toBe(0);
    await page.getByRole('link', { name: 'the new key' }).click();
    await page.getByText('works', { exact: true }).waitFor();
    await button(page, 'Revoke…').click();
    await button(page, 'Revoke it').click();
    await page.getByText('This key has ended.').waitFor();
    await dialog(page).waitFor({ state: 'hidden' });
    await expect.poll(() => focusedText(page)).toBe('Upper desk');
    await expect.poll(() => statusOf(second), { timeout: 3_000 }).toBe(401);
    expect(await statusOf(first)).toBe(200);
  });
}, 40_000);

it('rotating without grace asks for the password, at whose field a wrong one is told', async () => {
  const { email } = await accountOf(service);
  await visiting({ refusals: [403] }, async (page) => {
    await signIn(page, email);
    const first = await makeKey(page, 'Desk');
    await page.getByRole('link', { name: 'Desk' }).click();
    await button(page, 'Rotate…').click();
    await dialog(page).getByRole('radio', { name: 'Not at all' }).check();
    await secret(page, 'Password').fill('not the one that was chosen');
    await button(page, 'Make the new key').click();
    await expect.poll(() => faultsAt(page, 'Password')).toMatch(/password/i);
    expect(await statusOf(first)).toBe(200);
    await secret(page, 'Password').fill(PASSWORD);
    await button(page, 'Make the new key').click();
    await heading(page, 'Desk: copy the key now').waitFor();
    expect([await statusOf(first), await statusOf(await shownKey(page))]).toEqual([401, 200]);
  });
}, 40_000);

it('a key that an administrator issued is generated by its owner', async () => {
  const { email, id } = await accountOf(service, { roles: ['photographer'] });
  await service.sql(
    "INSERT INTO api_keys (account_id, kind, name, monthly_cap) VALUES ($1, 'server', 'Issued', 10)",
    [id],
  );
  await visiting({}, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/keys');
    await page.getByText('waits for you to generate it').waitFor();
    await page.getByRole('link', { name: 'Issued' }).click();
    await button(page, 'Generate the key').click();
    await heading(page, 'Issued: copy the key now').waitFor();
    expect(await statusOf(await shownKey(page))).toBe(200);
    expect(await page.getByText(/of 10/).count()).toBe(1);
  });
});

it('by keyboard alone: sign in, make a key, and leave a dialog to where it was opened', async () => {
  const { email } = await accountOf(service);
  await visiting({}, async (page) => {
    await page.goto('/sign-in');
    await heading(page, 'Sign in').waitFor();
    await tabTo(page, 'E-mail address');
    await page.keyboard.type(email);
    await tabTo(page, 'Password');
    await page.keyboard.type(PASSWORD);
    await page.keyboard.press('Enter');
    await heading(page, 'Make your first key').waitFor();
    await tabTo(page, 'Name');
    await page.keyboard.type('Typed');
    await page.keyboard.press('Enter');
    await expect.poll(() => focusedText(page)).toBe('Typed: copy the key now');
    await tabTo(page, 'I have it');
    await page.keyboard.press('Enter');
    await expect.poll(() => focusedText(page)).toBe('Keys');
    await tabTo(page, 'Typed');
    await page.keyboard.press('Enter');
    await expect.poll(() => focusedText(page)).toBe('Typed');
    for (const leave of ['Escape', 'Leave it'] as const) {
      await tabTo(page, 'Rotate…');
      await page.keyboard.press('Enter');
      await dialog(page).waitFor();
      const inDialog = () => page.evaluate(() => document.activeElement?.closest('[role=dialog]') !== null);
      await expect.poll(inDialog).toBe(true);
      for (let i = 0; i < 12; i++) {
        await page.keyboard.press('Tab');
        expect(await inDialog()).toBe(true);
      }
      if (leave === 'Escape') await page.keyboard.press('Escape');
      else {
        await tabTo(page, leave);
        await page.keyboard.press('Enter');
      }
      await dialog(page).waitFor({ state: 'hidden' });
      await expect.poll(() => focusedText(page)).toBe('Rotate…');
    }
  });
}, 40_000);
