import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { openScreen, violationsOn } from '../support/browser';
import { serveConsole, type Edits } from '../support/consoleServer';
import { consoleVisits } from '../support/consoleVisits';

const edits: Edits = new Map();
const { visiting } = consoleVisits(() => serveConsole(edits));

const isControlled = (page: Page) => page.evaluate(() => Boolean(navigator.serviceWorker.controller));
const storesOf = (page: Page) => page.evaluate(() => caches.keys());

it('tells that a newer version has come, and changes to it when the reader says so, with all that was typed', async () => {
  await visiting({ isKept: true, widthPx: 360 }, async (page) => {
    await openScreen(page, '/fill');
    await page.evaluate(() => navigator.serviceWorker.ready.then(() => undefined));
    await expect.poll(() => isControlled(page)).toBe(true);
    await page.getByRole('slider', { name: 'Background, aim' }).press('ArrowRight');
    await expect.poll(() => page.url()).toContain('aim.backgroundStops=-0.6667');
    const before = await storesOf(page);
    const change = page.getByRole('button', { name: 'Change to it now' });
    expect(await change.isVisible()).toBe(false);

    // Another build has another name for what it keeps.
    const [name = ''] = before;
    const [build = ''] = /[0-9a-f]{16}/.exec(name) ?? [];
    expect(build).not.toBe('');
    edits.set('/offline.js', (text) => text.replaceAll(build, build.split('').reverse().join('')));
    await page.evaluate(async () => {
      await (await navigator.serviceWorker.ready).update();
    });
    await change.waitFor();
    expect(await violationsOn(page)).toEqual([]);
    // Nothing has changed yet under the reader's hands.
    expect(page.url()).toContain('aim.backgroundStops=-0.6667');

    const loaded = page.waitForEvent('load');
    await change.click();
    await loaded;
    await page.getByRole('slider', { name: 'Background, aim' }).waitFor();
    expect(page.url()).toContain('aim.backgroundStops=-0.6667');
    expect(await change.isVisible()).toBe(false);
    // What the older version kept is gone.
    await expect
      .poll(() => storesOf(page))
      .toEqual([name.replace(build, build.split('').reverse().join(''))]);
    edits.clear();
  });
}, 60_000);
