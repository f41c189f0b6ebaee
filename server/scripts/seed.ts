import { migrate } from '../services/database/migrate';
import { seedDemo } from '../services/demo/seed';
import { rememberSignIn } from './support/demoSignIn';
import { dataFolder } from './support/place';
import { withDatabase } from './support/withDatabase';

/** `npm run seed`: fills an empty database with the demo scenario and says how to sign in. */
export function main(): Promise<void> {
  return withDatabase('seed', async ({ ownerUrl, clusterPort }) => {
    await migrate(ownerUrl);
    const report = await seedDemo(ownerUrl, new Date());
    if (report && clusterPort) rememberSignIn(dataFolder, report.lines);
    const lines = report ? report.lines : ['The database is not empty: nothing was changed'];
    process.stdout.write(`${lines.join('\n')}\n`);
  });
}
