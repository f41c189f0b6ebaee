import type { RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { ProblemError } from '../http/ProblemError';

const MINUTE_MS = 60_000;
const IPV6_PLACE = 56;

function limiter(limit: number, windowMs: number): RequestHandler {
  return rateLimit({
    limit,
    windowMs,
    standardHeaders: false,
    legacyHeaders: false,
    keyGenerator: (request) => ipKeyGenerator(request.ip ?? '', IPV6_PLACE),
    handler: (request, _response, next) => {
      const { resetTime } = (request as { rateLimit?: { resetTime?: Date } }).rateLimit ?? {};
      // The limiter keeps the process's time itself; the whole window is the safe answer where it says none.
      const waitMs = resetTime ? resetTime.getTime() - performance.timeOrigin - performance.now() : windowMs;
      const wait = String(Math.max(1, Math.ceil(waitMs / 1000)));
      const detail = `There were many requests from this address; wait ${wait} s.`;
      next(new ProblemError('too_many_attempts', detail, { headers: { 'Retry-After': wait } }));
    },
  }) as RequestHandler;
}

/**
 * How often one place may ask, in each process: the console works in bursts; passwords and links are not to be
 * tried out, and mails not to be sent about. What counts across processes is the throttle by account.
 */
export function addressLimits() {
  return {
    usual: limiter(600, MINUTE_MS),
    secrets: limiter(60, 5 * MINUTE_MS),
    mails: limiter(30, 60 * MINUTE_MS),
  } as const;
}
