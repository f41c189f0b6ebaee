import { urlOf, type SnippetCall } from './snippetCall';

/** The call as it goes over the wire. */
export function httpSnippet(call: SnippetCall, bearer: string): string {
  const { host, pathname } = new URL(urlOf(call));
  return [
    `POST ${pathname} HTTP/1.1`,
    `Host: ${host}`,
    `Authorization: Bearer ${bearer}`,
    'Content-Type: application/json',
    '',
    JSON.stringify(call.body),
  ].join('\n');
}
