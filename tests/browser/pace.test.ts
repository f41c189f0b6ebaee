import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { calculatorList } from '../../shared/calculators';
import { openScreen } from '../support/browser';
import { consoleVisits } from '../support/consoleVisits';

const { visiting } = consoleVisits();

/** A frame of a display that shows sixty a second. */
const FRAME_MS = 16;
const CHANGES = 10;
/** The best of these counts: whatever else the machine does only ever adds to the page's own work. */
const ROUNDS = 3;

/** Changes the first slider, else the first number, to and fro; each change ends before the next begins. */
function changeOften(page: Page): Promise<boolean> {
  return page.evaluate(async (changes) => {
    const slider = document.querySelector<HTMLInputElement>('form input[type=range]:not(:disabled)');
    const control = slider ?? document.querySelector<HTMLInputElement>('form input.ant-input');
    if (!control) return false;
    const first = Number(control.value);
    const other = slider ? first + (first > 0 ? -1 : 1) : Number((first * 1.01).toPrecision(6));
    for (let i = 0; i < changes; i++) {
      control.value = String(i % 2 ? first : other);
      control.dispatchEvent(new Event('input', { bubbles: true }));
      await new Promise((resolve) => requestAnimationFrame(resolve));
    }
    return true;
  }, CHANGES);
}

/**
 * Milliseconds of the processor for one change, until answer and drawings are laid out: the page's own work alone,
 * however busy other programs keep the machine.
 */
async function workOfChange(page: Page): Promise<number> {
  const client = await page.context().newCDPSession(page);
  await client.send('Performance.enable', { timeDomain: 'threadTicks' });
  const worked = async () => {
    const { metrics } = await client.send('Performance.getMetrics');
    return metrics.find(({ name }) => name === 'TaskDuration')?.value ?? Number.NaN;
  };
  expect(await changeOften(page)).toBe(true);
  let least = Infinity;
  for (let round = 0; round < ROUNDS; round += 1) {
    const before = await worked();
    await changeOften(page);
    least = Math.min(least, ((await worked()) - before) * (1000 / CHANGES));
  }
  return least;
}

/** A search over thousands of combinations; its answer may take two frames. */
const SEARCHES = new Set(['fill/recipes']);

it.each(calculatorList.map(({ id }) => id).filter((id) => id !== 'light/scenes'))(
  '%s answers and draws a change within a frame, a search within two',
  async (id) => {
    await visiting({}, async (page) => {
      await openScreen(page, `/calculators/${id}`);
      await page.locator('.answer figure').first().waitFor();
      const workMs = await workOfChange(page);
      expect(workMs).toBeGreaterThan(0);
      expect(workMs).toBeLessThan(FRAME_MS * (SEARCHES.has(id) ? 2 : 1));
    });
  },
);
