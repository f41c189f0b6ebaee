import { readFile } from 'node:fs/promises';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { extname, join, normalize } from 'node:path';
import { TEST_SETTINGS, type TestSettings } from '../../server/scripts/support/testSettings';
import { buildClient } from '../../server/scripts/support/buildClient';

/** The console as a browser meets it. */
export interface ServedConsole {
  readonly url: string;
  close(): Promise<void>;
}

/** The policy under which the service serves the console. */
const CSP =
  "default-src 'self'; script-src 'self'; style-src 'self' 'unsafe-inline'; img-src 'self' data:; connect-src 'self'; font-src 'self' data:; object-src 'none'; base-uri 'none'";

const TYPES: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.svg': 'image/svg+xml',
  '.woff': 'font/woff',
  '.woff2': 'font/woff2',
};

export async function builtClient(): Promise<string> {
  const given = process.env[TEST_SETTINGS];
  const folder = given ? (JSON.parse(given) as TestSettings).clientFolder : null;
  return folder ?? buildClient();
}

/** What a file's text is served as, by its path; as it may change while the console is served. */
export type Edits = Map<string, (text: string) => string>;

function serverOf(folder: string, edits: Edits): Server {
  return createServer((request, response) => {
    const { pathname } = new URL(request.url ?? '/', 'http://localhost');
    const isFile = extname(pathname) !== '';
    const path = join(folder, isFile ? normalize(decodeURIComponent(pathname)) : 'index.html');
    readFile(path).then(
      (content) => {
        response.setHeader('Content-Type', TYPES[extname(path)] ?? 'application/octet-stream');
        response.setHeader('Content-Security-Policy', CSP);
        const edit = edits.get(pathname);
        response.end(edit ? edit(content.toString()) : content);
      },
      () => response.writeHead(404).end(),
    );
  });
}

/** Serves the built console on a free port of loopback, every screen's address answered by the one page. */
export async function serveConsole(edits: Edits = new Map()): Promise<ServedConsole> {
  const server = serverOf(await builtClient(), edits);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  return {
    url: `http://127.0.0.1:${port}`,
    close: () =>
      new Promise((resolve, reject) => server.close((error) => (error ? reject(error) : resolve()))),
  };
}
