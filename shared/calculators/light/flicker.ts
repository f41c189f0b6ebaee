import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { defineCalculator } from '../../contract/defineCalculator';
import { number } from '../../contract/quantities';
import { shutterIn } from '../../contract/settingIn';
import { exactWithMark, settingOut } from '../../contract/settingOut';
import { exactOf, readingFields } from '../../contract/settings';
import {
  bandSwingStops,
  flickerRisk,
  FLICKER_RISKS,
  frameSwingStops,
  nearestWholeCycles,
  residualRipple,
  rippleCycles,
  ripplePeriodsS,
} from '../../math/flicker';
import { nearestMark } from '../../math/marks';

const input = z.strictObject({
  mainsHz: number({
    title: 'Mains frequency',
    description: '50 or 60, or as measured; lamps pulse at twice of it',
    unit: 'Hz',
    min: 10,
    max: 500,
  }),
  shutter: shutterIn(),
  curtainS: number({
    title: 'Travel from first to last row',
    description:
      'a focal-plane shutter takes about 1/300 s, an electronic one up to 1/10 s, a leaf shutter none',
    unit: 's',
    min: 0,
    max: 1,
    advanced: true,
  }).default(1 / 300),
  rippleDepth: number({
    title: 'Depth of the ripple',
    description: '(brightest − darkest)/(brightest + darkest) of the lamp; 0 is steady, 1 goes dark',
    min: 0,
    max: 1,
    advanced: true,
  }).default(1),
  ...readingFields,
});

const unevenness = (title: string, description: string) =>
  z
    .strictObject({
      swingStops: z.number().meta({ title: 'Difference', unit: 'stops', description }),
      risk: z.enum(FLICKER_RISKS).meta({
        title: 'Risk',
        description: 'none up to 0.05 stops, slight up to 1/3, clear up to 1, else strong',
      }),
    })
    .meta({ title });

const judged = (swingStops: number) => ({ swingStops, risk: flickerRisk(swingStops) });

/** A time of whole cycles, with the mark that comes nearest and what that mark leaves uneven. */
function wholeCycles(cycles: number, { mainsHz, rippleDepth, scale }: z.output<typeof input>) {
  const exactS = ripplePeriodsS(mainsHz, cycles);
  const atMark = rippleCycles(mainsHz, nearestMark('shutter', scale, exactS).exact);
  const atMarkSwing = frameSwingStops(residualRipple(atMark), rippleDepth);
  return { cycles, shutter: exactWithMark('shutter', scale, exactS), atMark: judged(atMarkSwing) };
}

export const lightFlicker = defineCalculator({
  id: 'light/flicker',
  title: 'Mains flicker',
  summary: 'Whether lamps on the mains leave bands or uneven frames at a shutter, and which times avoid it.',
  units: 1,
  input,
  output: z.strictObject({
    rippleCycles: z.number().meta({ title: 'Cycles of ripple in the exposure' }),
    residualRipple: z.number().meta({
      title: 'Ripple left',
      description: 'share of the lamp’s ripple that the exposure does not level out, 0 to 1',
    }),
    bands: unevenness('Bands within a frame', 'between the brightest and the darkest row, at worst'),
    brightness: unevenness('Brightness from frame to frame', 'between the brightest and the darkest frame'),
    wholeCycles: z
      .array(
        z.strictObject({
          cycles: z.number().meta({ title: 'Cycles' }),
          shutter: settingOut('Shutter'),
          atMark: unevenness('With the mark set', 'between the brightest and the darkest frame'),
        }),
      )
      .meta({ title: 'Times of whole cycles nearby', description: 'they hold no ripple, whatever its form' }),
  }),
  sources: [
    'Derivation: the mean of 1 + m·cos over c = 2·f·t cycles swings by ±m·|sin(πc)/(πc)|',
    'A near sine at twice the mains, as a test laboratory measures lamps on magnetic ballasts and filaments; depth as the percent flicker of ANSI/IES',
    'Words for the risk: common practice, no source',
  ],
  examples: [
    {
      title: '1/125 under lamps on 50 Hz that go dark: clear bands; 1/100 holds a whole cycle',
      input: { mainsHz: 50, shutter: '1/125' },
      output: {
        rippleCycles: 0.78125,
        residualRipple: 0.2584750772197007,
        bands: { swingStops: 0.6627602606941921, risk: 'clear' },
        brightness: { swingStops: 0.7631095578820463, risk: 'clear' },
        wholeCycles: [
          {
            cycles: 1,
            shutter: { exact: 0.01, mark: '1/100', residualStops: -0.022810476891942297 },
            atMark: { swingStops: 0.04596879716962267, risk: 'none' },
          },
        ],
      },
    },
    {
      title: 'An exact hundredth of a second on 50 Hz holds one whole cycle and no ripple',
      input: { mainsHz: 50, shutter: 0.01, readAs: 'exact', rippleDepth: 0.4 },
      output: {
        rippleCycles: 1.0,
        residualRipple: 0,
        bands: { swingStops: 0, risk: 'none' },
        brightness: { swingStops: 0.0, risk: 'none' },
        wholeCycles: [
          {
            cycles: 1,
            shutter: { exact: 0.01, mark: '1/100', residualStops: -0.022810476891942297 },
            atMark: { swingStops: 0.01838621220102538, risk: 'none' },
          },
        ],
      },
    },
    {
      title: '1/500 on 60 Hz with a moderate ripple: over a stop between frames',
      input: { mainsHz: 60, shutter: '1/500', rippleDepth: 0.4 },
      output: {
        rippleCycles: 0.234375,
        residualRipple: 0.9120591124610553,
        bands: { swingStops: 1.051798525190213, risk: 'strong' },
        brightness: { swingStops: 1.1034854330250918, risk: 'strong' },
        wholeCycles: [
          {
            cycles: 1,
            shutter: { exact: 0.008333333333333333, mark: '1/125', residualStops: -0.09310940439148147 },
            atMark: { swingStops: 0.0764681812856093, risk: 'slight' },
          },
        ],
      },
    },
  ],
  compute(given) {
    const { mainsHz, curtainS, rippleDepth } = given;
    const cycles = rippleCycles(mainsHz, exactOf('shutter', given.shutter, given));
    const left = residualRipple(cycles);
    const notes: Remark[] = [note('ripple_of_mains_only')];
    if (rippleDepth === 1) notes.push(note('ripple_worst_case'));
    if (cycles < 1) notes.push(note('ripple_under_one_cycle'));
    return {
      result: {
        rippleCycles: cycles,
        residualRipple: left,
        bands: judged(bandSwingStops(left, rippleDepth, rippleCycles(mainsHz, curtainS))),
        brightness: judged(frameSwingStops(left, rippleDepth)),
        wholeCycles: nearestWholeCycles(cycles).map((count) => wholeCycles(count, given)),
      },
      notes,
    };
  },
});
