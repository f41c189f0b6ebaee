import { expect, describe, it } from 'vitest';
import { z } from 'zod';
import { defineCalculator, parseInput, type AnyCalculator } from '../../../shared/contract/defineCalculator';
import { atMostOne, exactly, exactlyOne } from '../../../shared/contract/exactlyOne';
import { inputJsonSchema, type JsonSchema } from '../../../shared/contract/jsonSchema';
import { oneOrMany } from '../../../shared/contract/oneOrMany';
import { distanceM, integer, number } from '../../../shared/contract/quantities';
import { apertureIn, isoIn, powerIn, shutterIn } from '../../../shared/contract/settingIn';
import { compiled } from '../../support/strictSchema';

const trial = (input: z.ZodType): AnyCalculator =>
  defineCalculator({
    id: 'trial/trial',
    title: 'Trial',
    summary: 'A trial.',
    units: 1,
    input,
    output: z.strictObject({}),
    sources: ['derivation'],
    examples: [],
    compute: () => ({ result: {} }),
  }) as AnyCalculator;

/** Schema and service must agree on every one of these. */
function agreed(input: z.ZodType, bodies: readonly unknown[]): boolean[] {
  const calculator = trial(input);
  const validate = compiled(inputJsonSchema(calculator));
  return bodies.map((body) => {
    const isTaken = 'input' in parseInput(calculator, body);
    expect(validate(body), JSON.stringify(body)).toBe(isTaken);
    return isTaken;
  });
}

describe('what zod has no JSON Schema for', () => {
  const n = () => number({ title: 'N', unit: 'm', min: 0, max: 9 }).optional();
  const abcd = () => z.strictObject({ a: n(), b: n(), c: n(), d: n() });
  const everyChoice = Array.from({ length: 16 }, (_, bits) =>
    Object.fromEntries(['a', 'b', 'c', 'd'].filter((_, i) => bits & (1 << i)).map((name) => [name, 1])),
  );

  it('alternatives hold as in the service, for every choice of names', () => {
    const taken = (schema: z.ZodType) => agreed(schema, everyChoice).filter(Boolean).length;
    expect(taken(exactlyOne('a', 'b', 'c', 'd')(abcd()))).toBe(4);
    expect(taken(exactly(2, ['a', 'b', 'c', 'd'])(abcd()))).toBe(6);
    expect(taken(exactly(3, ['a', 'b', 'c', 'd'])(abcd()))).toBe(4);
    expect(taken(exactlyOne('a', 'b')(abcd()))).toBe(8);
    expect(taken(atMostOne('a', 'b', 'c', 'd')(abcd()))).toBe(5);
    expect(taken(exactlyOne('a', 'b')(atMostOne('c', 'd')(abcd())))).toBe(6);
  });

  it('alternatives are told in words, beside the field’s own', () => {
    const group = exactlyOne('a', 'b')(abcd()).meta({ title: 'Group', description: 'The light.' });
    const schema = inputJsonSchema(
      trial(atMostOne('x', 'group')(z.strictObject({ x: n(), group: group.optional() }))),
    );
    expect(schema.description).toBe('A trial. Give at most one of x and group.');
    expect((schema.properties?.group as JsonSchema).description).toBe(
      'The light. Give exactly one of a and b.',
    );
  });

  it('settings are a number in range, or text as on the camera', () => {
    const settings = z.strictObject({
      aperture: apertureIn().optional(),
      shutter: shutterIn({ range: [0.001, 30] }).optional(),
      iso: isoIn().default(100),
      power: powerIn().optional(),
    });
    const taken = [
      { aperture: 0.5 },
      { aperture: 'f/5.6' },
      { shutter: '1/125' },
      { shutter: '2 s' },
      { shutter: 0.001 },
    ];
    expect(agreed(settings, [...taken, { power: 1 }, { power: '1/16 + 1/3' }, { iso: 1 }, {}])).not.toContain(
      false,
    );
    const refused = [
      { aperture: 0.49 },
      { aperture: '5.6' },
      { aperture: null },
      { shutter: 0 },
      { shutter: 31 },
    ];
    const more = [
      { shutter: '1/' },
      { power: 0 },
      { power: 1.1 },
      { power: '50%' },
      { iso: '400' },
      { iso: [1] },
    ];
    expect(agreed(settings, [...refused, ...more])).not.toContain(true);
    const { properties } = inputJsonSchema(trial(settings));
    expect(properties?.iso).toMatchObject({ type: 'number', default: 100, title: 'ISO' });
    expect(properties?.shutter).toMatchObject({
      'x-unit': 's',
      anyOf: [{ minimum: 0.001, maximum: 30 }, { type: 'string' }],
    });
    expect(properties?.power).toMatchObject({
      anyOf: [{ exclusiveMinimum: 0, maximum: 1 }, { type: 'string' }],
    });
  });

  it('one or many is a value or a list of so many', () => {
    const item = z.strictObject({
      m: distanceM(),
      loss: integer({ title: 'Loss', min: 0, max: 3 }).default(0),
    });
    const schema = z.strictObject({
      guns: oneOrMany(item, 2, { title: 'Guns' }),
      isos: oneOrMany(isoIn(), 3).optional(),
    });
    const gun = { m: 5 };
    expect(
      agreed(schema, [
        { guns: gun },
        { guns: [gun, gun] },
        { guns: gun, isos: 100 },
        { guns: gun, isos: [1, 2, 3] },
      ]),
    ).not.toContain(false);
    const refused = [
      {},
      { guns: [] },
      { guns: [gun, gun, gun] },
      { guns: { m: 0 } },
      { guns: [{ m: 5, loss: 0.5 }] },
    ];
    expect(
      agreed(schema, [
        ...refused,
        { guns: gun, isos: [0] },
        { guns: gun, isos: [1, 2, 3, 4] },
        { guns: [[gun]] },
      ]),
    ).not.toContain(true);
    expect(inputJsonSchema(trial(schema)).properties?.guns).toMatchObject({ title: 'Guns' });
  });

  it('our own annotations stand where a field has them, and only there', () => {
    const { properties } = inputJsonSchema(
      trial(
        z.strictObject({
          a: distanceM({ advanced: true, step: 0.1 }).default(2),
          b: number({ title: 'B', min: 0, max: 1 }),
        }),
      ),
    );
    expect(properties?.a).toEqual({
      type: 'number',
      minimum: 0.01,
      maximum: 10_000,
      title: 'Distance',
      default: 2,
      'x-unit': 'm',
      'x-advanced': true,
    });
    expect(properties?.b).toEqual({ type: 'number', minimum: 0, maximum: 1, title: 'B' });
  });

  it('times and days have their format', () => {
    const schema = z.strictObject({
      at: z.iso.datetime({ offset: true }).optional(),
      day: z.iso.date().optional(),
    });
    expect(
      agreed(schema, [
        { at: '2026-06-21T21:30:00+02:00' },
        { day: '2026-02-28' },
        { at: '2026-06-21' },
        { day: '2026-02-30' },
      ]),
    ).toEqual([true, true, false, false]);
  });
});
