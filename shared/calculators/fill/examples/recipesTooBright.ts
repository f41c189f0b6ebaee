import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { fillRecipesIn } from '../../../contract/fillIn';
import type { fillRecipesOut } from '../recipes';

export const recipesTooBright: Example<z.input<typeof fillRecipesIn>, z.output<typeof fillRecipesOut>> = {
  title: 'The juggler on the steps stands in more light than the background: no flash darkens',
  input: {
    background: {
      ev100: 10,
    },
    subjectAmbient: {
      belowBackgroundStops: -1,
    },
    camera: {
      apertureMin: 'f/1.8',
      apertureMax: 'f/16',
      isoMin: 100,
      isoMax: 6400,
      shutterSlowest: '1/4',
      shutterFastest: '1/8000',
      syncSpeed: '1/250',
    },
    flashes: [
      {
        name: 'octabox',
        role: 'key',
        guideNumberM: 40,
        minPower: '1/128',
        distanceM: 2,
        lossStops: 1.5,
      },
    ],
    count: 1,
  },
  output: {
    recipes: [
      {
        settings: {
          aperture: {
            exact: 4,
            mark: 'f/4',
            residualStops: 0,
          },
          shutter: {
            exact: 0.012401570718501561,
            mark: '1/80',
            residualStops: 0,
          },
          iso: {
            exact: 100,
            mark: '100',
            residualStops: 0,
          },
          ndStops: 0,
        },
        sync: 'none',
        flashes: [],
        outcome: {
          backgroundStops: -0.33333333333333215,
          subjectAmbientStops: 0.6666666666666679,
          subjectFlashStops: null,
          subjectStops: 0.6666666666666679,
          flashToAmbientStops: null,
          misses: {
            backgroundStops: -0.33333333333333215,
            subjectStops: 0.6666666666666679,
          },
          missStops: 0.6666666666666679,
          onAim: false,
        },
        why: [
          {
            code: 'background_off_aim',
            stops: -0.33333333333333215,
            message: 'The background comes out −0.33 stops from the aim.',
          },
          {
            code: 'subject_off_aim',
            stops: 0.6666666666666679,
            message: 'The subject comes out +0.67 stops from the aim.',
          },
          {
            code: 'lowest_iso',
            stops: null,
            message: 'ISO is the lowest that the camera has, so there is least noise.',
          },
          {
            code: 'no_flash',
            stops: null,
            message: 'Ambient light does it alone; no flash is used.',
          },
        ],
        score: 12000020000,
      },
    ],
    whyNot: [
      {
        limit: 'aim_background',
        shortByStops: 0.9999999999999991,
        giveUp: 'Let the background come out 1 stop darker.',
        leavesStops: 0,
        recipe: {
          settings: {
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
              exact: 100,
              mark: '100',
              residualStops: 0,
            },
            ndStops: 0,
          },
          sync: 'none',
          flashes: [],
          outcome: {
            backgroundStops: -1,
            subjectAmbientStops: 0,
            subjectFlashStops: null,
            subjectStops: 0,
            flashToAmbientStops: null,
            misses: {
              backgroundStops: -1,
              subjectStops: 0,
            },
            missStops: 1,
            onAim: false,
          },
          why: [
            {
              code: 'background_off_aim',
              stops: -1,
              message: 'The background comes out −1 stops from the aim.',
            },
            {
              code: 'lowest_iso',
              stops: null,
              message: 'ISO is the lowest that the camera has, so there is least noise.',
            },
            {
              code: 'no_flash',
              stops: null,
              message: 'Ambient light does it alone; no flash is used.',
            },
          ],
          score: 0,
        },
      },
      {
        limit: 'ambient_too_bright',
        shortByStops: 0.9999999999999996,
        giveUp:
          'Shade the subject by 1 stop; no flash darkens. Or lower everything and let the background come out darker.',
        leavesStops: 0,
        recipe: {
          settings: {
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
              exact: 100,
              mark: '100',
              residualStops: 0,
            },
            ndStops: 0,
          },
          sync: 'none',
          flashes: [],
          outcome: {
            backgroundStops: 0,
            subjectAmbientStops: 0,
            subjectFlashStops: null,
            subjectStops: 0,
            flashToAmbientStops: null,
            misses: {
              backgroundStops: 0,
              subjectStops: 0,
            },
            missStops: 0,
            onAim: true,
          },
          why: [
            {
              code: 'on_aim',
              stops: 0,
              message: 'Every part comes out as aimed.',
            },
            {
              code: 'lowest_iso',
              stops: null,
              message: 'ISO is the lowest that the camera has, so there is least noise.',
            },
            {
              code: 'no_flash',
              stops: null,
              message: 'Ambient light does it alone; no flash is used.',
            },
          ],
          score: 0,
        },
      },
      {
        limit: 'aim_subject',
        shortByStops: 0.9999999999999996,
        giveUp: 'Let the subject come out 1 stop brighter.',
        leavesStops: 0,
        recipe: {
          settings: {
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
              exact: 100,
              mark: '100',
              residualStops: 0,
            },
            ndStops: 0,
          },
          sync: 'none',
          flashes: [],
          outcome: {
            backgroundStops: 0,
            subjectAmbientStops: 1,
            subjectFlashStops: null,
            subjectStops: 1,
            flashToAmbientStops: null,
            misses: {
              backgroundStops: 0,
              subjectStops: 1,
            },
            missStops: 1,
            onAim: false,
          },
          why: [
            {
              code: 'subject_off_aim',
              stops: 1,
              message: 'The subject comes out +1 stops from the aim.',
            },
            {
              code: 'lowest_iso',
              stops: null,
              message: 'ISO is the lowest that the camera has, so there is least noise.',
            },
            {
              code: 'no_flash',
              stops: null,
              message: 'Ambient light does it alone; no flash is used.',
            },
          ],
          score: 0,
        },
      },
    ],
  },
};
