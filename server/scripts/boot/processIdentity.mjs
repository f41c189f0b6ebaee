import { readFileSync } from 'node:fs';

/** Process numbers are used again, so a process is named by its number and the moment it started. */
export function processIdentity(pid) {
  try {
    // The command's name, in brackets, may hold spaces; the start time is the 20th word after it (proc(5), field 22).
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const words = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return words[0] === 'Z' ? null : `${pid}-${words[19]}`;
  } catch {
    return existsWithoutProc(pid) ? `${pid}-0` : null;
  }
}

function existsWithoutProc(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
}

export function isAlive(identity) {
  const pid = Number(identity.split('-')[0]);
  return Number.isInteger(pid) && pid > 0 && processIdentity(pid) === identity;
}
