/** What each header of an answer says; those without a note are the transport's own. */
const NOTES: Readonly<Record<string, string>> = {
  'content-type': 'JSON; problems come as application/problem+json (RFC 9457).',
  ratelimit: 'What is left: r of the burst and of the month, t seconds until there is more (IETF draft).',
  'ratelimit-policy': 'The limits themselves: q calls in w seconds, and the month’s units (IETF draft).',
  'evenfall-quota-limit': 'Units of this calendar month (UTC).',
  'evenfall-quota-remaining': 'Units left after this call.',
  'evenfall-quota-reset': 'Seconds until the next month begins.',
  'x-request-id': 'This call’s name in our logs and in the key’s log; tell it when you ask us about a call.',
  'retry-after': 'Seconds to wait before asking again.',
  'cache-control': 'Whether your own cache may keep the answer.',
  etag: 'The answer’s version; sent back as If-None-Match it brings 304, which costs nothing.',
  'www-authenticate': 'How to authenticate: a bearer key.',
};

const headerNote = (name: string): string | undefined => NOTES[name.toLowerCase()];

export interface ShownHeader {
  readonly name: string;
  readonly value: string;
  readonly note?: string;
}

/** The headers that this service explains, in the order of its explanations. */
export function explainedHeaders(headers: readonly (readonly [string, string])[]): ShownHeader[] {
  const order = Object.keys(NOTES);
  return headers
    .filter(([name]) => headerNote(name) !== undefined)
    .sort(([a], [b]) => order.indexOf(a) - order.indexOf(b))
    .map(([name, value]) => ({ name, value, note: headerNote(name) }));
}
