import jwt from 'jsonwebtoken';
import { z } from 'zod';
import { ACCESS_S } from '../../policies/sessionLife';
import { derivedKey } from '../console/derivedKey';

const ALGORITHM = 'HS256';
const AUDIENCE = 'evenfall-console';
const ISSUER = 'evenfall';
const TYPE = 'session-access';

const claimsSchema = z.object({ sub: z.uuid(), sid: z.uuid(), typ: z.literal(TYPE), exp: z.int() });

export interface AccessClaims {
  readonly accountId: string;
  readonly sessionId: string;
  readonly expiresAt: Date;
  /** Its minutes are over: good for nothing but signing out, or for telling that a refresh is due. */
  readonly isStale: boolean;
}

const seconds = (moment: Date) => Math.floor(moment.getTime() / 1000);

/** A token that names a session for some minutes. The session's row is what counts. */
export function signAccess(
  claims: Pick<AccessClaims, 'accountId' | 'sessionId'>,
  { sessionSecret, now }: { sessionSecret: string; now: Date },
): { token: string; expiresAt: Date } {
  const exp = seconds(now) + ACCESS_S;
  const payload = { sid: claims.sessionId, typ: TYPE, iat: seconds(now), exp };
  const token = jwt.sign(payload, derivedKey(sessionSecret, 'sessions'), {
    algorithm: ALGORITHM,
    audience: AUDIENCE,
    issuer: ISSUER,
    subject: claims.accountId,
  });
  return { token, expiresAt: new Date(exp * 1000) };
}

/** What a token says, if it is one of ours: algorithm, signature, audience, issuer and type; null otherwise. */
export function readAccess(
  token: string,
  { sessionSecret, now }: { sessionSecret: string; now: Date },
): AccessClaims | null {
  try {
    const payload = jwt.verify(token, derivedKey(sessionSecret, 'sessions'), {
      algorithms: [ALGORITHM],
      audience: AUDIENCE,
      issuer: ISSUER,
      clockTimestamp: seconds(now),
      ignoreExpiration: true,
    });
    const { sub, sid, exp } = claimsSchema.parse(payload);
    return {
      accountId: sub,
      sessionId: sid,
      expiresAt: new Date(exp * 1000),
      isStale: exp <= seconds(now),
    };
  } catch {
    return null;
  }
}
