import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { calculatorList } from '../../shared/calculators';
import { contrastViolationsOn, openScreen, violationsOn } from '../support/browser';
import { consoleVisits } from '../support/consoleVisits';

const { visiting, open } = consoleVisits();

const SCREENS = [
  ['the landing page', '/'],
  ['the list', '/calculators'],
  ['a plain calculator', '/calculators/exposure/value'],
  ['a calculator that solves', '/calculators/exposure/solve'],
  ['a long choice', '/calculators/exposure/solve?scene=home&aperture=f/4&iso=400'],
  ['equivalents', '/calculators/exposure/equivalents'],
  ['a difference', '/calculators/exposure/difference'],
  ['a calculator with nested and repeated fields', '/calculators/flash/daylight'],
  ['a form full of faults', '/calculators/exposure/value?aperture=abc&shutter=-1&apperture=8'],
  ['nothing', '/no/such/screen'],
] as const;

/** Controls under 24 by 24 CSS px (WCAG 2.2, 2.5.8); those that are not on show have no box. */
function tooSmallToTouch(page: Page): Promise<string[]> {
  return page.evaluate(() =>
    [...document.querySelectorAll('main button, main input, main summary, header a, header button')]
      .map((element) => ({ element, box: element.getBoundingClientRect() }))
      .filter(({ box }) => box.width > 0 && (box.height < 24 || box.width < 24))
      // In a row that is a target as a whole, and in a select whose frame is.
      .filter(({ element }) => !element.closest('tr, .ant-select'))
      .map(({ element }) => element.outerHTML),
  );
}

it.each(SCREENS)(
  '%s is free of faults that axe can find, at 1440 and at 360 px, and legible in every appearance',
  async (_, path) => {
    await visiting({ widthPx: 1440, appearance: 'day' }, async (page) => {
      await openScreen(page, path);
      expect(await violationsOn(page), 'at 1440 px').toEqual([]);
      await page.setViewportSize({ width: 360, height: 740 });
      expect(await violationsOn(page), 'at 360 px').toEqual([]);
      expect(await page.evaluate(() => document.documentElement.scrollWidth), 'width').toBe(360);
      expect(await tooSmallToTouch(page), 'targets').toEqual([]);
      for (const name of ['Dusk', 'Dark-adapted']) {
        await page.getByRole('radio', { name }).check();
        expect(await contrastViolationsOn(page), name).toEqual([]);
      }
    });
  },
  40_000,
);

it.each(calculatorList.map(({ id, title }) => [id, title] as const))(
  '%s opens with its example and answers at once',
  async (id, title) => {
    await visiting({}, async (page) => {
      await page.goto(`/calculators/${id}`);
      await page.getByRole('table').first().waitFor();
      expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe(title);
      expect(await page.title()).toBe(`${title} · Evenfall`);
      expect(await page.locator('[aria-invalid=true]').count()).toBe(0);
      expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(1440);
      await page.setViewportSize({ width: 360, height: 740 });
      // Drawings are laid out anew in the frame after.
      await expect.poll(() => page.evaluate(() => document.documentElement.scrollWidth)).toBe(360);
    });
  },
);

it.each(['/no/such/screen', '/calculators/exposure/nothing'])(
  '%s leads nowhere and says so',
  async (path) => {
    await visiting({}, async (page) => {
      await openScreen(page, path);
      expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe(
        'Nothing stands at this address',
      );
    });
  },
);

it('a screen whose files do not come says so, and keeps the rest of the page', async () => {
  const { page, end } = await open();
  await openScreen(page, '/');
  await page.route('**/assets/CalculatorListView*', (route) => route.abort());
  await page.getByRole('link', { name: 'Calculators', exact: true }).click();
  await page.getByRole('heading', { name: 'This screen stopped' }).waitFor();
  expect(await page.getByRole('link', { name: 'Evenfall' }).isVisible()).toBe(true);
  await end();
});

it('an appearance follows the system until one is chosen, which then stays over a reload', async () => {
  await visiting({ systemPrefers: 'dark' }, async (page) => {
    const ground = () => page.evaluate(() => getComputedStyle(document.body).backgroundColor);
    await openScreen(page, '/');
    expect(await ground()).toBe('rgb(13, 23, 31)');
    await page.getByRole('radio', { name: 'Dark-adapted' }).check();
    expect(await ground()).toBe('rgb(0, 0, 0)');
    await page.reload();
    expect(await ground()).toBe('rgb(0, 0, 0)');
    await openScreen(page, '/calculators/exposure/value');
    const box = page.getByRole('textbox', { name: 'Aperture' });
    expect(await box.evaluate((input) => getComputedStyle(input).color)).toBe('rgb(244, 0, 0)');
  });
});
