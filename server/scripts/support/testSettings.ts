/** What `npm test` sets up and hands to the tests, as JSON in one environment variable. */
export type TestSettings = {
  /** For making and dropping databases. */
  adminUrl: string;
  ownerUrl: string;
  serviceUrl: string;
  /** A migrated, empty database to be cloned; every test database's name starts with the prefix. */
  template: string;
  prefix: string;
  /** The built server: its workers, and scripts that a test may start as processes of their own. */
  serverFolder: string;
  /** The built console, where a browser test was selected. */
  clientFolder: string | null;
  chromium: string | null;
  /** For what the workers of one run want to gather; gone when the run ends. */
  runFolder: string;
  /** Whether all tests run, so that what no test touched can be told. */
  isWhole: boolean;
};

export const TEST_SETTINGS = 'EVENFALL_TEST';
/** Where the reporter leaves the counts of a run. */
export const TEST_COUNTS = 'EVENFALL_TEST_COUNTS';

export type Counts = { passed: number; failed: number; skipped: number };
export type CountsByKind = Readonly<Record<string, Counts>>;
