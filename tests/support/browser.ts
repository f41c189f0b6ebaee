import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { AxeResults, RunOptions } from 'axe-core';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import type { Appearance } from '../../src/styles/appearance';

const CHROMIUM = '/usr/bin/chromium';
const ARGUMENTS = [
  '--headless',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

const AXE = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

export type WidthPx = 360 | 1440;

export interface VisitOptions {
  readonly baseUrl: string;
  readonly widthPx?: WidthPx;
  /** What was chosen on an earlier visit; none leaves it to the system's preference. */
  readonly appearance?: Appearance;
  readonly systemPrefers?: 'light' | 'dark';
  /** Statuses of refusals that the visit provokes; any other is a complaint. */
  readonly refusals?: readonly number[];
  /** Lets the service worker be installed; other visits need not fetch the whole console each time. */
  readonly isKept?: boolean;
}

/** What Playwright itself writes where service workers are blocked. */
const BLOCKED = 'Service Worker registration blocked by Playwright';

/** What Chromium writes to the console for each answer of 400 and above. */
const REFUSED = /^Failed to load resource: the server responded with a status of (\d+)/;

/** One visitor: a context of its own, with everything noted that a page must not do. */
export interface Visit {
  readonly page: Page;
  readonly context: BrowserContext;
  /** Console errors, exceptions, broken policies and failed fetches, in words; empty where all is well. */
  readonly complaints: readonly string[];
  end(): Promise<void>;
}

/** Debian's Chromium, started once for a file of tests. */
export function openBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: CHROMIUM, args: ARGUMENTS });
}

/** Opens a context and a page that notes its complaints from the first byte on. */
export async function visit(
  browser: Browser,
  {
    baseUrl,
    widthPx = 1440,
    appearance,
    systemPrefers = 'light',
    refusals = [],
    isKept = false,
  }: VisitOptions,
): Promise<Visit> {
  const context = await browser.newContext({
    baseURL: baseUrl,
    viewport: { width: widthPx, height: widthPx < 500 ? 740 : 900 },
    colorScheme: systemPrefers,
    locale: 'en-US',
    hasTouch: widthPx < 500,
    serviceWorkers: isKept ? 'allow' : 'block',
  });
  const complaints: string[] = [];
  await context.exposeFunction('noteViolation', (text: string) => complaints.push(`policy: ${text}`));
  await context.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) =>
      (window as unknown as { noteViolation(text: string): void }).noteViolation(
        `${event.violatedDirective} ${event.blockedURI}`,
      ),
    );
  });
  if (appearance)
    await context.addInitScript((name) => {
      // A page without an address has no storage.
      if (location.protocol === 'about:') return;
      if (localStorage.getItem('evenfall.appearance') === null)
        localStorage.setItem('evenfall.appearance', name);
    }, appearance);
  const page = await context.newPage();
  page.setDefaultTimeout(5_000);
  page.on('console', (message) => {
    if (message.type() !== 'error' && message.type() !== 'warning') return;
    if (message.text() === BLOCKED) return;
    if (refusals.includes(Number(REFUSED.exec(message.text())?.[1]))) return;
    complaints.push(`console: ${message.text()}`);
  });
  page.on('pageerror', (error) => complaints.push(`exception: ${error.message}`));
  page.on('response', (response) => {
    if (response.status() >= 400 && !refusals.includes(response.status()))
      complaints.push(`${response.status()}: ${response.url()}`);
  });
  return { page, context, complaints, end: () => context.close() };
}

/** Opens a screen and waits until its heading stands and its files have come. */
export async function openScreen(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await page.locator('main h1').waitFor();
  await page.waitForLoadState('networkidle');
}

/** What axe finds wrong on the page as it stands, one line a node. */
export async function violationsOn(page: Page, options: RunOptions = {}): Promise<string[]> {
  if (!(await page.evaluate(() => 'axe' in window))) await page.evaluate(AXE);
  const results = await page.evaluate(
    (given) => (window as unknown as { axe: { run(o: RunOptions): Promise<AxeResults> } }).axe.run(given),
    { resultTypes: ['violations' as const], ...options },
  );
  return results.violations.flatMap(({ id, help, nodes }) =>
    nodes.map(
      ({ target, failureSummary }) => `${id} (${help}) at ${target.join(' ')}: ${failureSummary ?? ''}`,
    ),
  );
}

/** Contrast alone, for the appearances in which a screen was not looked at whole. */
export function contrastViolationsOn(page: Page): Promise<string[]> {
  return violationsOn(page, { runOnly: { type: 'rule', values: ['color-contrast'] } });
}
