import { type z } from 'zod';
import { stopsOfDensity, stopsOfFactor, stopsOfPolarisers } from '../math/density';
import { number } from './quantities';

/** More than any stack of filters takes away, in stops. */
export const MOST_FILTER_STOPS = 40;

/** The ways to say a filter; exactly one of them in a request. */
export const FILTER_WAYS = ['stops', 'density', 'factor', 'polariserDeg'] as const;

export const filterFields = {
  stops: number({ title: 'Stops', unit: 'stops', min: 0, max: MOST_FILTER_STOPS }).optional(),
  density: number({
    title: 'Density',
    description: 'as "ND 0.9" has it: log10 of the factor',
    min: 0,
    max: 12,
  }).optional(),
  factor: number({
    title: 'Factor',
    description: 'as "ND8" has it: how many times longer',
    min: 1,
    max: 1e12,
  }).optional(),
  polariserDeg: number({
    title: 'Crossed polarisers',
    description: 'how far two polarisers are turned against each other',
    unit: '°',
    min: 0,
    max: 89,
  }).optional(),
};

export type FilterIn = z.output<z.ZodObject<typeof filterFields>>;

/** Stops that a filter takes away, however it was said. */
export function stopsOfFilter({ stops, density, factor, polariserDeg }: FilterIn): number {
  if (density !== undefined) return stopsOfDensity(density);
  if (factor !== undefined) return stopsOfFactor(factor);
  return polariserDeg === undefined ? (stops ?? 0) : stopsOfPolarisers(polariserDeg);
}
