import type { Migration } from './migration';

export const accountsAndKeys: Migration = {
  name: '0001-accounts-and-keys',
  sql: `
-- The service's clock. Tests replace this function in a database of their own.
CREATE FUNCTION service_now() RETURNS timestamptz LANGUAGE sql STABLE AS 'SELECT now()';

CREATE FUNCTION month_of(moment timestamptz) RETURNS date LANGUAGE sql IMMUTABLE
  AS $$ SELECT date_trunc('month', moment AT TIME ZONE 'UTC')::date $$;

CREATE TABLE plans (
  id text PRIMARY KEY CHECK (id ~ '^[a-z][a-z0-9-]{1,30}$'),
  title text NOT NULL,
  units_per_month bigint NOT NULL CHECK (units_per_month >= 0),
  rate_per_second integer NOT NULL CHECK (rate_per_second > 0),
  burst integer NOT NULL CHECK (burst >= rate_per_second),
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now()
);
INSERT INTO plans (id, title, units_per_month, rate_per_second, burst) VALUES
  ('starter', 'Starter', 10000, 10, 40),
  ('studio', 'Studio', 200000, 50, 200),
  ('house', 'House', 5000000, 200, 800);

CREATE TABLE accounts (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  email text NOT NULL CHECK (length(email) BETWEEN 3 AND 254),
  name text NOT NULL CHECK (length(name) BETWEEN 1 AND 100),
  password_hash text,
  roles text[] NOT NULL DEFAULT '{developer}'
    CHECK (roles <@ ARRAY['developer', 'photographer', 'educator', 'admin']),
  plan_id text NOT NULL DEFAULT 'starter' REFERENCES plans (id),
  verified_at timestamptz,
  blocked_at timestamptz,
  own_units_per_month bigint CHECK (own_units_per_month >= 0),
  own_rate_per_second integer CHECK (own_rate_per_second > 0),
  length_unit text NOT NULL DEFAULT 'metres' CHECK (length_unit IN ('metres', 'feet')),
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now()
);
CREATE UNIQUE INDEX accounts_email ON accounts (lower(email));

CREATE TABLE api_keys (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  account_id uuid NOT NULL REFERENCES accounts (id) ON DELETE CASCADE,
  kind text NOT NULL CHECK (kind IN ('server', 'page')),
  name text NOT NULL CHECK (length(name) BETWEEN 1 AND 100),
  hash bytea UNIQUE CHECK (length(hash) = 32),
  hash_version smallint NOT NULL DEFAULT 1,
  shown_prefix text,
  last_four text CHECK (length(last_four) = 4),
  scopes text[] NOT NULL DEFAULT '{*}' CHECK (cardinality(scopes) > 0),
  allowed_sites text[] NOT NULL DEFAULT '{}',
  monthly_cap bigint CHECK (monthly_cap >= 0),
  expires_at timestamptz,
  claimed_at timestamptz,
  revoked_at timestamptz,
  replaced_by uuid REFERENCES api_keys (id) ON DELETE SET NULL,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now(),
  -- A key has a secret exactly from the moment its owner generated it.
  CHECK ((hash IS NULL) = (claimed_at IS NULL)),
  CHECK ((hash IS NULL) = (shown_prefix IS NULL) AND (hash IS NULL) = (last_four IS NULL)),
  CHECK (kind = 'page' OR allowed_sites = '{}')
);
CREATE INDEX api_keys_account ON api_keys (account_id, created_at);

-- One hot row an account and month; half-empty pages keep its updates within the page.
CREATE TABLE quota_periods (
  account_id uuid NOT NULL REFERENCES accounts (id) ON DELETE CASCADE,
  month date NOT NULL,
  used bigint NOT NULL DEFAULT 0 CHECK (used >= 0),
  tokens double precision NOT NULL CHECK (tokens >= 0),
  refilled_at timestamptz NOT NULL,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now(),
  PRIMARY KEY (account_id, month)
) WITH (fillfactor = 50);

CREATE TABLE key_periods (
  key_id uuid NOT NULL REFERENCES api_keys (id) ON DELETE CASCADE,
  month date NOT NULL,
  used bigint NOT NULL DEFAULT 0 CHECK (used >= 0),
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now(),
  PRIMARY KEY (key_id, month)
) WITH (fillfactor = 50);
`,
};
