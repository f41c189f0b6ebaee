import type { Migration } from './migration';

/**
 * meter_take decides a whole batch of calls in one statement. For each call, in order of arrival: is the key
 * good, is the scope held, is the site listed, is there a rate token, and do the account's quota and the key's
 * cap have room for all of its units. A call takes all of its units or none.
 *
 * Verdicts, a letter a call: g granted, i key not known, r revoked, e expired, b account blocked, s scope
 * missing, o site not listed, l rate limited, q quota exhausted, c key's cap reached.
 *
 * Rows that are missing in a new month are made before any lock is taken, and the accounts' rows are locked in
 * order of their ids, so that batches of several processes can't wait for each other in a circle. A key's row is
 * only ever changed under its account's lock.
 *
 * The planner is told to keep its plans: it learns nothing from the parameters' lengths, and planning anew takes
 * longer than the work.
 */
export const metering: Migration = {
  name: '0002-metering',
  sql: `
CREATE FUNCTION meter_take(p_hashes bytea[], p_keys int[], p_units int[], p_needs text[], p_sites text[],
  OUT verdicts text, OUT at timestamptz, OUT keys json)
LANGUAGE plpgsql SET plan_cache_mode = force_generic_plan AS $$
DECLARE
  v_month date;
  -- Whole from the start, since unnest goes by place and not by subscript.
  k_state text[] := array_fill('i'::text, ARRAY[cardinality(p_hashes)]);
  k_id uuid[] := array_fill(NULL::uuid, ARRAY[cardinality(p_hashes)]);
  k_taken bigint[] := array_fill(NULL::bigint, ARRAY[cardinality(p_hashes)]);
  k_account uuid[]; k_slot int[]; k_cap bigint[]; k_used bigint[]; k_seen json[];
  k_scopes text[]; k_sites text[];
  a_id uuid[]; a_is_new boolean[]; a_limit bigint[]; a_rate int[]; a_burst int[]; a_used bigint[]; a_tokens double precision[];
  r record; i int; k int; a int; n int := 0; u int; v text; need text; has_cap boolean := false;
BEGIN
  at := service_now();
  v_month := month_of(at);
  verdicts := '';

  FOR r IN SELECT h.no, key.id, key.account_id, key.kind, key.monthly_cap, key.scopes, key.allowed_sites,
      CASE WHEN key.revoked_at IS NOT NULL THEN 'r' WHEN key.expires_at <= at THEN 'e'
        WHEN acc.blocked_at IS NOT NULL THEN 'b' ELSE 'g' END AS state,
      coalesce(acc.own_units_per_month, plan.units_per_month) AS units,
      coalesce(acc.own_rate_per_second, plan.rate_per_second) AS rate,
      coalesce(acc.own_rate_per_second * 4, plan.burst) AS burst,
      q.account_id IS NULL AS is_new
    FROM unnest(p_hashes) WITH ORDINALITY h (hash, no)
    JOIN api_keys key ON key.hash = h.hash JOIN accounts acc ON acc.id = key.account_id JOIN plans plan ON plan.id = acc.plan_id
    LEFT JOIN quota_periods q ON q.account_id = acc.id AND q.month = v_month
  LOOP
    k := r.no; k_state[k] := r.state; k_id[k] := r.id; k_account[k] := r.account_id;
    IF r.state = 'g' THEN
      a := array_position(a_id, r.account_id);
      IF a IS NULL THEN
        n := n + 1; a := n;
        a_id[a] := r.account_id; a_is_new[a] := r.is_new; a_limit[a] := r.units; a_rate[a] := r.rate; a_burst[a] := r.burst;
      END IF;
      k_slot[k] := a; k_taken[k] := 0; k_used[k] := 0; k_cap[k] := r.monthly_cap;
      has_cap := has_cap OR r.monthly_cap IS NOT NULL;
      k_scopes[k] := ' ' || array_to_string(r.scopes, ' ') || ' ';
      -- Null for a server key, which no site restricts.
      k_sites[k] := CASE WHEN r.kind = 'page' THEN ' ' || array_to_string(r.allowed_sites, ' ') || ' ' END;
    END IF;
  END LOOP;

  IF true = ANY (a_is_new) THEN
    -- A new month is no new burst: the bucket goes on from the month before, where there is one.
    INSERT INTO quota_periods (account_id, month, tokens, refilled_at)
      SELECT s.id, v_month, least(s.burst, coalesce(p.tokens, s.burst)), least(at, coalesce(p.refilled_at, at))
      FROM unnest(a_id, a_burst) s (id, burst)
      LEFT JOIN quota_periods p ON p.account_id = s.id AND p.month = (v_month - interval '1 month')::date
      ORDER BY s.id ON CONFLICT DO NOTHING;
  END IF;
  IF n > 0 THEN
    FOR r IN SELECT q.account_id, q.used, q.tokens, q.refilled_at FROM quota_periods q
      WHERE q.month = v_month AND q.account_id = ANY (a_id) ORDER BY q.account_id FOR UPDATE LOOP
      a := array_position(a_id, r.account_id);
      a_used[a] := r.used;
      -- A bucket refills by the time gone since it last did; a clock that went back refills nothing.
      a_tokens[a] := least(a_burst[a], r.tokens + a_rate[a] * greatest(0, extract(epoch FROM at - r.refilled_at)));
    END LOOP;
  END IF;
  IF has_cap THEN
    FOR r IN SELECT p.key_id, p.used FROM key_periods p WHERE p.month = v_month AND p.key_id = ANY (k_id) LOOP
      k_used[array_position(k_id, r.key_id)] := r.used;
    END LOOP;
  END IF;

  FOR i IN 1 .. cardinality(p_keys) LOOP
    k := p_keys[i]; u := p_units[i]; v := k_state[k];
    IF v = 'g' THEN
      IF k_sites[k] IS NOT NULL AND (p_sites[i] = '' OR position(' ' || p_sites[i] || ' ' IN k_sites[k]) = 0) THEN v := 'o';
      ELSIF k_scopes[k] <> ' * ' AND p_needs[i] <> '' THEN
        FOREACH need IN ARRAY string_to_array(p_needs[i], ' ') LOOP
          IF position(' ' || need || ' ' IN k_scopes[k]) = 0
            AND position(' ' || split_part(need, '/', 1) || ' ' IN k_scopes[k]) = 0 THEN v := 's'; END IF;
        END LOOP;
      END IF;
    END IF;
    IF v = 'g' THEN
      a := k_slot[k];
      IF a_tokens[a] < 1 THEN v := 'l';
      ELSE
        a_tokens[a] := a_tokens[a] - 1;
        IF u > 0 AND a_used[a] + u > a_limit[a] THEN v := 'q';
        ELSIF u > 0 AND k_used[k] + k_taken[k] + u > k_cap[k] THEN v := 'c';
        ELSE
          a_used[a] := a_used[a] + u;
          k_taken[k] := k_taken[k] + u;
        END IF;
      END IF;
    END IF;
    verdicts := verdicts || v;
  END LOOP;

  IF n > 0 THEN
    UPDATE quota_periods q SET used = s.used, tokens = s.tokens, refilled_at = greatest(q.refilled_at, at), updated_at = at
      FROM unnest(a_id, a_used, a_tokens) s (id, used, tokens) WHERE q.account_id = s.id AND q.month = v_month;
    FOR r IN INSERT INTO key_periods AS p (key_id, month, used)
      SELECT s.id, v_month, s.taken FROM unnest(k_id, k_taken) s (id, taken) WHERE s.taken IS NOT NULL
      ON CONFLICT (key_id, month) DO UPDATE SET used = p.used + excluded.used, updated_at = at RETURNING p.key_id, p.used LOOP
      k_used[array_position(k_id, r.key_id)] := r.used;
    END LOOP;
  END IF;

  FOR k IN 1 .. cardinality(p_hashes) LOOP
    a := k_slot[k];
    k_seen[k] := CASE WHEN a IS NULL THEN json_build_object('id', k_id[k], 'account', k_account[k])
      ELSE json_build_object('id', k_id[k], 'account', k_account[k], 'limit', a_limit[a], 'used', a_used[a],
        'cap', k_cap[k], 'keyUsed', k_used[k], 'rate', a_rate[a], 'burst', a_burst[a], 'tokens', a_tokens[a],
        'scopes', btrim(k_scopes[k])) END;
  END LOOP;
  keys := array_to_json(k_seen);
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
