import express, { type Express } from 'express';
import type { AnyCalculator } from '../shared/contract/defineCalculator';
import type { Config } from './config';
import type { Call } from './http/Call';
import type { Finish } from './http/send';
import { nothingHere, problemAnswers } from './middleware/problems';
import { consoleHeaders } from './middleware/surfaceHeaders';
import { apiRouter } from './routes/api';
import { consoleFiles } from './routes/consoleFiles';
import { docsRoutes } from './routes/docs';
import { healthRoutes } from './routes/health';
import { mailPages } from './routes/mailPages';
import { metricsRoute } from './routes/metrics';
import { problemPages } from './routes/problemPages';
import { v1Handler } from './routes/v1';
import { wellKnown } from './routes/wellKnown';
import type { Console } from './services/console/openConsole';
import type { Meter } from './services/metering/meter';
import type { ServiceMetrics } from './services/metrics/serviceMetrics';

export interface AppDependencies {
  readonly config: Pick<Config, 'publicUrl' | 'trustProxyHops' | 'contactEmail' | 'metricsToken'>;
  readonly calculators: readonly AnyCalculator[];
  readonly version: string;
  readonly console: Pick<Console, 'services' | 'mailbox'>;
  readonly meter: Meter;
  readonly metrics: ServiceMetrics;
  readonly now: () => Date;
  readonly finish: Finish;
  readonly onFault: (call: Call, error: unknown) => void;
  readonly isReady: () => Promise<boolean>;
  readonly openapi: Record<string, unknown>;
  /** The built console; null serves the API alone. */
  readonly clientFolder: string | null;
}

/** The application: what a request meets, in this order. It never listens. */
export function createApp(dependencies: AppDependencies): Express {
  const { config, openapi, clientFolder, isReady } = dependencies;
  const { publicUrl } = config;
  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.set('trust proxy', config.trustProxyHops);

  app.use(v1Handler({ ...dependencies, publicUrl }));
  app.use(consoleHeaders());
  app.use('/health', healthRoutes(isReady));
  app.use('/metrics', metricsRoute(dependencies.metrics, config.metricsToken));
  app.use(wellKnown({ ...dependencies, publicUrl, contact: config.contactEmail }));
  app.get('/openapi.json', (_request, response) => {
    response
      .set({ 'Cache-Control': 'public, max-age=300', 'Access-Control-Allow-Origin': '*' })
      .json(openapi);
  });
  app.use('/docs', docsRoutes(openapi));
  app.use('/problems', problemPages());
  app.use(apiRouter({ ...dependencies, services: dependencies.console.services }));
  if (dependencies.console.mailbox) app.use('/mail', mailPages(dependencies.console.mailbox));
  if (clientFolder) app.use(consoleFiles(clientFolder));
  app.use(nothingHere);
  app.use(problemAnswers({ ...dependencies, publicUrl }));
  return app;
}
