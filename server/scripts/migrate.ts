import { migrate } from '../services/database/migrate';
import { withDatabase } from './support/withDatabase';

/** `npm run migrate`: brings the tables up to date and names what was applied. */
export function main(): Promise<void> {
  return withDatabase('migrate', async ({ ownerUrl }) => {
    const applied = await migrate(ownerUrl);
    const lines = applied.length > 0 ? applied.map((name) => `Applied ${name}`) : ['Nothing to apply'];
    process.stdout.write(`${lines.join('\n')}\n`);
  });
}
