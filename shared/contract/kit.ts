import { z } from 'zod';
import { exactlyOne } from './exactlyOne';
import { flashControlIn, flashEnergyFields, guideNumberIn } from './flashIn';
import { powerRangeFields } from './fillFields';
import { highSpeedSyncFields } from './highSpeedSyncIn';
import { focalLengthMm, integer, lossStops, number } from './quantities';
import { apertureIn, isoIn, shutterIn } from './settingIn';

/** Most things of each kind that a kit holds. */
const MOST = 30;

const name = () => z.string().trim().min(1).max(60).meta({ title: 'Name' });

const camera = z.strictObject({
  name: name(),
  sensorWidthMm: number({ title: 'Sensor’s width', unit: 'mm', min: 1, max: 200 }),
  sensorHeightMm: number({ title: 'Sensor’s height', unit: 'mm', min: 1, max: 200 }),
  pixelsAcross: integer({ title: 'Pixels across', unit: 'px', min: 100, max: 100_000 }),
  isoMin: isoIn({ title: 'Lowest ISO' }),
  isoMax: isoIn({ title: 'Highest ISO', description: 'that you would use' }),
  shutterSlowest: shutterIn({ title: 'Slowest shutter', description: 'that you would use' }),
  shutterFastest: shutterIn({ title: 'Fastest shutter' }),
  syncSpeed: shutterIn({ title: 'Sync speed' }),
  highSpeedSync: z.strictObject(highSpeedSyncFields).optional().meta({ title: 'High-speed sync' }),
});

const lens = z.strictObject({
  name: name(),
  focalLengthMm: focalLengthMm(),
  longestFocalLengthMm: focalLengthMm({ title: 'Longest focal length', description: 'of a zoom' }).optional(),
  apertureMin: apertureIn({ title: 'Widest aperture' }),
  apertureMax: apertureIn({ title: 'Smallest aperture' }),
});

const flash = exactlyOne(
  'guideNumberM',
  'energyWs',
)(
  z.strictObject({
    name: name(),
    guideNumberM: guideNumberIn().optional(),
    energyWs: flashEnergyFields.energyWs,
    efficacyLmSPerWs: flashEnergyFields.efficacyLmSPerWs,
    measured: z
      .array(
        z.strictObject({
          modifier: z.string().trim().min(1).max(60).meta({ title: 'Modifier' }),
          guideNumberM: number({ title: 'Guide number', unit: 'm', min: 0.1, max: 10_000 }),
        }),
      )
      .max(MOST)
      .optional()
      .meta({ title: 'Measured guide numbers', description: 'with a modifier in place, from test frames' }),
    ...powerRangeFields,
    t05S: number({
      title: 'Duration t0.5',
      description: 'at full power',
      unit: 's',
      min: 1e-8,
      max: 10,
    }).optional(),
    control: flashControlIn().default('decay'),
    recycleFullS: number({
      title: 'Recycling',
      description: 'after full power',
      unit: 's',
      min: 0,
      max: 600,
    }).optional(),
  }),
);

const modifier = z.strictObject({
  name: name(),
  lossStops: lossStops({ title: 'Loss', description: 'as you measured it, with the flash that you use' }),
});

const filter = z.strictObject({
  name: name(),
  ndStops: number({ title: 'Neutral density', unit: 'stops', min: 0, max: 40 }),
});

const battery = z.strictObject({
  name: name(),
  fullPops: integer({ title: 'Pops at full power', description: 'on one charge', min: 1, max: 100_000 }),
});

const many = <T extends z.ZodType>(item: T, title: string) =>
  z.array(item).max(MOST).default([]).meta({ title });

/** What somebody has with them: the limits of everything that is worked out for them. */
export const kitIn = z.strictObject({
  cameras: many(camera, 'Cameras'),
  lenses: many(lens, 'Lenses'),
  flashes: many(flash, 'Flashes'),
  modifiers: many(modifier, 'Modifiers'),
  filters: many(filter, 'Filters'),
  batteries: many(battery, 'Batteries'),
});

export type KitIn = z.input<typeof kitIn>;
export type Kit = z.output<typeof kitIn>;

/** A kit with nothing in it. */
export const EMPTY_KIT: Kit = {
  cameras: [],
  lenses: [],
  flashes: [],
  modifiers: [],
  filters: [],
  batteries: [],
};
