import type { Field } from '../../shared/contract/field';
import { isSettingShape } from '../text/settingShape';

/** What an answer's value would be as input for a field of the same name; undefined where it can't be one. */
export function inputFromAnswer(field: Field, answered: unknown): unknown {
  if (isSettingShape(answered)) return field.setting === 'iso' ? Number(answered.mark) : answered.mark;
  if (typeof answered === 'number') return Number(answered.toPrecision(6));
  return undefined;
}

/** Something to start a field with: what was given before, what an example gives, its default, its first choice. */
export function startingValue(field: Field, remembered: unknown, examples: readonly unknown[]): unknown {
  return remembered ?? examples.find((one) => one !== undefined) ?? field.defaultValue ?? field.choices?.[0];
}
