import { TEST_SETTINGS, type TestSettings } from '../../server/scripts/support/testSettings';

export type { TestSettings };

/** What the runner has set up. A test that needs it can't run under bare vitest, and says so. */
export function testSettings(): TestSettings {
  const text = process.env[TEST_SETTINGS];
  if (!text) throw new Error('This test needs a database: run it by `npm test -- PATH`');
  return JSON.parse(text) as TestSettings;
}
