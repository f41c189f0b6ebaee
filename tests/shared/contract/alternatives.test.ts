import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { atMostOne, exactly, exactlyOne, givenOf } from '../../../shared/contract/exactlyOne';
import { number } from '../../../shared/contract/quantities';
import { faultsIn, inShort } from '../../support/trial';

const NAMES = ['a', 'b', 'c', 'd'] as const;
const n = () => number({ title: 'N', min: 0, max: 9 }).optional();
const four = () =>
  z.strictObject({ a: n(), b: n(), c: n(), d: n(), other: number({ title: 'Other', min: 0, max: 1 }) });
const body = (given: readonly string[]) => ({
  other: 1,
  ...Object.fromEntries(given.map((name) => [name, 1])),
});
const told = (schema: z.ZodType, given: unknown) =>
  faultsIn(schema, given).map(({ pointer, code, detail }) => `${pointer} ${code}: ${detail}`);

describe('exactly one of', () => {
  const schema = exactlyOne('a', 'b', 'c')(four());

  it('lets each one by itself through', () => {
    for (const name of ['a', 'b', 'c']) expect(faultsIn(schema, body([name]))).toEqual([]);
    expect(faultsIn(schema, body(['a', 'd']))).toEqual([]);
  });

  it('asks for the first where none is given', () => {
    expect(told(schema, body([]))).toEqual(['/a exactly: Give exactly one of a, b and c; none was given.']);
  });

  it('blames every one after the first where there are several', () => {
    expect(told(schema, body(['a', 'b', 'c']))).toEqual([
      '/b exactly: Give exactly one of a, b and c; a, b and c were given.',
      '/c exactly: Give exactly one of a, b and c; a, b and c were given.',
    ]);
  });

  it('counts what is given badly as given, and tells that fault too', () => {
    expect(inShort(faultsIn(schema, { ...body(['b']), a: 'x', zzz: 1 })).sort()).toEqual([
      '/a wrong_type',
      '/b exactly',
      '/zzz unknown_field',
    ]);
    expect(inShort(faultsIn(schema, { ...body([]), a: null }))).toEqual(['/a wrong_type']);
  });

  it('says nothing about a body that is no object', () => {
    for (const whole of [null, 5, [], 'text'])
      expect(inShort(faultsIn(schema, whole))).toEqual([' wrong_type']);
  });

  it('does not mistake inherited names for given ones', () => {
    expect(givenOf({}, ['constructor', 'toString'])).toEqual([]);
    expect(givenOf({ a: undefined, b: null, c: 0 }, ['a', 'b', 'c'])).toEqual(['b', 'c']);
  });
});

describe('exactly k of n, and at most one', () => {
  it('hold for every choice of names', () => {
    fc.assert(
      fc.property(fc.subarray([...NAMES]), fc.integer({ min: 1, max: 3 }), (given, count) => {
        const faults = faultsIn(exactly(count, NAMES)(four()), body(given));
        expect(faults.length === 0).toBe(given.length === count);
        for (const { code, pointer } of faults) {
          expect(code).toBe('exactly');
          const name = pointer.slice(1);
          expect(given.includes(name as 'a')).toBe(given.length > count);
        }
        expect(faultsIn(atMostOne(...NAMES)(four()), body(given)).length).toBe(Math.max(0, given.length - 1));
      }),
    );
  });

  it('say in words how many', () => {
    expect(told(exactly(2, ['a', 'b', 'c'])(four()), body(['b']))).toEqual([
      '/a exactly: Give exactly two of a, b and c; b was given.',
    ]);
    expect(told(atMostOne('a', 'b')(four()), body(['a', 'b']))).toEqual([
      '/b at_most_one: Give at most one of a and b; a and b were given.',
    ]);
  });

  it('stand side by side on one object and within groups', () => {
    const group = exactlyOne('a', 'b')(z.strictObject({ a: n(), b: n() })).meta({ title: 'Group' });
    const both = exactlyOne('a', 'b')(exactly(1, ['c', 'd'])(four().extend({ group })));
    expect(inShort(faultsIn(both, { group: {} })).sort()).toEqual([
      '/a exactly',
      '/c exactly',
      '/group/a exactly',
      '/other missing',
    ]);
  });
});
