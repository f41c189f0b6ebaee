// How the shutter follows a falling sky at f/4 and ISO 400, and when the hand-held limit makes ISO rise.
// Usage: compile with any TypeScript compiler, then EVENFALL_KEY=evenfall_server_… node falling-light.js
import { callEvenfall, EvenfallError } from './callEvenfall.js';

interface Setting {
  readonly exact: number;
  readonly mark: string;
}

const { result: limit } = await callEvenfall<{ slowestShutter: Setting }>('exposure/handheld', {
  focalLengthMm: 35,
});
console.log(`Hand-held at 35 mm: ${limit.slowestShutter.mark} at the slowest`);

for (const ev100 of [8, 7, 6, 5, 4]) {
  const { result } = await callEvenfall<{ shutter: Setting }>('exposure/solve', {
    ev100,
    aperture: 'f/4',
    iso: 400,
  });
  if (result.shutter.exact <= limit.slowestShutter.exact) {
    console.log(`EV ${ev100}: f/4, ${result.shutter.mark}, ISO 400`);
    continue;
  }
  const held = { ev100, aperture: 'f/4', shutter: limit.slowestShutter.mark };
  const { result: raised } = await callEvenfall<{ iso: Setting }>('exposure/solve', held);
  console.log(`EV ${ev100}: f/4, ${limit.slowestShutter.mark}, ISO ${raised.iso.mark}`);
}

try {
  await callEvenfall('exposure/solve', { ev100: 5, aperture: 'f/4', shuter: '1/30' });
} catch (error) {
  if (!(error instanceof EvenfallError)) throw error;
  for (const { pointer, detail } of error.problem.errors ?? []) console.log(`${pointer}: ${detail}`);
}
