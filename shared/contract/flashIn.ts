import { z } from 'zod';
import { RISE_FLOOR_S, type FlashControl, type MeasuredDuration } from '../math/flashDuration';
import { addGuideNumbers } from '../math/guideNumber';
import type { FieldMeta } from './field';
import { asList, oneOrMany } from './oneOrMany';
import { meterConstants, number } from './quantities';
import { powerIn } from './settingIn';

/** The least power that a calculator takes: thirty stops under full, far below any flash. */
const LEAST_POWER = 1e-9;

/** A guide number, or several of guns that stand together; f-number times metres at ISO 100 and full power. */
export const guideNumberIn = () =>
  oneOrMany(
    number({
      title: 'Guide number',
      description:
        'f-number times metres at ISO 100 and full power, at the zoom or reflector in use; a list of guns adds as the root of the sum of squares',
      unit: 'm',
      min: 0.01,
      max: 10_000,
    }),
    20,
  );

/** One guide number for what a request gave. */
export function guideNumberOf(given: number | number[]): number {
  return addGuideNumbers(asList(given));
}

/** The other way to say how strong a flash is; goes with `together('energyWs', 'efficacyLmSPerWs')`. */
export const flashEnergyFields = {
  energyWs: number({
    title: 'Energy',
    description: 'of the capacitors, instead of a guide number',
    unit: 'W·s',
    min: 0.01,
    max: 1_000_000,
  }).optional(),
  efficacyLmSPerWs: number({
    title: 'Efficacy',
    description: 'light for the energy; 15 to 50 as read for studio systems',
    unit: 'lm·s/Ws',
    min: 0.1,
    max: 500,
  }).optional(),
  reflectorFactor: number({
    title: 'Reflector factor',
    description:
      'how many times brighter on the axis than a bare tube; 2 for all light spread over a half-space, measured for real reflectors',
    min: 0.01,
    max: 1000,
  }).default(1),
  incidentC: meterConstants.incidentC,
};

/** A fraction of full power, or a mark such as "1/16". */
export const flashPowerIn = (meta?: FieldMeta) => powerIn({ range: [LEAST_POWER, 1], ...meta });

const duration = (title: string, share: string) =>
  number({
    title,
    description: `time above ${share} of the peak, of the pulse at full power`,
    unit: 's',
    min: 1e-8,
    max: 10,
  }).optional();

/** A flash duration at full power, in one of two ways; goes with `exactlyOne('t05S', 't01S')`. */
export const flashDurationFields = {
  t05S: duration('Duration t0.5', 'half'),
  t01S: duration('Duration t0.1', 'a tenth'),
};

/** The duration that a request gave. */
export function measuredDuration(given: { t05S?: number; t01S?: number }): MeasuredDuration {
  return given.t05S === undefined ? { t01S: given.t01S ?? 0 } : { t05S: given.t05S };
}

const CONTROLS: [FlashControl, ...FlashControl[]] = ['decay', 'cutoff', 'voltage'];

/** How a flash makes less light. */
export const flashControlIn = () =>
  z.enum(CONTROLS).meta({
    title: 'Control of power',
    description:
      'decay: the whole capacitor empties, an exponential; cutoff: the tube is switched off early, so less power is shorter; voltage: the capacitor is charged less, so less power is longer',
  });

/** What else decides a pulse. */
export const pulseFields = {
  ratio: number({
    title: 'Ratio t0.1 to t0.5',
    description: 'as measured, of a whole discharge; 3.32 for a plain exponential where left out',
    min: 1,
    max: 20,
    advanced: true,
  }).optional(),
  riseFloorS: number({
    title: 'Rise of the tube',
    description: 'added to a cut-off pulse below 1/16 power',
    unit: 's',
    min: 0,
    max: 0.01,
    advanced: true,
  }).default(RISE_FLOOR_S),
};
