import { z } from 'zod';
import type { FieldMeta, Unit } from './field';

interface NumberOptions extends Omit<FieldMeta, 'range' | 'setting'> {
  readonly min: number;
  readonly max: number;
  /** The lower bound itself is not allowed. */
  readonly above?: boolean;
}

/** A number with its range, unit and words; the range is enforced, documented and named in messages. */
export function number({ min, max, above = false, ...meta }: NumberOptions) {
  const bounded = above ? z.number().gt(min) : z.number().min(min);
  return bounded.max(max).meta({ ...meta });
}

/** A whole number with its range. */
export function integer({ min, max, ...meta }: Omit<NumberOptions, 'above'>) {
  return z
    .int()
    .min(min)
    .max(max)
    .meta({ ...meta });
}

const preset =
  (defaults: NumberOptions & { unit?: Unit }) =>
  (meta: Partial<NumberOptions> = {}) =>
    number({ ...defaults, ...meta });

/** A distance in metres, 0.01 to 10,000. */
export const distanceM = preset({ title: 'Distance', unit: 'm', min: 0.01, max: 10_000 });
/** A focal length in millimetres, 1 to 5,000. */
export const focalLengthMm = preset({ title: 'Focal length', unit: 'mm', min: 1, max: 5_000 });
/** Brightness against a middle tone or a difference of light, −60 to 60 stops. */
export const stops = preset({ title: 'Stops', unit: 'stops', min: -60, max: 60 });
/** A loss given as a positive number of stops, 0 to 40. */
export const lossStops = preset({ title: 'Loss', unit: 'stops', min: 0, max: 40 });
/** A scene's exposure value at ISO 100, −30 to 40. */
export const ev100In = preset({ title: 'EV at ISO 100', unit: 'stops', min: -30, max: 40 });
/** A luminance in cd/m², 1e-9 to 1e10. */
export const luminanceIn = preset({ title: 'Luminance', unit: 'cd/m²', min: 1e-9, max: 1e10 });
/** An illuminance in lux, 1e-9 to 1e10. */
export const illuminanceIn = preset({ title: 'Illuminance', unit: 'lx', min: 1e-9, max: 1e10 });

/** The meter constants, with the usual values; ISO 2720:1974 recommends K 10.6–13.4, C 240–400 or 320–540. */
export const meterConstants = {
  reflectedK: number({
    title: 'Meter constant K',
    description: 'reflected light, cd·s·ISO/m²; 12.5 is usual, ISO 2720 recommends 10.6 to 13.4',
    min: 1,
    max: 100,
    advanced: true,
  }).default(12.5),
  incidentC: number({
    title: 'Meter constant C',
    description: 'incident light, lx·s·ISO; 250 is usual for a flat receptor, 320 to 340 for a dome',
    min: 10,
    max: 5_000,
    advanced: true,
  }).default(250),
};
