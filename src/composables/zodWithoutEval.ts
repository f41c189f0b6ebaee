import { config } from 'zod';

// Left to itself, zod tries whether it may compile code while it runs; the console's policy forbids that, and says so
// in the browser's console. Imported before any calculator is loaded.
config({ jitless: true });
