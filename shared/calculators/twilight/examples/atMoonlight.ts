import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { twilightAtIn, twilightAtOut } from '../at';

export const atMoonlight: Example<z.input<typeof twilightAtIn>, z.output<typeof twilightAtOut>> = {
  title: 'A winter night under a high full moon, which outshines the sky by far',
  input: {
    latitude: 51.5074,
    longitude: -0.1278,
    at: '2026-12-24T00:00:00Z',
  },
  output: {
    timeZone: 'Europe/London',
    at: '2026-12-24T00:00:00+00:00',
    sunAltitudeDeg: -61.913491137224995,
    azimuthDeg: 0.0903063382587586,
    illuminanceLux: 0.0006447034585263924,
    ev100: -11.921004751558783,
    incidentC: 250,
    fallStopsPerMinute: 0,
    band: {
      twilight: 'night',
      hour: null,
    },
    moon: {
      altitudeDeg: 65.43591711239478,
      phaseAngleDeg: 4.040870789617429,
      illuminanceLux: 0.24522446606250514,
    },
  },
};
