import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { defineCalculator } from '../../contract/defineCalculator';
import {
  FLASH_UNKNOWNS,
  flashExposureIn,
  highSpeedLoss,
  setupOf,
  unknownOf,
  type FlashExposureIn,
} from '../../contract/flashExposureIn';
import { flashHelp, flashHelpOut } from '../../contract/flashHelp';
import { exactWithMark, settingOut } from '../../contract/settingOut';
import { usualGearNotes } from '../../contract/usualGear';
import { reachOf, solveFlash, type FlashSetup, type FlashUnknown } from '../../math/flashExposure';
import { closeUpLossStops } from '../../math/guideNumber';
import { exposureExamples } from './examples/exposureExamples';

/** Beyond these, an answer is told with a note. Common practice, no source. */
const USUAL = { leastPower: 1 / 300, guideNumberM: 120, nearestM: 0.5 };

function notesOn(given: FlashExposureIn, unknown: FlashUnknown, setup: FlashSetup): Remark[] {
  const notes: Remark[] = [];
  if (given.energyWs !== undefined) notes.push(note('guide_number_from_energy'));
  if (Array.isArray(given.guideNumberM) && given.guideNumberM.length > 1)
    notes.push(note('guns_aimed_alike'));
  if (given.pops > 1) notes.push(note('pops_need_still_subject'));
  if (setup.distanceM < USUAL.nearestM) notes.push(note('flash_very_near'));
  if (unknown === 'guideNumberM' && setup.guideNumberM > USUAL.guideNumberM)
    notes.push(note('guide_number_outside_usual', { guideNumberM: setup.guideNumberM }));
  if (unknown === 'power' && setup.power < USUAL.leastPower)
    notes.push(note('power_below_usual', { mark: exactWithMark('power', given.scale, setup.power).mark }));
  return notes;
}

export const flashExposureOut = z.strictObject({
  unknown: z.enum(FLASH_UNKNOWNS).meta({ title: 'Solved for' }),
  guideNumberM: z.number().meta({
    title: 'Guide number',
    unit: 'm',
    description: 'of all guns in the list together, at ISO 100 and full power',
  }),
  distanceM: z.number().meta({ title: 'Flash to subject', unit: 'm' }),
  aperture: settingOut('Aperture'),
  iso: settingOut('ISO'),
  power: settingOut('Flash power').meta({
    description: 'more than 1 is more than the flash has; the mark is then full power',
  }),
  brightnessStops: z.number().meta({
    title: 'Brightness',
    unit: 'stops',
    description: 'of the subject with the exact value, against a middle tone',
  }),
  brightnessAtMarkStops: z.number().meta({
    title: 'Brightness with the mark set',
    unit: 'stops',
    description: 'of the subject, against a middle tone',
  }),
  highSpeedLossStops: z.number().meta({
    title: 'Loss by high-speed sync',
    unit: 'stops',
    description: 'against one whole pulse',
  }),
  withinPower: z.boolean().meta({ title: 'The flash reaches' }),
  shortByStops: z.number().meta({
    title: 'Short by',
    unit: 'stops',
    description: 'what full power still lacks; 0 where the flash reaches',
  }),
  reserveStops: z.number().meta({
    title: 'In reserve',
    unit: 'stops',
    description: 'from this power up to full; negative where the flash does not reach',
  }),
  whatHelps: flashHelpOut(),
});

export const flashExposure = defineCalculator({
  id: 'flash/exposure',
  title: 'Flash exposure',
  summary: 'The one of distance, aperture, ISO, power and guide number that lights the subject as wished.',
  units: 1,
  input: flashExposureIn,
  output: flashExposureOut,
  sources: [
    'ISO 1230:2007, introduction: f-number times distance is constant for an ISO speed',
    'Several guns, pops, power and loss by derivation from the additivity of light and the inverse square',
    'From energy: GN = √(M·η·W·100/(4π·C)) by derivation; C = 250 after ISO 2720:1974, second-hand',
    'High-speed sync: light spread evenly over curtain travel and exposure, a model',
  ],
  examples: exposureExamples,
  compute(given) {
    const unknown = unknownOf(given);
    const highSpeed = highSpeedLoss(given);
    const removable = given.lossStops + given.ndStops;
    const lossStopsInAll = removable + closeUpLossStops(given.magnification) + highSpeed.stops;
    const conditions = { count: given.pops * given.heads, lossStops: lossStopsInAll };
    const known = setupOf(given);
    const setup = { ...known, [unknown]: solveFlash(unknown, known, given.brightnessStops, conditions) };

    const aperture = exactWithMark('aperture', given.scale, setup.aperture);
    const iso = exactWithMark('iso', given.scale, setup.iso);
    const power = exactWithMark('power', given.scale, setup.power);
    const residuals = { aperture, iso, power, distanceM: null, guideNumberM: null };
    const residual = residuals[unknown]?.residualStops ?? 0;
    const reach = reachOf(setup.power);
    const help = reach.withinPower
      ? null
      : flashHelp(reach.shortByStops, { ...setup, heads: given.heads, lossStops: removable }, given);
    return {
      result: {
        unknown,
        guideNumberM: setup.guideNumberM,
        distanceM: setup.distanceM,
        aperture,
        iso,
        power,
        brightnessStops: given.brightnessStops,
        brightnessAtMarkStops: given.brightnessStops + residual,
        highSpeedLossStops: highSpeed.stops,
        ...reach,
        whatHelps: help?.out ?? null,
      },
      notes: [
        ...(help ? [help.note] : []),
        ...highSpeed.notes,
        ...notesOn(given, unknown, setup),
        ...usualGearNotes(unknown === 'aperture' ? { aperture } : unknown === 'iso' ? { iso } : {}),
      ],
      cautions: ['flash_and_eyes'],
    };
  },
});
