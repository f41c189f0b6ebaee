import { isUtf8 } from 'node:buffer';
import type { IncomingMessage } from 'node:http';
import { ProblemError } from './ProblemError';

const JSON_TYPE = /^application\/json\s*(;\s*charset\s*=\s*"?utf-?8"?\s*)?$/i;

function mebibytes(limit: number): string {
  return limit >= 2 ** 20 ? `${limit / 2 ** 20} MiB` : `${limit / 2 ** 10} KiB`;
}

function tooLarge(limit: number): ProblemError {
  return new ProblemError('too_large', `The body may have up to ${mebibytes(limit)} here.`);
}

function parse(body: Buffer): unknown {
  if (!isUtf8(body)) throw new ProblemError('malformed_json', 'The body is not UTF-8.');
  try {
    return JSON.parse(body.toString('utf8'));
  } catch {
    const given = body.length === 0 ? 'The body is empty; send a JSON object.' : undefined;
    throw new ProblemError('malformed_json', given);
  }
}

function collect(request: IncomingMessage, limit: number): Promise<unknown> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = [];
    let size = 0;
    request.on('data', (chunk: Buffer) => {
      size += chunk.length;
      if (size <= limit) chunks.push(chunk);
      else {
        // What is still to come is read and dropped, so that the sender gets to read the answer.
        chunks.length = 0;
        reject(tooLarge(limit));
      }
    });
    request.on('end', () => {
      try {
        resolve(parse(chunks.length === 1 ? (chunks[0] as Buffer) : Buffer.concat(chunks)));
      } catch (error) {
        reject(error as Error);
      }
    });
    // A sender who is gone before the end is told as an error too.
    request.on('error', () => reject(new ProblemError('malformed_request', 'The body ended too early.')));
  });
}

/**
 * Reads a JSON body.
 * @param limit bytes
 * @throws ProblemError 415 for another type or a compressed body, 413 over the limit, 400 for what is no JSON
 */
export async function readJson(request: IncomingMessage, limit: number): Promise<unknown> {
  const {
    'content-type': type = '',
    'content-encoding': encoding,
    'content-length': length,
  } = request.headers;
  if (!JSON_TYPE.test(type)) {
    const detail = type ? `"${type.slice(0, 100)}" was given` : 'no Content-Type was given';
    throw new ProblemError('unsupported_media_type', `Send application/json in UTF-8; ${detail}.`, {
      headers: { Accept: 'application/json' },
    });
  }
  if (encoding && encoding !== 'identity') {
    throw new ProblemError('unsupported_media_type', 'Send the body as it is, not compressed.', {
      headers: { 'Accept-Encoding': 'identity' },
    });
  }
  if (Number(length) > limit) {
    request.resume();
    throw tooLarge(limit);
  }
  return collect(request, limit);
}
