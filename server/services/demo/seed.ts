import pg from 'pg';
import { bcryptWork, preHash } from '../passwords/bcryptWork';
import { UsageRecorder, type FinishedCall } from '../usage/UsageRecorder';
import { writeUsage } from '../usage/writeUsage';
import { demoCalls } from './demoCalls';
import { demoKeys, insertDemoKey } from './demoKeys';
import { demoPeople, type DemoPerson } from './people';

/** What the start command prints after it seeded. */
export interface SeedReport {
  readonly lines: string[];
}

const COST = 12;
const DAY_MS = 86_400_000;
const EVENING = [
  ['exposure/value', 1],
  ['flash/exposure', 1],
  ['exposure/solve', 1],
  ['flash/motion', 1],
  ['light/convert', 1],
] as const;
const DESK = [
  ['flash/exposure', 1],
  ['flash/budget', 1],
  ['exposure/depth', 1],
] as const;

// The periods are the sums of the calls, so that every table says the same.
const KEY_PERIODS = `
INSERT INTO key_periods (key_id, month, used, created_at, updated_at)
SELECT key_id, month_of(hour), sum(units), min(hour), least(max(hour) + interval '1 hour', $1) FROM usage_hours
GROUP BY 1, 2`;
const QUOTA_PERIODS = `
INSERT INTO quota_periods (account_id, month, used, tokens, refilled_at)
SELECT k.account_id, p.month, sum(p.used), min(plan.burst), $1
FROM key_periods p JOIN api_keys k ON k.id = p.key_id JOIN accounts a ON a.id = k.account_id
  JOIN plans plan ON plan.id = a.plan_id
GROUP BY 1, 2`;

async function insertPerson(client: pg.Client, person: DemoPerson, now: Date): Promise<string> {
  const hash = bcryptWork({ text: preHash(person.password), cost: COST });
  const madeAt = new Date(now.getTime() - 45 * DAY_MS);
  const { rows } = await client.query<{ id: string }>(
    `INSERT INTO accounts (email, name, password_hash, roles, plan_id, verified_at, created_at)
     VALUES ($1, $2, $3, $4, $5, $6, $6) RETURNING id`,
    [person.email, person.name, hash, person.roles, person.planId, madeAt],
  );
  return rows[0]?.id ?? '';
}

/** Writes the calls as the service itself would have, a day at a time. */
async function insertCalls(client: pg.Client, calls: readonly FinishedCall[]): Promise<void> {
  const recorder = new UsageRecorder();
  let day = 0;
  for (const call of calls) {
    const callsDay = Math.floor(call.at.getTime() / DAY_MS);
    if (callsDay !== day) await writeUsage(client, recorder.take());
    day = callsDay;
    recorder.record(call);
  }
  await writeUsage(client, recorder.take());
}

async function seed(client: pg.Client, now: Date): Promise<void> {
  const developerId = await insertPerson(client, demoPeople.developer, now);
  for (const person of [demoPeople.photographer, demoPeople.educator, demoPeople.admin])
    await insertPerson(client, person, now);
  const booking = await insertDemoKey(client, developerId, demoKeys.booking, now);
  const rental = await insertDemoKey(client, developerId, demoKeys.rental, now);
  await insertDemoKey(client, developerId, demoKeys.tablet, now);
  await insertDemoKey(client, developerId, demoKeys.kiosk, now);
  const habits = [
    { keyId: booking, busy: 35, calculators: EVENING },
    { keyId: rental, busy: 25, calculators: DESK },
  ];
  await insertCalls(client, demoCalls(habits, now));
  await client.query(KEY_PERIODS, [now]);
  await client.query(QUOTA_PERIODS, [now]);
}

function report(): SeedReport {
  const people: readonly DemoPerson[] = Object.values(demoPeople);
  const widest = Math.max(...people.map(({ email }) => email.length));
  return {
    lines: [
      'The demo scenario of Maren Heights is in the database. Sign in as:',
      ...people.map(({ email, password }) => `  ${email.padEnd(widest)}  ${password}`),
      'A first key: npm run --silent key:issue -- --account developer@maren-heights.example --name first',
    ],
  };
}

/** Fills an empty database with the demo scenario, wholly or not at all; null when there is anything in it. */
export async function seedDemo(ownerUrl: string, now: Date): Promise<SeedReport | null> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    await client.query('BEGIN');
    await client.query('LOCK TABLE accounts IN SHARE ROW EXCLUSIVE MODE');
    const { rows } = await client.query<{ taken: boolean }>('SELECT EXISTS (SELECT FROM accounts) AS taken');
    if (rows[0]?.taken) return null;
    await seed(client, now);
    await client.query('COMMIT');
    return report();
  } finally {
    // Whatever was not committed goes with the connection.
    await client.end();
  }
}
