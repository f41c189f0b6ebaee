import { createServer } from 'node:http';
import express from 'express';
import type { RunningPart } from '../parts/runPart';
import { listen } from './listen';

/** A bare stock Express: reads JSON, sends it back, and does nothing else. */
export async function expressEcho(): Promise<RunningPart> {
  const app = express();
  app.use(express.json());
  app.post('/v1/exposure/value', (request, response) => {
    response.json(request.body);
  });
  return { ready: await listen(createServer(app)) };
}
