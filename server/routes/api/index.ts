import { Router, type ErrorRequestHandler } from 'express';
import type { Call } from '../../http/Call';
import { ProblemError } from '../../http/ProblemError';
import { sendConsoleProblem } from '../../http/sendConsole';
import type { Finish } from '../../http/send';
import { addressLimits } from '../../middleware/addressLimits';
import { isDatabaseAway, withoutSecrets } from '../../services/console/faults';
import type { ConsoleServices, Route } from './route';
import { consoleRoutes } from './consoleRoutes';
import { consoleCall, serveRoute } from './serveRoute';

export interface ApiDependencies {
  readonly services: ConsoleServices;
  readonly finish: Finish;
  readonly onFault: (call: Call, error: unknown) => void;
}

function problemOf(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  if (isDatabaseAway(error)) {
    const detail = 'The database can’t be reached just now. Nothing was changed; try again shortly.';
    return new ProblemError('unavailable', detail, { headers: { 'Retry-After': '2' }, cause: error });
  }
  // What the router throws for an address that it can't decode.
  if (error instanceof URIError) return new ProblemError('malformed_request', undefined, { cause: error });
  return new ProblemError('internal_error', undefined, { cause: error });
}

/** Turns what was thrown into problem details, and tells the log of our own faults without what they were about. */
function problemAnswer({ services, finish, onFault }: ApiDependencies): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) return void next(error);
    const call = consoleCall(request);
    const problem = problemOf(error);
    if (problem.code === 'internal_error') onFault(call, withoutSecrets(error));
    // A body that nobody read would keep the connection from its next request.
    request.resume();
    sendConsoleProblem(call, problem, services.settings.publicUrl, finish);
  };
}

function refuseMethod(routes: readonly Route[]): never {
  const methods = routes.map(({ method }) => method);
  const allowed = methods.includes('GET') ? [...methods, 'HEAD'] : methods;
  throw new ProblemError('method_not_allowed', `Use ${methods.join(' or ')} here.`, {
    headers: { Allow: [...allowed].sort().join(', ') },
  });
}

/** The console's own API, under /api: for its pages, by a session cookie; never metered, never for other sites. */
export function apiRouter(dependencies: ApiDependencies): Router {
  const router = Router({ caseSensitive: true, strict: true });
  const limits = addressLimits();
  const paths = new Map<string, Route[]>();
  for (const route of consoleRoutes) paths.set(route.path, [...(paths.get(route.path) ?? []), route]);
  // Paths without a parameter first, so that they are not taken for one.
  const ordered = [...paths].sort(([a], [b]) => a.split(':').length - b.split(':').length);
  for (const [path, routes] of ordered) {
    const at = router.route(path);
    for (const route of routes) {
      const method = route.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
      at[method](limits[route.limit], serveRoute(route, dependencies));
    }
    at.all(() => refuseMethod(routes));
  }
  router.use('/api', () => {
    throw new ProblemError('not_found');
  });
  router.use(problemAnswer(dependencies));
  return router;
}
