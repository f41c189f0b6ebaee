import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { fillRecipesIn } from '../../../contract/fillIn';
import type { fillRecipesOut } from '../recipes';

export const recipesThreeLights: Example<z.input<typeof fillRecipesIn>, z.output<typeof fillRecipesOut>> = {
  title: 'Key, fill and rim: a face at 3:1 with a rim one stop over it, and stands that may be moved',
  input: {
    background: {
      ev100: 7.5,
    },
    subjectAmbient: {
      belowBackgroundStops: 3,
    },
    aim: {
      backgroundStops: -0.5,
      ratio: 3,
      rimStops: 1,
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
        lossStops: 1.5,
        minM: 1.5,
        maxM: 3,
      },
      {
        name: 'umbrella',
        role: 'fill',
        guideNumberM: 36,
        minPower: '1/128',
        distanceM: 3,
        lossStops: 1,
      },
      {
        name: 'strip',
        role: 'rim',
        guideNumberM: 36,
        minPower: '1/128',
        distanceM: 2.5,
      },
    ],
    prefer: 'shallowFocus',
    count: 1,
  },
  output: {
    recipes: [
      {
        settings: {
          aperture: {
            exact: 1.7817974362806788,
            mark: 'f/1.8',
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
        sync: 'normal',
        flashes: [
          {
            name: 'octabox',
            role: 'key',
            power: {
              exact: 0.0078125,
              mark: '1/128',
              residualStops: 0,
            },
            distanceM: 1.5306160301660494,
            onSubjectStops: -0.7510353053347991,
          },
          {
            name: 'umbrella',
            role: 'fill',
            power: {
              exact: 0.012401570718501561,
              mark: '1/128+2/3',
              residualStops: 0,
            },
            distanceM: 3,
            onSubjectStops: -1.8300749985576887,
          },
          {
            name: 'strip',
            role: 'rim',
            power: {
              exact: 0.03125,
              mark: '1/32',
              residualStops: 0,
            },
            distanceM: 2.5,
            onSubjectStops: 1.0293271464432312,
          },
        ],
        outcome: {
          backgroundStops: -0.5,
          subjectAmbientStops: -3.5,
          subjectFlashStops: -0.19194119508847096,
          subjectStops: -0.0531713027478381,
          keyStops: -0.7510353053347991,
          fillStops: -1.8300749985576887,
          shadowSideStops: -1.4358136598536215,
          ratio: 3.112629375194835,
          litOverShadowRatio: 2.607455004476049,
          rimStops: 1.0293271464432312,
          flashToAmbientStops: 3.308058804911529,
          reserveStops: 5,
          misses: {
            backgroundStops: 0,
            subjectStops: -0.0531713027478381,
            ratioStops: 0.05317130274806181,
            rimStops: 0.0293271464432312,
          },
          missStops: 0.05317130274806181,
          onAim: true,
        },
        why: [
          {
            code: 'on_aim',
            stops: 0.05317130274806181,
            message: 'Every part comes out within 0.05 stops of the aim, which is less than half a step.',
          },
          {
            code: 'widest_aperture',
            stops: null,
            message:
              'The lens is wide open: focus is as shallow as it gets, and the flash needs least power.',
          },
          {
            code: 'lowest_iso',
            stops: null,
            message: 'ISO is the lowest that the camera has, so there is least noise.',
          },
          {
            code: 'much_in_reserve',
            stops: 5,
            message: 'Even the flash that works hardest has 5 stops in reserve, so batteries last.',
          },
        ],
        score: 7000.0233333333335,
      },
    ],
  },
};
