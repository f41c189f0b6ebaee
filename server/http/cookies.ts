export interface CookieWish {
  readonly name: string;
  readonly value: string;
  readonly path: string;
  readonly maxAgeS: number;
  readonly isSecure: boolean;
  readonly sameSite: 'Lax' | 'Strict';
}

/** The value of one cookie; where a name comes twice, neither is believed. */
export function readCookie(header: string | undefined, name: string): string | null {
  const values = (header ?? '')
    .split(';')
    .map((pair) => pair.trim())
    .filter((pair) => pair.startsWith(`${name}=`))
    .map((pair) => pair.slice(name.length + 1));
  return values.length === 1 && values[0] ? values[0] : null;
}

/** A Set-Cookie line; scripts never see the cookie. Values are of letters, digits and . _ - only. */
export function cookieLine({ name, value, path, maxAgeS, isSecure, sameSite }: CookieWish): string {
  const secure = isSecure ? '; Secure' : '';
  return `${name}=${value}; Path=${path}; Max-Age=${Math.max(0, Math.floor(maxAgeS))}; HttpOnly${secure}; SameSite=${sameSite}`;
}
