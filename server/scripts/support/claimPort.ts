import type { Config } from '../../config';
import { isPortFree } from './freePort';
import { PeopleError } from './PeopleError';
import { portHolder } from './portHolder';
import type { ProcessRegistry } from './ProcessRegistry';

/** Makes sure, before anything slow is begun, that the service can listen where it is to. */
export async function claimPort({ host, port, publicUrl }: Config, registry: ProcessRegistry): Promise<void> {
  const other = registry.others().find((entry) => entry.port === port && entry.host === host);
  if (other) {
    throw new PeopleError(
      `Evenfall is already running at ${other.url} (process ${other.pid}). Stop that one first, or start another beside it: PORT=${port + 1} npm start`,
    );
  }
  if (!(await isPortFree(port, host))) throw portTaken({ host, port });
  registry.update({ host, port, url: publicUrl });
}

export function portTaken({ host, port }: { host: string; port: number }): PeopleError {
  const holder = portHolder(port);
  const who = holder ? `${holder.command}, process ${holder.pid}` : 'a program of another user';
  return new PeopleError(
    `Port ${port} on ${host} is taken (${who}), or this user may not listen there. Choose another: PORT=${port + 1 > 65_535 ? 4310 : port + 1} npm start`,
  );
}
