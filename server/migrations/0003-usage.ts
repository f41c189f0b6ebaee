import type { Migration } from './migration';

/**
 * What was used: hourly counts with a histogram of milliseconds, and each key's recent calls. Both are written
 * a second's worth at a time; the quota itself is counted in quota_periods before a call is served.
 */
export const usage: Migration = {
  name: '0003-usage',
  sql: `
CREATE FUNCTION add_each(a int[], b int[]) RETURNS int[] LANGUAGE sql IMMUTABLE AS $$
  SELECT array_agg(coalesce(x, 0) + coalesce(y, 0) ORDER BY no) FROM unnest(a, b) WITH ORDINALITY t (x, y, no) $$;

CREATE TABLE usage_hours (
  key_id uuid NOT NULL REFERENCES api_keys (id) ON DELETE CASCADE,
  hour timestamptz NOT NULL,
  calculator text NOT NULL CHECK (length(calculator) <= 60),
  status_class smallint NOT NULL CHECK (status_class BETWEEN 2 AND 5),
  calls integer NOT NULL CHECK (calls >= 0),
  units bigint NOT NULL CHECK (units >= 0),
  total_ms double precision NOT NULL CHECK (total_ms >= 0),
  latency int[] NOT NULL,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now(),
  PRIMARY KEY (key_id, hour, calculator, status_class)
);

-- A row holds the calls of one flush, as a list in order of time; the newest 10,000 calls of a key are kept.
CREATE TABLE request_log (
  id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  key_id uuid NOT NULL REFERENCES api_keys (id) ON DELETE CASCADE,
  last_at timestamptz NOT NULL,
  calls_held integer NOT NULL CHECK (calls_held > 0),
  calls jsonb NOT NULL,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now()
);
CREATE INDEX request_log_key ON request_log (key_id, id DESC);
CREATE INDEX request_log_age ON request_log (last_at);

CREATE TABLE plan_requests (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  account_id uuid NOT NULL REFERENCES accounts (id) ON DELETE CASCADE,
  plan_id text NOT NULL REFERENCES plans (id),
  reason text NOT NULL CHECK (length(reason) BETWEEN 1 AND 2000),
  state text NOT NULL DEFAULT 'open' CHECK (state IN ('open', 'granted', 'declined')),
  answer text CHECK (length(answer) <= 2000),
  answered_by uuid REFERENCES accounts (id) ON DELETE SET NULL,
  answered_at timestamptz,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now(),
  CHECK ((state = 'open') = (answered_at IS NULL))
);
CREATE UNIQUE INDEX plan_requests_one_open ON plan_requests (account_id) WHERE state = 'open';
CREATE INDEX plan_requests_state ON plan_requests (state, created_at);
`,
};
