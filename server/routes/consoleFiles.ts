import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import express, { Router } from 'express';

const YEAR_S = 31_536_000;

/** The console: files with a hash in their name for ever, the page itself fresh each time, for every path. */
export function consoleFiles(clientFolder: string): Router {
  const router = Router();
  router.use(
    '/assets',
    express.static(join(clientFolder, 'assets'), {
      immutable: true,
      maxAge: YEAR_S * 1000,
      fallthrough: false,
    }),
  );
  router.use(express.static(clientFolder, { index: false, maxAge: 0 }));
  const page = readFileSync(join(clientFolder, 'index.html'), 'utf8');
  router.get('/{*path}', (request, response, next) => {
    if (!request.accepts('html')) return void next();
    response.set('Cache-Control', 'no-cache').type('html').send(page);
  });
  return router;
}
