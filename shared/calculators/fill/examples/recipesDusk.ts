import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { fillRecipesIn } from '../../../contract/fillIn';
import type { fillRecipesOut } from '../recipes';

export const recipesDusk: Example<z.input<typeof fillRecipesIn>, z.output<typeof fillRecipesOut>> = {
  title:
    'The lamp maker on the terrace at dusk: background one stop under, subject two stops darker than it; hand-held',
  input: {
    background: {
      testFrame: {
        aperture: 'f/2.8',
        shutter: '1/60',
        iso: 400,
        offsetStops: 0,
      },
    },
    subjectAmbient: {
      belowBackgroundStops: 2,
    },
    aim: {
      backgroundStops: -1,
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
    view: {
      focalLengthMm: 50,
      distanceM: 3,
    },
    support: {
      kind: 'handheld',
      stabilisationStops: 2,
    },
    count: 2,
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
            exact: 0.0625,
            mark: '1/15',
            residualStops: 0,
          },
          iso: {
            exact: 100,
            mark: '100',
            residualStops: 0,
          },
          ndStops: 0,
        },
        sync: 'normal',
        flashes: [
          {
            name: 'octabox',
            role: 'key',
            power: {
              exact: 0.09921256574801249,
              mark: '1/16+2/3',
              residualStops: 0,
            },
            distanceM: 2,
            onSubjectStops: -0.18947714355860779,
          },
        ],
        outcome: {
          backgroundStops: -1,
          subjectAmbientStops: -3,
          subjectFlashStops: -0.18947714355860779,
          subjectStops: 0.002772322799259763,
          keyStops: -0.18947714355860779,
          shadowSideStops: -3,
          litOverShadowRatio: 8.015387801933585,
          flashToAmbientStops: 2.810522856441392,
          reserveStops: 3.333333333333333,
          handheld: {
            withinLimit: true,
            overStops: 0,
            slowestShutter: {
              exact: 0.08,
              mark: '1/13',
              residualStops: -0.022810476891941645,
            },
          },
          misses: {
            backgroundStops: 0,
            subjectStops: 0.002772322799259763,
          },
          missStops: 0.002772322799259763,
          onAim: true,
        },
        why: [
          {
            code: 'on_aim',
            stops: 0.002772322799259763,
            message: 'Every part comes out as aimed.',
          },
          {
            code: 'lowest_iso',
            stops: null,
            message: 'ISO is the lowest that the camera has, so there is least noise.',
          },
          {
            code: 'much_in_reserve',
            stops: 3.333333333333333,
            message: 'Even the flash that works hardest has 3.33 stops in reserve, so batteries last.',
          },
        ],
        score: 1000,
      },
      {
        settings: {
          aperture: {
            exact: 8,
            mark: 'f/8',
            residualStops: 0,
          },
          shutter: {
            exact: 0.07874506561842959,
            mark: '1/13',
            residualStops: 0,
          },
          iso: {
            exact: 317.48021039363994,
            mark: '320',
            residualStops: 0,
          },
          ndStops: 0,
        },
        sync: 'normal',
        flashes: [
          {
            name: 'octabox',
            role: 'key',
            power: {
              exact: 0.125,
              mark: '1/8',
              residualStops: 0,
            },
            distanceM: 2,
            onSubjectStops: -0.18947714355860779,
          },
        ],
        outcome: {
          backgroundStops: -0.9999999999999991,
          subjectAmbientStops: -2.999999999999999,
          subjectFlashStops: -0.18947714355860779,
          subjectStops: 0.0027723227992600408,
          keyStops: -0.18947714355860779,
          shadowSideStops: -2.999999999999999,
          litOverShadowRatio: 8.015387801933581,
          flashToAmbientStops: 2.8105228564413913,
          reserveStops: 3,
          handheld: {
            withinLimit: true,
            overStops: 0,
            slowestShutter: {
              exact: 0.08,
              mark: '1/13',
              residualStops: -0.022810476891941645,
            },
          },
          misses: {
            backgroundStops: 8.881784197001252e-16,
            subjectStops: 0.0027723227992600408,
          },
          missStops: 0.0027723227992600408,
          onAim: true,
        },
        why: [
          {
            code: 'on_aim',
            stops: 0.0027723227992600408,
            message: 'Every part comes out as aimed.',
          },
          {
            code: 'deeper_than_first',
            stops: 2,
            message: 'The aperture is 2 stops smaller than in the first recipe, so focus is deeper.',
          },
          {
            code: 'iso_raised',
            stops: 1.6666666666666667,
            message: 'ISO is 1.67 stops over the camera’s lowest, which adds noise.',
          },
          {
            code: 'much_in_reserve',
            stops: 3,
            message: 'Even the flash that works hardest has 3 stops in reserve, so batteries last.',
          },
        ],
        score: 1001.6866666666666,
      },
    ],
  },
};
