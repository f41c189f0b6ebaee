import { randomBytes } from 'node:crypto';
import type { IncomingMessage } from 'node:http';

const ACCEPTED = /^[A-Za-z0-9._-]{8,64}$/;
const PREFIX = randomBytes(8).toString('hex');
let count = 0;

/** The caller's request id where it is a plain one, else one that is unique: a random run and a count. */
export function requestIdOf(request: IncomingMessage): string {
  const given = request.headers['x-request-id'];
  if (typeof given === 'string' && ACCEPTED.test(given)) return given;
  count += 1;
  return `${PREFIX}-${count.toString(36)}`;
}
