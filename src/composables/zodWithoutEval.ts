import { config } from 'zod/v4/core';

// Left to itself, zod tries whether it may compile code while it runs; the console's policy forbids that, and says so
// in the browser's console. It tries when a schema is made, so this comes before everything else.
config({ jitless: true });
