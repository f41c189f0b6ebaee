import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { processIdentity } from '../../../server/scripts/boot/processIdentity.mjs';
import { ProcessRegistry } from '../../../server/scripts/support/ProcessRegistry';

let dataFolder: string;
beforeEach(() => {
  dataFolder = mkdtempSync(join(tmpdir(), 'evenfall-registry-'));
});
afterEach(() => rmSync(dataFolder, { recursive: true, force: true }));

const entries = () => readdirSync(join(dataFolder, 'processes'));
const enter = (identity: string, entry: object) =>
  writeFileSync(join(dataFolder, 'processes', identity), JSON.stringify(entry));

describe('ProcessRegistry', () => {
  it('is empty before anybody has entered', () => {
    expect(new ProcessRegistry(dataFolder, 'start').others()).toEqual([]);
  });

  it('shows the other living processes, and not its own', () => {
    const registry = new ProcessRegistry(dataFolder, 'start');
    registry.update({ cluster: 'cluster' });
    const parent = { pid: process.ppid, script: 'start', cluster: 'cluster', port: 4310 };
    enter(processIdentity(process.ppid) ?? '', parent);
    expect(registry.others()).toEqual([parent]);
  });

  it('forgets processes that have died, though their number be used again', () => {
    const registry = new ProcessRegistry(dataFolder, 'start');
    registry.update({});
    enter(`${process.ppid}-1`, { pid: process.ppid, script: 'start', cluster: 'cluster' });
    enter('4194305-1', { pid: 4_194_305, script: 'start', cluster: 'cluster' });
    expect(registry.others()).toEqual([]);
    expect(entries()).toEqual([processIdentity(process.pid)]);
  });

  it('adds up what it is told, and leaves without a trace', () => {
    const registry = new ProcessRegistry(dataFolder, 'start');
    registry.update({ port: 4310, url: 'http://127.0.0.1:4310' });
    registry.update({ cluster: 'cluster' });
    expect(registry.own()).toMatchObject({
      script: 'start',
      port: 4310,
      cluster: 'cluster',
      pid: process.pid,
    });
    registry.leave();
    expect(entries()).toEqual([]);
  });
});
