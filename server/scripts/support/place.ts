import { join } from 'node:path';

/** The project's root: run.mjs has changed to it before anything of this is loaded. */
export const root = process.cwd();

/** What a clone keeps for itself: builds, its cluster, its secret. Never committed. */
export const dataFolder = join(root, '.data');
