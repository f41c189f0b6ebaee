import { readFile } from 'node:fs/promises';
import ICAL from 'ical.js';
import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { twilightDay } from '../../shared/calculators/twilight/day';
import { twilightLadder } from '../../shared/calculators/twilight/ladder';
import { encodeQuery } from '../../shared/contract/queryCodec';
import { rungSettings, turningTitle } from '../../src/text/eveningText';
import { askCalculator } from '../support/askCalculator';
import { contrastViolationsOn, openScreen, violationsOn } from '../support/browser';
import { consoleVisits } from '../support/consoleVisits';

const { visiting } = consoleVisits();

const place = { latitude: 51.5074, longitude: -0.1278 };
const gear = {
  hold: { aperture: 'f/4', iso: 400 },
  limits: { shutterSlowest: '1/15', isoMax: 3200, apertureMin: 'f/2' },
};
const frame = { aperture: 'f/4', shutter: '1/60', iso: 400 };
const evening = { ...place, date: '2026-10-04', testFrame: { at: '18:45', ...frame }, ...gear };
const address = (body: object) => `/evening?${new URLSearchParams(encodeQuery(body)).toString()}`;
/** The same as the service is asked, with whole instants. */
const expected = () =>
  askCalculator(twilightLadder, {
    ...place,
    testFrame: { at: '2026-10-04T18:45:00+01:00', ...frame },
    ...gear,
  }).result;
const clock = (at: string) => at.slice(11, 16);
const rungRows = (page: Page) =>
  page.getByRole('table', { name: /Times in Europe\/London; each rung/ }).getByRole('row');
const dials = (page: Page) => page.locator('.dials').textContent();

it.each([
  ['as it opens', '/evening'],
  ['with a ladder', address(evening)],
  ['with faults', address({ ...evening, latitude: 91 })],
])(
  'the page %s is free of faults that axe can find, at 1440 and at 360 px, and legible in every appearance',
  async (_, path) => {
    await visiting({ appearance: 'day' }, async (page) => {
      await openScreen(page, path);
      expect(await violationsOn(page), 'at 1440 px').toEqual([]);
      await page.setViewportSize({ width: 360, height: 740 });
      expect(await violationsOn(page), 'at 360 px').toEqual([]);
      await expect.poll(() => page.evaluate(() => document.documentElement.scrollWidth)).toBe(360);
      for (const name of ['Dusk', 'Dark-adapted']) {
        await page.getByRole('radio', { name }).check();
        expect(await contrastViolationsOn(page), name).toEqual([]);
      }
    });
  },
  60_000,
);

it('shows the ladder that the service would answer, rung by rung, with its turning points', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, address(evening));
    const { rungs, turningPoints } = expected();
    expect(await rungRows(page).count()).toBe(rungs.length + 1);
    for (const [i, rung] of rungs.entries()) {
      const row = await rungRows(page)
        .nth(i + 1)
        .textContent();
      for (const part of [clock(rung.at), rung.aperture.mark, rung.shutter.mark, rung.iso.mark])
        expect(row).toContain(part);
    }
    const turns = await page.getByRole('region', { name: 'Turning points' }).textContent();
    for (const turn of turningPoints) expect(turns).toContain(`${clock(turn.at)} ${turningTitle(turn)}`);
    await page.getByRole('img', { name: /The dusk ladder over the light/ }).waitFor();
  });
});

it('tells what to set at any minute, by the arrow keys alone', async () => {
  await visiting({ widthPx: 360, appearance: 'dark-adapted' }, async (page) => {
    await openScreen(page, address(evening));
    const { rungs } = expected();
    await page.getByRole('slider', { name: 'Minute' }).focus();
    for (let i = 0; i < 14; i += 1) await page.keyboard.press('ArrowRight');
    const atMs = Date.parse('2026-10-04T18:59:00+01:00');
    const rung = rungs.find(({ at, until }) => Date.parse(at) <= atMs && atMs < Date.parse(until));
    await page.getByRole('heading', { name: 'What now, 18:59' }).waitFor();
    for (const part of rung ? rungSettings(rung) : ['a rung']) expect(await dials(page)).toContain(part);
  });
});

it('follows the clock while that is wished, from one rung to the next', async () => {
  await visiting({}, async (page) => {
    const { rungs } = expected();
    const second = Date.parse(rungs[1]?.until ?? '');
    await page.clock.install({ time: second - 3000 });
    await openScreen(page, address(evening));
    await page.getByRole('checkbox', { name: 'Follow the clock' }).check();
    await expect.poll(() => dials(page)).toContain(rungs[1]?.shutter.mark);
    await page.clock.runFor(5000);
    await expect.poll(() => dials(page)).toContain(rungs[2]?.shutter.mark);
  });
});

it('takes a test frame that is typed, and has it all again after a reload and on the next visit', async () => {
  await visiting({}, async (page) => {
    await page.clock.setFixedTime(new Date('2026-10-04T17:50:00Z'));
    await openScreen(page, '/evening');
    expect(await rungRows(page).count()).toBe(0);
    await page.getByRole('textbox', { name: 'Latitude' }).fill('51.5074');
    await page.getByRole('textbox', { name: 'Longitude' }).fill('-0.1278');
    await page.getByText('All times are those of the place: Europe/London.').waitFor();
    await page.getByRole('button', { name: 'Add a test frame' }).click();
    expect(await page.getByLabel('Taken at').inputValue()).toMatch(/^18:50/);
    await page.getByRole('textbox', { name: 'Shutter', exact: true }).fill('1/30');
    // At once, before the address has followed.
    await page.reload();
    await expect.poll(() => dials(page)).toContain('1/30');
    await page.goto('/');
    await page.goto('/evening');
    await expect.poll(() => dials(page)).toContain('1/30');
    expect(await page.getByRole('textbox', { name: 'Latitude' }).inputValue()).toBe('51.5074');
  });
});

it('says at its field what is wrong: a latitude, a zone, limits that leave nothing', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, address({ ...evening, latitude: 91 }));
    await page.getByText('Latitude must be from −90 to 90 °, not 91 °.').first().waitFor();
    await openScreen(page, address({ ...evening, timeZone: 'Europe/Londinium' }));
    await expect
      .poll(() => page.getByRole('textbox', { name: 'Time zone' }).getAttribute('aria-invalid'))
      .toBe('true');
    await openScreen(page, address({ ...evening, hold: { aperture: 'f/1.4', iso: 400 } }));
    await page.getByText(/1 fault in what was entered/).waitFor();
    expect(await rungRows(page).count()).toBe(0);
  });
});

it('keeps places by name in this browser, and goes back to them', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, address(evening));
    await page.getByRole('button', { name: 'Keep this place' }).click();
    await page.keyboard.type('Lamp maker’s terrace');
    await page.keyboard.press('Enter');
    await page.getByRole('textbox', { name: 'Latitude' }).fill('10');
    await page.reload();
    await page.getByRole('combobox', { name: /Own places/ }).selectOption('Lamp maker’s terrace');
    expect(await page.getByRole('textbox', { name: 'Latitude' }).inputValue()).toBe('51.5074');
  });
});

it('goes on from a recipe, with its settings, aim and flash', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/fill');
    await page.getByRole('link', { name: 'Follow the light from here' }).click();
    await page.getByRole('heading', { name: 'The light going down' }).waitFor();
    const query = new URL(page.url()).searchParams;
    await expect.poll(() => page.locator('.dials').textContent()).toContain('flash 1/');
    for (const name of ['shutter', 'aperture'])
      expect(await dials(page)).toContain(query.get(`testFrame.${name}`));
  });
});

it('writes twilights and turning points into a calendar file that a reader of such files understands', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, address(evening));
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('button', { name: 'Calendar file' }).click(),
    ]);
    expect(download.suggestedFilename()).toBe('evening-2026-10-04.ics');
    const text = await readFile(await download.path(), 'utf8');
    const events = new ICAL.Component(ICAL.parse(text) as unknown[]).getAllSubcomponents('vevent');
    const starts = events.map((event) => new ICAL.Event(event).startDate.toJSDate().getTime());
    const day = askCalculator(twilightDay, { ...place, date: '2026-10-04' }).result.events;
    const instants = [...day.map(({ at }) => at ?? ''), ...expected().turningPoints.map(({ at }) => at)];
    expect(starts).toEqual(instants.map((at) => Date.parse(at)).sort((a, b) => a - b));
  });
});

it('fits on one page of paper', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, address(evening));
    await page.emulateMedia({ media: 'print' });
    // A4 less margins of 12 mm, at 96 px an inch.
    await page.setViewportSize({ width: 703, height: 1031 });
    expect(await page.locator('.evening-sheet').isVisible()).toBe(true);
    expect(await page.locator('.evening-screen').isVisible()).toBe(false);
    expect(await page.evaluate(() => document.documentElement.scrollHeight)).toBeLessThanOrEqual(1031);
  });
});

it('works without a network after the first visit: evening, fill and calculators, but never the API from a store', async () => {
  await visiting({ isKept: true, widthPx: 360, appearance: 'dark-adapted' }, async (page, { context }) => {
    await openScreen(page, '/');
    await page.evaluate(async () => {
      await navigator.serviceWorker.ready;
    });
    await expect.poll(() => page.evaluate(() => Boolean(navigator.serviceWorker.controller))).toBe(true);
    await context.setOffline(true);
    await page.goto(address(evening));
    await expect.poll(() => dials(page)).toContain('f/4');
    expect(await rungRows(page).count()).toBe(expected().rungs.length + 1);
    expect(await contrastViolationsOn(page)).toEqual([]);
    for (const path of [
      '/fill',
      '/calculators',
      '/calculators/twilight/ladder',
      '/calculators/flash/motion',
    ]) {
      await page.goto(path);
      await page.locator('main h1').waitFor();
    }
    await page.getByRole('heading', { name: 'Cautions' }).waitFor();
    const stored = await page.evaluate(async () => {
      const names = await caches.keys();
      const lists = await Promise.all(names.map(async (name) => (await caches.open(name)).keys()));
      return lists.flat().map(({ url }) => new URL(url).pathname);
    });
    expect(stored.length).toBeGreaterThan(40);
    expect(stored.filter((path) => /^\/(api|v1|docs)\b/.test(path))).toEqual([]);
    await context.setOffline(false);
  });
}, 60_000);
