import type { Request, Response } from 'express';
import { ipKeyGenerator } from 'express-rate-limit';
import type { Call } from '../../http/Call';
import { cookieLine, readCookie } from '../../http/cookies';
import { ABSOLUTE_DAYS } from '../../policies/sessionLife';
import { readAccess, type AccessClaims } from '../../services/sessions/accessToken';
import type { GivenSession } from '../../services/sessions/beginSession';
import type { ConsoleServices, Origin } from '../../services/console/ConsoleServices';
import type { SignedIn } from '../../services/sessions/liveSession';

export const REFRESH_PATH = '/api/session/refresh';
const AGENT_MAX = 300;
/** As long as any session may last; when this one ends is the database's to say. */
const COOKIE_S = ABSOLUTE_DAYS * 86_400;
/** Providers hand a customer a /56 of IPv6 addresses: they are one place. */
const IPV6_PLACE = 56;

/** The names of the two cookies; browsers hold the prefixed ones to their rules, which need https. */
function cookieNames(publicUrl: string): { access: string; refresh: string; isSecure: boolean } {
  const isSecure = publicUrl.startsWith('https:');
  return {
    access: `${isSecure ? '__Host-' : ''}evenfall_session`,
    refresh: `${isSecure ? '__Secure-' : ''}evenfall_refresh`,
    isSecure,
  };
}

/** What throttles take for one place. */
function addressGroupOf(address: string): string {
  return ipKeyGenerator(address, IPV6_PLACE);
}

function originOf(request: Request, call: Call): Origin {
  const address = request.ip ?? '';
  const agent = (request.headers['user-agent'] ?? '').slice(0, AGENT_MAX);
  return { address, addressGroup: addressGroupOf(address), agent, requestId: call.requestId };
}

/** One request of the console: where it came from, who is signed in, and the cookies that it leaves with. */
export class Visit {
  readonly origin: Origin;
  /** What the session cookie says, if it is one of ours; the session itself may have ended. */
  readonly claims: AccessClaims | null;
  readonly refreshToken: string | null;
  signedIn: SignedIn | null = null;

  constructor(
    readonly request: Request,
    private readonly response: Response,
    readonly call: Call,
    private readonly services: ConsoleServices,
  ) {
    const { settings, now } = services;
    this.origin = originOf(request, call);
    const names = cookieNames(settings.publicUrl);
    const { cookie } = request.headers;
    const access = readCookie(cookie, names.access);
    const secret = { sessionSecret: settings.sessionSecret, now: now() };
    this.claims = access === null ? null : readAccess(access, secret);
    this.refreshToken = readCookie(cookie, names.refresh);
  }

  setHeader(name: string, value: string): void {
    this.response.setHeader(name, value);
  }

  /** Gives the browser a session, or the access token alone where another tab has the refresh token. */
  giveCookies({ access, refresh }: GivenSession): void {
    // The access token holds for minutes; its cookie stays, so that a refresh or a sign-out knows the session.
    this.setCookie('access', access, COOKIE_S);
    if (refresh !== null) this.setCookie('refresh', refresh, COOKIE_S);
  }

  dropCookies(): void {
    this.setCookie('access', '', 0);
    this.setCookie('refresh', '', 0);
  }

  private setCookie(kind: 'access' | 'refresh', value: string, maxAgeS: number): void {
    const names = cookieNames(this.services.settings.publicUrl);
    const line = cookieLine({
      name: names[kind],
      value,
      maxAgeS,
      path: kind === 'access' ? '/' : REFRESH_PATH,
      isSecure: names.isSecure,
      sameSite: kind === 'access' ? 'Lax' : 'Strict',
    });
    this.response.append('Set-Cookie', line);
  }
}
