import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { calculatorList } from '../../shared/calculators';
import { openScreen } from '../support/browser';
import { consoleVisits } from '../support/consoleVisits';

const { visiting } = consoleVisits();

/** One stop of the Tab key: what has the focus, and whether one sees that it has. */
interface Stop {
  readonly name: string;
  readonly isRinged: boolean;
}

/** Marks each control after the page's heading that the Tab key should reach; gives the marks in their order. */
function markControls(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const radios = new Set<string>();
    const heading = document.querySelector('main h1');
    const names: string[] = [];
    const all = 'main :is(a[href], button, input, select, textarea, summary, [tabindex="0"])';
    for (const control of document.querySelectorAll<HTMLElement>(all)) {
      const { disabled, type, name, tabIndex } = control as HTMLInputElement;
      // One of a group of radio buttons stands for all.
      if (disabled || tabIndex < 0 || (type === 'radio' && radios.has(name))) continue;
      if (type === 'radio') radios.add(name);
      const isAfter = heading?.compareDocumentPosition(control) === Node.DOCUMENT_POSITION_FOLLOWING;
      if (!isAfter || !control.checkVisibility()) continue;
      control.dataset.stop = type === 'radio' ? name : String(names.length);
      names.push(control.dataset.stop);
    }
    return names;
  });
}

/** What has the focus now; null outside of the main part. */
function stopNow(page: Page): Promise<Stop | null> {
  return page.evaluate(() => {
    const held = document.activeElement as HTMLInputElement | null;
    if (!held?.closest('main')) return null;
    const group = document.querySelector<HTMLInputElement>(`main input[type=radio][name="${held.name}"]`);
    const name =
      held.type === 'radio' ? (held.name ?? '') : (held.dataset.stop ?? held.outerHTML.slice(0, 80));
    // The ring may be drawn by what stands for a control that is itself not seen.
    const drawn = [held, held.parentElement, held.nextElementSibling, held.closest('label'), group];
    const isRinged = drawn.some((element) => {
      if (!element) return false;
      const { outlineStyle, outlineWidth, boxShadow } = getComputedStyle(element);
      return (outlineStyle !== 'none' && Number.parseFloat(outlineWidth) > 0) || boxShadow !== 'none';
    });
    return { name, isRinged };
  });
}

it.each(calculatorList.map(({ id }) => id))(
  'every control of %s is reached by the Tab key alone, in order, and one sees which has the focus',
  async (id) => {
    await visiting({}, async (page) => {
      await openScreen(page, `/calculators/${id}`);
      await page.locator('.answer').first().waitFor();
      const controls = await markControls(page);
      expect(controls.length).toBeGreaterThan(3);
      const stops: Stop[] = [];
      await page.evaluate(() => document.querySelector<HTMLElement>('main h1')?.focus());
      for (let i = 0; i <= controls.length + 2; i += 1) {
        await page.keyboard.press('Tab');
        const stop = await stopNow(page);
        if (!stop) break;
        stops.push(stop);
      }
      expect(stops.filter(({ isRinged }) => !isRinged).map(({ name }) => name)).toEqual([]);
      // None left out, and the focus goes on out of the page: no trap.
      expect(stops.map(({ name }) => name)).toEqual(controls);
    });
  },
);
