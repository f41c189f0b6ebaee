import { createHash, timingSafeEqual } from 'node:crypto';
import { Router, type Request } from 'express';
import { ProblemError } from '../http/ProblemError';
import type { ServiceMetrics } from '../services/metrics/serviceMetrics';

const LOOPBACK = new Set(['127.0.0.1', '::1', '::ffff:127.0.0.1']);
const digest = (text: string) => createHash('sha256').update(text).digest();

/** With a token, the token decides; without one, only this machine itself may ask. */
function mayRead(request: Request, token: string | null): boolean {
  if (token === null) {
    // A proxy on this machine forwards for others; what it forwards is not from this machine.
    const isForwarded =
      request.headers['x-forwarded-for'] !== undefined || request.headers.forwarded !== undefined;
    return !isForwarded && LOOPBACK.has(request.socket.remoteAddress ?? '');
  }
  const given = request.headers.authorization ?? '';
  return timingSafeEqual(digest(given), digest(`Bearer ${token}`));
}

/** Metrics for Prometheus; to anyone else the address does not exist. */
export function metricsRoute(metrics: ServiceMetrics, token: string | null): Router {
  const router = Router();
  router.get('/', async (request, response) => {
    if (!mayRead(request, token)) throw new ProblemError('not_found');
    const text = await metrics.text();
    response.set({ 'Content-Type': metrics.contentType, 'Cache-Control': 'no-store' }).send(text);
  });
  return router;
}
