import type { Field } from '../../shared/contract/field';
import type { DayEvent, Rung, TurningPoint } from './eveningAnswers';
import { choiceTitle } from './choiceTitle';
import { valueText } from './valueText';

/** The clock of an instant that is told in the place's own time: "18:45", with seconds "18:45:10". */
export const clockText = (instant: string, hasSeconds = false): string =>
  instant.slice(11, hasSeconds ? 19 : 16);

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

export const eventTitle = (name: string): string => capital(choiceTitle(name));

const REASONS = {
  sun_stays_above: 'does not happen: the sun stays above',
  sun_stays_below: 'does not happen: the sun stays below',
} as const;

/** When an event is, or why it is not. */
export const eventTime = ({ at, reason }: DayEvent): string =>
  at === null ? REASONS[reason ?? 'sun_stays_below'] : clockText(at, true);

const TURNS: Record<TurningPoint['code'], readonly [enters: string, leaves: string]> = {
  handheld_limit: ['The shutter is at its slowest', 'The shutter gets faster again'],
  aperture_opens: ['The aperture opens', 'The aperture is back where it was held'],
  iso_rises: ['ISO rises', 'ISO is back where it was held'],
  flash_limit: ['The flash is at its end', 'The flash is within its range again'],
  out_of_reach: ['Darker than the limits reach', 'Within reach again'],
};

export const turningTitle = ({ code, isLeft }: TurningPoint): string => TURNS[code][isLeft ? 1 : 0];

/** What is to be set on a rung: "f/4, 1/60, ISO 400, flash 1/16". */
export function rungSettings({ aperture, shutter, iso, power }: Rung): string[] {
  const flash = power === undefined ? [] : [power ? `flash ${power.mark}` : 'no flash'];
  return [aperture.mark, shutter.mark, `ISO ${iso.mark}`, ...flash];
}

/** By how much a change may be due sooner or later: "2 min early to 3 min late". */
export function dueText({ earlyS, lateS }: Rung): string {
  if (earlyS === null || lateS === null) return '—';
  const minutes = (seconds: number) => Math.round(seconds / 60);
  const [early, late] = [minutes(earlyS), minutes(lateS)];
  return early === late ? `± ${late} min` : `−${early} to +${late} min`;
}

/** Time until a change, as one counts it down. */
export function untilText(ms: number): string {
  const seconds = Math.max(0, Math.round(ms / 1000));
  if (seconds < 60) return `${seconds} s`;
  const minutes = Math.floor(seconds / 60);
  return minutes < 60 ? `${minutes} min` : `${Math.floor(minutes / 60)} h ${minutes % 60} min`;
}

/** What is set in a folded part, in a line: each field by its title, a group's by their own. */
export function readBack(fields: readonly Field[], body: Readonly<Record<string, unknown>>): string {
  const said = fields.flatMap((field) => {
    const value = body[field.name];
    if (value === undefined || value === null) return [];
    const text = valueText(field, value);
    return text === '' ? [] : [field.kind === 'group' ? text : `${field.title} ${text}`];
  });
  return said.join(', ') || 'not set';
}
