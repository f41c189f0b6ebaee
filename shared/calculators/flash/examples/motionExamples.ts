import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { motionIn } from '../../../contract/motionIn';
import type { flashMotionOut } from '../motion';

/** Questions that a photographer asks, with their answers. */
export const motionExamples: readonly Example<z.input<typeof motionIn>, z.output<typeof flashMotionOut>>[] = [
  {
    title:
      'A juggler’s hand at 6 m/s, 85 mm from 4 m: 221 µs keep it within 28.8 µm, 46 µs within a pixel; this flash lasts too long',
    input: {
      subject: { speedMS: 6 },
      distanceM: 4,
      focalLengthMm: 85,
      pixelPitchUm: 6,
      tolerance: { circleOfConfusionUm: 28.8 },
      flash: { t05S: 0.0003, brightnessStops: 0 },
    },
    output: {
      flash: {
        blurPx: 21.637079545243356,
        blurUm: 129.82247727146014,
        blurMmAtSubject: 5.979470570797252,
        frozen: false,
        t01S: 0.0009965784284662086,
      },
      flashForFrozenS: 0.0002210823529411765,
      flashForOnePixelS: 4.605882352941176e-5,
      shutterForFrozen: { exact: 0.0002210823529411765, mark: '1/5000', residualStops: -0.19020482588365495 },
      magnification: 0.021711366538952746,
      toleranceUm: 28.8,
      tolerancePx: 4.8,
    },
  },
  {
    title:
      'A lamp maker sways by 5 cm/s while 1/8 s collects the dusk, three stops under the flash: a faint ghost',
    input: {
      subject: { speedMS: 0.05 },
      distanceM: 3,
      focalLengthMm: 50,
      pixelPitchUm: 6,
      flash: { t05S: 0.001, control: 'cutoff', power: '1/8', brightnessStops: 0 },
      ambient: { shutter: '1/8', subjectBrightnessStops: -3, backgroundBrightnessStops: -1 },
      support: { kind: 'tripod' },
    },
    output: {
      flash: {
        blurPx: 0.027209756771524856,
        blurUm: 0.16325854062914913,
        blurMmAtSubject: 0.009632253897119797,
        frozen: true,
        t01S: 0.00019264507794239591,
      },
      ambient: { blurPx: 17.65536723163842, blurUm: 105.9322033898305, blurMmAtSubject: 6.25, frozen: false },
      shake: { blurPx: 0, blurUm: 0, withinLimit: true, slowestShutter: null },
      ghost: {
        stopsBelowFlash: 3,
        ambientShare: 0.1111111111111111,
        trailPx: 17.65536723163842,
        visibility: 'faint',
        throughStops: -1.6474526700542453,
      },
      flashForFrozenS: 0.00708,
      flashForOnePixelS: 0.00708,
      shutterForFrozen: { exact: 0.00708, mark: '1/160', residualStops: -0.1912984089795188 },
      magnification: 0.01694915254237288,
      toleranceUm: 6,
      tolerancePx: 1,
    },
  },
  {
    title:
      'The same light with a kite flyer who walks, from the hand: the ghost thins out, the lamps behind streak over almost three pixels',
    input: {
      subject: { speedMS: 1.4 },
      distanceM: 6,
      focalLengthMm: 35,
      sensorWidthMm: 36,
      imageWidthPx: 6000,
      flash: { t01S: 0.002, brightnessStops: 0 },
      ambient: { shutter: '1/8', subjectBrightnessStops: -3 },
      support: { kind: 'handheld', stabilisationStops: 3 },
    },
    output: {
      flash: {
        blurPx: 2.738195026543726,
        blurUm: 16.429170159262355,
        blurMmAtSubject: 2.799999999999999,
        frozen: false,
        t01S: 0.0019999999999999996,
      },
      ambient: {
        blurPx: 171.13718915898292,
        blurUm: 1026.8231349538976,
        blurMmAtSubject: 175,
        frozen: false,
      },
      shake: {
        blurPx: 2.734375,
        blurUm: 16.40625,
        withinLimit: true,
        slowestShutter: { exact: 0.22857142857142856, mark: '1/5', residualStops: -0.2040503163883669 },
      },
      ghost: {
        stopsBelowFlash: 3,
        ambientShare: 0.1111111111111111,
        trailPx: 171.13718915898292,
        visibility: 'none',
      },
      flashForFrozenS: 0.0007304081632653062,
      flashForOnePixelS: 0.0007304081632653062,
      shutterForFrozen: { exact: 0.0007304081632653062, mark: '1/1600', residualStops: -0.2476571765310305 },
      magnification: 0.00586756077116513,
      toleranceUm: 6,
      tolerancePx: 1,
    },
  },
  {
    title: 'Straight towards the camera nothing shifts in the middle of the picture, so no flash is too long',
    input: { subject: { speedMS: 9, directionDeg: 90 }, distanceM: 10, focalLengthMm: 135, pixelPitchUm: 4 },
    output: {
      flashForFrozenS: null,
      flashForOnePixelS: null,
      shutterForFrozen: null,
      magnification: 0.013684744044602128,
      toleranceUm: 4,
      tolerancePx: 1,
    },
  },
];
