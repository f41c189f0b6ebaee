import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { openScreen } from '../support/browser';
import { consoleVisits } from '../support/consoleVisits';

const { visiting, url } = consoleVisits();
const textBox = (page: Page, name: string) => page.getByRole('textbox', { name, exact: true });
const radio = (page: Page, name: string) => page.getByRole('radio', { name, exact: true });
const figures = (page: Page) => page.locator('.figure').allTextContents();

it('every fault stands at its field, what was typed stays, and the answer comes back once it is mended', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/value');
    const aperture = textBox(page, 'Aperture');
    const shutter = textBox(page, 'Shutter');
    await aperture.fill('wide');
    await shutter.fill('0');
    const expected = [
      [aperture, 'Aperture takes a number such as 5.6'],
      [shutter, 'Shutter must be'],
    ] as const;
    for (const [box, words] of expected) {
      expect(await box.getAttribute('aria-invalid')).toBe('true');
      const id = (await box.getAttribute('aria-describedby')) ?? '';
      expect(await page.locator(`#${id}`).textContent()).toContain(words);
    }
    expect(await aperture.inputValue()).toBe('wide');
    expect(await page.getByText('No answer yet: 2 faults').count()).toBe(1);
    expect(await figures(page)).toEqual([]);
    await aperture.fill('5.6');
    await shutter.fill('1/60');
    // APEX: Av 5 and Tv 6 (f/5.6 stands for 4√2, 1/60 for 1/64 s).
    expect((await figures(page))[0]).toBe('11');
  });
});

it('a fault under "More" opens it', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/value?aperture=8&shutter=1/125&reflectedK=0');
    expect(await textBox(page, 'Meter constant K').isVisible()).toBe(true);
    await textBox(page, 'Meter constant K').fill('12.5');
    expect(await textBox(page, 'Meter constant K').isVisible()).toBe(true);
    expect((await figures(page))[0]).toBe('13');
  });
});

/** Presses Tab until the control of that name has the focus. */
async function tabTo(page: Page, name: string): Promise<void> {
  for (let i = 0; i < 40; i++) {
    await page.keyboard.press('Tab');
    const label = await page.evaluate(() => {
      const focused = document.activeElement as HTMLInputElement | null;
      return focused?.getAttribute('aria-label') ?? (focused?.labels?.[0] ?? focused)?.textContent.trim();
    });
    if (label === name) return;
  }
  throw new Error(`${name} is not reached by Tab`);
}

it('a calculator is played from the keyboard alone', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/solve');
    await tabTo(page, 'Skip to the content');
    await page.keyboard.press('Enter');
    await tabTo(page, 'EV at ISO 100, slider');
    for (let i = 0; i < 3; i++) await page.keyboard.press('ArrowLeft');
    // One stop less light at the same aperture and ISO: from 1/125 to 1/60.
    expect(await figures(page)).toEqual(['1/60']);
    await tabTo(page, 'Shutter');
    await page.keyboard.press('ArrowRight');
    expect(await radio(page, 'ISO').isChecked()).toBe(true);
    // EV 12 at f/8 and 1/60 (1/64 s): S = 100·64·64/4096 = 100.
    expect(await figures(page)).toEqual(['100']);
    await tabTo(page, 'Aperture');
    await page.keyboard.press('Control+A');
    await page.keyboard.type('f/4');
    expect(await figures(page)).toEqual(['25']);
    await tabTo(page, 'More');
    await page.keyboard.press('Enter');
    expect(await radio(page, 'half').isVisible()).toBe(true);
  });
});

it('whatever is left empty is solved', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/solve');
    await textBox(page, 'ISO').fill('');
    await textBox(page, 'Aperture').click();
    expect(await radio(page, 'ISO').isChecked()).toBe(true);
    expect(await textBox(page, 'Shutter').inputValue()).toBe('1/125');
    expect(await figures(page)).toEqual(['100']);
  });
});

it('the same light is asked about in another unit, or as a scene', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/light/convert');
    await radio(page, 'Illuminance').check();
    // EV 13 with C 250: 2.5·2^13 lx (ISO 2720:1974 as the calculator quotes it).
    expect(await textBox(page, 'Illuminance').inputValue()).toBe('20480');
    await openScreen(page, '/calculators/exposure/solve');
    await radio(page, 'Scene').check();
    expect(await textBox(page, 'EV at ISO 100').count()).toBe(0);
    await page.getByRole('combobox', { name: 'Scene' }).selectOption('home');
    // Rooms at home are EV 5 to 7; f/8 at EV 6 and ISO 100 asks for 64/64 s.
    expect(await figures(page)).toEqual(['1s']);
  });
});

it('the values stand in the address, leave no trail in the history, and open from there', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/value');
    const before = await page.evaluate(() => history.length);
    const slider = page.getByRole('slider', { name: 'Aperture, slider' });
    for (let i = 0; i < 6; i++) await slider.press('ArrowRight');
    await textBox(page, 'Neutral density').fill('3');
    await page.waitForURL(/ndStops=3/);
    expect(await page.evaluate(() => history.length)).toBe(before);
    const sent = page.url();
    expect(new URL(sent).searchParams.get('aperture')).toBe('f/4');
    const told = await figures(page);
    await visiting({ widthPx: 360 }, async (other) => {
      await openScreen(other, sent);
      expect(await textBox(other, 'Aperture').inputValue()).toBe('f/4');
      expect(await textBox(other, 'Neutral density').inputValue()).toBe('3');
      expect(await figures(other)).toEqual(told);
    });
  });
});

it('what an address got wrong is told with the name that comes near', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/value?aperture=8&shutter=1/125&izo=200');
    expect(await page.locator('#stray-faults').textContent()).toMatch(/izo.*is not a field here.*iso/);
  });
});

it('another address for the same calculator fills the form anew', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/value?aperture=f/4&shutter=1/125');
    await page.evaluate(() => history.pushState({}, '', '?aperture=f/11&shutter=1/125'));
    await page.evaluate(() => dispatchEvent(new PopStateEvent('popstate', { state: {} })));
    await expect.poll(() => textBox(page, 'Aperture').inputValue()).toBe('f/11');
  });
});

it('a chosen equivalent becomes the settings to go on from', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/equivalents');
    expect(await radio(page, 'f/8, 1/125, ISO 100').isChecked()).toBe(true);
    await radio(page, 'f/4, 1/500, ISO 100').check();
    expect(await textBox(page, 'Aperture').inputValue()).toBe('f/4');
    expect(await textBox(page, 'Shutter').inputValue()).toBe('1/500');
    expect((await figures(page))[0]).toBe('13');
  });
});

it('what may be left out is removed and added again', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/equivalents');
    const rows = page.locator('.answer tbody tr:has(input)');
    expect(await rows.count()).toBe(4);
    await page.getByRole('button', { name: 'Remove limits' }).click();
    // Full stops of f/1 to f/32 whose time lies within 1/8000 and 30s at EV 13: all eleven but none slower.
    expect(await rows.count()).toBe(11);
    await page.getByRole('button', { name: 'Add limits' }).click();
    expect(await textBox(page, 'Widest aperture optional').inputValue()).toBe('f/4');
    expect(await rows.count()).toBe(4);
  });
});

it('items are added to a list and taken out of it', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/light/add');
    const items = page.locator('form ol > li');
    const before = await items.count();
    await page.getByRole('button', { name: 'Add another' }).click();
    expect(await items.count()).toBe(before + 1);
    await items
      .last()
      .getByRole('button', { name: /^Remove/ })
      .last()
      .click();
    expect(await items.count()).toBe(before);
  });
});

it('the call is shown with the values on the page', async () => {
  await visiting({}, async (page) => {
    await openScreen(page, '/calculators/exposure/value');
    await textBox(page, 'ISO').fill('640');
    const code = page.locator('.call code');
    expect(await code.textContent()).toContain('"iso":640');
    await radio(page, 'Python').check();
    expect(await code.textContent()).toContain('"iso": 640,');
    expect(await code.textContent()).toContain(`${url()}/v1/exposure/value`);
  });
});
