import { parseArgs } from 'node:util';
import { migrate } from '../services/database/migrate';
import { issueKeyForOperator } from '../services/keys/issueKey';
import { PeopleError } from './support/PeopleError';
import { withDatabase } from './support/withDatabase';

const usage = 'npm run --silent key:issue -- --account EMAIL --name NAME [--units N] [--rate R]';

type Request = Parameters<typeof issueKeyForOperator>[1];

/** For operators: prints one new server key, and nothing else, on standard output. */
export async function main(args: readonly string[]): Promise<void> {
  const request = readRequest(args);
  await withDatabase('key-issue', async ({ ownerUrl }) => {
    await migrate(ownerUrl);
    process.stdout.write(`${await issueKeyForOperator(ownerUrl, request)}\n`);
  });
}

function readRequest(args: readonly string[]): Request {
  const text = { type: 'string' } as const;
  try {
    const { values } = parseArgs({
      args: [...args],
      options: { account: text, name: text, units: text, rate: text },
    });
    if (!values.account || !values.name) throw new Error('--account and --name are needed');
    return {
      account: values.account,
      name: values.name,
      units: wholeNumber('--units', values.units),
      rate: wholeNumber('--rate', values.rate),
    };
  } catch (error) {
    throw new PeopleError(`${error instanceof Error ? error.message : String(error)}\nUsage: ${usage}`);
  }
}

function wholeNumber(name: string, text: string | undefined): number | undefined {
  if (text === undefined) return undefined;
  if (!/^[1-9]\d{0,11}$/.test(text))
    throw new Error(`${name} must be a whole number above 0, and ${JSON.stringify(text)} is not`);
  return Number(text);
}
