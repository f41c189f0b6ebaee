import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { calculatorList } from '../../shared/calculators';
import { contrastViolationsOn, openScreen, violationsOn } from '../support/browser';
import { consoleVisits } from '../support/consoleVisits';

const { visiting } = consoleVisits();

/** The drawings in the answer, by what a screen reader calls them, with what it says of them. */
function drawingsOn(page: Page): Promise<{ name: string; words: string }[]> {
  return page.evaluate(() =>
    [...document.querySelectorAll('.answer figure')].map((figure) => {
      const drawn = figure.querySelector('svg, canvas');
      const described = drawn?.getAttribute('aria-describedby');
      const by = described ? document.getElementById(described) : (drawn?.querySelector('desc') ?? null);
      return {
        name: drawn?.getAttribute('aria-label') ?? drawn?.querySelector('title')?.textContent ?? '',
        words: (by ?? figure.querySelector('figcaption'))?.textContent?.trim() ?? '',
      };
    }),
  );
}

/** Marks and words that a drawing carries: none may be NaN, and none may stick out of the page. */
function brokenInk(page: Page): Promise<string[]> {
  return page.evaluate(() =>
    [...document.querySelectorAll('.answer svg *')]
      .filter((element) => /NaN|Infinity|undefined/.test(element.outerHTML.slice(0, 400)))
      .map((element) => element.outerHTML.slice(0, 200)),
  );
}

it.each(calculatorList.map(({ id }) => [id] as const))(
  '%s shows its answer as a drawing with words, free of faults that axe can find, at both widths, in every appearance',
  async (id) => {
    await visiting({ widthPx: 1440, appearance: 'day' }, async (page) => {
      await openScreen(page, `/calculators/${id}`);
      await page.locator('.answer figure').first().waitFor();
      const drawings = await drawingsOn(page);
      expect(drawings.length).toBeGreaterThan(0);
      for (const { words } of drawings) expect(words).toMatch(/\d/);
      expect(await brokenInk(page)).toEqual([]);
      expect(await violationsOn(page), 'at 1440 px').toEqual([]);
      await page.setViewportSize({ width: 360, height: 740 });
      await expect.poll(() => page.evaluate(() => document.documentElement.scrollWidth)).toBe(360);
      expect(await violationsOn(page), 'at 360 px').toEqual([]);
      for (const name of ['Dusk', 'Dark-adapted']) {
        await page.getByRole('radio', { name }).check();
        expect(await contrastViolationsOn(page), name).toEqual([]);
      }
    });
  },
  60_000,
);

/** The grey of a pixel of the frame at 100 %. */
function greyAt(page: Page, x: number, y: number): Promise<number> {
  return page.evaluate(
    ([atX, atY]) =>
      document
        .querySelector('canvas')
        ?.getContext('2d')
        ?.getImageData(atX ?? 0, atY ?? 0, 1, 1).data[0] ?? -1,
    [x, y],
  );
}

it('two controls show what the flash freezes and what the ambient light smears', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/flash/motion');
    await page.locator('canvas').waitFor();
    const width = await page.evaluate(() => document.querySelector('canvas')?.width ?? 0);
    const left = Math.round(width * 0.28 - 35);
    // The first pale stripe's right edge, and the ground to the right of the lantern.
    const [stripe, beside] = [left + 8, left + 90];
    const words = () => page.locator('figcaption span').first().textContent();
    const frozen = await greyAt(page, stripe, 80);
    const ground = await greyAt(page, beside, 80);
    const seconds = page.getByRole('slider', { name: 'Seconds of ambient light' });
    // The sharp stripe stays through three stops of seconds, while the trail reaches what was ground.
    for (let i = 0; i < 9; i++) await seconds.press('ArrowRight');
    await expect.poll(words).toContain('trail over 141.2 pixels');
    expect(Math.abs((await greyAt(page, stripe, 80)) - frozen)).toBeLessThan(12);
    expect(await greyAt(page, beside, 80)).not.toBe(ground);
    const trail = await greyAt(page, beside, 80);
    const under = page.getByRole('slider', { name: 'Ambient light under the flash, stops' });
    for (let i = 0; i < 9; i++) await under.press('ArrowRight');
    await expect.poll(words).toContain('0 stops');
    expect(await greyAt(page, beside, 80)).toBeGreaterThan(trail);
    // Both stand in the question as well.
    await page.waitForURL(/ambient.subjectBrightnessStops=0/);
    expect(await page.getByRole('textbox', { name: 'Shutter', exact: true }).inputValue()).toBe('1s');
  });
});

it('in the dark-adapted appearance the frame shines red alone', async () => {
  await visiting({ appearance: 'dark-adapted' }, async (page) => {
    await openScreen(page, '/calculators/flash/motion');
    const shot = await page.locator('canvas').screenshot();
    const greens = await page.evaluate(async (base64) => {
      const image = new Image();
      image.src = `data:image/png;base64,${base64}`;
      await image.decode();
      const sheet = new OffscreenCanvas(image.width, image.height).getContext('2d');
      sheet?.drawImage(image, 0, 0);
      const { data = new Uint8ClampedArray() } = sheet?.getImageData(0, 0, image.width, image.height) ?? {};
      let [red, other] = [0, 0];
      for (let i = 0; i < data.length; i += 4) {
        red = Math.max(red, data[i] ?? 0);
        other = Math.max(other, data[i + 1] ?? 0, data[i + 2] ?? 0);
      }
      return { red, other };
    }, shot.toString('base64'));
    expect(greens.red).toBeGreaterThan(200);
    expect(greens.other).toBe(0);
  });
});

const EMPTY_AND_ABSURD = [
  [
    'no flash, no ambient light',
    '/calculators/flash/motion?subject.speedMS=0&distanceM=3&focalLengthMm=50&pixelPitchUm=6',
  ],
  [
    'a bullet',
    '/calculators/flash/motion?subject.speedMS=90000&distanceM=1&focalLengthMm=500&pixelPitchUm=1&ambient.shutter=30s&ambient.subjectBrightnessStops=-60',
  ],
  [
    'a flash that cannot reach',
    '/calculators/flash/exposure?guideNumberM=10&distanceM=5000&aperture=f/22&iso=100',
  ],
  [
    'sharp without end',
    '/calculators/exposure/depth?focalLengthMm=8&aperture=f/32&distanceM=1000&sensorWidthMm=36&sensorHeightMm=24',
  ],
  [
    'blur wider than the frame',
    '/calculators/exposure/depth?focalLengthMm=600&aperture=f/1&distanceM=0.7&sensorWidthMm=5&sensorHeightMm=4',
  ],
  ['an hour under lamps', '/calculators/light/flicker?mainsHz=60&shutter=3600'],
  ['a hundred stops apart', '/calculators/light/add?parts.0.stops=-60&parts.1.stops=60'],
  ['no filter', '/calculators/filters/density?stops=0'],
  ['a gel that no series has', '/calculators/filters/gel?sourceK=1000&targetK=40000'],
  [
    'a battery for no frame',
    '/calculators/flash/budget?fullPowerPops=0.1&power=1&frames=10&recycleFullS=3600&fps=1000',
  ],
  [
    'a light as large as a house',
    '/calculators/flash/falloff?distanceM.0=0.01&distanceM.1=10000&referenceM=1&sourceDiameterM=100&toleranceStops=20',
  ],
  [
    'ambient light over the wish',
    '/calculators/flash/daylight?background.ev100=15&subjectAmbient.ev100=18&aperture=f/2&iso=100&syncSpeed=1/200&flash.guideNumberM=50&flash.distanceM=3',
  ],
  ['a shutter far longer than the pulse', '/calculators/flash/duration?t05S=1e-7&control=decay&shutter=30s'],
] as const;

it.each(EMPTY_AND_ABSURD)('%s is drawn sensibly', async (_, address) => {
  await visiting({ widthPx: 360 }, async (page) => {
    await openScreen(page, address);
    await page.locator('.answer figure').first().waitFor();
    expect(await brokenInk(page)).toEqual([]);
    for (const { words } of await drawingsOn(page)) expect(words).not.toMatch(/NaN|Infinity|undefined/);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(360);
  });
});

it('lengths are shown in feet in place, and stay so over a reload, while the question stays in metres', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/flash/falloff?distanceM.0=3.048&referenceM=3.048');
    await page.getByRole('radio', { name: 'ft', exact: true }).check();
    const box = page.getByRole('textbox', { name: 'Reference distance' });
    expect(await box.inputValue()).toBe('10');
    await expect
      .poll(() => page.locator('.answer figure figcaption').textContent())
      .toContain('reference at 10 ft');
    await page.reload();
    await box.waitFor();
    expect(await box.inputValue()).toBe('10');
    await box.fill('20');
    await page.waitForURL(/referenceM=6.096/);
  });
});

it('what was solved is taken along to the next calculator', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/solve?ev100=13&aperture=f/8&iso=100');
    await page.getByRole('link', { name: 'Equivalent settings' }).last().click();
    await page.getByRole('heading', { level: 1, name: 'Equivalent settings' }).waitFor();
    expect(await page.getByRole('textbox', { name: 'Shutter', exact: true }).inputValue()).toBe('1/125');
  });
});
