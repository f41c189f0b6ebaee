import type { Migration } from './migration';

/** What the console stands on: sessions, links sent by mail, the outbox, throttles, passes, the audit trail. */
export const consoleTables: Migration = {
  name: '0004-console',
  sql: `
ALTER TABLE accounts ADD COLUMN closed_at timestamptz;

-- The Idempotency-Key under which a key was made, and what was asked for then.
ALTER TABLE api_keys ADD COLUMN asked_as text CHECK (length(asked_as) BETWEEN 1 AND 128);
ALTER TABLE api_keys ADD COLUMN asked_hash bytea CHECK (length(asked_hash) = 32);
-- Days before its expiry for which the owner was last reminded.
ALTER TABLE api_keys ADD COLUMN reminded_days smallint;
CREATE UNIQUE INDEX api_keys_asked ON api_keys (account_id, asked_as);

CREATE TABLE sessions (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  account_id uuid NOT NULL REFERENCES accounts (id) ON DELETE CASCADE,
  agent text NOT NULL CHECK (length(agent) <= 300),
  address text NOT NULL CHECK (length(address) <= 64),
  address_group text NOT NULL CHECK (length(address_group) <= 64),
  last_seen_at timestamptz NOT NULL DEFAULT service_now(),
  expires_at timestamptz NOT NULL,
  ended_at timestamptz,
  end_reason text CHECK (end_reason IN
    ('signed_out', 'ended', 'replaced', 'password', 'reuse', 'expired', 'closed', 'blocked')),
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now(),
  CHECK ((ended_at IS NULL) = (end_reason IS NULL))
);
CREATE INDEX sessions_account ON sessions (account_id, created_at);

-- Every refresh token that a session was given; each is good for one use.
CREATE TABLE session_tokens (
  hash bytea PRIMARY KEY CHECK (length(hash) = 32),
  session_id uuid NOT NULL REFERENCES sessions (id) ON DELETE CASCADE,
  used_at timestamptz,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now()
);
CREATE INDEX session_tokens_session ON session_tokens (session_id);

-- An account begins when its address is confirmed; until then the wish waits here, each with a link of its own.
CREATE TABLE sign_ups (
  hash bytea PRIMARY KEY CHECK (length(hash) = 32),
  email text NOT NULL CHECK (length(email) BETWEEN 3 AND 254),
  name text NOT NULL CHECK (length(name) BETWEEN 1 AND 100),
  password_hash text NOT NULL,
  roles text[] NOT NULL CHECK (roles <@ ARRAY['developer', 'photographer', 'educator'] AND cardinality(roles) > 0),
  expires_at timestamptz NOT NULL,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now()
);
CREATE INDEX sign_ups_email ON sign_ups (lower(email));

-- A row without an account belongs to an address that has none: the same work is done for it.
CREATE TABLE email_tokens (
  hash bytea PRIMARY KEY CHECK (length(hash) = 32),
  account_id uuid REFERENCES accounts (id) ON DELETE CASCADE,
  purpose text NOT NULL CHECK (purpose IN ('reset', 'email')),
  new_email text CHECK (length(new_email) BETWEEN 3 AND 254),
  expires_at timestamptz NOT NULL,
  used_at timestamptz,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now(),
  CHECK ((purpose = 'email') = (new_email IS NOT NULL))
);
CREATE INDEX email_tokens_account ON email_tokens (account_id);

-- The outbox, and the mail log once a mail is sent: what it said, links included, is sealed and then dropped.
CREATE TABLE mail_outbox (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  account_id uuid REFERENCES accounts (id) ON DELETE SET NULL,
  recipient text NOT NULL CHECK (length(recipient) BETWEEN 3 AND 254),
  kind text NOT NULL CHECK (kind ~ '^[a-z_]{1,40}$'),
  sealed bytea,
  next_attempt_at timestamptz NOT NULL DEFAULT service_now(),
  attempts integer NOT NULL DEFAULT 0 CHECK (attempts >= 0),
  last_error text CHECK (length(last_error) <= 200),
  expires_at timestamptz NOT NULL,
  sent_at timestamptz,
  failed_at timestamptz,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now(),
  CHECK (sent_at IS NULL OR failed_at IS NULL),
  CHECK ((sealed IS NULL) = (sent_at IS NOT NULL OR failed_at IS NOT NULL))
);
CREATE INDEX mail_outbox_waiting ON mail_outbox (next_attempt_at) WHERE sealed IS NOT NULL;
CREATE INDEX mail_outbox_age ON mail_outbox (created_at);

-- The limiter's own form of table (key, points, expire), which it fills by position.
CREATE TABLE throttles (
  key varchar(255) PRIMARY KEY,
  points integer NOT NULL DEFAULT 0,
  expire bigint,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now()
);

CREATE TABLE key_passes (
  hash bytea PRIMARY KEY CHECK (length(hash) = 32),
  key_id uuid NOT NULL REFERENCES api_keys (id) ON DELETE CASCADE,
  session_id uuid NOT NULL REFERENCES sessions (id) ON DELETE CASCADE,
  expires_at timestamptz NOT NULL,
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now()
);
CREATE INDEX key_passes_session ON key_passes (session_id);
CREATE INDEX key_passes_key ON key_passes (key_id);

-- Who did what to what, when, from where. Rows outlive what they speak of, so nothing refers to them or from them.
CREATE TABLE audit_events (
  id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  at timestamptz NOT NULL DEFAULT service_now(),
  event text NOT NULL CHECK (event ~ '^[a-z_]{1,40}$'),
  actor_id uuid,
  account_id uuid,
  subject_kind text,
  subject_id text,
  details jsonb NOT NULL DEFAULT '{}',
  address text,
  agent text,
  request_id text
);
CREATE INDEX audit_events_account ON audit_events (account_id, id DESC);

CREATE FUNCTION audit_is_append_only() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF current_setting('evenfall.forgetting', true) IS DISTINCT FROM 'on' THEN
    RAISE EXCEPTION 'audit events are only ever added' USING ERRCODE = 'insufficient_privilege';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER audit_events_stay BEFORE UPDATE OR DELETE ON audit_events
  FOR EACH ROW EXECUTE FUNCTION audit_is_append_only();
CREATE TRIGGER audit_events_all_stay BEFORE TRUNCATE ON audit_events
  FOR EACH STATEMENT EXECUTE FUNCTION audit_is_append_only();

-- The one exception: where a closed account's events came from is personal, and is forgotten with the account.
CREATE FUNCTION audit_forget(p_account uuid) RETURNS void LANGUAGE plpgsql SECURITY DEFINER
  SET search_path = public, pg_temp AS $$
BEGIN
  IF NOT EXISTS (SELECT FROM accounts WHERE id = p_account AND closed_at IS NOT NULL) THEN
    RAISE EXCEPTION 'the account is not closed' USING ERRCODE = 'insufficient_privilege';
  END IF;
  PERFORM set_config('evenfall.forgetting', 'on', true);
  UPDATE audit_events SET address = NULL, agent = NULL, details = '{}'
    WHERE (account_id = p_account OR actor_id = p_account)
      AND (address IS NOT NULL OR agent IS NOT NULL OR details <> '{}');
  PERFORM set_config('evenfall.forgetting', 'off', true);
END $$;

CREATE FUNCTION touch_updated_at() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  NEW.updated_at := service_now();
  RETURN NEW;
END $$;
CREATE TRIGGER accounts_touch BEFORE UPDATE ON accounts FOR EACH ROW EXECUTE FUNCTION touch_updated_at();
CREATE TRIGGER api_keys_touch BEFORE UPDATE ON api_keys FOR EACH ROW EXECUTE FUNCTION touch_updated_at();
CREATE TRIGGER sessions_touch BEFORE UPDATE ON sessions FOR EACH ROW EXECUTE FUNCTION touch_updated_at();
CREATE TRIGGER session_tokens_touch BEFORE UPDATE ON session_tokens FOR EACH ROW EXECUTE FUNCTION touch_updated_at();
CREATE TRIGGER email_tokens_touch BEFORE UPDATE ON email_tokens FOR EACH ROW EXECUTE FUNCTION touch_updated_at();
CREATE TRIGGER mail_outbox_touch BEFORE UPDATE ON mail_outbox FOR EACH ROW EXECUTE FUNCTION touch_updated_at();

-- meter_take for a batch in which some hashes are passes: each good pass stands for its key, and hashes that
-- mean the same key become one, since the meter counts by key. The answer is spread back over the given hashes.
CREATE FUNCTION meter_take_with_passes(p_hashes bytea[], p_keys int[], p_units int[], p_needs text[], p_sites text[])
RETURNS TABLE (verdicts text, at timestamptz, keys jsonb) LANGUAGE plpgsql AS $$
DECLARE
  v_hashes bytea[]; v_distinct bytea[]; v_keys int[];
BEGIN
  SELECT array_agg(coalesce(key.hash, h.hash) ORDER BY h.no) INTO v_hashes
  FROM unnest(p_hashes) WITH ORDINALITY h (hash, no)
  LEFT JOIN key_passes pass ON pass.hash = h.hash AND pass.expires_at > service_now()
  LEFT JOIN sessions s ON s.id = pass.session_id AND s.ended_at IS NULL AND s.expires_at > service_now()
  LEFT JOIN api_keys key ON key.id = pass.key_id AND s.id IS NOT NULL;
  v_distinct := ARRAY (SELECT DISTINCT hash FROM unnest(v_hashes) u (hash));
  SELECT array_agg(array_position(v_distinct, v_hashes[c.no]) ORDER BY c.call) INTO v_keys
  FROM unnest(p_keys) WITH ORDINALITY c (no, call);
  RETURN QUERY SELECT taken.verdicts, taken.at,
    (SELECT jsonb_agg(taken.keys -> (array_position(v_distinct, h.hash) - 1) ORDER BY h.no)
     FROM unnest(v_hashes) WITH ORDINALITY h (hash, no))
  FROM meter_take(v_distinct, v_keys, p_units, p_needs, p_sites) taken;
END $$;
`,
};
