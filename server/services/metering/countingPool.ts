import pg from 'pg';

/** Longer than any batch takes, shorter than a person waits: no call may hang beyond a second. */
const STATEMENT_MS = 500;
const ANSWER_MS = 600;
const CONNECT_MS = 300;

/** Connections for counting alone, so that a slow query of the console can't hold up a call. */
export function countingPool(serviceUrl: string, size: number, onError: (error: Error) => void): pg.Pool {
  const pool = new pg.Pool({
    connectionString: serviceUrl,
    max: size,
    application_name: 'evenfall-counting',
    connectionTimeoutMillis: CONNECT_MS,
    statement_timeout: STATEMENT_MS,
    // A frozen database answers nothing at all, not even that a statement took too long.
    query_timeout: ANSWER_MS,
    idle_in_transaction_session_timeout: ANSWER_MS,
    keepAlive: true,
    idleTimeoutMillis: 30_000,
  });
  // An idle connection that the database ends would otherwise end the process.
  pool.on('error', onError);
  return pool;
}
