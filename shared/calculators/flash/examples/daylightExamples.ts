import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { daylightIn } from '../../../contract/daylightIn';
import type { flashDaylightOut } from '../daylight';

/** Questions that a photographer asks, with their answers. */
export const daylightExamples: readonly Example<
  z.input<typeof daylightIn>,
  z.output<typeof flashDaylightOut>
>[] = [
  {
    title:
      'f/2 against a sunlit hill with a sync speed of 1/200: filter or high-speed sync? Both may reach, and which is better is not known',
    input: {
      background: { ev100: 15 },
      subjectAmbient: { belowBackgroundStops: 2 },
      aperture: 'f/2',
      iso: 100,
      syncSpeed: '1/200',
      flash: { guideNumberM: 40, distanceM: 2 },
      view: { focalLengthMm: 85, distanceM: 3 },
    },
    output: {
      conflictStops: 5.333333333333332,
      asWanted: null,
      ways: [
        {
          way: 'smallerAperture',
          settings: {
            aperture: { exact: 12.699208415745591, mark: 'f/13', residualStops: -9.610279511444754e-16 },
            shutter: { exact: 0.0049215666011518475, mark: '1/200', residualStops: 0 },
            iso: { exact: 100, mark: '100', residualStops: 0 },
            ndStops: 0,
          },
          power: { exact: 0.30238105197476917, mark: '1/4+1/3', residualStops: 0.05889368905357046 },
          withinPower: true,
          reserveStops: 1.725560355720237,
          whatHelps: null,
          depth: { nearM: 2.6137232082148096, farM: 3.5202506182900977, totalM: 0.9065274100752883 },
          costs: [
            {
              code: 'focus_deepens',
              stops: 5.333333333333332,
              message: 'The aperture closes by 5.33 stops, so more of the depth is sharp.',
            },
            {
              code: 'flash_loses_by_aperture',
              stops: 5.333333333333332,
              message: 'The smaller aperture takes 5.33 stops of the flash as well.',
            },
          ],
        },
        {
          way: 'neutralDensity',
          settings: {
            aperture: { exact: 2, mark: 'f/2', residualStops: 0 },
            shutter: { exact: 0.0049215666011518475, mark: '1/200', residualStops: 0 },
            iso: { exact: 100, mark: '100', residualStops: 0 },
            ndStops: 5.333333333333332,
          },
          power: { exact: 0.30238105197476917, mark: '1/4+1/3', residualStops: 0.05889368905357046 },
          withinPower: true,
          reserveStops: 1.725560355720237,
          whatHelps: null,
          depth: { nearM: 2.931762800238172, farM: 3.0714893553776617, totalM: 0.13972655513948962 },
          costs: [
            {
              code: 'flash_loses_by_filter',
              stops: 5.333333333333332,
              message: 'The filter takes 5.33 stops of the flash as well.',
            },
            {
              code: 'finder_darkens',
              stops: 5.333333333333332,
              message:
                'An optical finder darkens by 5.33 stops; focus before the filter goes on. Strong filters tint.',
            },
          ],
        },
        {
          way: 'highSpeedSync',
          settings: {
            aperture: { exact: 2, mark: 'f/2', residualStops: 0 },
            shutter: { exact: 0.00012207031250000008, mark: '1/8000', residualStops: -9.610279511444756e-16 },
            iso: { exact: 100, mark: '100', residualStops: 0 },
            ndStops: 0,
          },
          power: { exact: 0.21229999999999982, mark: '1/8+2/3', residualStops: -0.09750960968926045 },
          withinPower: true,
          reserveStops: 2.235823723644073,
          whatHelps: null,
          depth: { nearM: 2.931762800238172, farM: 3.0714893553776617, totalM: 0.13972655513948962 },
          reserveRange: { lowStops: 0.735823723644073, highStops: 2.235823723644073 },
          costs: [
            {
              code: 'flash_loses_by_spreading',
              stops: 4.823069965409497,
              message: 'The light is spread over curtain and exposure, which takes 4.82 stops of it.',
            },
            {
              code: 'no_freezing_pulse',
              stops: null,
              message: 'The flash no longer freezes; the shutter does.',
            },
            {
              code: 'more_heat',
              stops: null,
              message: 'High-speed sync drains the battery and heats the head more than one pulse.',
            },
          ],
        },
      ],
      better: null,
    },
  },
  {
    title:
      'The same with filters of 3, 6 and 10 stops at hand and high-speed sync measured at 0.8 stops over the model: the filter is stronger than needed, and high-speed sync leaves the flash more',
    input: {
      background: { ev100: 15 },
      subjectAmbient: { belowBackgroundStops: 2 },
      aperture: 'f/2',
      iso: 100,
      syncSpeed: '1/200',
      flash: { guideNumberM: 40, distanceM: 2 },
      ndStops: [3, 6, 10],
      highSpeedSync: { extraLossStops: 0.8 },
    },
    output: {
      conflictStops: 5.333333333333332,
      asWanted: null,
      ways: [
        {
          way: 'smallerAperture',
          settings: {
            aperture: { exact: 12.699208415745591, mark: 'f/13', residualStops: -9.610279511444754e-16 },
            shutter: { exact: 0.0049215666011518475, mark: '1/200', residualStops: 0 },
            iso: { exact: 100, mark: '100', residualStops: 0 },
            ndStops: 0,
          },
          power: { exact: 0.30238105197476917, mark: '1/4+1/3', residualStops: 0.05889368905357046 },
          withinPower: true,
          reserveStops: 1.725560355720237,
          whatHelps: null,
          costs: [
            {
              code: 'focus_deepens',
              stops: 5.333333333333332,
              message: 'The aperture closes by 5.33 stops, so more of the depth is sharp.',
            },
            {
              code: 'flash_loses_by_aperture',
              stops: 5.333333333333332,
              message: 'The smaller aperture takes 5.33 stops of the flash as well.',
            },
          ],
        },
        {
          way: 'neutralDensity',
          settings: {
            aperture: { exact: 2, mark: 'f/2', residualStops: 0 },
            shutter: { exact: 0.007812500000000005, mark: '1/125', residualStops: -9.610279511444756e-16 },
            iso: { exact: 100, mark: '100', residualStops: 0 },
            ndStops: 6,
          },
          power: { exact: 0.47999999999999976, mark: '1/2', residualStops: 0.05889368905356923 },
          withinPower: true,
          reserveStops: 1.0588936890535692,
          whatHelps: null,
          costs: [
            {
              code: 'flash_loses_by_filter',
              stops: 6,
              message: 'The filter takes 6 stops of the flash as well.',
            },
            {
              code: 'finder_darkens',
              stops: 6,
              message:
                'An optical finder darkens by 6 stops; focus before the filter goes on. Strong filters tint.',
            },
            {
              code: 'filter_stronger_than_needed',
              stops: 0.6666666666666677,
              message:
                'The filter is 0.67 stops stronger than needed; the shutter is slower by that. A higher ISO instead would give the flash as much back.',
            },
          ],
        },
        {
          way: 'highSpeedSync',
          settings: {
            aperture: { exact: 2, mark: 'f/2', residualStops: 0 },
            shutter: { exact: 0.00012207031250000008, mark: '1/8000', residualStops: -9.610279511444756e-16 },
            iso: { exact: 100, mark: '100', residualStops: 0 },
            ndStops: 0,
          },
          power: { exact: 0.3696357691755339, mark: '1/4+2/3', residualStops: 0.10249039031073999 },
          withinPower: true,
          reserveStops: 1.4358237236440732,
          whatHelps: null,
          costs: [
            {
              code: 'flash_loses_by_spreading',
              stops: 5.623069965409496,
              message: 'The light is spread over curtain and exposure, which takes 5.62 stops of it.',
            },
            {
              code: 'no_freezing_pulse',
              stops: null,
              message: 'The flash no longer freezes; the shutter does.',
            },
            {
              code: 'more_heat',
              stops: null,
              message: 'High-speed sync drains the battery and heats the head more than one pulse.',
            },
          ],
        },
      ],
      better: 'highSpeedSync',
    },
  },
  {
    title: 'Later, at EV 9, f/2.8 fits the sync speed as it is',
    input: {
      background: { ev100: 9 },
      subjectAmbient: { ev100: 7.5 },
      aperture: 'f/2.8',
      iso: 100,
      syncSpeed: '1/200',
      flash: { guideNumberM: 40, distanceM: 2 },
      aim: { backgroundStops: -1 },
    },
    output: {
      conflictStops: -0.6666666666666661,
      asWanted: {
        settings: {
          aperture: { exact: 2.82842712474619, mark: 'f/2.8', residualStops: 0 },
          shutter: { exact: 0.007812499999999996, mark: '1/125', residualStops: 9.61027951144475e-16 },
          iso: { exact: 100, mark: '100', residualStops: 0 },
          ndStops: 0,
        },
        power: { exact: 0.01646446609406725, mark: '1/64', residualStops: -0.07549953953294775 },
        withinPower: true,
        reserveStops: 5.924500460467052,
        whatHelps: null,
      },
      ways: [],
      better: null,
    },
  },
];
