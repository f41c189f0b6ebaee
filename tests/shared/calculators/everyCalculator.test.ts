import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { answerFor, parseInput } from '../../../shared/contract/defineCalculator';
import type { Field } from '../../../shared/contract/field';
import { decodeQuery, encodeQuery } from '../../../shared/contract/queryCodec';
import { calculatorList, loadCalculators } from '../../../shared/calculators';
import { arbitraryInput } from '../../support/arbitraryInput';
import { expectAlike, isFiniteThroughout } from '../../support/closeTo';

const now = new Date('2026-06-21T18:00:00Z');
const calculators = await loadCalculators();

/** Every bounded scalar field, with the path to it; lists are entered at their first item. */
function boundedFields(fields: readonly Field[], path: string[] = []): { field: Field; path: string[] }[] {
  return fields.flatMap((field) => {
    const here = [...path, field.name];
    if (field.kind === 'group') return boundedFields(field.fields ?? [], here);
    if (field.kind === 'list' && field.item?.fields) return boundedFields(field.item.fields, [...here, '0']);
    return field.kind === 'number' || field.kind === 'setting' ? [{ field, path: here }] : [];
  });
}

function withValue(path: readonly string[], value: unknown): unknown {
  const [first, ...rest] = path;
  if (first === undefined) return value;
  return first === '0' ? [withValue(rest, value)] : { [first]: withValue(rest, value) };
}

it('the list and the calculators agree on id and title, and no id stands twice', () => {
  expect(calculators.length).toBe(calculatorList.length);
  calculators.forEach((calculator, i) => {
    expect(calculator.id).toBe(calculatorList[i]?.id);
    expect(calculator.title).toBe(calculatorList[i]?.title);
  });
  expect(new Set(calculators.map(({ id }) => id)).size).toBe(calculators.length);
});

describe.each(calculators.map((calculator) => [calculator.id, calculator] as const))(
  '%s',
  (_, calculator) => {
    const answer = (body: unknown) => {
      const parsed = parseInput(calculator, body);
      if ('faults' in parsed) throw new Error(JSON.stringify(parsed.faults));
      return answerFor(calculator, parsed.input, { now });
    };

    it('has at least one example and a source, and every example gives its output', () => {
      expect(calculator.examples.length).toBeGreaterThan(0);
      expect(calculator.sources.length).toBeGreaterThan(0);
      for (const { title, input, output } of calculator.examples)
        expectAlike(answer(input).result, output, title);
    });

    it('names every field so that a person can read it', () => {
      const check = (fields: readonly Field[]) => {
        for (const field of fields) {
          expect(field.title, field.name).not.toBe(field.name);
          check(field.fields ?? field.item?.fields ?? []);
        }
      };
      check(calculator.fields);
    });

    it('answers generated input with finite numbers that pass its own schema, or says what is wrong', () => {
      let answered = 0;
      fc.assert(
        fc.property(arbitraryInput(calculator.fields), (body) => {
          const parsed = parseInput(calculator, body);
          if ('faults' in parsed) {
            expect(parsed.faults.length).toBeGreaterThan(0);
            for (const fault of parsed.faults) expect(fault.detail).toMatch(/\.$|\?$/);
            return;
          }
          answered++;
          const given = answerFor(calculator, parsed.input, { now });
          expect(isFiniteThroughout(given), JSON.stringify(body)).toBe(true);
          const shape = calculator.output.safeParse(given.result);
          expect(shape.success, JSON.stringify([body, shape.error?.issues, given.result])).toBe(true);
          expect(answerFor(calculator, parsed.input, { now })).toEqual(given);
        }),
        { numRuns: 300 },
      );
      if (calculator.fields.every((field) => field.required || field.defaultValue !== undefined))
        expect(answered).toBeGreaterThan(0);
    });

    it('enforces every documented range with the right pointer', () => {
      for (const { field, path } of boundedFields(calculator.fields)) {
        const beyond = [
          field.minimum !== undefined && (field.minimumIsExcluded ? field.minimum : field.minimum - 1),
          field.maximum !== undefined && field.maximum * 2 + 1,
        ].filter((value): value is number => value !== false);
        expect(beyond.length, path.join('.')).toBeGreaterThan(0);
        for (const value of beyond) {
          const parsed = parseInput(calculator, withValue(path, value));
          const faults = 'faults' in parsed ? parsed.faults : [];
          const found = faults.find(({ pointer }) => pointer === `/${path.join('/')}`);
          expect(found?.code, `${path.join('.')} = ${value}`).toBe('out_of_range');
        }
      }
    });

    it('reads its examples back from a query string', () => {
      for (const { input } of calculator.examples) {
        const again = decodeQuery(encodeQuery(input), calculator.fields);
        expectAlike(answer(again), answer(input));
      }
    });

    it('refuses what is not an object, and a field it does not know', () => {
      for (const body of [null, 7, 'text', []]) expect(parseInput(calculator, body)).toHaveProperty('faults');
      const parsed = parseInput(calculator, { surprise: 1 });
      const pointers = 'faults' in parsed ? parsed.faults.map(({ pointer }) => pointer) : [];
      expect(pointers).toContain('/surprise');
    });
  },
);
