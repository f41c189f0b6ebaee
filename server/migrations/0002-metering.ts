import type { Migration } from './migration';

/**
 * meter_take decides a whole batch of calls in one statement. For each call, in order of arrival: is the key
 * good, is the scope held, is the site listed, is there a rate token, and do the account's quota and the key's
 * cap have room for all of its units. A call takes all of its units or none.
 *
 * Verdicts, a letter a call: g granted, i key not known, r revoked, e expired, b account blocked, s scope
 * missing, o site not listed, l rate limited, q quota exhausted, c key's cap reached.
 *
 * Locks are taken in one order everywhere, account rows before key rows, each by id, so that batches of
 * several processes can't wait for each other in a circle.
 */
export const metering: Migration = {
  name: '0002-metering',
  sql: `
CREATE FUNCTION meter_take(p_hashes bytea[], p_keys int[], p_units int[], p_needs text[], p_sites text[])
RETURNS TABLE (verdicts text, at timestamptz, keys jsonb) LANGUAGE plpgsql AS $$
DECLARE
  v_now timestamptz := service_now();
  v_month date := month_of(v_now);
  k_id uuid[]; k_account uuid[]; k_state text[]; k_cap bigint[]; k_scopes text[]; k_sites text[]; k_kind text[];
  k_used bigint[]; k_no int[]; k_granted boolean[];
  a_id uuid[]; a_limit bigint[]; a_rate int[]; a_burst int[];
  a_used bigint[]; a_tokens double precision[];
  r record; n int; i int; j int; k int; a int; u int; v text; v_out text := ''; need text;
BEGIN
  SELECT array_agg(key.id ORDER BY h.no), array_agg(key.account_id ORDER BY h.no), array_agg(key.kind ORDER BY h.no),
    array_agg(CASE WHEN key.id IS NULL THEN 'i' WHEN key.revoked_at IS NOT NULL THEN 'r'
      WHEN key.expires_at <= v_now THEN 'e' WHEN acc.blocked_at IS NOT NULL THEN 'b' ELSE 'g' END ORDER BY h.no),
    array_agg(key.monthly_cap ORDER BY h.no),
    array_agg(' ' || array_to_string(key.scopes, ' ') || ' ' ORDER BY h.no),
    array_agg(' ' || array_to_string(key.allowed_sites, ' ') || ' ' ORDER BY h.no)
  INTO k_id, k_account, k_kind, k_state, k_cap, k_scopes, k_sites
  FROM unnest(p_hashes) WITH ORDINALITY h (hash, no)
  LEFT JOIN api_keys key ON key.hash = h.hash LEFT JOIN accounts acc ON acc.id = key.account_id;

  SELECT array_agg(acc.id ORDER BY acc.id), array_agg(coalesce(acc.own_units_per_month, plan.units_per_month) ORDER BY acc.id),
    array_agg(coalesce(acc.own_rate_per_second, plan.rate_per_second) ORDER BY acc.id),
    array_agg(CASE WHEN acc.own_rate_per_second IS NULL THEN plan.burst ELSE acc.own_rate_per_second * 4 END ORDER BY acc.id)
  INTO a_id, a_limit, a_rate, a_burst
  FROM accounts acc JOIN plans plan ON plan.id = acc.plan_id
  WHERE acc.id IN (SELECT account FROM unnest(k_account, k_state) s (account, state) WHERE state = 'g');

  n := coalesce(array_length(a_id, 1), 0);
  IF n > 0 THEN
    LOOP
      i := 0;
      FOR r IN SELECT q.account_id, q.used, q.tokens, q.refilled_at FROM quota_periods q
        WHERE q.month = v_month AND q.account_id = ANY (a_id) ORDER BY q.account_id FOR UPDATE LOOP
        i := i + 1;
        a := array_position(a_id, r.account_id);
        a_used[a] := r.used;
        -- A bucket refills by the time gone since it last did; a clock that went back refills nothing.
        a_tokens[a] := least(a_burst[a], r.tokens + a_rate[a] * greatest(0, extract(epoch FROM v_now - r.refilled_at)));
      END LOOP;
      EXIT WHEN i = n;
      INSERT INTO quota_periods (account_id, month, tokens, refilled_at)
        SELECT s.id, v_month, s.burst, v_now FROM unnest(a_id, a_burst) s (id, burst) ORDER BY s.id ON CONFLICT DO NOTHING;
    END LOOP;
    FOR k IN 1 .. array_length(k_id, 1) LOOP
      k_no[k] := array_position(a_id, k_account[k]);
      k_used[k] := 0;
      k_granted[k] := false;
    END LOOP;
    INSERT INTO key_periods (key_id, month)
      SELECT s.id, v_month FROM unnest(k_id, k_state) s (id, state)
      WHERE state = 'g' AND NOT EXISTS (SELECT FROM key_periods p WHERE p.key_id = s.id AND p.month = v_month)
      ORDER BY s.id ON CONFLICT DO NOTHING;
    FOR r IN SELECT p.key_id, p.used FROM key_periods p
      WHERE p.month = v_month AND p.key_id = ANY (k_id) ORDER BY p.key_id FOR UPDATE LOOP
      k_used[array_position(k_id, r.key_id)] := r.used;
    END LOOP;
  END IF;

  FOR i IN 1 .. array_length(p_keys, 1) LOOP
    k := p_keys[i]; u := p_units[i]; v := k_state[k];
    IF v = 'g' THEN
      IF k_kind[k] = 'page' AND (p_sites[i] = '' OR position(' ' || p_sites[i] || ' ' IN k_sites[k]) = 0) THEN v := 'o';
      ELSIF k_scopes[k] <> ' * ' AND p_needs[i] <> '' THEN
        FOREACH need IN ARRAY string_to_array(p_needs[i], ' ') LOOP
          IF position(' ' || need || ' ' IN k_scopes[k]) = 0
            AND position(' ' || split_part(need, '/', 1) || ' ' IN k_scopes[k]) = 0 THEN v := 's'; END IF;
        END LOOP;
      END IF;
    END IF;
    IF v = 'g' THEN
      a := k_no[k];
      IF a_tokens[a] < 1 THEN v := 'l';
      ELSE
        a_tokens[a] := a_tokens[a] - 1;
        IF u > 0 AND a_used[a] + u > a_limit[a] THEN v := 'q';
        ELSIF u > 0 AND k_used[k] + u > k_cap[k] THEN v := 'c';
        ELSE
          a_used[a] := a_used[a] + u;
          k_used[k] := k_used[k] + u;
          k_granted[k] := true;
        END IF;
      END IF;
    END IF;
    v_out := v_out || v;
  END LOOP;

  IF n > 0 THEN
    UPDATE quota_periods q SET used = s.used, tokens = s.tokens, refilled_at = greatest(q.refilled_at, v_now), updated_at = v_now
      FROM unnest(a_id, a_used, a_tokens) s (id, used, tokens) WHERE q.account_id = s.id AND q.month = v_month;
    UPDATE key_periods p SET used = s.used, updated_at = v_now
      FROM unnest(k_id, k_used, k_granted) s (id, used, granted) WHERE p.key_id = s.id AND p.month = v_month AND s.granted;
  END IF;

  RETURN QUERY SELECT v_out, v_now, (
    SELECT jsonb_agg(CASE WHEN k_state[s.no] = 'g' THEN jsonb_build_object('id', k_id[s.no], 'account', k_account[s.no],
      'limit', a_limit[k_no[s.no]], 'used', a_used[k_no[s.no]], 'cap', k_cap[s.no], 'keyUsed', k_used[s.no],
      'rate', a_rate[k_no[s.no]], 'burst', a_burst[k_no[s.no]], 'tokens', a_tokens[k_no[s.no]], 'scopes', btrim(k_scopes[s.no]))
      ELSE jsonb_build_object('id', k_id[s.no], 'account', k_account[s.no]) END ORDER BY s.no)
    FROM generate_series(1, array_length(p_hashes, 1)) s (no));
END $$;

-- Units given back for calls that we failed after they were granted; never below nothing.
CREATE FUNCTION meter_give_back(p_account uuid, p_key uuid, p_granted_at timestamptz, p_units int)
RETURNS void LANGUAGE plpgsql AS $$
BEGIN
  UPDATE quota_periods SET used = greatest(0, used - p_units), updated_at = service_now()
    WHERE account_id = p_account AND month = month_of(p_granted_at);
  UPDATE key_periods SET used = greatest(0, used - p_units), updated_at = service_now()
    WHERE key_id = p_key AND month = month_of(p_granted_at);
END $$;
`,
};
