import type { Field } from '../../shared/contract/field';
import type { LengthUnit } from './lengthUnit';
import { choiceTitle } from './choiceTitle';
import { formatQuantity, formatStops } from './formatQuantity';
import { isSettingShape } from './settingShape';

/** Names that end in stops are differences, which read "2 stops"; the others are places on a scale, as an EV is. */
function numberText({ name, unit }: Field, value: number, measure: LengthUnit): string {
  const text = formatQuantity(value, unit, measure);
  if (unit !== 'stops' || !/stops$/i.test(name)) return text;
  return `${text} ${/^−?1$/.test(text) ? 'stop' : 'stops'}`;
}

/** How far a mark lies from the value that it stands in for. */
export function residualText(stops: number): string {
  const text = formatStops(Math.abs(stops));
  if (text === '0') return 'on the mark';
  return `the mark is ${text} ${text === '1' ? 'stop' : 'stops'} ${stops > 0 ? 'brighter' : 'darker'}`;
}

const INSTANT = /^(\d{4}-\d\d-\d\d)T(\d\d:\d\d:\d\d)(?:\.\d+)?(Z?)/;

/** An instant reads as date and time of day in the zone that its answer names; the offset follows from that. */
function plainText(value: string): string {
  const [, date, time, isUtc] = INSTANT.exec(value) ?? [];
  return date && time ? `${date} ${time}${isUtc ? ' UTC' : ''}` : value;
}

/** A value of an answer on one line; what is not there, or null, is a dash. */
export function valueText(field: Field, value: unknown, measure: LengthUnit = 'metres'): string {
  if (value === null || value === undefined) return '–';
  if (isSettingShape(value)) return value.mark;
  if (typeof value === 'number') return numberText(field, value, measure);
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string') return field.kind === 'choice' ? choiceTitle(value) : plainText(value);
  if (Array.isArray(value))
    return value.map((one) => valueText(field.item ?? field, one, measure)).join(', ');
  const held = value as Readonly<Record<string, unknown>>;
  return (field.fields ?? [])
    .filter(({ name }) => held[name] !== undefined)
    .map((part) => `${part.title} ${valueText(part, held[part.name], measure)}`)
    .join(', ');
}
