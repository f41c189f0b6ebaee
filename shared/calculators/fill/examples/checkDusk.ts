import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { fillCheckIn } from '../../../contract/fillIn';
import type { fillCheckOut } from '../check';

export const checkDusk: Example<z.input<typeof fillCheckIn>, z.output<typeof fillCheckOut>> = {
  title: 'A dusk frame: flash one stop under with ambient light one stop under makes the subject right',
  input: {
    background: {
      ev100: 8,
    },
    subjectAmbient: {
      belowBackgroundStops: 1,
    },
    camera: {
      syncSpeed: '1/250',
    },
    settings: {
      aperture: 'f/4',
      shutter: '1/60',
      iso: 400,
    },
    sync: 'normal',
    flashes: [
      {
        name: 'bare flash',
        role: 'key',
        guideNumberM: 32,
        power: '1/8',
        distanceM: 8,
      },
    ],
  },
  output: {
    outcome: {
      backgroundStops: 0,
      subjectAmbientStops: -1,
      subjectFlashStops: -1,
      subjectStops: 0,
      keyStops: -1,
      shadowSideStops: -1,
      litOverShadowRatio: 2,
      flashToAmbientStops: 0,
      reserveStops: 3,
      misses: {
        backgroundStops: 0,
        subjectStops: 0,
      },
      missStops: 0,
      onAim: true,
    },
    onSubject: [
      {
        name: 'bare flash',
        stops: -1,
      },
    ],
  },
};
