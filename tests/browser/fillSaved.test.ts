import { expect, it } from 'vitest';
import { STARTING_KITS } from '../../shared/contract/startingKits';
import { openScreen, violationsOn } from '../support/browser';
import { PASSWORD, type ConsoleService } from '../support/consoleService';
import { consoleVisits } from '../support/consoleVisits';
import { button, field, signIn } from '../support/peopleSteps';
import { serveService } from '../support/serveService';

let service: ConsoleService;
const { visiting } = consoleVisits(async () => {
  service = await serveService();
  return { url: service.url, close: () => service.stop() };
});

it('a photographer takes their own kit, saves what comes of it, shares it by a link, and takes the link back', async () => {
  const { email, browser } = await service.person({ roles: ['photographer'], name: 'Iris Fen' });
  const kit = { ...STARTING_KITS[0]?.kit, filters: [{ name: 'Dark glass', ndStops: 5 }] };
  expect((await browser.call('PUT', '/api/kit', { kit, version: 0 })).status).toBe(200);
  await visiting({ refusals: [422] }, async (page) => {
    await signIn(page, email);
    await openScreen(page, '/fill');
    await page.getByText('From a kit').click();
    const kits = page.getByRole('combobox', { name: 'Kit', exact: true });
    await expect.poll(() => kits.locator('option:checked').textContent()).toBe('Your kit');
    await page
      .getByRole('combobox', { name: 'Small flash, modifier' })
      .selectOption({ label: 'Shoot-through umbrella' });
    await button(page, 'Take these').click();
    await expect.poll(() => new URL(page.url()).searchParams.get('camera.ndStops.0')).toBe('5');
    expect(new URL(page.url()).searchParams.get('flashes.0.lossStops')).toBe('1.5');

    await button(page, 'Save…').click();
    await button(page, 'Save').click();
    const name = page.locator('form.line').getByRole('textbox', { name: 'Name' });
    await expect.poll(() => name.getAttribute('aria-invalid')).toBe('true');
    await name.fill('Kite flyer on the ridge');
    await button(page, 'Save').click();
    await page.getByText('Saved as Kite flyer on the ridge.').waitFor();
    const { body: list } = await browser.call('GET', '/api/saved');
    const [thing] = (list as unknown as { things: { id: string; name: string; kind: string }[] }).things;
    expect(thing).toMatchObject({ name: 'Kite flyer on the ridge', kind: 'recipe' });

    await page.getByRole('slider', { name: 'Subject, aim' }).press('ArrowRight');
    await button(page, 'Save the changes').click();
    await expect
      .poll(async () => (await browser.call('GET', `/api/saved/${thing?.id}`)).body)
      .toMatchObject({ thing: { body: { aim: { subjectStops: 0.3333 } } } });

    await button(page, 'Share by a link').click();
    const link = (await page.locator('code').filter({ hasText: '/shared/' }).textContent()) ?? '';
    const stranger = service.newBrowser();
    const token = new URL(link).pathname.replace('/shared/', '');
    expect((await stranger.call('GET', `/api/shared/${token}`)).body).toMatchObject({
      name: 'Kite flyer on the ridge',
      body: { aim: { subjectStops: 0.3333 } },
    });
    expect(await violationsOn(page)).toEqual([]);
    await button(page, 'Take the link back').click();
    await page.getByText('The link leads nowhere any more.').waitFor();
    expect((await stranger.call('GET', `/api/shared/${token}`)).status).toBe(404);
  });
}, 60_000);

it('a stranger is led to the sign-in and comes back with everything that was entered', async () => {
  const { email, browser } = await service.person({ roles: ['photographer'] });
  await browser.call('DELETE', '/api/session');
  await visiting({ widthPx: 360 }, async (page) => {
    await openScreen(page, '/fill');
    await page.getByRole('slider', { name: 'Background, aim' }).press('ArrowRight');
    await expect.poll(() => page.url()).toContain('aim.backgroundStops=-0.6667');
    await page.getByRole('link', { name: 'Sign in to save and share' }).click();
    await field(page, 'E-mail address').fill(email);
    await page.getByLabel('Password', { exact: true }).fill(PASSWORD);
    await button(page, 'Sign in').click();
    await page.waitForURL((url) => url.pathname === '/fill');
    expect(new URL(page.url()).searchParams.get('aim.backgroundStops')).toBe('-0.6667');
    await button(page, 'Save…').waitFor();
  });
}, 60_000);
