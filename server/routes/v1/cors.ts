import type { IncomingMessage } from 'node:http';
import type { HeaderList } from '../../http/send';

const EXPOSED =
  'RateLimit, RateLimit-Policy, Evenfall-Quota-Limit, Evenfall-Quota-Remaining, Evenfall-Quota-Reset, Retry-After, ETag, Link, X-Request-Id, Deprecation, Sunset';

/**
 * Lets a page of another site read the answer; what it may ask is decided by its key, never by cookies, so no
 * credentials mode. A refusal is readable too, since it says what to do.
 */
export function corsHeaders(request: IncomingMessage): HeaderList {
  const { origin } = request.headers;
  if (origin === undefined) return ['Vary', 'Origin'];
  return ['Access-Control-Allow-Origin', origin, 'Access-Control-Expose-Headers', EXPOSED, 'Vary', 'Origin'];
}

/** A preflight comes without the key, so any site is let through here and judged at the real request. */
export function preflightHeaders(methods: readonly string[]): HeaderList {
  return [
    'Access-Control-Allow-Origin',
    '*',
    'Access-Control-Allow-Methods',
    methods.join(', '),
    'Access-Control-Allow-Headers',
    'Authorization, Content-Type, If-None-Match, X-Request-Id',
    'Access-Control-Max-Age',
    '7200',
    'Cache-Control',
    'no-store',
  ];
}
