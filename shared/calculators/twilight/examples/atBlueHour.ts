import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { twilightAtIn, twilightAtOut } from '../at';

export const atBlueHour: Example<z.input<typeof twilightAtIn>, z.output<typeof twilightAtOut>> = {
  title: 'Forty minutes after sunset at midsummer: the sky falls a stop in six minutes',
  input: {
    latitude: 51.5074,
    longitude: -0.1278,
    at: '2026-06-21T22:00:00+01:00',
  },
  output: {
    timeZone: 'Europe/London',
    at: '2026-06-21T22:00:00+01:00',
    sunAltitudeDeg: -5.06410116971197,
    azimuthDeg: 318.8435598610821,
    illuminanceLux: 9.703145714511944,
    ev100: 1.9565244432369393,
    incidentC: 250,
    fallStopsPerMinute: 0.16139792061137487,
    band: {
      twilight: 'civilTwilight',
      hour: 'blueHour',
    },
    moon: {
      altitudeDeg: 22.88759916125922,
      phaseAngleDeg: 90.45439050718765,
      illuminanceLux: 0.007811374641894569,
    },
  },
};
