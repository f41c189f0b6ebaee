import { gzipSync } from 'node:zlib';
import { expect, it } from 'vitest';
import { benchClientSize } from '../bench/clientSize';
import { openScreen } from '../support/browser';
import { consoleVisits } from '../support/consoleVisits';

const { visiting } = consoleVisits();
const LIGHT = 'The light, EV at ISO 100';

it('the landing page tells the next exposure while the light is moved by keyboard', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/');
    const shutters = page.locator('.shutter');
    // N²/t = 2^EV·S/100: at f/4 and ISO 400, EV 9 asks for 16/2048 s, which is marked 1/125 (derivation).
    expect(await shutters.allTextContents()).toEqual(['1/125', '1/60', '1/30', '1/15']);
    await page.getByRole('slider', { name: LIGHT }).focus();
    for (let i = 0; i < 3; i++) await page.keyboard.press('ArrowLeft');
    expect(await shutters.allTextContents()).toEqual(['1/60', '1/30', '1/15', '1/8']);
    await page.getByRole('slider', { name: 'Aperture' }).press('ArrowRight');
    expect(await shutters.first().textContent()).toBe('1/80');
  });
});

it('the landing page moves the light to where the scale is touched', async () => {
  await visiting({ widthPx: 360 }, async (page) => {
    await openScreen(page, '/');
    const slider = page.getByRole('slider', { name: LIGHT });
    await slider.scrollIntoViewIfNeeded();
    const box = await slider.boundingBox();
    if (!box) throw new Error('The scale has no box');
    // The axis runs from −6 to 16 between equal paddings; its middle is EV 5.
    await page.touchscreen.tap(box.x + box.width / 2, box.y + box.height / 2);
    expect(await slider.inputValue()).toBe('15');
    expect(await page.locator('.ev').first().textContent()).toBe('EV 5');
  });
});

it('the landing page leads to the calculators and says where it has led', async () => {
  await visiting({ widthPx: 360 }, async (page) => {
    await openScreen(page, '/');
    const menu = page.getByRole('button', { name: 'Menu' });
    await menu.click();
    await page.keyboard.press('Escape');
    expect(await menu.getAttribute('aria-expanded')).toBe('false');
    expect(await menu.evaluate((button) => button === document.activeElement)).toBe(true);
    await menu.click();
    await page.getByRole('link', { name: 'Calculators', exact: true }).click();
    await page.getByRole('heading', { level: 1, name: 'Calculators' }).waitFor();
    expect(await page.title()).toBe('Calculators · Evenfall');
    await page.waitForFunction(() => document.activeElement?.tagName === 'H1');
    expect(await menu.getAttribute('aria-expanded')).toBe('false');
  });
});

it('the first load fetches the JavaScript that the benchmark counts, and no component library', async () => {
  await visiting({}, async (page) => {
    let kb = 0;
    const scripts: Promise<void>[] = [];
    page.on('response', (response) => {
      if (!response.headers()['content-type']?.includes('javascript')) return;
      scripts.push(response.body().then((body) => void (kb += gzipSync(body).length / 1000)));
    });
    await openScreen(page, '/');
    await Promise.all(scripts);
    const counted = (await benchClientSize()).find(({ name }) => name === 'client-landing')?.value ?? 0;
    expect(scripts.length).toBeGreaterThan(3);
    expect(kb).toBeCloseTo(counted, 3);
    expect(await page.locator('[class*=ant-]').count()).toBe(0);
  });
});
