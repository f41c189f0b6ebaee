import { z } from 'zod';
import type { FlashControl, MeasuredDuration } from '../math/flashDuration';
import { addGuideNumbers } from '../math/guideNumber';
import type { FieldMeta } from './field';
import { asList, oneOrMany } from './oneOrMany';
import { number } from './quantities';
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
