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
  return {
    'openapi.json': text(buildOpenapi(await loadCalculators(), options)),
    'console.json': text(buildConsoleOpenapi(consoleRoutes, options)),
  };
}
