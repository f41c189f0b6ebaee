import { spawn } from 'node:child_process';

/** Runs Node with the given arguments; what it prints goes to standard error. Rejects unless it ends well. */
export function runNode(args, options = {}) {
  return runProgram(process.execPath, args, options);
}

export function runProgram(program, args, options = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { stdio: ['ignore', 2, 2], ...options });
    const pass = (signal) => child.kill(signal);
    // A program in a session of its own is one that must not be interrupted.
    if (!options.detached) process.once('SIGINT', pass).once('SIGTERM', pass);
    const forget = () => process.off('SIGINT', pass).off('SIGTERM', pass);
    child.once('error', (error) => {
      forget();
      reject(error);
    });
    child.once('exit', (code, signal) => {
      forget();
      if (code === 0) resolve();
      else reject(forPeople(`${program} ${args.join(' ')} failed (${signal ?? `exit code ${code}`})`));
    });
  });
}

function forPeople(message) {
  return Object.assign(new Error(message), { isForPeople: true });
}
