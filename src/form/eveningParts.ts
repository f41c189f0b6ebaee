import type { SkylinePoint } from '../../shared/math/skyline';
import type { Place } from '../../shared/math/sunSite';
import { civilDay, parseCivilDate } from '../../shared/time/civilDate';
import { parseInstant } from '../../shared/time/instant';
import { valueAt, type Body } from './body';
import type { DayAnswer } from '../text/eveningAnswers';
import { zoneOfBody } from './eveningBody';

/** The place of a body whose coordinates are some; null else. */
export function placeOfBody(body: Body): Place | null {
  const { timeZone: _, ...coordinates } = body;
  if (zoneOfBody(coordinates) === null) return null;
  return { latitude: Number(body.latitude), longitude: Number(body.longitude) };
}

/** From the first to the last instant of the day that was answered. */
export function spanOf(day: DayAnswer | null): readonly [number, number] {
  const date = day && parseCivilDate(day.date);
  const span = date && civilDay(date, day.timeZone);
  return span ? [span.startMs, span.endMs] : [0, 1];
}

/** What the aim for the background is, in a question that was let through. */
export function aimStopsOf(input: unknown): number {
  const held = valueAt(input, ['aim', 'backgroundStops']);
  return typeof held === 'number' ? held : 0;
}

/** When the question says that lamps are lit; null for all the time. */
export function lampSpanOf(question: Body): { readonly onMs: number; readonly offMs?: number } | null {
  const msAt = (name: string) => {
    const held = valueAt(question, ['lamps', name]);
    return typeof held === 'string' ? parseInstant(held) : null;
  };
  const [onMs, offMs] = [msAt('onAt'), msAt('offAt')];
  return onMs === null ? null : { onMs, ...(offMs !== null && { offMs }) };
}

/** What stands around the subject: the corners of a skyline, or one altitude all around. */
export function skylineOf({ skyline, horizonDeg }: Body): readonly SkylinePoint[] | number {
  const isWhole = (value: unknown): value is SkylinePoint =>
    Number.isFinite(valueAt(value, ['azimuthDeg'])) && Number.isFinite(valueAt(value, ['altitudeDeg']));
  const corners = Array.isArray(skyline) ? skyline.filter(isWhole) : [];
  if (corners.length > 0) return corners;
  return typeof horizonDeg === 'number' && Number.isFinite(horizonDeg) ? horizonDeg : 0;
}
