import openapiTypescript, { astToString } from 'openapi-typescript';
import { version } from '../../package.json';
import { loadCalculators } from '../../shared/calculators';
import { consoleRoutes } from '../routes/api/consoleRoutes';
import { buildConsoleOpenapi } from './buildConsoleOpenapi';
import { buildOpenapi } from './buildOpenapi';

/** The committed documents name the default address of a service on one's own machine. */
const COMMITTED_URL = 'http://127.0.0.1:4310';

/** The documents that are committed under openapi/, by file name. */
export async function buildDocuments(): Promise<Record<string, string>> {
  const options = { version, publicUrl: COMMITTED_URL };
  const text = (document: Record<string, unknown>) => `${JSON.stringify(document, null, 2)}\n`;
  const console = buildConsoleOpenapi(consoleRoutes, options);
  return {
    'openapi.json': text(buildOpenapi(await loadCalculators(), options)),
    'console.json': text(console),
    'console.ts': await typesOf(text(console)),
  };
}

/** The document as types, for the console's own client. */
async function typesOf(document: string): Promise<string> {
  return `// Made from console.json by \`npm run openapi\`.\n${astToString(await openapiTypescript(document))}`;
}
