import type { Migration } from './migration';

/**
 * Units that were given back because we failed the call. A refund is sent again when nobody knows whether it was
 * written, so each is written down with the id under which it came, in the statement that gives the units back.
 * Rows are taken in the order in which the meter locks them: accounts first, then months.
 */
export const refunds: Migration = {
  name: '0007-refunds',
  sql: `
CREATE TABLE meter_refunds (
  id uuid PRIMARY KEY,
  account_id uuid NOT NULL REFERENCES accounts (id) ON DELETE CASCADE,
  key_id uuid NOT NULL REFERENCES api_keys (id) ON DELETE CASCADE,
  granted_at timestamptz NOT NULL,
  units integer NOT NULL CHECK (units > 0),
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now()
);
CREATE INDEX meter_refunds_account ON meter_refunds (account_id, created_at);

CREATE FUNCTION meter_refund(p_ids uuid[], p_accounts uuid[], p_keys uuid[], p_granted_at timestamptz[], p_units int[])
RETURNS void LANGUAGE plpgsql AS $$
DECLARE r record;
BEGIN
  FOR r IN
    WITH fresh AS (
      INSERT INTO meter_refunds (id, account_id, key_id, granted_at, units)
      SELECT s.id, s.account_id, s.key_id, s.granted_at, s.units
      FROM unnest(p_ids, p_accounts, p_keys, p_granted_at, p_units) s (id, account_id, key_id, granted_at, units)
      JOIN api_keys k ON k.id = s.key_id AND k.account_id = s.account_id
      ON CONFLICT DO NOTHING
      RETURNING account_id, key_id, granted_at, units
    )
    SELECT * FROM fresh ORDER BY account_id, month_of(granted_at), key_id
  LOOP
    PERFORM meter_give_back(r.account_id, r.key_id, r.granted_at, r.units);
  END LOOP;
END $$;
`,
};
