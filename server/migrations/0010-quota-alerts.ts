import type { Migration } from './migration';

/** Which alerts about a month's units an account has had, so that each is sent once. */
export const quotaAlerts: Migration = {
  name: '0010-quota-alerts',
  sql: `
CREATE TABLE quota_alerts (
  account_id uuid NOT NULL REFERENCES accounts (id) ON DELETE CASCADE,
  month date NOT NULL,
  alert text NOT NULL CHECK (alert IN ('pace', 'most', 'all')),
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now(),
  PRIMARY KEY (account_id, month, alert)
);
`,
};
