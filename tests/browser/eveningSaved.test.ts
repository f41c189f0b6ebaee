import { expect, it } from 'vitest';
import { encodeQuery } from '../../shared/contract/queryCodec';
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

const evening = {
  latitude: 51.5074,
  longitude: -0.1278,
  date: '2026-10-04',
  testFrame: { at: '18:45', aperture: 'f/4', shutter: '1/60', iso: 400 },
  hold: { aperture: 'f/4', iso: 400 },
  limits: { shutterSlowest: '1/15', isoMax: 3200, apertureMin: 'f/2' },
};
const address = `/evening?${new URLSearchParams(encodeQuery(evening)).toString()}`;

it('a photographer saves an evening, shares it by a link, and a stranger reads it until the link is taken back', async () => {
  const { email, browser } = await service.person({ roles: ['photographer'], name: 'Iris Fen' });
  await visiting({ widthPx: 360 }, async (page, { context }) => {
    await signIn(page, email);
    await openScreen(page, address);
    await button(page, 'Save…').click();
    const name = page.locator('form.line').getByRole('textbox', { name: 'Name' });
    expect(await name.inputValue()).toBe('Evening of 2026-10-04');
    await name.fill('Harbour at dusk');
    await button(page, 'Save').click();
    await page.getByText('Saved as Harbour at dusk.').waitFor();
    expect(await violationsOn(page)).toEqual([]);
    const { body: list } = await browser.call('GET', '/api/saved');
    const [thing] = (list as unknown as { things: { id: string; name: string; kind: string }[] }).things;
    expect(thing).toMatchObject({ name: 'Harbour at dusk', kind: 'evening' });

    await button(page, 'Share by a link').click();
    const link = (await page.locator('code').filter({ hasText: '/shared/' }).textContent()) ?? '';
    const shared = await context.browser()?.newPage();
    await shared?.goto(link);
    await shared?.getByRole('heading', { name: 'Harbour at dusk' }).waitFor();
    await shared?.getByRole('table').getByText('f/4').first().waitFor();
    await button(page, 'Take the link back').click();
    await page.getByText('The link leads nowhere any more.').waitFor();
    await shared?.reload();
    await shared?.getByRole('heading', { name: 'Harbour at dusk' }).waitFor({ state: 'detached' });
    await shared?.context().close();

    await page.getByRole('link', { name: 'Open it among what you saved' }).click();
    await page.getByRole('heading', { name: 'Harbour at dusk' }).waitFor();
    await page.getByRole('link', { name: 'Open it on the evening page' }).click();
    await page.waitForURL((url) => url.pathname === '/evening');
    expect(new URL(page.url()).searchParams.get('hold.aperture')).toBe('f/4');
  });
}, 60_000);

it('a stranger is led to the sign-in and comes back to the evening that was entered', async () => {
  const { email, browser } = await service.person({ roles: ['photographer'] });
  await browser.call('DELETE', '/api/session');
  await visiting({ widthPx: 360 }, async (page) => {
    await openScreen(page, address);
    await page.getByRole('link', { name: 'Sign in to save and share' }).click();
    await field(page, 'E-mail address').fill(email);
    await page.getByLabel('Password', { exact: true }).fill(PASSWORD);
    await button(page, 'Sign in').click();
    await page.waitForURL((url) => url.pathname === '/evening');
    expect(new URL(page.url()).searchParams.get('testFrame.at')).toBe('18:45');
    await button(page, 'Save…').waitFor();
  });
}, 60_000);
