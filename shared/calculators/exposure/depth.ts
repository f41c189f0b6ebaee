import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { contradiction } from '../../contract/contradiction';
import { contradictionAt } from '../../contract/contradictionAt';
import { defineCalculator } from '../../contract/defineCalculator';
import { distanceM, focalLengthMm, number } from '../../contract/quantities';
import { apertureIn } from '../../contract/settingIn';
import { exactOf, readingFields } from '../../contract/settings';
import {
  airyDiscUm,
  blurDiscUm,
  circleOfConfusionUm,
  depthLimits,
  hyperfocalM,
} from '../../math/depthOfField';

/** Nearer than this many focal lengths, how the lens is built shows in the distances. Common practice. */
const CLOSE_UP_FOCAL_LENGTHS = 20;

const fields = z.strictObject({
  focalLengthMm: focalLengthMm(),
  aperture: apertureIn(),
  distanceM: distanceM({ title: 'Focus distance', description: 'from the lens' }),
  circleOfConfusionUm: number({
    title: 'Circle of confusion',
    description: 'the disc on the sensor that still looks sharp; otherwise the sensor’s diagonal over 1,500',
    unit: 'µm',
    min: 0.1,
    max: 1000,
  }).optional(),
  sensorWidthMm: number({ title: 'Sensor width', unit: 'mm', min: 1, max: 500 }).optional(),
  sensorHeightMm: number({ title: 'Sensor height', unit: 'mm', min: 1, max: 500 }).optional(),
  backgroundM: distanceM({
    title: 'Background distance',
    description: 'from the lens; at infinity where left out',
  }).optional(),
  ...readingFields,
});

const input = contradiction<typeof fields, 'focus_inside_lens'>(
  'focus_inside_lens',
  ['distanceM'],
  (given) => given.distanceM <= given.focalLengthMm / 1000,
  (given) => given,
)(
  contradictionAt<typeof fields>(({ sensorWidthMm: width, sensorHeightMm: height, ...given }) => {
    if (given.circleOfConfusionUm !== undefined || (width === undefined) === (height === undefined))
      return [];
    const [path, side] = width === undefined ? ['sensorWidthMm', 'height'] : ['sensorHeightMm', 'width'];
    return [{ code: 'sensor_side_missing', path: [path], params: { given: side } }];
  })(fields),
);

/** The circle of confusion in use: as given, of the sensor, or of 36 × 24 mm. */
function circleOf({ circleOfConfusionUm: given, ...sensor }: z.output<typeof fields>): number {
  return given ?? circleOfConfusionUm(sensor.sensorWidthMm ?? 36, sensor.sensorHeightMm ?? 24);
}

function notesOf(given: z.output<typeof fields>, circleUm: number, diffractionUm: number): Remark[] {
  const { circleOfConfusionUm: circle, sensorWidthMm, backgroundM, distanceM: focusM } = given;
  const notes: Remark[] = [];
  if (circle === undefined && sensorWidthMm === undefined) notes.push(note('circle_assumed', { circleUm }));
  if (backgroundM === undefined) notes.push(note('background_at_infinity'));
  if (backgroundM !== undefined && backgroundM < focusM) notes.push(note('background_in_front'));
  if (diffractionUm > circleUm) notes.push(note('diffraction_over_circle'));
  const closeUpM = (CLOSE_UP_FOCAL_LENGTHS * given.focalLengthMm) / 1000;
  if (focusM < closeUpM) notes.push(note('close_up_lens_matters'));
  return notes;
}

export const exposureDepth = defineCalculator({
  id: 'exposure/depth',
  title: 'Depth of field',
  summary:
    'From where to where the picture is sharp, how much the background blurs, and what diffraction does.',
  units: 1,
  input,
  output: z.strictObject({
    nearM: z.number().meta({ title: 'Sharp from', unit: 'm' }),
    farM: z.number().nullable().meta({ title: 'Sharp to', unit: 'm', description: 'null is infinity' }),
    totalM: z.number().nullable().meta({ title: 'Depth', unit: 'm', description: 'null is without end' }),
    hyperfocalM: z.number().meta({
      title: 'Hyperfocal distance',
      unit: 'm',
      description: 'focused there, the picture is sharp from half of it to infinity',
    }),
    circleOfConfusionUm: z.number().meta({ title: 'Circle of confusion used', unit: 'µm' }),
    backgroundBlurUm: z.number().meta({
      title: 'Blur of the background',
      unit: 'µm',
      description: 'diameter of the disc that a point of the background makes on the sensor',
    }),
    backgroundBlurShare: z.number().nullable().meta({
      title: 'Blur as a share of the width',
      description: 'null where the sensor’s width is not known',
    }),
    diffractionUm: z.number().meta({
      title: 'Diffraction',
      unit: 'µm',
      description: 'diameter of the Airy disc in green light, focused far away',
    }),
  }),
  sources: [
    'Encyclopaedia, "Depth of field": H = f²/(N·c) + f; exact limits of the thin lens from memory of Ray, Applied Photographic Optics',
    'Encyclopaedia, "Circle of confusion": the diagonal over 1,500, common practice',
    'Blur of the background f²/(N(s − f))·|D − s|/D by derivation; Airy disc 2.44·λ·N at 550 nm',
  ],
  examples: [
    {
      title: 'A portrait at 85 mm and f/2.8 from 3 m: 21 cm are sharp, lamps at 30 m become discs of 0.8 mm',
      input: {
        focalLengthMm: 85,
        aperture: 'f/2.8',
        distanceM: 3,
        circleOfConfusionUm: 30,
        sensorWidthMm: 36,
        backgroundM: 30,
      },
      output: {
        nearM: 2.9006954628522403,
        farM: 3.106344890571944,
        totalM: 0.20564942771970385,
        hyperfocalM: 85.23244156788012,
        circleOfConfusionUm: 29.999999999999996,
        backgroundBlurUm: 788.6727006287351,
        backgroundBlurShare: 0.021907575017464865,
        diffractionUm: 3.7957492014093877,
      },
    },
    {
      title: 'A skyline at 24 mm and f/11, focused at 2 m: sharp from under a metre to infinity',
      input: { focalLengthMm: 24, aperture: 'f/11', distanceM: 2, sensorWidthMm: 36, sensorHeightMm: 24 },
      output: {
        nearM: 0.9436107366892076,
        farM: null,
        totalM: null,
        hyperfocalM: 1.7890452162436563,
        circleOfConfusionUm: 28.844410203711913,
        backgroundBlurUm: 25.765024415704158,
        backgroundBlurShare: 0.0007156951226584487,
        diffractionUm: 15.18299680563755,
      },
    },
    {
      title: 'Read as exact numbers, 50 mm at f/8 and 5 m is sharp from 3.39 m to 9.53 m',
      input: { focalLengthMm: 50, aperture: 8, distanceM: 5, circleOfConfusionUm: 30, readAs: 'exact' },
      output: {
        nearM: 3.389370932754881,
        farM: 9.52743902439024,
        totalM: 6.138068091635359,
        hyperfocalM: 10.46666666666667,
        circleOfConfusionUm: 29.999999999999996,
        backgroundBlurUm: 63.13131313131314,
        backgroundBlurShare: null,
        diffractionUm: 10.736,
      },
    },
  ],
  compute(given) {
    const aperture = exactOf('aperture', given.aperture, given);
    const circleUm = circleOf(given);
    const { focalLengthMm: focalLength, distanceM: focusM, backgroundM = Infinity, sensorWidthMm } = given;
    const focus = { focalLengthMm: focalLength, aperture, distanceM: focusM, circleOfConfusionUm: circleUm };
    const blurUm = blurDiscUm(focalLength, aperture, focusM, backgroundM);
    const diffractionUm = airyDiscUm(aperture);
    return {
      result: {
        ...depthLimits(focus),
        hyperfocalM: hyperfocalM(focalLength, aperture, circleUm),
        circleOfConfusionUm: circleUm,
        backgroundBlurUm: blurUm,
        backgroundBlurShare: sensorWidthMm === undefined ? null : blurUm / 1000 / sensorWidthMm,
        diffractionUm,
      },
      notes: notesOf(given, circleUm, diffractionUm),
    };
  },
});
