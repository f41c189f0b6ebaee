import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { ladderIn } from '../../../contract/ladderIn';
import type { ladderOut } from '../../../contract/ladderOut';

export const ladderOneFrame: Example<z.input<typeof ladderIn>, z.output<typeof ladderOut>> = {
  title: 'One frame at sunset, in whole stops: the shutter gives way first, then aperture and ISO',
  input: {
    latitude: 51.5074,
    longitude: -0.1278,
    testFrame: {
      at: '2026-10-04T18:36:00+01:00',
      aperture: 'f/4',
      shutter: '1/125',
      iso: 400,
    },
    hold: {
      aperture: 'f/4',
      iso: 400,
    },
    limits: {
      shutterSlowest: '1/30',
      isoMax: 1600,
      apertureMin: 'f/2',
    },
    scale: 'full',
    to: '2026-10-04T19:15:00+01:00',
  },
  output: {
    timeZone: 'Europe/London',
    rungs: [
      {
        at: '2026-10-04T18:36:00+01:00',
        until: '2026-10-04T18:38:50+01:00',
        aperture: {
          exact: 4,
          mark: 'f/4',
          residualStops: 0,
        },
        shutter: {
          exact: 0.0078125,
          mark: '1/125',
          residualStops: 0,
        },
        iso: {
          exact: 400,
          mark: '400',
          residualStops: 0,
        },
        sceneEv100: 9,
        sunAltitudeDeg: -1.5237317754868664,
        errorStops: 0,
        earlyS: null,
        lateS: null,
      },
      {
        at: '2026-10-04T18:38:50+01:00',
        until: '2026-10-04T18:44:01+01:00',
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
        sceneEv100: 8.499998631386593,
        sunAltitudeDeg: -1.9630043997333286,
        errorStops: 0.4999986313865925,
        earlyS: 169.79780639648436,
        lateS: 159.58956030273438,
      },
      {
        at: '2026-10-04T18:44:01+01:00',
        until: '2026-10-04T18:48:46+01:00',
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
        sceneEv100: 7.499998484357395,
        sunAltitudeDeg: -2.769684984983784,
        errorStops: 0.4999984843573948,
        earlyS: 151.87839453125,
        lateS: 145.07607861328125,
      },
      {
        at: '2026-10-04T18:48:46+01:00',
        until: '2026-10-04T18:53:13+01:00',
        aperture: {
          exact: 2.82842712474619,
          mark: 'f/2.8',
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
        sceneEv100: 6.500000235739201,
        sunAltitudeDeg: -3.5085466826231113,
        errorStops: 0.5000002357392006,
        earlyS: 139.8809853515625,
        lateS: 135.1740751953125,
      },
      {
        at: '2026-10-04T18:53:13+01:00',
        until: '2026-10-04T18:57:26+01:00',
        aperture: {
          exact: 2,
          mark: 'f/2',
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
        sceneEv100: 5.499998264363863,
        sunAltitudeDeg: -4.200007659718085,
        errorStops: 0.49999826436386297,
        earlyS: 131.28888232421875,
        lateS: 127.85147338867188,
      },
      {
        at: '2026-10-04T18:57:26+01:00',
        until: '2026-10-04T19:01:27+01:00',
        aperture: {
          exact: 2,
          mark: 'f/2',
          residualStops: 0,
        },
        shutter: {
          exact: 0.03125,
          mark: '1/30',
          residualStops: 0,
        },
        iso: {
          exact: 800,
          mark: '800',
          residualStops: 0,
        },
        sceneEv100: 4.499998183339273,
        sunAltitudeDeg: -4.856749578999118,
        errorStops: 0.49999818333927326,
        earlyS: 125.09825756835937,
        lateS: 121.14840600585937,
      },
      {
        at: '2026-10-04T19:01:27+01:00',
        until: '2026-10-04T19:15:00+01:00',
        aperture: {
          exact: 2,
          mark: 'f/2',
          residualStops: 0,
        },
        shutter: {
          exact: 0.03125,
          mark: '1/30',
          residualStops: 0,
        },
        iso: {
          exact: 1600,
          mark: '1600',
          residualStops: 0,
        },
        sceneEv100: 3.499998119072832,
        sunAltitudeDeg: -5.4843711740114225,
        errorStops: 0.4999981190728322,
        earlyS: 120.51242700195313,
        lateS: 118.80472290039063,
      },
    ],
    turningPoints: [
      {
        at: '2026-10-04T18:44:01+01:00',
        code: 'handheld_limit',
        isLeft: false,
      },
      {
        at: '2026-10-04T18:48:46+01:00',
        code: 'aperture_opens',
        isLeft: false,
      },
      {
        at: '2026-10-04T18:57:26+01:00',
        code: 'iso_rises',
        isLeft: false,
      },
      {
        at: '2026-10-04T19:05:24+01:00',
        code: 'out_of_reach',
        isLeft: false,
      },
    ],
    model: {
      skyOffsetStops: 2.213331941913551,
      lampFloorEv100: null,
      spreadStops: 0.5,
      misfitStops: [0],
    },
  },
};
