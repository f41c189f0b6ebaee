import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { fillRecipes } from '../../shared/calculators/fill/recipes';
import { encodeQuery } from '../../shared/contract/queryCodec';
import { initialBody } from '../../src/components/fill/initialBody';
import type { Body } from '../../src/form/body';
import { settingsLine } from '../../src/components/fill/recipeText';
import { askCalculator } from '../support/askCalculator';
import { contrastViolationsOn, openScreen, violationsOn } from '../support/browser';
import { consoleVisits } from '../support/consoleVisits';

const { visiting } = consoleVisits();

const address = (body: Body) => `/fill?${new URLSearchParams(encodeQuery(body)).toString()}`;
const recipeRadios = (page: Page) =>
  page.getByRole('group', { name: 'Recipes, best first' }).getByRole('radio');
const bestRecipe = async (page: Page) => (await recipeRadios(page).first().getAttribute('aria-label')) ?? '';
const bestOf = (body: Body) => {
  const [first] = askCalculator(fillRecipes, body).result.recipes;
  if (!first) throw new Error('there is no recipe');
  return settingsLine(first);
};

/** How far the picture at 100 % says that the subject trails. */
async function trailPx(page: Page): Promise<number> {
  const words = await page.getByRole('region', { name: 'The frame at 100 %' }).textContent();
  return Number(/trail over ([\d.]+) pixels/.exec(words ?? '')?.[1] ?? NaN);
}

const camera = {
  apertureMin: 'f/1.8',
  apertureMax: 'f/16',
  isoMin: 100,
  isoMax: 6400,
  shutterSlowest: '1/4',
  shutterFastest: '1/8000',
  syncSpeed: '1/250',
};
const flash = (name: string, role: string, guideNumberM: number, distanceM: number) => ({
  name,
  role,
  guideNumberM,
  minPower: '1/128',
  distanceM,
});
const dusk = {
  background: { testFrame: { aperture: 'f/2.8', shutter: '1/60', iso: 400 } },
  subjectAmbient: { belowBackgroundStops: 2 },
  camera,
  flashes: [flash('octabox', 'key', 24, 2)],
};
/** A low sun that outshines a small flash far away. */
const outshone = {
  ...dusk,
  background: { ev100: 14.5 },
  aim: { rimStops: 1, ratio: 3 },
  flashes: [flash('octabox', 'key', 12, 4), flash('umbrella', 'fill', 36, 3), flash('strip', 'rim', 36, 2.5)],
};

it.each([
  ['as it opens', '/fill'],
  ['with three flashes and what stands in the way', address(outshone)],
  ['with faults', address({ ...dusk, camera: { ...camera, apertureMax: 'f/1.4' }, flashes: [{ name: '' }] })],
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

it('leads from a typed test frame to a settings sheet on one page of paper', async () => {
  await visiting({}, async (page) => {
    await page.addInitScript(() => {
      window.print = () => document.body.setAttribute('data-printed', 'yes');
    });
    await openScreen(page, '/fill');
    await page.getByRole('textbox', { name: 'Aperture', exact: true }).fill('f/4');
    await page.getByRole('textbox', { name: 'Shutter', exact: true }).fill('1/30');
    await page.getByRole('textbox', { name: 'ISO', exact: true }).fill('800');
    const frame = { aperture: 'f/4', shutter: '1/30', iso: 800, offsetStops: 0 };
    const example = initialBody(fillRecipes.examples[0]?.input as Body);
    const expected = bestOf({ ...example, background: { testFrame: frame } });
    await expect.poll(() => bestRecipe(page)).toContain(`${expected};`);
    await page.getByRole('button', { name: 'Print the settings sheet' }).click();
    expect(await page.locator('body').getAttribute('data-printed')).toBe('yes');
    await expect.poll(() => page.url()).toContain('background.testFrame.iso=800');

    await page.emulateMedia({ media: 'print' });
    const sheet = page.locator('.settings-sheet');
    expect(await sheet.isVisible()).toBe(true);
    for (const part of expected.split(', ')) expect(await sheet.textContent()).toContain(part);
    expect(await sheet.textContent()).toContain('octabox');
    expect(await sheet.textContent()).toContain('background.testFrame.iso=800');
    for (const other of ['main h1', '.fill-screen', '#app > header', '#app > footer'])
      expect(await page.locator(other).isVisible(), other).toBe(false);
    // A4 less margins of 12 mm, at 96 px an inch.
    await page.setViewportSize({ width: 703, height: 1031 });
    expect(await page.evaluate(() => document.documentElement.scrollHeight)).toBeLessThanOrEqual(1031);
  });
});

it('lets background and subject be dragged, and moved by keys, to where they shall land', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, address(dusk));
    const background = page.getByRole('slider', { name: 'Background, aim' });
    await background.focus();
    await page.keyboard.press('ArrowLeft');
    await page.keyboard.press('ArrowLeft');
    await expect.poll(() => page.url()).toContain('aim.backgroundStops=-0.6667');
    expect(await background.getAttribute('aria-valuetext')).toMatch(/^−0.67 stops.*lands at −0.67$/);

    const subject = page.getByRole('slider', { name: 'Subject, aim' });
    const box = await subject.boundingBox();
    if (!box) throw new Error('the scale has no box');
    const x = (stops: number) => box.x + 22 + ((stops + 4) / 8) * (box.width - 44);
    await page.mouse.move(x(0), box.y + 20);
    await page.mouse.down();
    await page.mouse.move(x(0.5), box.y + 20);
    await page.mouse.move(x(1), box.y + 20);
    await page.mouse.up();
    await expect.poll(() => page.url()).toContain('aim.subjectStops=1');
    const expected = bestOf({ ...dusk, aim: { backgroundStops: -0.6667, subjectStops: 1 } });
    expect(await bestRecipe(page)).toContain(`${expected};`);
    await page.reload();
    await page.getByRole('slider', { name: 'Subject, aim' }).waitFor();
    expect(await page.getByRole('slider', { name: 'Subject, aim' }).inputValue()).toBe('3');
  });
});

it('says why not, gives up what is chosen, shows what comes of it, and takes it back', async () => {
  await visiting({ widthPx: 360 }, async (page) => {
    await openScreen(page, address(outshone));
    const reasons = page.getByRole('region', { name: 'Why not as wished' });
    const { whyNot = [] } = askCalculator(fillRecipes, outshone).result;
    expect(whyNot.length).toBeGreaterThan(2);
    expect(await reasons.getByRole('listitem').count()).toBe(whyNot.length);
    for (const { giveUp } of whyNot) expect(await reasons.textContent()).toContain(giveUp);

    await reasons.getByRole('button', { name: /^Give up: Bring the key/ }).click();
    await expect.poll(() => reasons.count()).toBe(0);
    expect(await recipeRadios(page).first().getAttribute('aria-label')).toMatch(/octabox 1\/1 at 2\.1/);
    await page.getByRole('button', { name: 'Take it back' }).click();
    await reasons.waitFor();
    await expect.poll(() => new URL(page.url()).searchParams.get('flashes.0.distanceM')).toBe('4');
  });
});

it('takes the light as EV or as a scene as well, and keeps what the test frame told', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, address(dusk));
    await page.getByRole('radio', { name: 'EV', exact: true }).check();
    // f/2.8, 1/64 s, ISO 400: 3 + 6 − 2 = 7.
    expect(await page.getByRole('textbox', { name: 'Light of the background' }).inputValue()).toBe('7');
    await page.getByRole('radio', { name: 'Scene' }).check();
    await page
      .getByRole('combobox', { name: 'Scene' })
      .selectOption({ label: 'Sky or skyline as the sun goes down' });
    await expect.poll(() => page.url()).toContain('background.ev100=12');
    const evening = { ...dusk, background: { ev100: 12 } };
    expect(await bestRecipe(page)).toContain(`${bestOf(evening)};`);
  });
});

it('opens what is folded away where a fault stands in it, and has the answer back once it is mended', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, address({ ...dusk, camera: { ...camera, apertureMax: 'f/1.4' } }));
    const smallest = page.getByRole('textbox', { name: 'Smallest aperture' });
    expect(await smallest.getAttribute('aria-invalid')).toBe('true');
    expect(await recipeRadios(page).count()).toBe(0);
    await smallest.fill('f/11');
    await expect.poll(() => recipeRadios(page).count()).toBeGreaterThan(1);
  });
});

it('shows another recipe at length when it is chosen', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/fill');
    const second = recipeRadios(page).nth(1);
    const words = (await second.getAttribute('aria-label')) ?? '';
    await expect.poll(() => trailPx(page)).toBeGreaterThan(0);
    const before = await trailPx(page);
    await second.focus();
    await page.keyboard.press('Space');
    const detail = page.getByRole('region', { name: 'Set this' });
    for (const part of words.split(';')[0]?.split(', ') ?? [])
      expect(await detail.textContent()).toContain(part);
    expect(await detail.getByRole('list').textContent()).toMatch(/first recipe/);
    // At 1/80 s who stands trails a fifth of what they do at 1/15 s.
    expect(await page.getByRole('img', { name: 'The frame at 100 %' }).isVisible()).toBe(true);
    await expect.poll(() => trailPx(page)).toBeLessThan(before / 4);
  });
});
