import { describe, expect, it } from 'vitest';
import { calculatorList, loadCalculators } from '../../../shared/calculators';
import { parseInput, type AnyCalculator } from '../../../shared/contract/defineCalculator';
import type { Field } from '../../../shared/contract/field';
import { inputFromAnswer, startingValue } from '../../../src/form/answerFill';
import { familiesOf, partsOf } from '../../../src/form/families';
import { anyFaultIn, faultsByPointer, strayFaults } from '../../../src/form/faultPlaces';
import { readTyped, shownText } from '../../../src/form/readTyped';
import { readingOf } from '../../../src/form/readingOf';
import { schemaOfField, schemaOfItem, type Schema } from '../../../src/form/schemaNode';

const calculators = await loadCalculators();
const calculator = (id: string): AnyCalculator => {
  const found = calculators.find((one) => one.id === id);
  if (!found) throw new Error(`${id} is not in the list`);
  return found;
};
const fieldOf = (id: string, name: string): Field => {
  const found = calculator(id).fields.find((field) => field.name === name);
  if (!found) throw new Error(`${id} has no ${name}`);
  return found;
};
const faultsOf = (id: string, body: unknown) => {
  const parsed = parseInput(calculator(id), body);
  return 'faults' in parsed ? parsed.faults : [];
};

describe('families of fields', () => {
  it('are read off the checks: one to be solved, and several ways to say one thing', () => {
    expect(familiesOf(calculator('exposure/solve').input)).toEqual(
      expect.arrayContaining([
        {
          kind: 'solve',
          names: ['aperture', 'shutter', 'iso'],
          slots: [['aperture'], ['shutter'], ['iso']],
        },
        expect.objectContaining({
          kind: 'alternatives',
          names: ['ev100', 'luminanceCdM2', 'illuminanceLux', 'scene'],
        }),
      ]),
    );
    expect(familiesOf(calculator('exposure/value').input)).toEqual([]);
  });

  it('may hold two ways to say one of the things that are solved for', () => {
    const [family, ...others] = familiesOf(calculator('flash/exposure').input);
    expect(others).toEqual([]);
    expect(family?.kind).toBe('solve');
    expect(family?.slots).toContainEqual(['guideNumberM', 'energyWs']);
    expect(family?.slots).toHaveLength(5);
  });

  it('know a way that takes two fields together', () => {
    expect(familiesOf(calculator('light/ratio').input)).toEqual([
      expect.objectContaining({ kind: 'alternatives', slots: [['fillStops', 'keyStops'], ['ratio']] }),
    ]);
  });

  it('are found in the groups inside, and in what a list holds', () => {
    const daylight = calculator('flash/daylight').input;
    const ambient = schemaOfField(daylight, 'subjectAmbient');
    expect(familiesOf(ambient as Schema)).toEqual([
      expect.objectContaining({ kind: 'alternatives', names: ['ev100', 'belowBackgroundStops'] }),
    ]);
    const parts = schemaOfField(calculator('light/add').input, 'parts');
    const item = parts && schemaOfItem(parts);
    expect(familiesOf(item as Schema)).toEqual([
      expect.objectContaining({ kind: 'alternatives', names: ['stops', 'ev100'] }),
    ]);
  });

  it('stand together at the place of their first member, everything else in its order', () => {
    const fields = ['a', 'b', 'c', 'd'].map((name) => ({ name }));
    const family = { kind: 'solve' as const, names: ['b', 'd'], slots: [['b'], ['d']] };
    expect(partsOf(fields, [family])).toEqual([
      { field: { name: 'a' } },
      { family, fields: [{ name: 'b' }, { name: 'd' }] },
      { field: { name: 'c' } },
    ]);
  });

  it.each(calculatorList.map(({ id }) => id))('leave no field of %s out and show none twice', (id) => {
    const { fields, input } = calculator(id);
    const shown = partsOf(fields, familiesOf(input)).flatMap((part) =>
      'field' in part ? [part.field.name] : part.fields.map(({ name }) => name),
    );
    expect([...shown].sort()).toEqual(fields.map(({ name }) => name).sort());
  });
});

describe('typed text', () => {
  const aperture = fieldOf('exposure/value', 'aperture');
  const nd = fieldOf('exposure/value', 'ndStops');

  it.each([
    ['f/5.6', 'f/5.6'],
    ['5.6', 5.6],
    [' 5,6 ', 5.6],
    ['', undefined],
    ['wide', 'wide'],
  ])('%j means %j for an aperture', (text, value) => {
    expect(readTyped(aperture, text)).toBe(value);
  });

  it('takes the minus that the console shows', () => {
    expect(readTyped(fieldOf('exposure/solve', 'ev100'), '−2.5')).toBe(-2.5);
  });

  it('does not take a thousands comma for a decimal one', () => {
    expect(readTyped(nd, '1,000')).toBe('1,000');
  });

  it('is shown as it would be written', () => {
    expect(shownText(aperture, 8)).toBe('f/8');
    expect(shownText(aperture, 'f/8')).toBe('f/8');
    expect(shownText(aperture, 'wide')).toBe('wide');
    expect(shownText(nd, 0.3333)).toBe('0.3333');
    expect(shownText(nd, undefined)).toBe('');
    expect(shownText(nd, { odd: 1 })).toBe('{"odd":1}');
  });
});

describe('faults', () => {
  it('are found by the pointer to their field', () => {
    const faults = faultsOf('exposure/value', { aperture: 'wide', shutter: -1 });
    const byPointer = faultsByPointer(faults);
    expect([...byPointer.keys()].sort()).toEqual(['/aperture', '/shutter']);
  });

  it('of unknown names are stray, those of nested fields and items are not', () => {
    const unknown = faultsOf('exposure/value', { apperture: 8, shutter: '1/125' });
    expect(strayFaults(unknown, calculator('exposure/value').fields).map(({ pointer }) => pointer)).toEqual([
      '/apperture',
    ]);
    const nested = [
      ...faultsOf('exposure/difference', { from: { aperture: 'wide' }, to: 3 }),
      ...faultsOf('light/add', { parts: [{ stops: 'much' }, 4] }),
    ];
    expect(nested.length).toBeGreaterThan(4);
    const fields = [...calculator('exposure/difference').fields, ...calculator('light/add').fields];
    expect(strayFaults(nested, fields)).toEqual([]);
  });

  it('inside a field count as that field’s, those of a longer name do not', () => {
    const faults = [{ pointer: '/limits/isoMin', code: 'x', detail: '' }];
    expect(anyFaultIn(faults, ['/limits'])).toBe(true);
    expect(anyFaultIn(faults, ['/limit'])).toBe(false);
  });
});

describe('what an answer fills in', () => {
  it('is a mark as it would be typed, or the number in six figures', () => {
    expect(inputFromAnswer(fieldOf('exposure/solve', 'iso'), { exact: 101, mark: '100' })).toBe(100);
    expect(inputFromAnswer(fieldOf('exposure/solve', 'shutter'), { exact: 1 / 128, mark: '1/125' })).toBe(
      '1/125',
    );
    expect(inputFromAnswer(fieldOf('flash/exposure', 'distanceM'), 10 / 3)).toBe(3.33333);
    expect(inputFromAnswer(fieldOf('flash/exposure', 'distanceM'), 'far')).toBeUndefined();
  });

  it('comes after what was held before and before a default', () => {
    const scene = fieldOf('exposure/solve', 'scene');
    expect(startingValue(scene, 'home', ['sunny'])).toBe('home');
    expect(startingValue(scene, undefined, [undefined, 'sunny'])).toBe('sunny');
    expect(startingValue(scene, undefined, [])).toBe(scene.choices?.[0]);
  });
});

it('settings are read as the body asks, else by the calculator’s default', () => {
  const { fields } = calculator('exposure/value');
  expect(readingOf({}, fields)).toEqual({ scale: 'third', readAs: 'mark' });
  expect(readingOf({ scale: 'half', readAs: 'exact' }, fields)).toEqual({ scale: 'half', readAs: 'exact' });
  expect(readingOf({ scale: 'quarter' }, fields)).toEqual({ scale: 'third', readAs: 'mark' });
});
