/** A request as it goes over the wire; every target gets the same headers. */
export function requestText(
  method: 'GET' | 'POST',
  path: string,
  { key, body, ifNoneMatch }: { key: string; body?: unknown; ifNoneMatch?: string },
): string {
  const text = body === undefined ? '' : JSON.stringify(body);
  const lines = [
    `${method} ${path} HTTP/1.1`,
    'Host: 127.0.0.1',
    'Accept: application/json',
    `Authorization: Bearer ${key}`,
    ...(ifNoneMatch === undefined ? [] : [`If-None-Match: ${ifNoneMatch}`]),
    ...(body === undefined
      ? []
      : ['Content-Type: application/json', `Content-Length: ${Buffer.byteLength(text)}`]),
  ];
  return `${lines.join('\r\n')}\r\n\r\n${text}`;
}
