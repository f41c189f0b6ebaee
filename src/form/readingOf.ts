import type { Field } from '../../shared/contract/field';
import type { Reading } from '../../shared/contract/settings';
import type { Body } from './body';

const SCALES = ['full', 'half', 'third'] as const;

/** How the body asks for its settings to be read, or the calculator's own default. */
export function readingOf(body: Body, fields: readonly Field[]): Reading {
  const said = (name: string) => body[name] ?? fields.find((field) => field.name === name)?.defaultValue;
  const scale = SCALES.find((one) => one === said('scale')) ?? 'third';
  return { scale, readAs: said('readAs') === 'exact' ? 'exact' : 'mark' };
}
