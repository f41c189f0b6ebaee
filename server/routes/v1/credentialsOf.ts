import type { IncomingMessage } from 'node:http';
import type { Socket } from 'node:net';
import { authorise, type Credentials } from '../../middleware/authorise';

interface Remembered {
  readonly authorization: string | undefined;
  readonly origin: string | undefined;
  readonly credentials: Credentials;
}

/** A caller keeps its connection and sends the same key each time: hashing it once is enough. */
const bySocket = new WeakMap<Socket, Remembered>();

/** What `authorise` reads of a call, remembered from the connection's last one. @throws as `authorise` does */
export function credentialsOf(request: IncomingMessage, ownOrigin: string): Credentials {
  const { authorization, origin } = request.headers;
  const last = bySocket.get(request.socket);
  if (last && last.authorization === authorization && last.origin === origin) return last.credentials;
  const credentials = authorise(request, ownOrigin);
  // Where a pass is used from is asked at every call.
  if (!credentials.isPass) bySocket.set(request.socket, { authorization, origin, credentials });
  return credentials;
}
