type Headers = Readonly<Record<string, string | readonly string[] | undefined>>;

const CONSOLE_HEADER = 'x-evenfall-console';

const CHANGES_NOTHING = ['GET', 'HEAD', 'OPTIONS'];

export function changesState(method: string): boolean {
  return !CHANGES_NOTHING.includes(method);
}

/**
 * Whether a request that changes something comes from a page of the console: the browser says so
 * (Sec-Fetch-Site), or, where it is too old for that, its Origin is ours; and it carries a header that no form and
 * no other site can send without asking first.
 */
export function isFromOwnPage(headers: Headers, publicUrl: string): boolean {
  const site = headers['sec-fetch-site'];
  const isOurs = site === undefined ? headers.origin === publicUrl : site === 'same-origin';
  return isOurs && headers[CONSOLE_HEADER] === '1';
}

/** Whether a bearer that lives in the console's page comes from there. */
export function isConsolePage(headers: Headers, publicUrl: string): boolean {
  const { origin, 'sec-fetch-site': site } = headers;
  return (origin === undefined || origin === publicUrl) && site === 'same-origin';
}
