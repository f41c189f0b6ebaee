import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { fillCheckIn } from '../../../contract/fillIn';
import type { fillCheckOut } from '../check';

export const checkRatio: Example<z.input<typeof fillCheckIn>, z.output<typeof fillCheckOut>> = {
  title: 'Key one stop over fill is 3:1, and the ambient light fills as well',
  input: {
    background: {
      ev100: 12,
    },
    subjectAmbient: {
      belowBackgroundStops: 5,
    },
    camera: {
      syncSpeed: '1/250',
    },
    settings: {
      aperture: 'f/4',
      shutter: '1/250',
      iso: 100,
    },
    aim: {
      ratio: 3,
    },
    sync: 'normal',
    flashes: [
      {
        name: 'octabox',
        role: 'key',
        guideNumberM: 32,
        power: '1/4',
        distanceM: 4,
      },
      {
        name: 'umbrella',
        role: 'fill',
        guideNumberM: 32,
        power: '1/8',
        distanceM: 4,
      },
    ],
  },
  output: {
    outcome: {
      backgroundStops: 0,
      subjectAmbientStops: -5,
      subjectFlashStops: 0.5849625007211562,
      subjectStops: 0.6147098441152081,
      keyStops: 0,
      fillStops: -1,
      shadowSideStops: -0.9125371587496606,
      ratio: 3,
      litOverShadowRatio: 2.8823529411764706,
      flashToAmbientStops: 5.584962500721156,
      reserveStops: 2,
      misses: {
        backgroundStops: 0,
        subjectStops: 0.6147098441152081,
        ratioStops: 0,
      },
      missStops: 0.6147098441152081,
      onAim: false,
    },
    onSubject: [
      {
        name: 'octabox',
        stops: 0,
      },
      {
        name: 'umbrella',
        stops: -1,
      },
    ],
  },
};
