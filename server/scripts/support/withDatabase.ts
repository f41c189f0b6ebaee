import { openDatabase, type Database } from '../cluster/openDatabase';
import { commandConfig } from './loadConfig';
import { dataFolder } from './place';
import { ProcessRegistry } from './ProcessRegistry';

/** For commands that do one thing: the database is there while they work, and as it was before afterwards. */
export async function withDatabase(
  script: string,
  work: (database: Database) => Promise<void>,
): Promise<void> {
  const registry = new ProcessRegistry(dataFolder, script);
  try {
    const database = await openDatabase(commandConfig(), { dataFolder, registry });
    try {
      await work(database);
    } finally {
      await database.close();
    }
  } finally {
    registry.leave();
  }
}
