import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { fillCheckIn } from '../../../contract/fillIn';
import type { fillCheckOut } from '../check';

export const checkHighSpeed: Example<z.input<typeof fillCheckIn>, z.output<typeof fillCheckOut>> = {
  title: 'High-speed sync at 1/2000 takes almost three stops of the flash',
  input: {
    background: {
      ev100: 15,
    },
    subjectAmbient: {
      belowBackgroundStops: 2,
    },
    camera: {
      syncSpeed: '1/250',
      highSpeedSync: {
        extraLossStops: 0,
      },
    },
    settings: {
      aperture: 'f/4',
      shutter: '1/2000',
      iso: 100,
    },
    sync: 'highSpeed',
    flashes: [
      {
        name: 'bare flash',
        role: 'key',
        guideNumberM: 48,
        power: 1,
        distanceM: 4,
      },
    ],
  },
  output: {
    outcome: {
      backgroundStops: 0,
      subjectAmbientStops: -2,
      subjectFlashStops: 0.2015269988281405,
      subjectStops: 0.4853390479702575,
      keyStops: 0.2015269988281405,
      shadowSideStops: -2,
      litOverShadowRatio: 5.599659284497443,
      flashToAmbientStops: 2.2015269988281405,
      highSpeedLossStops: 2.9683980026141716,
      reserveStops: 0,
      misses: {
        backgroundStops: 0,
        subjectStops: 0.4853390479702575,
      },
      missStops: 0.4853390479702575,
      onAim: false,
    },
    onSubject: [
      {
        name: 'bare flash',
        stops: 0.2015269988281405,
      },
    ],
  },
};
