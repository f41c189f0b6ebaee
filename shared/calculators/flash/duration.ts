import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { contradictionAt } from '../../contract/contradictionAt';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactlyOne } from '../../contract/exactlyOne';
import {
  flashControlIn,
  flashDurationFields,
  flashPowerIn,
  measuredDuration,
  pulseFields,
} from '../../contract/flashIn';
import { pulseNotes } from '../../contract/pulseNotes';
import { number } from '../../contract/quantities';
import { shutterIn } from '../../contract/settingIn';
import { exactWithMark, settingOut } from '../../contract/settingOut';
import { exactOf, readingFields } from '../../contract/settings';
import { clippedBy, flashPulse, halfPeakS, isLowerBound, tenthPeakS } from '../../math/flashDuration';
import { shareWithin } from '../../math/flashPulse';

/** A loss by the shutter that a photographer would notice, stops. Common practice, no source. */
const NOTICEABLE_STOPS = 0.1;

const fields = z.strictObject({
  ...flashDurationFields,
  control: flashControlIn(),
  power: flashPowerIn().default(1),
  ...pulseFields,
  shutter: shutterIn({ description: 'to know how much of the pulse it lets through' }).optional(),
  curtainS: number({
    title: 'Curtain travel',
    description: 'the part of the exposure in which the frame is not wholly open; 0 for a leaf shutter',
    unit: 's',
    min: 0,
    max: 1,
  }).default(0),
  ...readingFields,
});

const input = contradictionAt<typeof fields>(({ shutter, curtainS, ...reading }) => {
  if (shutter === undefined) return [];
  const shutterS = exactOf('shutter', shutter, reading);
  return curtainS < shutterS
    ? []
    : [{ code: 'frame_never_open', path: ['curtainS'], params: { shutterS, curtainS } }];
})(exactlyOne('t05S', 't01S')(fields));

const share = (title: string, description: string) => z.number().meta({ title, description });

export const flashDuration = defineCalculator({
  id: 'flash/duration',
  title: 'Flash duration',
  summary:
    'How long a flash lasts at a power, how much light falls inside t0.5 and t0.1, what a shutter clips.',
  units: 1,
  input,
  output: z.strictObject({
    t05S: z.number().meta({ title: 'Duration t0.5', unit: 's', description: 'time above half of the peak' }),
    t01S: z
      .number()
      .meta({ title: 'Duration t0.1', unit: 's', description: 'time above a tenth of the peak' }),
    onlyMeasurable: z.boolean().meta({
      title: 'Only a measurement tells',
      description: 'the durations are then the least that they can be',
    }),
    ratio: share('Ratio t0.1 to t0.5', 'of the pulse at this power'),
    shareInsideT05: share('Light inside t0.5', '0 to 1, from the start of the pulse'),
    shareInsideT01: share('Light inside t0.1', '0 to 1, from the start of the pulse'),
    equivalentShutter: settingOut('Equivalent shutter').meta({
      description: 'the exposure time that freezes as this flash does, by its t0.1',
    }),
    shareThroughShutter: share('Light through the shutter', '0 to 1').optional(),
    clippedStops: z
      .number()
      .optional()
      .meta({ title: 'Clipped by the shutter', unit: 'stops', description: '0 or less' }),
  }),
  sources: [
    'Working definitions of the trade: t0.5 above half, t0.1 above a tenth of the peak; no clause of a standard was seen, and some makers state the time for 50 % or 90 % of the energy',
    'Whole discharge: I = exp(−(t/τ)^k), k from the measured ratio, 1 for an exponential; by derivation',
    'Cut off: T = −τ·ln(1 − p), a model, within 9 % of one published table of durations with the rise added',
    'Voltage: that less power is longer, from makers’ pages',
  ],
  examples: [
    {
      title:
        'A studio head burns out in t0.5 = 1 ms, which is t0.1 = 3.3 ms; a leaf shutter at 1/500 takes 0.43 stops of it',
      input: { t05S: 0.001, control: 'decay', shutter: '1/500' },
      output: {
        t05S: 0.001,
        t01S: 0.0033219280948873623,
        onlyMeasurable: false,
        ratio: 3.321928094887362,
        shareInsideT05: 0.5,
        shareInsideT01: 0.9,
        equivalentShutter: {
          exact: 0.0033219280948873623,
          mark: '1/320',
          residualStops: -0.09956989431586616,
        },
        shareThroughShutter: 0.7417437802446929,
        clippedStops: -0.43100717058358423,
      },
    },
    {
      title:
        'A shoe-mount flash cut off at 1/32 lasts 58 µs in all, where the full pulse has a t0.1 of 3.3 ms',
      input: { t05S: 0.001, control: 'cutoff', power: '1/32' },
      output: {
        t05S: 5.780368961312479e-5,
        t01S: 5.780368961312479e-5,
        onlyMeasurable: false,
        ratio: 1,
        shareInsideT05: 1,
        shareInsideT01: 1,
        equivalentShutter: {
          exact: 5.780368961312479e-5,
          mark: '1/16000',
          residualStops: 0.07847889145703345,
        },
      },
    },
    {
      title: 'Controlled by voltage, a quarter of the power lasts at least as long as full power: measure it',
      input: { t01S: 0.0025, control: 'voltage', power: '1/4' },
      output: {
        t05S: 0.0007525749891599528,
        t01S: 0.002499999999999999,
        onlyMeasurable: true,
        ratio: 3.3219280948873617,
        shareInsideT05: 0.5,
        shareInsideT01: 0.9,
        equivalentShutter: {
          exact: 0.002499999999999999,
          mark: '1/400',
          residualStops: -0.022810476891940996,
        },
      },
    },
    {
      title: 'A measured ratio of 2.5 instead of 3.32 puts 62 % of the light inside t0.5',
      input: { t05S: 0.001, control: 'decay', ratio: 2.5 },
      output: {
        t05S: 0.001,
        t01S: 0.0024999999999999996,
        onlyMeasurable: false,
        ratio: 2.4999999999999996,
        shareInsideT05: 0.6201447618216215,
        shareInsideT01: 0.9369639237279632,
        equivalentShutter: {
          exact: 0.0024999999999999996,
          mark: '1/400',
          residualStops: -0.02281047689194116,
        },
      },
    },
  ],
  compute(given) {
    const power = exactOf('power', given.power, given);
    const pulse = flashPulse(measuredDuration(given), { ...given, power });
    const [t05S, t01S] = [halfPeakS(pulse), tenthPeakS(pulse)];
    const notes: Remark[] = pulseNotes(given, power, pulse);
    const result = {
      t05S,
      t01S,
      onlyMeasurable: isLowerBound(given.control, power),
      ratio: t01S / t05S,
      shareInsideT05: shareWithin(pulse, t05S),
      shareInsideT01: shareWithin(pulse, t01S),
      equivalentShutter: exactWithMark('shutter', given.scale, t01S),
    };
    if (given.shutter === undefined) return { result, notes };
    const clipped = clippedBy(pulse, exactOf('shutter', given.shutter, given), given.curtainS);
    if (clipped.clippedStops < -NOTICEABLE_STOPS)
      notes.push(note('pulse_clipped', { stops: clipped.clippedStops }));
    return {
      result: { ...result, shareThroughShutter: clipped.share, clippedStops: clipped.clippedStops },
      notes,
    };
  },
});
