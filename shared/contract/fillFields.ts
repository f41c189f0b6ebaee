import { z } from 'zod';
import type { FillPreference, FlashRole } from '../math/fill/fillTypes';
import { exactlyOne } from './exactlyOne';
import { flashControlIn, guideNumberIn } from './flashIn';
import { highSpeedSyncFields } from './highSpeedSyncIn';
import { subjectIn, supportIn } from './motionIn';
import { distanceM, ev100In, focalLengthMm, lossStops, number, stops } from './quantities';
import { apertureIn, isoIn, powerIn, shutterIn } from './settingIn';
import { ndStopsIn, settingsIn } from './settings';

/** Most flashes and filters of a request. */
export const MOST_FLASHES = 6;
export const MOST_FILTERS = 8;
/** Thirteen stops under full; flashes go down to 1/256 or 1/512. */
const LEAST_POWER = 1 / 8192;

const ROLES: [FlashRole, ...FlashRole[]] = ['key', 'fill', 'rim'];
const PREFERENCES: [FillPreference, ...FillPreference[]] = [
  'shallowFocus',
  'deepFocus',
  'lowIso',
  'frozen',
  'battery',
];

const testFrame = () =>
  settingsIn().extend({
    ndStops: ndStopsIn().default(0),
    offsetStops: stops({
      title: 'Came out',
      description: 'how much brighter than a middle tone the background came out',
    }).default(0),
  });

const background = () =>
  exactlyOne(
    'ev100',
    'testFrame',
  )(
    z.strictObject({
      ev100: ev100In({ title: 'Light of the background' }).optional(),
      testFrame: testFrame()
        .optional()
        .meta({ title: 'Test frame', description: 'its settings, and how the background came out' }),
    }),
  ).meta({ title: 'Background' });

const ambient = (title: string) =>
  exactlyOne(
    'ev100',
    'belowBackgroundStops',
  )(
    z.strictObject({
      ev100: ev100In({ title: 'Light' }).optional(),
      belowBackgroundStops: stops({
        title: 'Under the background',
        description: 'how much less ambient light is there than on the background',
      }).optional(),
    }),
  ).meta({ title });

const aim = () =>
  z
    .strictObject({
      backgroundStops: stops({ title: 'Background', description: 'against a middle tone' }).default(0),
      subjectStops: stops({ title: 'Subject', description: 'against a middle tone' }).default(0),
      ratio: number({
        title: 'Lighting ratio',
        description: '(key + fill):fill of the flashes on the face, 3 for 3:1; none wished where left out',
        min: 1,
        above: true,
        max: 1000,
      }).optional(),
      rimStops: stops({
        title: 'Rim',
        description: 'the rim flash alone, against a middle tone; no rim is used where left out',
      }).optional(),
    })
    .prefault({})
    .meta({ title: 'Aim', description: 'how bright each is to come out' });

const view = () =>
  z
    .strictObject({
      focalLengthMm: focalLengthMm(),
      distanceM: distanceM({ title: 'Camera to subject', description: 'from the lens' }),
      pixelPitchUm: number({
        title: 'Pixel pitch',
        description: 'that of 6,000 pixels across the sensor where left out',
        unit: 'µm',
        min: 0.01,
        max: 1000,
        advanced: true,
      }).optional(),
      cropFactor: number({
        title: 'Crop factor',
        description: '43.3 mm over the sensor’s diagonal; 1 for 36 × 24 mm',
        min: 0.1,
        max: 20,
      }).optional(),
    })
    .meta({ title: 'View', description: 'for hand-held limit, blur and ghost' });

/** What both calculators ask about the scene and the picture. */
export const sceneFields = {
  background: background(),
  subjectAmbient: ambient('Ambient light on the subject'),
  rimAmbient: ambient('Ambient light on the edge').optional(),
  aim: aim(),
};

export const motionFields = {
  view: view().optional(),
  subject: subjectIn().optional(),
  support: supportIn().optional(),
};

export const preferIn = () =>
  z.enum(PREFERENCES).optional().meta({
    title: 'Prefer',
    description: 'what decides between recipes that are equally near to the aim',
  });

const limits = {
  apertureMin: apertureIn({ title: 'Widest aperture' }),
  apertureMax: apertureIn({ title: 'Smallest aperture' }),
  isoMin: isoIn({ title: 'Lowest ISO' }),
  isoMax: isoIn({ title: 'Highest ISO' }),
  shutterSlowest: shutterIn({ title: 'Slowest shutter' }),
  shutterFastest: shutterIn({ title: 'Fastest shutter' }),
};

const sync = {
  syncSpeed: shutterIn({ title: 'Sync speed', description: 'the fastest shutter for an ordinary flash' }),
  highSpeedSync: z
    .strictObject(highSpeedSyncFields)
    .optional()
    .meta({ title: 'High-speed sync', description: 'where camera and flashes can; {} for usual values' }),
  ndStops: z
    .array(number({ title: 'Filter', unit: 'stops', min: 0, max: 40 }))
    .max(MOST_FILTERS)
    .optional()
    .meta({ title: 'Filters at hand', description: 'each by itself; a stack is an entry of its own' }),
};

/** The camera with all that it allows. */
export const cameraIn = () => z.strictObject({ ...limits, ...sync }).meta({ title: 'Camera' });

/** The camera of settings that are there already, whose limits may be left out. */
export const looseCameraIn = () =>
  z
    .strictObject({
      ...(Object.fromEntries(Object.entries(limits).map(([name, field]) => [name, field.optional()])) as {
        [Name in keyof typeof limits]: z.ZodOptional<(typeof limits)[Name]>;
      }),
      ...sync,
    })
    .meta({ title: 'Camera', description: 'its limits play no part here' });

/** What both calculators ask about a flash. */
export const flashFields = {
  name: z.string().min(1).max(60).meta({ title: 'Name' }),
  role: z
    .enum(ROLES)
    .meta({ title: 'Role', description: 'key and fill light the front, the rim lights the edge only' }),
  guideNumberM: guideNumberIn(),
  lossStops: lossStops({ title: 'Loss', description: 'by gel and modifier' }).default(0),
  t05S: number({
    title: 'Duration t0.5',
    description: 'at full power; where it is given, what the shutter clips counts',
    unit: 's',
    min: 1e-8,
    max: 10,
    advanced: true,
  }).optional(),
  control: flashControlIn().default('decay'),
  recycleFullS: number({
    title: 'Recycling',
    description: 'after a pop at full power',
    unit: 's',
    min: 0,
    max: 600,
    advanced: true,
  }).optional(),
};

/** The range of a flash's power. */
export const powerRangeFields = {
  minPower: powerIn({ title: 'Least power', range: [LEAST_POWER, 1] }),
  powerStep: number({
    title: 'Power step',
    description: 'between two powers; 0.333 means a third',
    unit: 'stops',
    min: 0.1,
    max: 3,
  }).default(1 / 3),
};
