import fc from 'fast-check';
import type { Field } from '../../shared/contract/field';
import { markAt } from '../../shared/math/marks';
import { powerMarkAt } from '../../shared/math/powerMarks';
import { evenly, inRatio } from './spread';

/** Numbers spread over their whole range, evenly, in ratio and over all doubles, with both ends included. */
function numberWithin(field: Field): fc.Arbitrary<number> {
  const low = field.minimum ?? -1e6;
  const high = field.maximum ?? 1e6;
  if (field.isInteger) return fc.integer({ min: low, max: high });
  const doubles = fc.double({ min: low, max: high, minExcluded: field.minimumIsExcluded, noNaN: true });
  const positive = inRatio(Math.max(low, high * 1e-12, 1e-12), high);
  return (
    fc
      .oneof(doubles, evenly(low, high), low < 0 ? doubles : positive)
      // JSON and queries know no negative zero.
      .map((n) => n + 0)
      .filter((n) => !(field.minimumIsExcluded && n === low))
  );
}

const SETTINGS = {
  aperture: fc.oneof(
    fc.integer({ min: -6, max: 48 }).map((p) => markAt('aperture', 'third', p).label),
    inRatio(0.5, 256),
  ),
  shutter: fc.oneof(
    fc.integer({ min: -15, max: 50 }).map((p) => markAt('shutter', 'third', p).label),
    inRatio(1e-6, 86_400),
  ),
  iso: fc.oneof(
    fc.integer({ min: -15, max: 45 }).map((p) => Number(markAt('iso', 'third', p).label)),
    inRatio(1, 1e7),
  ),
  power: fc.oneof(
    fc.integer({ min: 0, max: 27 }).map((p) => powerMarkAt('third', p).label),
    inRatio(1e-6, 1),
  ),
};

function ofSetting(field: Field): fc.Arbitrary<unknown> {
  const low = field.minimum ?? 0;
  const high = field.maximum ?? Infinity;
  const narrowed = SETTINGS[field.setting ?? 'iso'] as fc.Arbitrary<string | number>;
  return narrowed.filter((value) => typeof value === 'string' || (value >= low && value <= high));
}

function ofField(field: Field): fc.Arbitrary<unknown> {
  switch (field.kind) {
    case 'number':
      return numberWithin(field);
    case 'setting':
      return ofSetting(field);
    case 'choice':
      return fc.constantFrom(...(field.choices ?? []));
    case 'boolean':
      return fc.boolean();
    case 'group':
      return arbitraryInput(field.fields ?? []);
    case 'list':
      return fc.array(ofField(field.item as Field), {
        minLength: field.minItems ?? 0,
        maxLength: Math.min(field.maxItems ?? 6, (field.minItems ?? 0) + 6),
      });
    case 'oneOrMany':
      return fc.oneof(
        ofField(field.item as Field),
        fc.array(ofField(field.item as Field), { minLength: 1, maxLength: 4 }),
      );
    default:
      return fc.string({ maxLength: 12 });
  }
}

/** Inputs inside every documented range; optional fields come and go, contradictions between fields may occur. */
export function arbitraryInput(fields: readonly Field[]): fc.Arbitrary<Record<string, unknown>> {
  const model = Object.fromEntries(fields.map((field) => [field.name, ofField(field)]));
  return fc.record(model, { requiredKeys: fields.filter((f) => f.required).map((f) => f.name) });
}
