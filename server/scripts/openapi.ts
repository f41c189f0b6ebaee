import { parseArgs } from 'node:util';
import { buildDocuments } from '../openapi/writeDocuments';
import { staleDocuments, writeDocuments } from './support/openapiFiles';
import { PeopleError } from './support/PeopleError';

/** `npm run openapi`: writes the documents under openapi/; with `--check` it only tells whether they are fresh. */
export async function main(args: readonly string[]): Promise<void> {
  const { values } = parseArgs({ args: [...args], options: { check: { type: 'boolean' } } });
  const documents = await buildDocuments();
  if (!values.check) {
    process.stdout.write(`${writeDocuments(documents).join('\n')}\n`);
    return;
  }
  const stale = staleDocuments(documents);
  if (stale.length > 0) throw new PeopleError(`Not fresh: ${stale.join(', ')}. Run: npm run openapi`);
  process.stdout.write('The documents under openapi/ are fresh\n');
}
