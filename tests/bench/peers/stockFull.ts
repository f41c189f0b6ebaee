import { createHash } from 'node:crypto';
import { createServer } from 'node:http';
import express, { type RequestHandler } from 'express';
import { rateLimit } from 'express-rate-limit';
import helmet from 'helmet';
import pg from 'pg';
import { pinoHttp } from 'pino-http';
import { exposureValue } from '../../../shared/calculators/exposure/value';
import { answerFor } from '../../../shared/contract/defineCalculator';
import type { RunningPart } from '../parts/runPart';
import { listen } from './listen';

export interface StockFullTask {
  readonly ownerUrl: string;
  readonly key: string;
}

const hashOf = (key: string) => createHash('sha256').update(key).digest('hex');

async function quotaTable(pool: pg.Pool, key: string): Promise<void> {
  await pool.query('DROP TABLE IF EXISTS stock_quota');
  await pool.query(
    'CREATE TABLE stock_quota (key_hash text PRIMARY KEY, used bigint NOT NULL, most bigint NOT NULL) WITH (fillfactor = 50)',
  );
  await pool.query('INSERT INTO stock_quota VALUES ($1, 0, 1000000000)', [hashOf(key)]);
}

/** Key and quota in one statement, so that the usual way is not made worse than it has to be. */
function takeOne(pool: pg.Pool): RequestHandler {
  const take =
    'UPDATE stock_quota SET used = used + 1 WHERE key_hash = $1 AND used < most RETURNING used, most';
  return async (request, response, next) => {
    const key = request.get('authorization')?.slice('Bearer '.length) ?? '';
    const { rows } = await pool.query<{ used: string; most: string }>(take, [hashOf(key)]);
    const row = rows[0];
    if (!row) return void response.status(429).json({ error: 'no such key, or its quota is used up' });
    response.set('Quota-Remaining', String(Number(row.most) - Number(row.used)));
    next();
  };
}

/** The same call built the usual way: stock Express, the usual middleware, one UPDATE a request. */
export async function stockFull({ ownerUrl, key }: StockFullTask): Promise<RunningPart> {
  const pool = new pg.Pool({ connectionString: ownerUrl });
  await quotaTable(pool, key);
  const app = express();
  app.use(pinoHttp());
  app.use(helmet());
  app.use(
    rateLimit({ windowMs: 60_000, limit: 1_000_000_000, standardHeaders: 'draft-8', legacyHeaders: false }),
  );
  app.use(express.json());
  app.post('/v1/exposure/value', takeOne(pool), (request, response) => {
    const parsed = exposureValue.input.safeParse(request.body);
    if (!parsed.success) return void response.status(422).json({ issues: parsed.error.issues });
    response.json(answerFor(exposureValue, parsed.data, { now: new Date() }));
  });
  return { ready: await listen(createServer(app)) };
}
