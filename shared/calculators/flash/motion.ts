import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { defineCalculator } from '../../contract/defineCalculator';
import { measuredDuration } from '../../contract/flashIn';
import { motionIn, sensorView, type MotionIn } from '../../contract/motionIn';
import { pulseNotes } from '../../contract/pulseNotes';
import { exactWithMark, settingOut } from '../../contract/settingOut';
import { exactOf } from '../../contract/settings';
import { flashPulse, tenthPeakS } from '../../math/flashDuration';
import { ambientShare, ghostVisibility, stopsBelowFlash, throughStops } from '../../math/ghost';
import { shakeBlurUm, slowestHandheldS, stopsOverLimit } from '../../math/handheld';
import { blurOf, longestSharpS, type SensorView } from '../../math/motionBlur';
import { motionExamples } from './examples/motionExamples';

/** A time on the limit is within it; covers rounding. */
const ON_LIMIT_STOPS = 1e-9;

const blur = {
  blurPx: z.number().meta({ title: 'Blur', unit: 'px' }),
  blurUm: z.number().meta({ title: 'Blur on the sensor', unit: 'µm' }),
  blurMmAtSubject: z.number().meta({ title: 'Travel at the subject', unit: 'mm' }),
  frozen: z.boolean().meta({ title: 'Frozen', description: 'within the tolerance' }),
};

const seconds = (title: string, description: string) =>
  z.number().nullable().meta({ title, description, unit: 's' });

const ghostOut = z.strictObject({
  stopsBelowFlash: z.number().meta({
    title: 'Ambient under flash',
    unit: 'stops',
    description: 'on the subject: flash minus ambient, the plain difference',
  }),
  ambientShare: z.number().meta({ title: 'Ambient share', description: 'of the subject’s light, 0 to 1' }),
  trailPx: z.number().meta({ title: 'Trail', unit: 'px' }),
  visibility: z.enum(['none', 'faint', 'clear', 'dominant']).meta({ title: 'Visibility' }),
  throughStops: z.number().optional().meta({
    title: 'Background through the edge',
    unit: 'stops',
    description: 'how bright the background shows through the moving edge, against a middle tone',
  }),
});

const shakeOut = z.strictObject({
  blurPx: blur.blurPx,
  blurUm: blur.blurUm,
  withinLimit: z.boolean().meta({ title: 'Within the hand-held limit' }),
  slowestShutter: settingOut('Hand-held limit')
    .nullable()
    .meta({ description: 'the mark is on the safe side; null on a tripod' }),
});

export const flashMotionOut = z.strictObject({
  flash: z
    .strictObject({
      ...blur,
      t01S: z.number().meta({ title: 'Duration t0.1', unit: 's', description: 'at this power' }),
    })
    .optional()
    .meta({ title: 'By the flash' }),
  ambient: z.strictObject(blur).optional().meta({ title: 'By the ambient light' }),
  shake: shakeOut.optional().meta({ title: 'By shake', description: 'also what lamps behind streak' }),
  ghost: ghostOut.optional().meta({ title: 'Ghost' }),
  flashForFrozenS: seconds(
    'Longest flash',
    't0.1 that just freezes within the tolerance; null along the axis',
  ),
  flashForOnePixelS: seconds('Longest flash for one pixel', 'the same to one pixel; null along the axis'),
  shutterForFrozen: settingOut('Slowest shutter')
    .nullable()
    .meta({ description: 'that freezes without flash; the mark is on the safe side, null along the axis' }),
  magnification: z.number().meta({ title: 'Magnification', description: 'size on the sensor over size' }),
  toleranceUm: z.number().meta({ title: 'Tolerance', unit: 'µm' }),
  tolerancePx: z.number().meta({ title: 'Tolerance', unit: 'px' }),
});

/** The hand's part, where a shutter is known. */
function shakeOf(given: MotionIn, view: SensorView): z.output<typeof shakeOut> | undefined {
  const { support, ambient, focalLengthMm } = given;
  if (!support || !ambient) return undefined;
  if (support.kind === 'tripod') return { blurPx: 0, blurUm: 0, withinLimit: true, slowestShutter: null };
  const shutterS = exactOf('shutter', ambient.shutter, given);
  const limitS = slowestHandheldS(focalLengthMm, support.cropFactor, support.stabilisationStops);
  const blurUm = shakeBlurUm(focalLengthMm, shutterS, support.stabilisationStops);
  const slowestShutter = exactWithMark('shutter', given.scale, limitS, 'ceil');
  return {
    blurPx: blurUm / view.pitchUm,
    blurUm,
    withinLimit: stopsOverLimit(shutterS, limitS) <= ON_LIMIT_STOPS,
    slowestShutter,
  };
}

/** The trail beside the frozen subject, where both lights are known. */
function ghostOf(given: MotionIn, view: SensorView, trailPx: number): z.output<typeof ghostOut> | undefined {
  const { flash, ambient, detailPx } = given;
  if (!flash || !ambient) return undefined;
  const belowFlashStops = stopsBelowFlash(flash.brightnessStops, ambient.subjectBrightnessStops);
  const tolerancePx = view.toleranceUm / view.pitchUm;
  const through =
    ambient.backgroundBrightnessStops === undefined || trailPx < tolerancePx
      ? null
      : throughStops(ambient.backgroundBrightnessStops, trailPx, detailPx);
  return {
    stopsBelowFlash: belowFlashStops,
    ambientShare: ambientShare(belowFlashStops),
    trailPx,
    visibility: ghostVisibility({ belowFlashStops, trailPx, tolerancePx, detailPx }),
    ...(through === null ? {} : { throughStops: through }),
  };
}

function notesOn(given: MotionIn, result: z.output<typeof flashMotionOut>): Remark[] {
  const notes: Remark[] = [];
  if (result.flashForFrozenS === null && given.subject.speedMS > 0) notes.push(note('movement_along_axis'));
  if (result.ghost) notes.push(note('visibility_by_practice'));
  if (given.support?.kind === 'handheld')
    notes.push(note(result.shake ? 'shake_is_a_model' : 'shake_needs_shutter'));
  return notes;
}

export const flashMotion = defineCalculator({
  id: 'flash/motion',
  title: 'Motion, ghost and shake',
  summary: 'What the flash freezes, what the ambient light smears, and how visible the ghost will be.',
  units: 1,
  input: motionIn,
  output: flashMotionOut,
  sources: [
    'Blur v·|cos α|·t·f/(d − f) by derivation; the flash’s time is its t0.1, the cautious choice',
    'Flash duration: the models of flash/duration',
    'Trail: a detail that travels spreads its light over its path, by derivation; how visible that is: common practice, no source',
    'Shake f·ω·t with ω = 0.03 rad/s, which the hand-held rule with a circle of 0.030 mm implies; derivation',
  ],
  examples: motionExamples,
  compute(given) {
    const view = sensorView(given);
    const { subject, flash, ambient } = given;
    const power = flash ? exactOf('power', flash.power, given) : 1;
    const pulse = flash && flashPulse(measuredDuration(flash), { ...flash, power });
    const t01S = pulse && tenthPeakS(pulse);
    const trail = ambient && blurOf(subject, exactOf('shutter', ambient.shutter, given), view);
    const shake = shakeOf(given, view);
    const ghost = trail && ghostOf(given, view, trail.blurPx);
    const longestS = longestSharpS(subject, view.magnification, view.toleranceUm);
    const result = {
      ...(t01S === undefined ? {} : { flash: { ...blurOf(subject, t01S, view), t01S } }),
      ...(trail ? { ambient: trail } : {}),
      ...(shake ? { shake } : {}),
      ...(ghost ? { ghost } : {}),
      flashForFrozenS: longestS,
      flashForOnePixelS: longestSharpS(subject, view.magnification, view.pitchUm),
      shutterForFrozen: longestS === null ? null : exactWithMark('shutter', given.scale, longestS, 'ceil'),
      magnification: view.magnification,
      toleranceUm: view.toleranceUm,
      tolerancePx: view.toleranceUm / view.pitchUm,
    };
    return {
      result,
      notes: [...(flash && pulse ? pulseNotes(flash, power, pulse) : []), ...notesOn(given, result)],
      cautions: flash ? ['flash_and_eyes'] : [],
    };
  },
});
