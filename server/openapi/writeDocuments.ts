import { version } from '../../package.json';
import { loadCalculators } from '../../shared/calculators';
import { buildOpenapi } from './buildOpenapi';

/** The committed documents name the default address of a service on one's own machine. */
const COMMITTED_URL = 'http://127.0.0.1:4310';

/** The documents that are committed under openapi/, by file name. */
export async function buildDocuments(): Promise<Record<string, string>> {
  const document = buildOpenapi(await loadCalculators(), { version, publicUrl: COMMITTED_URL });
  return { 'openapi.json': `${JSON.stringify(document, null, 2)}\n` };
}
