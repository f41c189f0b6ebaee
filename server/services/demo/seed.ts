import pg from 'pg';

/** What the start command prints after it seeded. */
export interface SeedReport {
  readonly lines: string[];
}

/**
 * Fills an empty database with the demo scenario; null when there is anything in it.
 * The scenario's people come with the accounts; until then an account without a password owns the first key.
 */
export async function seedDemo(ownerUrl: string, now: Date): Promise<SeedReport | null> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    const { rows } = await client.query<{ taken: boolean }>('SELECT EXISTS (SELECT FROM accounts) AS taken');
    if (rows[0]?.taken) return null;
    await client.query(
      `INSERT INTO accounts (email, name, roles, plan_id, verified_at, created_at) VALUES
       ('developer@maren-heights.example', 'Lantern Row Studio', '{developer}', 'starter', $1, $1)`,
      [now],
    );
    return {
      lines: [
        'The demo scenario of Maren Heights is in the database.',
        'A first key: npm run --silent key:issue -- --account developer@maren-heights.example --name first',
      ],
    };
  } finally {
    await client.end();
  }
}
