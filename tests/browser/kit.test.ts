import { expect, it } from 'vitest';
import { contrastViolationsOn, openScreen, violationsOn } from '../support/browser';
import type { ConsoleService } from '../support/consoleService';
import { consoleVisits } from '../support/consoleVisits';
import { accountOf, button, field, heading, signIn } from '../support/peopleSteps';
import { serveService } from '../support/serveService';

let service: ConsoleService;
const { visiting, open } = consoleVisits(async () => {
  service = await serveService();
  return { url: service.url, close: () => service.stop() };
});

const photographer = () => accountOf(service, { roles: ['photographer'] });

it('a kit is begun from a usual one, changed, kept, and there again on another device', async () => {
  const { email } = await photographer();
  await visiting({}, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/kit');
    await button(page, 'A small flash on a stand').click();
    await field(page, 'Name').first().fill('My camera');
    await button(page, 'Keep the kit').click();
    await page.getByText('Kept.').waitFor();
  });
  await visiting({}, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/kit');
    await expect.poll(() => field(page, 'Name').first().inputValue()).toBe('My camera');
  });
}, 40_000);

it('what was typed outlives a reload, for strangers too, and comes along at the sign-in', async () => {
  const { email } = await photographer();
  await visiting({}, async (page) => {
    await openScreen(page, '/kit');
    await button(page, 'A compact camera with a crop sensor').click();
    await field(page, 'Name').first().fill('Pocket camera');
    await page.reload();
    await expect.poll(() => field(page, 'Name').first().inputValue()).toBe('Pocket camera');
    await signIn(page, email);
    await openScreen(page, '/kit');
    await button(page, 'Keep the kit').click();
    await page.getByText('Kept.').waitFor();
    const [kept] = await service.sql<{ name: string }>(
      "SELECT kit -> 'cameras' -> 0 ->> 'name' AS name FROM kits k JOIN accounts a ON a.id = k.account_id WHERE a.email = $1",
      [email],
    );
    expect(kept?.name).toBe('Pocket camera');
  });
}, 40_000);

it('a recipe is saved from the fill page, shared, read by a stranger, and the link taken back', async () => {
  const { email } = await photographer();
  let link = '';
  await visiting({}, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/fill');
    await button(page, 'Save…').click();
    await field(page, 'Name').last().fill('Harbour wall');
    await button(page, 'Save').click();
    await page.getByText('Saved as Harbour wall.').waitFor();
    await openScreen(page, '/recipes');
    await page.getByRole('link', { name: 'Harbour wall' }).click();
    await button(page, 'Share by a link').click();
    link = (await page.locator('main code').first().textContent()) ?? '';
    expect(link).toContain('/shared/');
  });
  await visiting({}, async (page) => {
    await openScreen(page, link);
    await heading(page, 'Harbour wall').waitFor();
    await page.getByRole('row').nth(1).waitFor();
    expect(await page.locator('main').textContent()).not.toContain(email);
    await page.getByRole('link', { name: 'Open it on the fill page' }).click();
    await heading(page, 'Set this').waitFor();
  });
  await visiting({ refusals: [404] }, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/recipes');
    await page.getByRole('link', { name: 'Harbour wall' }).click();
    await button(page, 'Take the link back').click();
    await page.getByText('The link leads nowhere any more.').waitFor();
    await openScreen(page, link);
    await heading(page, 'This link leads nowhere').waitFor();
    await openScreen(page, '/recipes');
    await page.getByRole('link', { name: 'Harbour wall' }).click();
    await button(page, 'Remove…').click();
    await button(page, 'Remove it').click();
    await page.getByText('Nothing yet.').waitFor();
  });
}, 60_000);

it('what was read before is there without a connection', async () => {
  const { email } = await photographer();
  const { page, context, end } = await open();
  await signIn(page, email);
  await openScreen(page, '/fill');
  await button(page, 'Save…').click();
  await field(page, 'Name').last().fill('Pier');
  await button(page, 'Save').click();
  await page.getByRole('link', { name: 'Open it among what you saved' }).click();
  await heading(page, 'Pier').waitFor();
  await page.getByRole('row').nth(1).waitFor();
  await page.getByRole('link', { name: 'Recipes and evenings' }).click();
  await page.getByRole('link', { name: 'Pier' }).waitFor();
  await context.setOffline(true);
  await page.getByRole('link', { name: 'Pier' }).click();
  await page.getByText('There is no connection').waitFor();
  await page.getByRole('row').nth(1).waitFor();
  await end();
}, 40_000);

it.each([
  ['/kit', 'A small flash on a stand'],
  ['/recipes', null],
] as const)(
  '%s is free of faults that axe can find, at 1440 and 360 px, and legible in every appearance',
  async (path, press) => {
    const { email } = await photographer();
    await visiting({ appearance: 'day' }, async (page) => {
      await signIn(page, email);
      await openScreen(page, path);
      if (press) await button(page, press).click();
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
