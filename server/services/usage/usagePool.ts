import pg from 'pg';

/** One connection for writing statistics, apart from counting and from the console. */
export function usagePool(serviceUrl: string, onError: (error: Error) => void): pg.Pool {
  const pool = new pg.Pool({
    connectionString: serviceUrl,
    max: 1,
    application_name: 'evenfall-usage',
    connectionTimeoutMillis: 2_000,
    statement_timeout: 10_000,
    query_timeout: 12_000,
    keepAlive: true,
  });
  pool.on('error', onError);
  return pool;
}
