import { z } from 'zod';
import { circleOfConfusionUm } from '../math/depthOfField';
import type { DaylightScene } from '../math/daylightWays';
import { contradictionAt } from './contradictionAt';
import { exactlyOne } from './exactlyOne';
import { guideNumberIn } from './flashIn';
import { curtainFaults, highSpeedSyncFields } from './highSpeedSyncIn';
import { distanceM, ev100In, focalLengthMm, lossStops, number, stops } from './quantities';
import { apertureIn, isoIn, shutterIn } from './settingIn';
import { exactOf, readingFields } from './settings';

const subjectAmbient = () =>
  exactlyOne(
    'ev100',
    'belowBackgroundStops',
  )(
    z.strictObject({
      ev100: ev100In({ title: 'Ambient light on the subject' }).optional(),
      belowBackgroundStops: stops({
        title: 'Under the background',
        description: 'how much less ambient light the subject stands in than the background',
      }).optional(),
    }),
  );

const aim = () =>
  z.strictObject({
    backgroundStops: stops({ title: 'Background', description: 'against a middle tone' }).default(0),
    subjectStops: stops({ title: 'Subject', description: 'against a middle tone' }).default(0),
  });

const view = () =>
  z.strictObject({
    focalLengthMm: focalLengthMm(),
    distanceM: distanceM({ title: 'Camera to subject', description: 'from the lens' }),
    cropFactor: number({
      title: 'Crop factor',
      description: '43.3 mm over the sensor’s diagonal; 1 for 36 × 24 mm',
      min: 0.1,
      max: 20,
    }).default(1),
    circleOfConfusionUm: number({
      title: 'Circle of confusion',
      description: 'what still looks sharp; that of 36 × 24 mm over the crop factor where left out',
      unit: 'µm',
      min: 0.1,
      max: 1000,
      advanced: true,
    }).optional(),
  });

const fields = z.strictObject({
  background: z
    .strictObject({ ev100: ev100In({ title: 'Light of the background' }) })
    .meta({ title: 'Background' }),
  subjectAmbient: subjectAmbient().meta({ title: 'Ambient light on the subject' }),
  aperture: apertureIn({ title: 'Aperture wanted' }),
  iso: isoIn(),
  syncSpeed: shutterIn({ title: 'Sync speed', description: 'the fastest shutter for an ordinary flash' }),
  flash: z
    .strictObject({
      guideNumberM: guideNumberIn(),
      distanceM: distanceM({ title: 'Flash to subject' }),
      lossStops: lossStops({ title: 'Loss', description: 'by modifier and gel' }).default(0),
    })
    .meta({ title: 'Flash' }),
  aim: aim().prefault({}).meta({ title: 'Aim', description: 'how bright each is to come out' }),
  ndStops: z
    .array(number({ title: 'Filter', unit: 'stops', min: 0, max: 40 }))
    .min(1)
    .max(50)
    .optional()
    .meta({ title: 'Filters at hand', description: 'any strength where left out' }),
  highSpeedSync: z.strictObject(highSpeedSyncFields).prefault({}).meta({ title: 'High-speed sync' }),
  view: view().optional().meta({ title: 'View', description: 'to know the depth of field of each way' }),
  ...readingFields,
});
export type DaylightIn = z.output<typeof fields>;

/** A wide aperture in daylight, and a flash. */
export const daylightIn = contradictionAt<typeof fields>((given) =>
  curtainFaults(given.highSpeedSync, given.syncSpeed, given, ['highSpeedSync', 'curtainS']),
)(
  contradictionAt<typeof fields>(({ view: seen }) =>
    seen === undefined || seen.distanceM * 1000 > seen.focalLengthMm
      ? []
      : [{ code: 'focus_inside_lens', path: ['view', 'distanceM'], params: { ...seen } }],
  )(fields),
);

/** The light, the wish and the camera as exact numbers. */
export function daylightScene(given: DaylightIn): DaylightScene {
  const { background, subjectAmbient: subject } = given;
  return {
    backgroundEv100: background.ev100,
    subjectEv100: subject.ev100 ?? background.ev100 - (subject.belowBackgroundStops ?? 0),
    backgroundStops: given.aim.backgroundStops,
    subjectStops: given.aim.subjectStops,
    aperture: exactOf('aperture', given.aperture, given),
    iso: exactOf('iso', given.iso, given),
    syncSpeedS: exactOf('shutter', given.syncSpeed, given),
  };
}

/** What still looks sharp in a view. */
export function circleOfView(seen: NonNullable<DaylightIn['view']>): number {
  return seen.circleOfConfusionUm ?? circleOfConfusionUm(36 / seen.cropFactor, 24 / seen.cropFactor);
}
