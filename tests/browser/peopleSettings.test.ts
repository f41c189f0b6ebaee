import { readFile } from 'node:fs/promises';
import { expect, it } from 'vitest';
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
import type { Page } from 'playwright-core';

let service: ConsoleService;
const { visiting } = consoleVisits(async () => {
  service = await serveService();
  return { url: service.url, close: () => service.stop() };
});

const part = (page: Page, name: string) => page.getByRole('region', { name, exact: true });

it('a name and a measure are kept: the frame shows the one, calculators the other, calls stay in metres', async () => {
  const { email } = await accountOf(service);
  await visiting({ refusals: [422] }, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/settings');
    const own = part(page, 'Name and measure');
    await field(page, 'Name').fill(' ');
    await own.getByRole('button', { name: 'Save' }).click();
    await expect.poll(() => faultsAt(page, 'Name')).toContain('1 to 100 characters');
    await field(page, 'Name').fill('Tamsin Fen');
    await own.getByRole('radio', { name: 'Feet' }).check();
    await own.getByRole('button', { name: 'Save' }).click();
    await own.getByText('Saved.').waitFor();
    await page.getByRole('link', { name: 'Tamsin Fen' }).waitFor();
    await openScreen(page, '/calculators/exposure/depth');
    const distance = page.getByRole('textbox', { name: 'Focus distance', exact: true });
    await distance.fill('10');
    await page.getByRole('cell', { name: / ft$/ }).first().waitFor();
    // The international foot is 0.3048 m exactly.
    expect(await page.locator('.call code').textContent()).toContain('"distanceM":3.048');
    expect(await page.locator('.answer table').first().innerText()).not.toMatch(/\d m\b/);
    await page.waitForURL(/distanceM=3\.048/);
    await page.reload();
    await expect.poll(() => distance.inputValue()).toBe('10');
  });
}, 40_000);

it('roles decide what the navigation shows, and a screen of another role leads to where they are chosen', async () => {
  const { email } = await accountOf(service, { roles: ['photographer'] });
  await visiting({ refusals: [422] }, async (page) => {
    await signIn(page, email);
    const keys = page.getByRole('link', { name: 'Keys', exact: true });
    expect(await keys.count()).toBe(0);
    await page.goto('/usage');
    await page.getByText('goes with the role developer').waitFor();
    const roles = part(page, 'Roles');
    await page.getByRole('checkbox', { name: /^Photographer/ }).uncheck();
    await roles.getByRole('button', { name: 'Save' }).click();
    await roles.getByText('Choose at least one').waitFor();
    await page.getByRole('checkbox', { name: /^Developer/ }).check();
    await roles.getByRole('button', { name: 'Save' }).click();
    await keys.waitFor();
  });
});

it('a password is changed with the present one, which a wrong one is not taken for', async () => {
  const { email } = await accountOf(service);
  await visiting({ refusals: [401, 403, 422] }, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/settings');
    await secret(page, 'Present password').fill('not the one that was chosen');
    await secret(page, 'New password').fill('a paper boat under the ridge');
    await button(page, 'Change the password').click();
    await expect.poll(() => faultsAt(page, 'Present password')).toMatch(/password/i);
    expect(await secret(page, 'New password').inputValue()).toBe('a paper boat under the ridge');
    await secret(page, 'Present password').fill(PASSWORD);
    await secret(page, 'New password').fill('short');
    await button(page, 'Change the password').click();
    await expect.poll(() => faultsAt(page, 'New password')).toContain('at least 15 characters');
    await secret(page, 'New password').fill('a paper boat under the ridge');
    await button(page, 'Change the password').click();
    await part(page, 'Password').getByText('Changed.').waitFor();
    await button(page, 'Sign out').click();
    await page.getByRole('link', { name: 'Sign in', exact: true }).waitFor();
    await signIn(page, email, 'a paper boat under the ridge');
  });
}, 40_000);

it('an address changes when the link that is mailed there is used', async () => {
  const { email } = await accountOf(service);
  const next = service.newAddress();
  await visiting({ refusals: [410] }, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/settings');
    await field(page, 'New address').fill(next);
    await part(page, 'E-mail address').getByRole('textbox', { name: 'Password' }).fill(PASSWORD);
    await button(page, 'Send the mail').click();
    await page.getByText(`A mail is on its way to ${next}.`).waitFor();
    const mail = await service.mail.next(next);
    await followMail(page, mail, 'Confirm the new address');
    await button(page, 'Confirm the address').click();
    await page.getByText('From now on you sign in with').waitFor();
    await page.getByRole('link', { name: 'To your settings' }).click();
    await page.getByText(`Now ${next}.`).waitFor();
    await followMail(page, mail, 'Confirm the new address');
    await button(page, 'Confirm the address').click();
    await page.getByRole('alert').getByText('used already').waitFor();
    expect(await button(page, 'Confirm the address').count()).toBe(0);
  });
}, 40_000);

it('own data are saved as a file, and a closed account lets nobody in', async () => {
  const { email } = await accountOf(service);
  await visiting({ refusals: [401, 403] }, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/settings');
    await part(page, 'What happened').getByText('Signed in').first().waitFor();
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      button(page, 'Save the file').click(),
    ]);
    expect(download.suggestedFilename()).toBe('evenfall-account.json');
    expect(JSON.parse(await readFile(await download.path(), 'utf8'))).toMatchObject({ account: { email } });
    await button(page, 'Close the account…').click();
    const dialog = page.getByRole('dialog');
    await dialog.getByLabel('Password', { exact: true }).fill('not the one that was chosen');
    await button(page, 'Close it for good').click();
    await dialog
      .getByText(/password/i)
      .nth(1)
      .waitFor();
    await dialog.getByLabel('Password', { exact: true }).fill(PASSWORD);
    await button(page, 'Close it for good').click();
    await page.waitForURL(`${service.url}/`);
    await page.goto('/sign-in');
    await field(page, 'E-mail address').fill(email);
    await secret(page, 'Password').fill(PASSWORD);
    await button(page, 'Sign in').click();
    await page.getByRole('alert').locator('p').waitFor();
    expect(await heading(page, 'Sign in').count()).toBe(1);
  });
}, 40_000);
