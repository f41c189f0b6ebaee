import { parseCivilDate, formatCivilDate, type CivilDate } from '../../shared/time/civilDate';
import {
  clockTimeAt,
  eveningDateAt,
  instantOfClock,
  isClockTime,
  type ClockPlace,
} from '../../shared/time/clockTime';
import { formatInstant, parseInstant } from '../../shared/time/instant';
import { isTimeZone, timeZoneAt } from '../../shared/time/zone';
import { valueAt, withValueAt, type Body, type Path } from './body';

/**
 * The page's body holds what both calculators take, with instants as the place's clock shows them on the date: so they
 * stay what they are when date or place change. What is asked and saved has whole instants.
 */
const FRAME_LISTS = ['moreFrames'] as const;

/** Where instants stand in a ladder's question. */
function instantPaths(body: Body): Path[] {
  const more = FRAME_LISTS.flatMap((name) => {
    const list = valueAt(body, [name]);
    return Array.isArray(list) ? list.map((_, i): Path => [name, i, 'at']) : [];
  });
  return [
    ['testFrame', 'at'],
    ['secondFrame', 'at'],
    ...more,
    ['lamps', 'onAt'],
    ['lamps', 'offAt'],
    ['from'],
    ['to'],
  ];
}

function mapInstants(body: Body, change: (text: string) => string): Body {
  return instantPaths(body).reduce((next, path) => {
    const held = valueAt(next, path);
    return typeof held === 'string' ? withValueAt(next, path, change(held)) : next;
  }, body);
}

const isBetween = (value: unknown, least: number, most: number): value is number =>
  typeof value === 'number' && value >= least && value <= most;

/** The zone of a body, null where place or zone are none. */
export function zoneOfBody({ latitude, longitude, timeZone }: Body): string | null {
  if (timeZone !== undefined) return typeof timeZone === 'string' && isTimeZone(timeZone) ? timeZone : null;
  return isBetween(latitude, -90, 90) && isBetween(longitude, -180, 180)
    ? timeZoneAt(latitude, longitude)
    : null;
}

/** Where a body's clock hangs; null where place or zone are none. */
export function clockPlaceOf(body: Body): ClockPlace | null {
  const timeZone = zoneOfBody(body);
  const { longitude } = body;
  return timeZone !== null && isBetween(longitude, -180, 180) ? { timeZone, longitudeDeg: longitude } : null;
}

function dateOfBody({ date }: Body): CivilDate | null {
  return typeof date === 'string' ? parseCivilDate(date) : null;
}

/** The fields that one calculator takes, with whole instants in the place of clock times. */
export function questionOf(body: Body, takes: (name: string) => boolean, nowMs: number): Body {
  const part = Object.fromEntries(Object.entries(body).filter(([name]) => takes(name)));
  const clock = clockPlaceOf(body);
  const date = body.date === undefined && clock ? eveningDateAt(nowMs, clock) : dateOfBody(body);
  if (!clock || !date) return part;
  return mapInstants(part, (text) => {
    const ms = instantOfClock(date, text, clock);
    return ms === null ? text : formatInstant(ms, clock.timeZone);
  });
}

/** A ladder's question as the page holds it: with a date, and clock times instead of instants. */
export function pageBodyOf(question: Body): Body {
  const clock = clockPlaceOf(question);
  const held = valueAt(question, ['testFrame', 'at']);
  const firstMs = typeof held === 'string' ? parseInstant(held) : null;
  if (!clock || firstMs === null) return question;
  const date = question.date ?? formatCivilDate(eveningDateAt(firstMs, clock));
  return {
    ...mapInstants(question, (text) => {
      const ms = parseInstant(text);
      return ms === null ? text : clockTimeAt(ms, clock.timeZone);
    }),
    date,
  };
}

/** Whether the time at a pointer can't be judged because place or date are still wrong. */
export function isUnjudged(body: Body, pointer: string): boolean {
  const isTime = instantPaths(body).some((path) => `/${path.join('/')}` === pointer);
  const held = valueAt(body, pointer.slice(1).split('/'));
  return isTime && isClockTime(held) && (clockPlaceOf(body) === null || dateOfBody(body) === null);
}
