import type { AddressInfo } from 'node:net';
import { version } from '../package.json';
import { loadCalculators } from '../shared/calculators';
import { createApp } from './app';
import type { Config } from './config';
import { closeHttpServer } from './http/closeHttpServer';
import { createHttpServer } from './http/createHttpServer';
import { buildOpenapi } from './openapi/buildOpenapi';
import { accessLog } from './services/accessLog';
import { openConsole } from './services/console/openConsole';
import { serviceLog } from './services/logging';
import { countingPool } from './services/metering/countingPool';
import { GroupCommitMeter } from './services/metering/groupCommitMeter';
import { serviceMetrics } from './services/metrics/serviceMetrics';
import { recordFinished } from './services/usage/recordFinished';
import { usagePool } from './services/usage/usagePool';
import { UsageWriter } from './services/usage/UsageWriter';

export interface ServeOptions {
  readonly config: Config;
  /** The role that owns the tables. */
  readonly ownerUrl: string;
  /** The service's own role, which may touch rows only. */
  readonly serviceUrl: string;
  readonly clientFolder: string | null;
  /** Where log lines go; standard output where left out. */
  readonly logFd?: number;
  /** Where the built workers lie; beside this file's own build where left out. */
  readonly workerFolder?: URL;
  /** Hears the text of each of the console's statements, for tests that count the work done. */
  readonly onStatement?: (sql: string) => void;
}

export interface Service {
  readonly url: string;
  stop(): Promise<void>;
}

/** Connects, listens, and gives back how to stop: no new calls, those under way end, counts are committed. */
export async function serve(options: ServeOptions): Promise<Service> {
  const { config, serviceUrl, clientFolder, logFd, onStatement } = options;
  const { workerFolder = new URL('./', import.meta.url) } = options;
  const { logger, flush } = serviceLog(config, logFd);
  const pool = countingPool(serviceUrl, config.countingPoolSize, (error) => {
    logger.warn({ reason: error.message }, 'a counting connection ended');
  });
  const meter = new GroupCommitMeter(
    pool,
    () => performance.now(),
    ({ accountId, keyId, units }) =>
      logger.error({ account: accountId, key: keyId, units }, 'units could not be given back'),
  );
  const usageConnections = usagePool(serviceUrl, (error) => {
    logger.warn({ reason: error.message }, 'a usage connection ended');
  });
  const usage = new UsageWriter(usageConnections, (error) => {
    logger.error({ reason: error.message }, 'usage could not be written; these counts are lost');
  });
  const now = () => new Date();
  const metrics = serviceMetrics(usageConnections, () => performance.now());
  const log = accessLog(logger, now);
  const record = recordFinished(usage, now);
  const calculators = await loadCalculators();
  const onTrouble = (what: string, reason: string) => logger.warn({ reason }, what);
  const background = { onTrouble, onStatement };
  const consoleSide = await openConsole({ config, serviceUrl, workerFolder, now, ...background });
  const app = createApp({
    config,
    calculators,
    version,
    console: consoleSide,
    meter,
    metrics,
    now,
    finish: (call, status, ms) => {
      log(call, status, ms);
      record(call, status, ms);
      metrics.finish(call, status, ms);
    },
    onFault: (call, error) => logger.error({ request: call.requestId, err: error }, 'a call failed'),
    isReady: () =>
      pool.query('SELECT 1').then(
        () => true,
        () => false,
      ),
    openapi: buildOpenapi(calculators, { version, publicUrl: config.publicUrl }),
    clientFolder,
  });
  const server = createHttpServer(app);
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(config.port, config.host, resolve);
  });
  const { port } = server.address() as AddressInfo;
  const stop = async () => {
    await closeHttpServer(server);
    await consoleSide.stop();
    await meter.close();
    await usage.close();
    await usageConnections.end();
    flush();
  };
  return { url: `http://${config.host}:${port}`, stop };
}
