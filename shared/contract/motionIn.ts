import { z } from 'zod';
import { magnificationAt, pixelPitchUm, type SensorView } from '../math/motionBlur';
import { contradictionAt } from './contradictionAt';
import { atMostOne, exactlyOne } from './exactlyOne';
import { flashControlIn, flashDurationFields, flashPowerIn, pulseFields } from './flashIn';
import { distanceM, focalLengthMm, number, stops } from './quantities';
import { shutterIn } from './settingIn';
import { readingFields } from './settings';
import { together } from './together';

/** A subject that moves. */
export const subjectIn = () =>
  z
    .strictObject({
      speedMS: number({
        title: 'Speed',
        description: 'walking 1.4, running 6, a juggler’s or dancer’s hand 5 to 8, a cyclist 8 to 14',
        unit: 'm/s',
        min: 0,
        max: 100_000,
      }),
      directionDeg: number({
        title: 'Direction',
        description: '0 across the frame, 90 along the lens axis',
        unit: '°',
        min: -360,
        max: 360,
      }).default(0),
    })
    .meta({ title: 'Subject' });

/** How the camera is held. */
export const supportIn = () =>
  z
    .strictObject({
      kind: z.enum(['tripod', 'handheld']).meta({ title: 'Camera on' }),
      cropFactor: number({
        title: 'Crop factor',
        description: '43.3 mm over the sensor’s diagonal; 1 for 36 × 24 mm',
        min: 0.1,
        max: 20,
      }).default(1),
      stabilisationStops: number({
        title: 'Stabilisation',
        description: 'what the stabiliser is claimed to gain',
        unit: 'stops',
        min: 0,
        max: 12,
      }).default(0),
    })
    .meta({ title: 'Support' });

const flash = () =>
  exactlyOne(
    't05S',
    't01S',
  )(
    z.strictObject({
      ...flashDurationFields,
      control: flashControlIn().default('decay'),
      power: flashPowerIn().default(1),
      ...pulseFields,
      brightnessStops: stops({
        title: 'Subject by flash',
        description: 'how bright the flash alone makes the subject, against a middle tone',
      }),
    }),
  );

const ambient = () =>
  z.strictObject({
    shutter: shutterIn(),
    subjectBrightnessStops: stops({
      title: 'Subject by ambient light',
      description: 'how bright the ambient light alone makes the subject, against a middle tone',
    }),
    backgroundBrightnessStops: stops({
      title: 'Background',
      description: 'how bright the background beside the subject comes out, against a middle tone',
    }).optional(),
  });

const tolerance = () =>
  atMostOne(
    'px',
    'circleOfConfusionUm',
  )(
    z.strictObject({
      px: number({ title: 'Pixels', unit: 'px', min: 0.01, max: 10_000 }).optional(),
      circleOfConfusionUm: number({
        title: 'Circle of confusion',
        unit: 'µm',
        min: 0.01,
        max: 10_000,
      }).optional(),
    }),
  );

const fields = z.strictObject({
  subject: subjectIn(),
  distanceM: distanceM({ title: 'Camera to subject', description: 'from the lens' }),
  focalLengthMm: focalLengthMm(),
  pixelPitchUm: number({ title: 'Pixel pitch', unit: 'µm', min: 0.01, max: 1000 }).optional(),
  sensorWidthMm: number({ title: 'Sensor width', unit: 'mm', min: 0.1, max: 1000 }).optional(),
  imageWidthPx: number({ title: 'Image width', unit: 'px', min: 1, max: 1_000_000 }).optional(),
  flash: flash().optional().meta({ title: 'Flash' }),
  ambient: ambient().optional().meta({ title: 'Ambient light' }),
  support: supportIn().optional(),
  tolerance: tolerance()
    .optional()
    .meta({ title: 'Tolerance', description: 'what still counts as sharp; one pixel where left out' }),
  detailPx: number({
    title: 'Detail',
    description: 'width of what the eye looks for in the trail',
    unit: 'px',
    min: 0.1,
    max: 100_000,
    advanced: true,
  }).default(10),
  ...readingFields,
});
export type MotionIn = z.output<typeof fields>;

/** A moving subject, a camera, and the lights that draw it. */
export const motionIn = contradictionAt<typeof fields>(({ distanceM: distance, focalLengthMm: focal }) =>
  distance * 1000 > focal
    ? []
    : [
        {
          code: 'focus_inside_lens',
          path: ['distanceM'],
          params: { distanceM: distance, focalLengthMm: focal },
        },
      ],
)(
  together<typeof fields>(
    'sensorWidthMm',
    'imageWidthPx',
  )(exactlyOne('pixelPitchUm', 'sensorWidthMm')(fields)),
);

/** Size on the sensor, pixels and tolerance of a request. */
export function sensorView(given: MotionIn): SensorView {
  const pitchUm = given.pixelPitchUm ?? pixelPitchUm(given.sensorWidthMm ?? 36, given.imageWidthPx ?? 6000);
  return {
    magnification: magnificationAt(given.focalLengthMm, given.distanceM),
    pitchUm,
    toleranceUm: given.tolerance?.circleOfConfusionUm ?? (given.tolerance?.px ?? 1) * pitchUm,
  };
}
