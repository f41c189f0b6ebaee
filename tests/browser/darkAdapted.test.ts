import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { openScreen } from '../support/browser';
import { consoleVisits } from '../support/consoleVisits';

const { visiting } = consoleVisits();

/** The most green or blue of any pixel that the page shows, 0 to 255; red alone spares the rods of the eye. */
async function mostGreenOrBlue(page: Page): Promise<number> {
  const picture = (await page.screenshot({ fullPage: true })).toString('base64');
  return page.evaluate(async (base64) => {
    const image = new Image();
    image.src = `data:image/png;base64,${base64}`;
    await image.decode();
    const canvas = new OffscreenCanvas(image.width, image.height);
    const context = canvas.getContext('2d');
    context?.drawImage(image, 0, 0);
    const { data } = context?.getImageData(0, 0, image.width, image.height) ?? { data: [255, 255, 255, 255] };
    let most = 0;
    for (let i = 0; i < data.length; i += 4) most = Math.max(most, data[i + 1] ?? 255, data[i + 2] ?? 255);
    return most;
  }, picture);
}

/** Smoothing of edges may leave a trace. */
const TRACE = 48;

it.each([
  '/',
  '/calculators',
  '/calculators/exposure/value',
  '/calculators/flash/motion',
  '/calculators/fill/check',
  '/evening?testFrame.aperture=4&testFrame.shutter=1/60&testFrame.iso=400',
  '/fill',
  '/sign-in',
])('%s shows nothing but red in the dark-adapted appearance', async (path) => {
  await visiting({ widthPx: 360, appearance: 'dark-adapted' }, async (page) => {
    await openScreen(page, path);
    expect(await mostGreenOrBlue(page)).toBeLessThan(TRACE);
  });
});
