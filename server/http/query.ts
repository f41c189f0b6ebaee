import { ProblemError } from './ProblemError';

const KEY_NAMES = new Set(['key', 'apikey', 'api_key', 'access_token', 'token', 'authorization']);
const ENCODED = /[%+]/;
/** The start of every key of ours. */
const KEY_START = /evenfall_(server|page|pass)_/;

function decode(text: string): string {
  if (!ENCODED.test(text)) return text;
  try {
    return decodeURIComponent(text.replaceAll('+', ' '));
  } catch {
    throw new ProblemError('malformed_request', `"${text.slice(0, 60)}" is not percent-encoded UTF-8.`);
  }
}

/**
 * Reads a query string into pairs.
 * @throws ProblemError 400 for a bad encoding, a name that stands twice, or a key in the address
 */
export function readQuery(search: string): [string, string][] {
  if (search === '') return [];
  const seen = new Set<string>();
  const pairs: [string, string][] = [];
  for (const part of search.split('&')) {
    if (part === '') continue;
    const at = part.indexOf('=');
    const name = decode(at < 0 ? part : part.slice(0, at));
    const value = at < 0 ? '' : decode(part.slice(at + 1));
    if (KEY_NAMES.has(name.toLowerCase()) || KEY_START.test(value)) {
      throw new ProblemError(
        'malformed_request',
        'Addresses end up in logs: send the key in the Authorization header, never in the address.',
      );
    }
    if (seen.has(name)) {
      throw new ProblemError('malformed_request', `"${name}" stands twice in the query; give it once.`);
    }
    seen.add(name);
    pairs.push([name, value]);
  }
  return pairs;
}
