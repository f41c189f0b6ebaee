import { readFileSync, readdirSync, readlinkSync } from 'node:fs';

export type PortHolder = { pid: number; command: string };

const LISTENING = '0A';

/** The sockets that listen on the port, by the inode under which /proc lists them (proc(5), /proc/net/tcp). */
function listeningInodes(port: number): Set<string> {
  const hexPort = port.toString(16).toUpperCase().padStart(4, '0');
  const lines = ['/proc/net/tcp', '/proc/net/tcp6'].flatMap((path) => readLines(path));
  const sockets = lines.map((line) => line.trim().split(/\s+/));
  const listening = sockets.filter(
    ([, local, , state]) => local?.endsWith(`:${hexPort}`) && state === LISTENING,
  );
  return new Set(listening.map((words) => `socket:[${words[9]}]`));
}

function readLines(path: string): string[] {
  try {
    return readFileSync(path, 'utf8').split('\n').slice(1);
  } catch {
    return [];
  }
}

function holdsOneOf(pid: number, sockets: ReadonlySet<string>): boolean {
  try {
    return readdirSync(`/proc/${pid}/fd`).some((fd) => sockets.has(linkOf(`/proc/${pid}/fd/${fd}`)));
  } catch {
    return false;
  }
}

function linkOf(path: string): string {
  try {
    return readlinkSync(path);
  } catch {
    return '';
  }
}

/** Who listens on the port, as far as this user may know: another user's processes stay unknown. */
export function portHolder(port: number): PortHolder | null {
  const sockets = listeningInodes(port);
  if (sockets.size === 0) return null;
  const pids = readdirSync('/proc').map(Number).filter(Number.isInteger);
  const pid = pids.find((candidate) => holdsOneOf(candidate, sockets));
  if (pid === undefined) return null;
  return { pid, command: readFileSync(`/proc/${pid}/comm`, 'utf8').trim() };
}
