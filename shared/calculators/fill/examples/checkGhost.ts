import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { fillCheckIn } from '../../../contract/fillIn';
import type { fillCheckOut } from '../check';

export const checkGhost: Example<z.input<typeof fillCheckIn>, z.output<typeof fillCheckOut>> = {
  title:
    'A juggler’s hand at 5 m/s: what the flash freezes, how visible the ghost is, whether the camera shakes',
  input: {
    background: {
      ev100: 4,
    },
    subjectAmbient: {
      belowBackgroundStops: 2,
    },
    camera: {
      syncSpeed: '1/250',
    },
    settings: {
      aperture: 'f/2.8',
      shutter: '1/30',
      iso: 800,
    },
    sync: 'normal',
    flashes: [
      {
        name: 'bare flash',
        role: 'key',
        guideNumberM: 32,
        power: '1/32',
        distanceM: 5,
        t05S: 0.001,
        control: 'cutoff',
        recycleFullS: 3,
      },
    ],
    view: {
      focalLengthMm: 50,
      distanceM: 5,
      pixelPitchUm: 6,
    },
    subject: {
      speedMS: 5,
    },
    support: {
      kind: 'handheld',
    },
  },
  output: {
    outcome: {
      backgroundStops: -1,
      subjectAmbientStops: -3,
      subjectFlashStops: 0.35614381022527564,
      subjectStops: 0.49057013044620174,
      keyStops: 0.35614381022527564,
      shadowSideStops: -3,
      litOverShadowRatio: 11.240000000000002,
      flashToAmbientStops: 3.3561438102252756,
      clippedStops: 0,
      reserveStops: 5,
      recycleS: 0.09375,
      blur: {
        blurPx: 0.4865630438815219,
        blurUm: 2.9193782632891314,
        blurMmAtSubject: 0.289018448065624,
        frozen: true,
        by: 'flash',
        lightS: 0.00005780368961312479,
      },
      ghost: {
        stopsBelowFlash: 3.3561438102252756,
        trailPx: 263.04713804713805,
        visibility: 'none',
        throughStops: -1.053828681598251,
      },
      handheld: {
        withinLimit: false,
        overStops: 0.6438561897747244,
        slowestShutter: {
          exact: 0.02,
          mark: '1/50',
          residualStops: -0.022810476891942297,
        },
      },
      misses: {
        backgroundStops: -1,
        subjectStops: 0.49057013044620174,
      },
      missStops: 1,
      onAim: false,
    },
    onSubject: [
      {
        name: 'bare flash',
        stops: 0.35614381022527564,
      },
    ],
  },
};
