import type { Migration } from './migration';

/**
 * What photographers keep: their gear as one document, and recipes and evenings under a name. What is shared is
 * found by the hash of its link's token; the token itself is made again from a nonce and the service's secret.
 */
export const kitAndSaved: Migration = {
  name: '0011-kit-and-saved',
  sql: `
CREATE TABLE kits (
  account_id uuid PRIMARY KEY REFERENCES accounts (id) ON DELETE CASCADE,
  kit jsonb NOT NULL,
  version integer NOT NULL DEFAULT 1 CHECK (version > 0),
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now()
);

CREATE TABLE saved_things (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  account_id uuid NOT NULL REFERENCES accounts (id) ON DELETE CASCADE,
  kind text NOT NULL CHECK (kind IN ('recipe', 'evening')),
  name text NOT NULL CHECK (length(name) BETWEEN 1 AND 100),
  body jsonb NOT NULL,
  version integer NOT NULL DEFAULT 1 CHECK (version > 0),
  share_nonce bytea CHECK (length(share_nonce) = 16),
  share_hash bytea UNIQUE CHECK (length(share_hash) = 32),
  created_at timestamptz NOT NULL DEFAULT service_now(),
  updated_at timestamptz NOT NULL DEFAULT service_now(),
  CHECK ((share_nonce IS NULL) = (share_hash IS NULL))
);
CREATE INDEX saved_things_account ON saved_things (account_id, updated_at DESC, id);
`,
};
