import { Router } from 'express';

/** Whether this process lives, and whether it can serve; for balancers and operators. */
export function healthRoutes(isReady: () => Promise<boolean>): Router {
  const router = Router();
  router.get('/live', (_request, response) => {
    response.set('Cache-Control', 'no-store').json({ status: 'live' });
  });
  router.get('/ready', async (_request, response) => {
    const ready = await isReady();
    response.set('Cache-Control', 'no-store');
    if (!ready) response.set('Retry-After', '1');
    response.status(ready ? 200 : 503).json({ status: ready ? 'ready' : 'unavailable' });
  });
  return router;
}
