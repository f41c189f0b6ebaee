import { randomBytes } from 'node:crypto';
import { withClient } from '../../server/scripts/cluster/prepareDatabase';
import { testSettings } from './testSettings';

export type TestDatabase = {
  name: string;
  /** The role that owns the tables: may do everything, to arrange a case or to look behind the scenes. */
  ownerUrl: string;
  /** The role of the running service. */
  serviceUrl: string;
  drop(): Promise<void>;
};

/** A database of the caller's own: migrated, empty, and gone after `drop`, or else at the end of the run. */
export async function openTestDatabase(): Promise<TestDatabase> {
  const { adminUrl, ownerUrl, serviceUrl, template, prefix } = testSettings();
  const name = `${prefix}${randomBytes(6).toString('hex')}`;
  await withClient(adminUrl, (client) =>
    client.query(`CREATE DATABASE ${name} TEMPLATE ${template} OWNER evenfall_owner`),
  );
  return {
    name,
    ownerUrl: withDatabase(ownerUrl, name),
    serviceUrl: withDatabase(serviceUrl, name),
    drop: async () => {
      await withClient(adminUrl, (client) => client.query(`DROP DATABASE IF EXISTS ${name} WITH (FORCE)`));
    },
  };
}

function withDatabase(address: string, name: string): string {
  const url = new URL(address);
  url.pathname = `/${name}`;
  return url.href;
}
