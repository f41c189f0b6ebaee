import { parentPort } from 'node:worker_threads';
import { bcryptWork, type PasswordWork } from './bcryptWork';

/** One job at a time; what fails is told, so that nobody waits for it. */
parentPort?.on('message', (work: PasswordWork) => {
  try {
    parentPort?.postMessage({ result: bcryptWork(work) });
  } catch (error) {
    parentPort?.postMessage({ failure: error instanceof Error ? error.message : 'the hashing failed' });
  }
});
