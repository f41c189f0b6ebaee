import type { KitIn } from './kit';

/** Kits to begin with, in general words. Their numbers are usual for such gear: common practice, no source. */
export const STARTING_KITS: readonly { readonly title: string; readonly kit: KitIn }[] = [
  {
    title: 'A small flash on a stand',
    kit: {
      cameras: [
        {
          name: 'Full-frame camera',
          sensorWidthMm: 36,
          sensorHeightMm: 24,
          pixelsAcross: 6000,
          isoMin: 100,
          isoMax: 3200,
          shutterSlowest: '1/60',
          shutterFastest: '1/8000',
          syncSpeed: '1/200',
          highSpeedSync: {},
        },
      ],
      lenses: [{ name: 'Short telephoto', focalLengthMm: 85, apertureMin: 'f/1.8', apertureMax: 'f/16' }],
      flashes: [
        {
          name: 'Small flash',
          guideNumberM: 36,
          minPower: '1/128',
          t05S: 0.002,
          control: 'cutoff',
          recycleFullS: 4,
        },
      ],
      modifiers: [{ name: 'Shoot-through umbrella', lossStops: 1.5 }],
      filters: [{ name: 'ND 0.9', ndStops: 3 }],
      batteries: [{ name: 'Set of four cells', fullPops: 200 }],
    },
  },
  {
    title: 'A battery head with a softbox, and a small flash behind',
    kit: {
      cameras: [
        {
          name: 'Full-frame camera',
          sensorWidthMm: 36,
          sensorHeightMm: 24,
          pixelsAcross: 8000,
          isoMin: 100,
          isoMax: 6400,
          shutterSlowest: '1/30',
          shutterFastest: '1/8000',
          syncSpeed: '1/250',
          highSpeedSync: {},
        },
      ],
      lenses: [
        {
          name: 'Standard zoom',
          focalLengthMm: 24,
          longestFocalLengthMm: 70,
          apertureMin: 'f/2.8',
          apertureMax: 'f/22',
        },
      ],
      flashes: [
        {
          name: 'Battery head',
          guideNumberM: 60,
          minPower: '1/256',
          t05S: 0.0012,
          control: 'voltage',
          recycleFullS: 1.5,
        },
        {
          name: 'Small flash',
          guideNumberM: 36,
          minPower: '1/128',
          t05S: 0.002,
          control: 'cutoff',
          recycleFullS: 4,
        },
      ],
      modifiers: [
        { name: 'Softbox, two layers', lossStops: 2 },
        { name: 'Grid', lossStops: 0.7 },
      ],
      filters: [
        { name: 'ND 0.9', ndStops: 3 },
        { name: 'ND 1.8', ndStops: 6 },
      ],
      batteries: [{ name: 'Head’s battery', fullPops: 350 }],
    },
  },
  {
    title: 'A compact camera with a crop sensor',
    kit: {
      cameras: [
        {
          name: 'Crop-sensor camera',
          sensorWidthMm: 23.5,
          sensorHeightMm: 15.7,
          pixelsAcross: 6000,
          isoMin: 100,
          isoMax: 1600,
          shutterSlowest: '1/60',
          shutterFastest: '1/4000',
          syncSpeed: '1/160',
        },
      ],
      lenses: [{ name: 'Normal lens', focalLengthMm: 35, apertureMin: 'f/1.8', apertureMax: 'f/16' }],
      flashes: [
        { name: 'Small flash', guideNumberM: 28, minPower: '1/64', control: 'cutoff', recycleFullS: 3 },
      ],
    },
  },
];
