import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect } from 'vitest';
import { openBrowser, visit, type Visit, type VisitOptions } from './browser';
import { serveConsole, type ServedConsole } from './consoleServer';

export type Given = Omit<VisitOptions, 'baseUrl'>;

export interface ConsoleVisits {
  url(): string;
  /** A visit that the test ends itself, and whose complaints it judges itself. */
  open(given?: Given): Promise<Visit>;
  /** Runs a visit and ends it; a page that complained fails the test. */
  visiting(given: Given, during: (page: Page, visit: Visit) => Promise<void>): Promise<void>;
}

/** One served console and one Chromium for a file of tests, a context for each visit. */
export function consoleVisits(serve: () => Promise<ServedConsole> = () => serveConsole()): ConsoleVisits {
  let browser: Browser;
  let served: ServedConsole;

  beforeAll(async () => {
    served = await serve();
    browser = await openBrowser();
  }, 120_000);

  afterAll(async () => {
    await browser?.close();
    await served?.close();
  });

  const open = (given: Given = {}) => visit(browser, { baseUrl: served.url, ...given });
  return {
    url: () => served.url,
    open,
    async visiting(given, during) {
      const visitor = await open(given);
      try {
        await during(visitor.page, visitor);
        expect(visitor.complaints).toEqual([]);
      } finally {
        await visitor.end();
      }
    },
  };
}
