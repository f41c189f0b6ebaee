import { z } from 'zod';
import { civilDateAt } from '../time/civilDate';
import { parseInstant } from '../time/instant';
import { isTimeZone, timeZoneAt } from '../time/zone';
import type { FoundContradiction } from './contradictionAt';
import { number } from './quantities';

/** A place on the earth, as every calculator of the sun takes it. */
export const geographicFields = {
  latitude: number({ title: 'Latitude', description: 'north positive', unit: '°', min: -90, max: 90 }),
  longitude: number({ title: 'Longitude', description: 'east positive', unit: '°', min: -180, max: 180 }),
  timeZone: z.string().min(1).max(64).optional().meta({
    title: 'Time zone',
    description:
      'a name of the IANA database, such as "Europe/London"; looked up from the place where left out',
    advanced: true,
  }),
};

export interface GeographicIn {
  readonly latitude: number;
  readonly longitude: number;
  readonly timeZone?: string;
}

/** The zone in which times are told: the one that is given, or the one in force at the place. */
export function zoneOf({ timeZone, latitude, longitude }: GeographicIn): string {
  return timeZone ?? timeZoneAt(latitude, longitude);
}

/** A name that is no time zone's. */
export function zoneFaults({ timeZone }: Partial<GeographicIn>): FoundContradiction[] {
  if (timeZone === undefined || isTimeZone(timeZone)) return [];
  return [{ code: 'time_zone_unknown', path: ['timeZone'], params: { given: timeZone } }];
}

/** An instant, with its offset. */
export const instantIn = (title: string, description = 'with its offset, or Z') =>
  z.iso.datetime({ offset: true }).meta({ title, description });

/** Years for which the earth's turning, and so the sun's time, is known well enough. */
const FIRST_YEAR = 1700;
const LAST_YEAR = 2199;

/** An instant or date outside the years that are answered. */
export function yearFaults(
  text: string | undefined,
  path: readonly (string | number)[],
): FoundContradiction[] {
  const year = Number(text?.slice(0, 4));
  if (text === undefined || (year >= FIRST_YEAR && year <= LAST_YEAR)) return [];
  return [{ code: 'year_out_of_range', path, params: { first: FIRST_YEAR, last: LAST_YEAR, given: text } }];
}

/** Milliseconds since 1970 (UTC) of an instant that the schema let through. */
export function msOf(instant: string): number {
  return parseInstant(instant) ?? Number.NaN;
}

/** The date that the place's calendar shows at an instant. */
export const dateAt = (at: Date, timeZone: string) => civilDateAt(at.getTime(), timeZone);
