import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { ladderIn } from '../../../contract/ladderIn';
import type { ladderOut } from '../../../contract/ladderOut';

export const ladderFlash: Example<z.input<typeof ladderIn>, z.output<typeof ladderOut>> = {
  title: 'A second frame tells the lamps from the sky; the flash keeps the subject at its aim',
  input: {
    latitude: 51.5074,
    longitude: -0.1278,
    testFrame: {
      at: '2026-10-04T18:45:00+01:00',
      aperture: 'f/4',
      shutter: '1/60',
      iso: 400,
    },
    secondFrame: {
      at: '2026-10-04T19:30:00+01:00',
      aperture: 'f/4',
      shutter: '1/4',
      iso: 400,
    },
    hold: {
      aperture: 'f/4',
      iso: 400,
    },
    limits: {
      shutterSlowest: '1/15',
      isoMax: 1600,
      apertureMin: 'f/2.8',
    },
    flash: {
      guideNumberM: 36,
      distanceM: 3,
      lossStops: 1.5,
      minPower: '1/128',
      syncSpeed: '1/200',
    },
    subjectBelowBackgroundStops: 1,
    scale: 'full',
    to: '2026-10-04T19:30:00+01:00',
  },
  output: {
    timeZone: 'Europe/London',
    rungs: [
      {
        at: '2026-10-04T18:45:00+01:00',
        until: '2026-10-04T18:47:34+01:00',
        aperture: {
          exact: 4,
          mark: 'f/4',
          residualStops: 0,
        },
        shutter: {
          exact: 0.015625,
          mark: '1/60',
          residualStops: 0,
        },
        iso: {
          exact: 400,
          mark: '400',
          residualStops: 0,
        },
        power: {
          exact: 0.0393725328092148,
          mark: '1/32+1/3',
          residualStops: 0,
        },
        sceneEv100: 7.999999999877,
        sunAltitudeDeg: -2.9219172372080333,
        errorStops: -1.2300027663059154e-10,
        earlyS: null,
        lateS: null,
      },
      {
        at: '2026-10-04T18:47:34+01:00',
        until: '2026-10-04T18:52:43+01:00',
        aperture: {
          exact: 4,
          mark: 'f/4',
          residualStops: 0,
        },
        shutter: {
          exact: 0.03125,
          mark: '1/30',
          residualStops: 0,
        },
        iso: {
          exact: 400,
          mark: '400',
          residualStops: 0,
        },
        power: {
          exact: 0.0393725328092148,
          mark: '1/32+1/3',
          residualStops: 0,
        },
        sceneEv100: 7.500000010938933,
        sunAltitudeDeg: -3.3215390221638277,
        errorStops: 0.5000000109389333,
        earlyS: 70.57694653320313,
        lateS: 69.36693359375,
      },
      {
        at: '2026-10-04T18:52:43+01:00',
        until: '2026-10-04T18:58:22+01:00',
        aperture: {
          exact: 4,
          mark: 'f/4',
          residualStops: 0,
        },
        shutter: {
          exact: 0.0625,
          mark: '1/15',
          residualStops: 0,
        },
        iso: {
          exact: 400,
          mark: '400',
          residualStops: 0,
        },
        power: {
          exact: 0.0393725328092148,
          mark: '1/32+1/3',
          residualStops: 0,
        },
        sceneEv100: 6.500001419618284,
        sunAltitudeDeg: -4.122874972766527,
        errorStops: 0.5000014196182843,
        earlyS: 65.49104028320312,
        lateS: 65.21496630859374,
      },
      {
        at: '2026-10-04T18:58:22+01:00',
        until: '2026-10-04T19:06:46+01:00',
        aperture: {
          exact: 2.82842712474619,
          mark: 'f/2.8',
          residualStops: 0,
        },
        shutter: {
          exact: 0.0625,
          mark: '1/15',
          residualStops: 0,
        },
        iso: {
          exact: 400,
          mark: '400',
          residualStops: 0,
        },
        power: {
          exact: 0.0196862664046074,
          mark: '1/64+1/3',
          residualStops: 0,
        },
        sceneEv100: 5.500001231981649,
        sunAltitudeDeg: -5.002429325359682,
        errorStops: 0.5000012319816491,
        earlyS: 60.56783227539062,
        lateS: 62.085309326171874,
      },
      {
        at: '2026-10-04T19:06:46+01:00',
        until: '2026-10-04T19:30:00+01:00',
        aperture: {
          exact: 2.82842712474619,
          mark: 'f/2.8',
          residualStops: 0,
        },
        shutter: {
          exact: 0.0625,
          mark: '1/15',
          residualStops: 0,
        },
        iso: {
          exact: 800,
          mark: '800',
          residualStops: 0,
        },
        power: {
          exact: 0.0098431332023037,
          mark: '1/128+1/3',
          residualStops: 0,
        },
        sceneEv100: 4.500000555337266,
        sunAltitudeDeg: -6.312146165035397,
        errorStops: 0.500000555337266,
        earlyS: 57.848443603515626,
        lateS: 64.98884497070313,
      },
    ],
    turningPoints: [
      {
        at: '2026-10-04T18:52:43+01:00',
        code: 'handheld_limit',
        isLeft: false,
      },
      {
        at: '2026-10-04T18:58:22+01:00',
        code: 'aperture_opens',
        isLeft: false,
      },
      {
        at: '2026-10-04T19:06:46+01:00',
        code: 'iso_rises',
        isLeft: false,
      },
    ],
    model: {
      skyOffsetStops: 2.8207875861137603,
      lampFloorEv100: 3.988441337245302,
      spreadStops: 0.25,
      misfitStops: [1.2300027663059154e-10, -1.4491868149946185e-8],
    },
  },
};
