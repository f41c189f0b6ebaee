import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { isAlive, processIdentity } from '../../../server/scripts/boot/processIdentity.mjs';
import { openCluster, type Cluster } from '../../../server/scripts/cluster/openCluster';
import { openDatabase } from '../../../server/scripts/cluster/openDatabase';
import { findPostmaster, processesIn } from '../../../server/scripts/cluster/postmaster';
import { adminUrl, databaseUrl, withClient } from '../../../server/scripts/cluster/prepareDatabase';
import { ProcessRegistry } from '../../../server/scripts/support/ProcessRegistry';

// One cluster goes through its life here, in the order of the tests.
describe("a cluster of the clone's own", () => {
  const dataFolder = mkdtempSync(join(tmpdir(), 'evenfall-cluster-'));
  const registry = new ProcessRegistry(dataFolder, 'test');
  const open = () => openCluster({ dataFolder, name: 'cluster', isDurable: false, registry });
  let cluster: Cluster;
  let firstPid: number;

  const keep = (note: string) =>
    withClient(adminUrl(cluster.port, cluster.passwords), async (client) => {
      await client.query('CREATE TABLE IF NOT EXISTS kept (note text)');
      await client.query('INSERT INTO kept VALUES ($1)', [note]);
    });
  const kept = () =>
    withClient(adminUrl(cluster.port, cluster.passwords), async (client) => {
      const { rows } = await client.query<{ note: string }>('SELECT note FROM kept');
      return rows.map(({ note }) => note);
    });

  beforeAll(async () => {
    chmodSync(dataFolder, 0o755);
    cluster = await open();
    firstPid = cluster.pid;
  }, 60_000);

  afterAll(async () => {
    await (await open()).close();
    rmSync(dataFolder, { recursive: true, force: true });
  });

  it('answers who knows the password and nobody else', async () => {
    await keep('first');
    const guess = databaseUrl(cluster.port, 'evenfall_admin', 'a-guess', 'postgres');
    await expect(withClient(guess, (client) => client.query('SELECT 1'))).rejects.toMatchObject({
      code: '28P01',
    });
    const passwordless = `postgres://evenfall_admin@127.0.0.1:${cluster.port}/postgres`;
    await expect(withClient(passwordless, (client) => client.query('SELECT 1'))).rejects.toThrow(/password/);
  });

  it('listens on loopback only, and keeps its passwords from other users', async () => {
    const settings = await withClient(adminUrl(cluster.port, cluster.passwords), async (client) => {
      const { rows } = await client.query<{ name: string; setting: string }>(
        `SELECT name, setting FROM pg_settings WHERE name IN ('listen_addresses', 'unix_socket_directories')`,
      );
      return Object.fromEntries(rows.map(({ name, setting }) => [name, setting]));
    });
    expect(settings).toEqual({ listen_addresses: '127.0.0.1', unix_socket_directories: '' });
    expect(statSync(join(dataFolder, 'cluster.json')).mode & 0o077).toBe(0);
    expect(statSync(cluster.folder).mode & 0o077).toBe(0);
  });

  it('is adopted by a second process while it runs, with its data', async () => {
    cluster = await open();
    expect(cluster.pid).toBe(firstPid);
    expect(await kept()).toEqual(['first']);
  });

  it('stays up when it is left while another process uses it', async () => {
    const other = processIdentity(process.ppid) ?? '';
    const entry = join(dataFolder, 'processes', other);
    writeFileSync(entry, JSON.stringify({ pid: process.ppid, script: 'start', cluster: 'cluster' }));
    await cluster.close();
    expect(await kept()).toEqual(['first']);
    rmSync(entry);
  });

  it('stops when the last one leaves, and starts again on the same port with the same data', async () => {
    const { port } = cluster;
    cluster = await open();
    await cluster.close();
    expect(findPostmaster(cluster.folder)).toBeNull();
    expect(processesIn(cluster.folder)).toEqual([]);
    cluster = await open();
    expect(cluster.pid).not.toBe(firstPid);
    expect(cluster.port).toBe(port);
    expect(await kept()).toEqual(['first']);
  });

  it('recovers what was committed after its server was killed', async () => {
    await keep('before the kill');
    process.kill(cluster.pid, 'SIGKILL');
    cluster = await open();
    expect(await kept()).toEqual(['first', 'before the kill']);
  });

  it('starts although the pid file of a dead server names a living process', async () => {
    const identity = processIdentity(cluster.pid) ?? '';
    process.kill(cluster.pid, 'SIGKILL');
    await expect.poll(() => isAlive(identity)).toBe(false);
    const path = join(cluster.folder, 'postmaster.pid');
    writeFileSync(path, readFileSync(path, 'utf8').replace(/^\d+/, String(process.pid)));
    expect(findPostmaster(cluster.folder)).toBeNull();
    cluster = await open();
    expect(await kept()).toHaveLength(2);
  });

  it('is opened with new passwords when its record is lost', async () => {
    await cluster.close();
    const { passwords } = cluster;
    rmSync(join(dataFolder, 'cluster.json'));
    cluster = await open();
    expect(cluster.passwords.admin).not.toBe(passwords.admin);
    expect(await kept()).toHaveLength(2);
  });

  it('refuses data of another major version in one clear line, and leaves them alone', async () => {
    await cluster.close();
    const path = join(cluster.folder, 'PG_VERSION');
    const version = readFileSync(path, 'utf8');
    writeFileSync(path, '9\n');
    await expect(open()).rejects.toThrow(
      /are PostgreSQL 9's, and only [\d, ]+ is installed: install postgresql-9/,
    );
    writeFileSync(path, version);
    cluster = await open();
    expect(await kept()).toHaveLength(2);
  });

  it('gives the service a role that may touch rows and no tables', async () => {
    const database = await openDatabase(
      { databaseUrl: null, databaseOwnerUrl: null, port: 4310 },
      { dataFolder, registry },
    );
    await withClient(database.ownerUrl, (owner) => owner.query('CREATE TABLE things (id int)'));
    await withClient(database.serviceUrl, async (service) => {
      await service.query('INSERT INTO things VALUES (1)');
      expect((await service.query('DELETE FROM things')).rowCount).toBe(1);
      for (const forbidden of [
        'CREATE TABLE more (id int)',
        'DROP TABLE things',
        'CREATE ROLE x',
        'CREATE DATABASE x',
      ]) {
        await expect(service.query(forbidden)).rejects.toMatchObject({ code: '42501' });
      }
    });
    await database.close();
    expect(processesIn(cluster.folder)).toEqual([]);
  });

  it('is not made where the settings name a database', async () => {
    const elsewhere = join(dataFolder, 'elsewhere');
    const settings = { databaseUrl: 'postgres://a@b/c', databaseOwnerUrl: 'postgres://o@b/c', port: 4310 };
    const database = await openDatabase(settings, { dataFolder: elsewhere, registry });
    expect(database).toMatchObject({
      serviceUrl: 'postgres://a@b/c',
      ownerUrl: 'postgres://o@b/c',
      clusterPort: null,
    });
    expect(existsSync(elsewhere)).toBe(false);
  });
});
