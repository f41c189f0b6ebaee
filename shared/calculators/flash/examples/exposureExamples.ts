import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { flashExposureIn } from '../../../contract/flashExposureIn';
import type { flashExposureOut } from '../exposure';

/** Questions that a photographer asks, with their answers. */
export const exposureExamples: readonly Example<
  z.input<typeof flashExposureIn>,
  z.output<typeof flashExposureOut>
>[] = [
  {
    title:
      'A lamp maker lit at 3 m by guide number 50 through a softbox that takes 1.5 stops, at a quarter of the power and ISO 200: f/7.1',
    input: { guideNumberM: 50, lossStops: 1.5, distanceM: 3, iso: 200, power: '1/4' },
    output: {
      unknown: 'aperture',
      guideNumberM: 50,
      distanceM: 3,
      aperture: { exact: 7.007470127114287, mark: 'f/7.1', residualStops: -0.04887928855953036 },
      iso: { exact: 200, mark: '200', residualStops: 0 },
      power: { exact: 0.25, mark: '1/4', residualStops: 0 },
      brightnessStops: 0,
      brightnessAtMarkStops: -0.04887928855953036,
      highSpeedLossStops: 0,
      withinPower: true,
      shortByStops: 0,
      reserveStops: 2,
      whatHelps: null,
    },
  },
  {
    title: 'Two guns of 36 and 22 on one stand are one of 42.2, not of 58: f/8.4 at 5 m',
    input: { guideNumberM: [36, 22], distanceM: 5, iso: 100, power: 1 },
    output: {
      unknown: 'aperture',
      guideNumberM: 42.190046219457976,
      distanceM: 5,
      aperture: { exact: 8.438009243891596, mark: 'f/8', residualStops: 0.15380533607903585 },
      iso: { exact: 100, mark: '100', residualStops: 0 },
      power: { exact: 1, mark: '1/1', residualStops: 0 },
      brightnessStops: 0,
      brightnessAtMarkStops: 0.15380533607903585,
      highSpeedLossStops: 0,
      withinPower: true,
      shortByStops: 0,
      reserveStops: 0,
      whatHelps: null,
    },
  },
  {
    title: 'At a sixteenth of the power and ISO 400, guide number 40 reaches 3.5 m at f/5.6',
    input: { guideNumberM: 40, aperture: 'f/5.6', iso: 400, power: '1/16' },
    output: {
      unknown: 'distanceM',
      guideNumberM: 40,
      distanceM: 3.535533905932738,
      aperture: { exact: 5.65685424949238, mark: 'f/5.6', residualStops: 0 },
      iso: { exact: 400, mark: '400', residualStops: 0 },
      power: { exact: 0.0625, mark: '1/16', residualStops: 0 },
      brightnessStops: 0,
      brightnessAtMarkStops: 0,
      highSpeedLossStops: 0,
      withinPower: true,
      shortByStops: 0,
      reserveStops: 4,
      whatHelps: null,
    },
  },
  {
    title:
      'Too weak: guide number 24 behind a softbox is 1.5 stops short of f/8 at 3 m; at 1.8 m it would do',
    input: { guideNumberM: 24, lossStops: 1.5, distanceM: 3, aperture: 'f/8', iso: 100 },
    output: {
      unknown: 'power',
      guideNumberM: 24,
      distanceM: 3,
      aperture: { exact: 8, mark: 'f/8', residualStops: 0 },
      iso: { exact: 100, mark: '100', residualStops: 0 },
      power: { exact: 2.82842712474619, mark: '1/1', residualStops: -1.5 },
      brightnessStops: 0,
      brightnessAtMarkStops: -1.5,
      highSpeedLossStops: 0,
      withinPower: false,
      shortByStops: 1.4999999999999998,
      reserveStops: -1.4999999999999998,
      whatHelps: {
        distanceM: 1.7838106725040819,
        heads: 2.82842712474619,
        lessLossStops: 1.4999999999999998,
        aperture: { exact: 4.756828460010884, mark: 'f/4.5', residualStops: 0.1666666666666668 },
        iso: { exact: 282.84271247461896, mark: '320', residualStops: 0.166666666666667 },
      },
    },
  },
  {
    title:
      'Frozen in daylight at 1/2000: high-speed sync takes 3 stops of guide number 60, and half power is enough for f/5.6 at 2.6 m',
    input: {
      guideNumberM: 60,
      distanceM: 2.6,
      aperture: 'f/5.6',
      iso: 100,
      highSpeedSync: { shutter: '1/2000', syncSpeed: '1/250', extraLossStops: 0 },
    },
    output: {
      unknown: 'power',
      guideNumberM: 60,
      distanceM: 2.6,
      aperture: { exact: 5.65685424949238, mark: 'f/5.6', residualStops: 0 },
      iso: { exact: 100, mark: '100', residualStops: 0 },
      power: { exact: 0.4702957037037038, mark: '1/2', residualStops: 0.08835994209540575 },
      brightnessStops: 0,
      brightnessAtMarkStops: 0.08835994209540575,
      highSpeedLossStops: 2.9683980026141716,
      withinPower: true,
      shortByStops: 0,
      reserveStops: 1.0883599420954058,
      whatHelps: null,
    },
  },
  {
    title:
      'A studio head of 400 W·s at 40 lm·s/Ws in a reflector four times as bright as the bare tube: guide number 45',
    input: {
      energyWs: 400,
      efficacyLmSPerWs: 40,
      reflectorFactor: 4,
      distanceM: 2.5,
      iso: 100,
      power: '1/2',
    },
    output: {
      unknown: 'aperture',
      guideNumberM: 45.13516668382051,
      distanceM: 2.5,
      aperture: { exact: 12.766152972845845, mark: 'f/13', residualStops: 0.015170537194347834 },
      iso: { exact: 100, mark: '100', residualStops: 0 },
      power: { exact: 0.5, mark: '1/2', residualStops: 0 },
      brightnessStops: 0,
      brightnessAtMarkStops: 0.015170537194347834,
      highSpeedLossStops: 0,
      withinPower: true,
      shortByStops: 0,
      reserveStops: 1,
      whatHelps: null,
    },
  },
];
