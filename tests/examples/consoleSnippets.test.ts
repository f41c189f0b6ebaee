import { execFile } from 'node:child_process';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { promisify } from 'node:util';
import ts from 'typescript';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { curlSnippet } from '../../src/components/snippets/curlSnippet';
import { pythonSnippet } from '../../src/components/snippets/pythonSnippet';
import type { SnippetCall } from '../../src/components/snippets/snippetCall';
import { typescriptSnippet } from '../../src/components/snippets/typescriptSnippet';

interface Received {
  readonly method?: string;
  readonly path?: string;
  readonly key?: string;
  readonly type?: string;
  readonly body: unknown;
}

const run = promisify(execFile);
/** Only the key is handed on; the programs are found where a shell finds them by itself. */
const env = { EVENFALL_KEY: 'evenfall_server_example' };
let server: Server;
let received: Received[] = [];
let baseUrl = '';

beforeAll(async () => {
  server = createServer((request, response) => {
    const parts: Buffer[] = [];
    request.on('data', (part: Buffer) => parts.push(part));
    request.on('end', () => {
      const { method, url: path, headers } = request;
      const body: unknown = JSON.parse(Buffer.concat(parts).toString());
      received.push({ method, path, key: headers.authorization, type: headers['content-type'], body });
      response.setHeader('Content-Type', 'application/json');
      response.end(JSON.stringify({ result: { answer: 42 }, notes: [], cautions: [] }));
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  baseUrl = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
});

afterAll(() => server.close());

/** The snippets as a reader would run them: pasted into a shell, a module, a program. */
const RUNNERS = {
  curl: (call: SnippetCall) => run('sh', ['-c', `${curlSnippet(call)} -s`], { env }),
  TypeScript: (call: SnippetCall) => {
    const options = { target: ts.ScriptTarget.ES2022, module: ts.ModuleKind.ESNext };
    const code = ts.transpileModule(typescriptSnippet(call), { compilerOptions: options }).outputText;
    return run(process.execPath, ['--input-type=module', '-e', code], { env });
  },
  Python: (call: SnippetCall) => run('python3', ['-c', pythonSnippet(call)], { env }),
} as const;

const BODIES = {
  'plain values': { aperture: 'f/5.6', shutter: '1/125', iso: 400, ndStops: 0 },
  'nested values, lists, truth and nothing': {
    from: { aperture: 8, isKept: true, other: false },
    parts: [{ stops: -1.5 }, { stops: 2 }],
    empty: {},
    none: [],
    nothing: null,
  },
  'text that quotes, escapes and leaves ASCII': {
    name: `it's "so" \\ $HOME \`id\` %s {x}\nnext`,
    'a-b': 'dusk – Dämmerung 黄昏',
  },
} as const;

describe.each(Object.keys(RUNNERS) as (keyof typeof RUNNERS)[])('the call in %s', (language) => {
  it.each(Object.entries(BODIES))(
    'sends %s as they are, with the key of the environment',
    async (_, body) => {
      received = [];
      const { stdout } = await RUNNERS[language]({ baseUrl, id: 'exposure/value', body });
      expect(received).toEqual([
        {
          method: 'POST',
          path: '/v1/exposure/value',
          key: 'Bearer evenfall_server_example',
          type: 'application/json',
          body,
        },
      ]);
      expect(stdout).toContain('42');
    },
  );
});

it('the TypeScript call is free of type errors where fetch and process are known', () => {
  const code = `${typescriptSnippet({ baseUrl, id: 'a/b', body: BODIES['plain values'] })}\nexport {};`;
  const { diagnostics } = ts.transpileModule(code, {
    reportDiagnostics: true,
    compilerOptions: { strict: true, target: ts.ScriptTarget.ES2022 },
  });
  expect(diagnostics).toEqual([]);
});
