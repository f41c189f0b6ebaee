import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { acceptsGet, describeFields } from '../../../shared/contract/describeFields';
import { exactlyOne } from '../../../shared/contract/exactlyOne';
import type { Field } from '../../../shared/contract/field';
import { oneOrMany } from '../../../shared/contract/oneOrMany';
import { distanceM, integer, number } from '../../../shared/contract/quantities';
import { apertureIn, isoIn, powerIn, shutterIn } from '../../../shared/contract/settingIn';

const only = (schema: z.ZodType): Field => describeFields(z.strictObject({ field: schema }))[0] as Field;

describe('a described field', () => {
  it('knows a number’s range, unit, words and default', () => {
    expect(
      only(number({ title: 'Loss', unit: 'stops', min: 0, max: 40, step: 0.5, description: 'd' }).default(2)),
    ).toMatchObject({
      name: 'field',
      kind: 'number',
      title: 'Loss',
      description: 'd',
      unit: 'stops',
      step: 0.5,
      minimum: 0,
      maximum: 40,
      minimumIsExcluded: false,
      isInteger: false,
      required: false,
      defaultValue: 2,
      advanced: false,
    });
  });

  it('knows an open bound and whole numbers', () => {
    expect(only(number({ title: 'T', min: 0, max: 1, above: true }))).toMatchObject({
      minimum: 0,
      minimumIsExcluded: true,
      required: true,
    });
    expect(only(integer({ title: 'N', min: 2, max: 5 }))).toMatchObject({
      isInteger: true,
      minimum: 2,
      maximum: 5,
    });
  });

  it('knows a setting’s range, also a narrowed one, and that no power is none', () => {
    expect(only(apertureIn())).toMatchObject({
      kind: 'setting',
      setting: 'aperture',
      minimum: 0.5,
      maximum: 256,
    });
    expect(only(shutterIn({ title: 'Sync', range: [1e-4, 1] }))).toMatchObject({
      title: 'Sync',
      unit: 's',
      minimum: 1e-4,
      maximum: 1,
      minimumIsExcluded: false,
    });
    expect(only(isoIn().default(100))).toMatchObject({
      minimum: 1,
      maximum: 1e7,
      defaultValue: 100,
      required: false,
    });
    expect(only(powerIn())).toMatchObject({ minimum: 0, maximum: 1, minimumIsExcluded: true });
  });

  it('takes the outermost words, whichever wrapper carries them', () => {
    const wrapped = distanceM().optional().meta({ title: 'From the lamp', advanced: true });
    expect(only(wrapped)).toMatchObject({
      title: 'From the lamp',
      unit: 'm',
      advanced: true,
      required: false,
    });
    expect(only(distanceM().meta({ title: 'Inner' }).default(3))).toMatchObject({
      title: 'Inner',
      defaultValue: 3,
    });
    expect(only(distanceM().nullable().optional())).toMatchObject({ kind: 'number', required: false });
    expect(only(distanceM().prefault(3))).toMatchObject({ required: false, defaultValue: 3 });
  });

  it('knows groups, lists, one or many, choices, text and times', () => {
    expect(only(z.strictObject({ a: distanceM(), b: isoIn().optional() }))).toMatchObject({
      kind: 'group',
      fields: [
        { name: 'a', required: true },
        { name: 'b', required: false },
      ],
    });
    expect(only(z.array(distanceM()).min(2).max(9))).toMatchObject({
      kind: 'list',
      minItems: 2,
      maxItems: 9,
      item: { kind: 'number', unit: 'm' },
    });
    expect(only(oneOrMany(distanceM(), 4).optional())).toMatchObject({
      kind: 'oneOrMany',
      title: 'Distance',
      minItems: 1,
      maxItems: 4,
      item: { kind: 'number' },
      required: false,
    });
    expect(only(z.enum(['x', 'y']).default('y'))).toMatchObject({
      kind: 'choice',
      choices: ['x', 'y'],
      defaultValue: 'y',
    });
    expect(only(z.boolean())).toMatchObject({ kind: 'boolean' });
    expect(only(z.string().max(5))).toMatchObject({ kind: 'text', format: undefined });
    expect(only(z.iso.datetime({ offset: true }))).toMatchObject({ kind: 'text', format: 'datetime' });
    expect(only(z.iso.date().optional())).toMatchObject({ kind: 'text', format: 'date' });
  });

  it('has its name for a title where nobody gave one', () => {
    expect(only(z.number()).title).toBe('field');
  });
});

it('the fields of an object come in its order, also under a rule; anything else has none', () => {
  const schema = exactlyOne(
    'b',
    'a',
  )(z.strictObject({ b: distanceM().optional(), a: distanceM().optional(), c: isoIn() }));
  expect(describeFields(schema).map(({ name }) => name)).toEqual(['b', 'a', 'c']);
  expect(describeFields(schema.optional()).map(({ name }) => name)).toEqual(['b', 'a', 'c']);
  expect(describeFields(z.number())).toEqual([]);
});

it('GET is answered where all that is required is a scalar', () => {
  const accepts = (shape: z.ZodRawShape) => acceptsGet(describeFields(z.strictObject(shape)));
  expect(accepts({ a: distanceM(), b: apertureIn(), c: z.boolean(), d: z.string() })).toBe(true);
  expect(accepts({ a: z.strictObject({ b: isoIn() }).optional(), l: z.array(isoIn()).default([]) })).toBe(
    true,
  );
  expect(accepts({})).toBe(true);
  expect(accepts({ a: z.strictObject({}) })).toBe(false);
  expect(accepts({ a: z.array(isoIn()) })).toBe(false);
  expect(accepts({ a: oneOrMany(isoIn(), 2) })).toBe(false);
});
