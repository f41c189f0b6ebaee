import type { Field } from '../../shared/contract/field';
import { decodeQuery } from '../../shared/contract/queryCodec';
import { numberOfSetting } from '../../shared/contract/settingIn';
import { lengthOf, metresOf, type LengthUnit } from '../text/lengthUnit';

/** Lengths are typed as the reader measures, and held in metres. */
const isLength = ({ kind, unit }: Field) => kind === 'number' && unit === 'm';

/** What typed text means for a field, by the same rule as in an address; nothing typed is nothing given. */
export function readTyped(field: Field, text: string, measure: LengthUnit = 'metres'): unknown {
  const trimmed = text.trim();
  if (trimmed === '') return undefined;
  const value = decodeQuery([[field.name, tidied(field, trimmed)]], [field])[field.name];
  return typeof value === 'number' && isLength(field) ? metresOf(value, measure) : value;
}

/** People type 5,6 on many keyboards, and the minus that the console itself shows. */
function tidied(field: Field, text: string): string {
  if (field.kind !== 'number' && field.kind !== 'setting') return text;
  return text.replace(/^−/, '-').replace(/^(-?\d+),(\d{1,2})$/, '$1.$2');
}

/** A value as it stands in its text box. */
export function shownText(field: Field, value: unknown, measure: LengthUnit = 'metres'): string {
  if (value === undefined || value === null) return '';
  if (typeof value === 'number' && isLength(field)) return String(lengthOf(value, measure));
  if (typeof value === 'number' && field.setting === 'aperture') {
    const marked = `f/${value}`;
    return numberOfSetting('aperture', marked) === value ? marked : String(value);
  }
  return typeof value === 'string' ? value : JSON.stringify(value);
}
