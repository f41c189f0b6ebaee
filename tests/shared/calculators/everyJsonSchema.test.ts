import type { ValidateFunction } from 'ajv/dist/2020';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { loadCalculators } from '../../../shared/calculators';
import { answerFor, parseInput } from '../../../shared/contract/defineCalculator';
import type { Field } from '../../../shared/contract/field';
import {
  answerJsonSchema,
  inputJsonSchema,
  outputJsonSchema,
  type JsonSchema,
} from '../../../shared/contract/jsonSchema';
import { arbitraryInput } from '../../support/arbitraryInput';
import { compiled } from '../../support/strictSchema';

const calculators = await loadCalculators();
const now = new Date('2026-06-21T18:00:00Z');

const passes = (validate: ValidateFunction, value: unknown) => {
  // What goes over the wire is JSON.
  const isValid = validate(JSON.parse(JSON.stringify(value)));
  return { isValid, errors: JSON.stringify(validate.errors) };
};

const given = (body: object, path: readonly string[], value: unknown): object => {
  const [first = '', ...rest] = path;
  const held = (body as Record<string, unknown>)[first];
  if (rest.length === 0) return { ...body, [first]: value };
  if (first === '0') return [given({}, rest, value)];
  return {
    ...body,
    [first]: rest[0] === '0' ? given([], rest, value) : given((held ?? {}) as object, rest, value),
  };
};

/** Numbers and settings with their paths; lists are entered at their first item. */
function bounded(fields: readonly Field[], path: string[] = []): { field: Field; path: string[] }[] {
  return fields.flatMap((field) => {
    const here = [...path, field.name];
    if (field.kind === 'group') return bounded(field.fields ?? [], here);
    if (field.kind === 'list' && field.item?.fields) return bounded(field.item.fields, [...here, '0']);
    return field.kind === 'number' || field.kind === 'setting' ? [{ field, path: here }] : [];
  });
}

/** The nearest double above or below. */
function next(value: number, up: boolean): number {
  if (value === 0) return up ? Number.MIN_VALUE : -Number.MIN_VALUE;
  const view = new DataView(new ArrayBuffer(8));
  view.setFloat64(0, value);
  view.setBigInt64(0, view.getBigInt64(0) + (up === value > 0 ? 1n : -1n));
  return view.getFloat64(0);
}

describe.each(calculators.map((calculator) => [calculator.id, calculator] as const))(
  'the JSON Schema of %s',
  (_, calculator) => {
    const input = compiled(inputJsonSchema(calculator));
    const output = compiled(outputJsonSchema(calculator));
    const answer = compiled(answerJsonSchema(calculator));

    it('takes every example, and gives every answer its shape', () => {
      for (const example of calculator.examples) {
        const taken = passes(input, example.input);
        expect(taken.isValid, taken.errors).toBe(true);
        const given = passes(output, example.output);
        expect(given.isValid, given.errors).toBe(true);
        const parsed = parseInput(calculator, example.input);
        if ('faults' in parsed) throw new Error(JSON.stringify(parsed.faults));
        const whole = passes(answer, answerFor(calculator, parsed.input, { now }));
        expect(whole.isValid, whole.errors).toBe(true);
      }
    });

    it('takes whatever the service takes', () => {
      fc.assert(
        fc.property(arbitraryInput(calculator.fields), (body) => {
          const parsed = parseInput(calculator, body);
          const { isValid, errors } = passes(input, body);
          if ('input' in parsed) expect(isValid, `${errors} ${JSON.stringify(body)}`).toBe(true);
        }),
        { numRuns: 100 },
      );
    });

    it('refuses numbers out of range where the service does, to the last digit', () => {
      const base = (calculator.examples[0]?.input ?? {}) as object;
      for (const { field, path } of bounded(calculator.fields)) {
        const { minimum = 0, maximum = 0, minimumIsExcluded = false, isInteger } = field;
        const values = isInteger
          ? [minimum - 1, minimum, maximum, maximum + 1]
          : [minimum, maximum].flatMap((bound) => [next(bound, false), bound, next(bound, true)]);
        for (const value of values) {
          const body = given(base, path, value);
          const pointer = `/${path.join('/')}`;
          const parsed = parseInput(calculator, body);
          const isRefused =
            'faults' in parsed &&
            parsed.faults.some((fault) => fault.pointer === pointer && fault.code === 'out_of_range');
          input(body);
          const isRefusedBySchema = (input.errors ?? []).some(
            ({ instancePath, keyword }) => instancePath === pointer && /inimum|aximum/.test(keyword),
          );
          const isOutside = value < minimum || value > maximum || (minimumIsExcluded && value === minimum);
          expect([isRefused, isRefusedBySchema], `${pointer} ${value}`).toEqual([isOutside, isOutside]);
        }
      }
    });

    it('refuses a field that is not known, and what is no object', () => {
      for (const body of [{ surprise: 1 }, null, 7, 'text', []]) expect(input(body)).toBe(false);
    });

    it('speaks the standard’s words and our two, and has words for every field', () => {
      const text = JSON.stringify(inputJsonSchema(calculator));
      for (const own of ['"setting":', '"range":', '"oneOrMany":', '"advanced":', '"step":', '"unit":'])
        expect(text).not.toContain(own);
      const { title, description, $schema, properties = {} } = inputJsonSchema(calculator);
      expect([title, $schema]).toEqual([calculator.title, 'https://json-schema.org/draft/2020-12/schema']);
      expect(description).toContain(calculator.summary);
      for (const [name, property] of Object.entries(properties))
        expect((property as JsonSchema).type ?? (property as JsonSchema).anyOf, name).toBeDefined();
      for (const field of calculator.fields)
        expect((properties[field.name] as JsonSchema).title, field.name).toBe(field.title);
    });
  },
);
