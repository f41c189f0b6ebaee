import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { calculatorList } from '../../shared/calculators';
import { APPEARANCES } from '../../src/styles/appearance';
import { openBrowser, openScreen, visit, type WidthPx } from '../support/browser';
import { serveConsole } from '../support/consoleServer';

const WIDTHS: readonly WidthPx[] = [360, 1440];

/**
 * Pictures of every calculator's page in the three appearances and on a phone and a desk, one file each; with parts
 * of ids, of those alone. They are for eyes: no test compares them.
 */
export async function takePictures(folder: string, only: readonly string[]): Promise<void> {
  const ids = calculatorList
    .map(({ id }) => id)
    .filter((id) => only.length === 0 || only.some((part) => id.includes(part)));
  await mkdir(folder, { recursive: true });
  const served = await serveConsole();
  const browser = await openBrowser();
  try {
    for (const appearance of APPEARANCES) {
      for (const widthPx of WIDTHS) {
        const { page, end } = await visit(browser, { baseUrl: served.url, appearance, widthPx });
        for (const id of ids) {
          await openScreen(page, `/calculators/${id}`);
          const path = join(folder, `${id.replace('/', '-')}-${appearance}-${widthPx}.png`);
          await page.screenshot({ path, fullPage: true });
        }
        await end();
      }
    }
  } finally {
    await browser.close();
    await served.close();
  }
  process.stdout.write(`${folder}\n`);
}
