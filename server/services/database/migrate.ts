import pg from 'pg';
import { Umzug } from 'umzug';
import { migrations } from '../../migrations';

/** Any number; it only has to be the same in every process that migrates. */
const MIGRATION_LOCK = 7_426_170_931;

/** Rights of the service's own role: rows, never tables. */
const SERVICE_ROLE = 'evenfall_service';
const GRANTS = `
DO $$ BEGIN
  IF EXISTS (SELECT FROM pg_roles WHERE rolname = '${SERVICE_ROLE}') THEN
    GRANT USAGE ON SCHEMA public TO ${SERVICE_ROLE};
    GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA public TO ${SERVICE_ROLE};
    GRANT USAGE ON ALL SEQUENCES IN SCHEMA public TO ${SERVICE_ROLE};
    GRANT EXECUTE ON ALL FUNCTIONS IN SCHEMA public TO ${SERVICE_ROLE};
    REVOKE INSERT, UPDATE, DELETE ON applied_migrations FROM ${SERVICE_ROLE};
    REVOKE UPDATE, DELETE ON audit_events FROM ${SERVICE_ROLE};
  END IF;
END $$`;

async function applied(client: pg.Client): Promise<string[]> {
  await client.query(
    'CREATE TABLE IF NOT EXISTS applied_migrations (name text PRIMARY KEY, applied_at timestamptz NOT NULL DEFAULT now())',
  );
  const { rows } = await client.query<{ name: string }>('SELECT name FROM applied_migrations ORDER BY name');
  return rows.map(({ name }) => name);
}

function umzugOver(client: pg.Client): Umzug<pg.Client> {
  return new Umzug({
    context: client,
    logger: undefined,
    migrations: migrations.map(({ name, sql }) => ({
      name,
      up: async () => {
        await client.query('BEGIN');
        try {
          await client.query(sql);
          await client.query('INSERT INTO applied_migrations (name) VALUES ($1)', [name]);
          await client.query('COMMIT');
        } catch (error) {
          await client.query('ROLLBACK');
          throw error;
        }
      },
    })),
    storage: {
      executed: () => applied(client),
      // Noted in the migration's own transaction, so that a crash between the two can't happen.
      logMigration: () => Promise.resolve(),
      unlogMigration: () => Promise.reject(new Error('migrations only go forward')),
    },
  });
}

/**
 * Brings the database's schema up to date, under an advisory lock held by one connection of its own, so that
 * several processes may start at once. Needs the role that owns the tables and a direct connection.
 * @returns the names of the steps that were applied now
 */
export async function migrate(ownerUrl: string): Promise<string[]> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    await client.query('SELECT pg_advisory_lock($1)', [MIGRATION_LOCK]);
    const done = await umzugOver(client).up();
    await client.query(GRANTS);
    return done.map(({ name }) => name);
  } finally {
    await client.end();
  }
}
