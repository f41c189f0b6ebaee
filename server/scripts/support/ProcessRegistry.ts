import { mkdirSync, readFileSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { isAlive, processIdentity } from '../boot/processIdentity.mjs';

/** What a process that uses this data folder says about itself; `cluster` is the one that must stay up for it. */
export type RegisteredProcess = {
  pid: number;
  script: string;
  cluster: string | null;
  host?: string;
  port?: number;
  url?: string;
};

/** Which processes use this data folder. The entries of processes that have died are removed on the way. */
export class ProcessRegistry {
  readonly #folder: string;
  readonly #ownName = processIdentity(process.pid) ?? `${process.pid}-0`;
  #own: RegisteredProcess;

  constructor(dataFolder: string, script: string) {
    this.#folder = join(dataFolder, 'processes');
    this.#own = { pid: process.pid, script, cluster: null };
  }

  /** Enters this process, or changes its entry. */
  update(changes: Partial<RegisteredProcess>): void {
    this.#own = { ...this.#own, ...changes };
    mkdirSync(this.#folder, { recursive: true });
    const draft = `${this.#folder}.${this.#ownName}`;
    writeFileSync(draft, JSON.stringify(this.#own));
    renameSync(draft, join(this.#folder, this.#ownName));
  }

  own(): RegisteredProcess {
    return this.#own;
  }

  leave(): void {
    rmSync(join(this.#folder, this.#ownName), { force: true });
  }

  others(): RegisteredProcess[] {
    const names = this.#names().filter((name) => name !== this.#ownName);
    for (const name of names) if (!isAlive(name)) rmSync(join(this.#folder, name), { force: true });
    return names.filter(isAlive).flatMap((name) => this.#read(name));
  }

  #names(): string[] {
    try {
      return readdirSync(this.#folder);
    } catch {
      return [];
    }
  }

  #read(name: string): RegisteredProcess[] {
    try {
      return [JSON.parse(readFileSync(join(this.#folder, name), 'utf8')) as RegisteredProcess];
    } catch {
      // It has left since the folder was listed.
      return [];
    }
  }
}
