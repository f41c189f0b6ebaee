import type { Field } from '../../shared/contract/field';
import { decodeQuery } from '../../shared/contract/queryCodec';
import { numberOfSetting } from '../../shared/contract/settingIn';

/** What typed text means for a field, by the same rule as in an address; nothing typed is nothing given. */
export function readTyped(field: Field, text: string): unknown {
  const trimmed = text.trim();
  if (trimmed === '') return undefined;
  return decodeQuery([[field.name, tidied(field, trimmed)]], [field])[field.name];
}

/** People type 5,6 on many keyboards, and the minus that the console itself shows. */
function tidied(field: Field, text: string): string {
  if (field.kind !== 'number' && field.kind !== 'setting') return text;
  return text.replace(/^−/, '-').replace(/^(-?\d+),(\d{1,2})$/, '$1.$2');
}

/** A value as it stands in its text box. */
export function shownText(field: Field, value: unknown): string {
  if (value === undefined || value === null) return '';
  if (typeof value === 'number' && field.setting === 'aperture') {
    const marked = `f/${value}`;
    return numberOfSetting('aperture', marked) === value ? marked : String(value);
  }
  return typeof value === 'string' ? value : JSON.stringify(value);
}
