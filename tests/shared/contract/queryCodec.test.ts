import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { loadCalculators } from '../../../shared/calculators';
import { parseInput } from '../../../shared/contract/defineCalculator';
import { describeFields } from '../../../shared/contract/describeFields';
import { guardLengths } from '../../../shared/contract/guardLengths';
import { oneOrMany } from '../../../shared/contract/oneOrMany';
import { number } from '../../../shared/contract/quantities';
import { decodeQuery, encodeQuery } from '../../../shared/contract/queryCodec';
import { apertureIn, isoIn, shutterIn } from '../../../shared/contract/settingIn';
import { arbitraryInput } from '../../support/arbitraryInput';
import { faultsIn, inShort } from '../../support/trial';

const calculators = await loadCalculators();

const metres = (title: string) => number({ title, min: -1e6, max: 1e6 });
const schema = guardLengths(
  z.strictObject({
    aperture: apertureIn().optional(),
    shutter: shutterIn().optional(),
    iso: isoIn().optional(),
    stops: metres('Stops').optional(),
    name: z.string().optional(),
    flag: z.boolean().optional(),
    way: z.enum(['1', 'up']).optional(),
    limits: z
      .strictObject({ isoMax: isoIn().optional(), inner: z.strictObject({ far: metres('Far') }).optional() })
      .optional(),
    parts: z
      .array(z.strictObject({ stops: metres('Stops'), name: z.string().optional() }))
      .max(20)
      .optional(),
    guides: oneOrMany(metres('Guide'), 3).optional(),
    lamps: oneOrMany(z.strictObject({ power: metres('Power') }), 3).optional(),
  }),
);
const fields = describeFields(schema);
const decode = (query: string) => decodeQuery([...new URLSearchParams(query)], fields);
const short = (query: string) => inShort(faultsIn(schema, decode(query)));

describe('a query', () => {
  it('says scalars, groups, lists, and one or many', () => {
    expect(decode('aperture=f/5.6&shutter=1/125&iso=400&stops=-1.5&flag=true&way=1&name=7')).toEqual({
      aperture: 'f/5.6',
      shutter: '1/125',
      iso: 400,
      stops: -1.5,
      flag: true,
      way: '1',
      name: '7',
    });
    expect(decode('limits.isoMax=800&limits.inner.far=2')).toEqual({
      limits: { isoMax: 800, inner: { far: 2 } },
    });
    expect(decode('parts.0.stops=1&parts.0.name=a&parts.1.stops=2')).toEqual({
      parts: [{ stops: 1, name: 'a' }, { stops: 2 }],
    });
    expect(decode('guides=36')).toEqual({ guides: 36 });
    expect(decode('guides.0=36&guides.1=20')).toEqual({ guides: [36, 20] });
    expect(decode('lamps.power=1')).toEqual({ lamps: { power: 1 } });
    expect(decode('lamps.0.power=1')).toEqual({ lamps: [{ power: 1 }] });
  });

  it('says lists in any order, up to the longest', () => {
    expect(decode('parts.1.stops=2&parts.0.stops=1')).toEqual({ parts: [{ stops: 1 }, { stops: 2 }] });
    const many = Array.from({ length: 12 }, (_, i) => `parts.${11 - i}.stops=${11 - i}`).join('&');
    expect(decode(many)).toEqual({ parts: Array.from({ length: 12 }, (_, i) => ({ stops: i })) });
  });

  it('takes as a number only what is written as one', () => {
    const cases: [string, unknown][] = [
      ['5', 5],
      ['%2B5', 5],
      ['-0.5', -0.5],
      ['.5', 0.5],
      ['5.', 5],
      ['1e3', 1000],
      ['1E-3', 0.001],
      ['1e999', Infinity],
      ['0x10', '0x10'],
      ['0b1', '0b1'],
      ['', ''],
      ['%205', ' 5'],
      ['+5', ' 5'],
      ['5%20', '5 '],
      ['1,5', '1,5'],
      ['1_000', '1_000'],
      ['Infinity', 'Infinity'],
      ['NaN', 'NaN'],
      ['null', 'null'],
      ['5m', '5m'],
      ['--5', '--5'],
      ['e5', 'e5'],
    ];
    for (const [text, value] of cases) expect(decode(`stops=${text}`), text).toEqual({ stops: value });
    expect(short('stops=0x10')).toEqual(['/stops wrong_type']);
    expect(short('stops=')).toEqual(['/stops wrong_type']);
    expect(short('stops=1e999')).toEqual(['/stops out_of_range']);
    expect(short('flag=yes')).toEqual(['/flag wrong_type']);
  });

  it('keeps names that mean nothing, so that they are told', () => {
    expect(short('isso=1')).toEqual(['/isso unknown_field']);
    expect(short('limits.isoMix=1')).toEqual(['/limits/isoMix unknown_field']);
    expect(short('=1')).toEqual(['/ unknown_field']);
    expect(short('.=1')).toEqual(['/ unknown_field']);
    expect(short('limits..isoMax=1')).toEqual(['/limits/ unknown_field']);
    expect(short('0=1')).toEqual(['/0 unknown_field']);
    expect(short('limits.0=1')).toEqual(['/limits/0 unknown_field']);
  });

  it('tells a name that is both a value and a group, in either order', () => {
    expect(short('limits=1&limits.isoMax=800')).toEqual(['/limits wrong_type']);
    expect(short('limits.isoMax=800&limits=1')).toEqual(['/limits wrong_type']);
    expect(short('iso.0=400')).toEqual(['/iso wrong_type']);
    expect(short('iso.max=400')).toEqual(['/iso wrong_type']);
  });

  it('tells lists with gaps, with names, or written in other digits', () => {
    expect(short('parts.1.stops=1')).toEqual(['/parts wrong_type']);
    expect(short('parts.9999.stops=1')).toEqual(['/parts wrong_type']);
    expect(short('parts.00.stops=1')).toEqual(['/parts wrong_type']);
    expect(short('parts.0.stops=1&parts.length=5')).toEqual(['/parts wrong_type']);
    expect(short('parts.stops=1')).toEqual(['/parts wrong_type']);
    expect(short('parts.-1.stops=1')).toEqual(['/parts wrong_type']);
  });

  it('is harmless where it is hostile', () => {
    const names = [
      '__proto__',
      'constructor',
      'prototype',
      'toString',
      'hasOwnProperty',
      'valueOf',
      '__defineGetter__',
    ];
    for (const name of names) {
      expect(short(`${name}=1`), name).toEqual([`/${name} unknown_field`]);
      expect(short(`${name}.polluted=1`), name).toEqual([`/${name} unknown_field`]);
      expect(short(`limits.${name}.polluted=1`), name).toEqual([`/limits/${name} unknown_field`]);
    }
    expect(short('parts.0.__proto__.stops=1&parts.0.stops=1')).toEqual(['/parts/0/__proto__ unknown_field']);
    expect(short('constructor.prototype.polluted=1')).toEqual(['/constructor unknown_field']);
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
    expect(short('parts.0=x&parts.length=abc')).toEqual(['/parts wrong_type']);
  });

  it('nests no deeper than any input, however many dots a name has', () => {
    const name = `limits${'.a'.repeat(20_000)}`;
    const [fault] = faultsIn(schema, decode(`${name}=1`));
    expect(fault?.code).toBe('unknown_field');
    expect(fault?.detail.length).toBeLessThan(300);
  });

  it('never throws, whatever the names and values', () => {
    const part = fc.oneof(
      fc.constantFrom(
        'limits',
        'parts',
        'guides',
        'iso',
        'stops',
        'length',
        '__proto__',
        '0',
        '1',
        '',
        'isoMax',
      ),
      fc.string({ maxLength: 4 }),
    );
    const name = fc.array(part, { minLength: 1, maxLength: 10 }).map((parts) => parts.join('.'));
    fc.assert(
      fc.property(fc.array(fc.tuple(name, fc.string({ maxLength: 6 })), { maxLength: 8 }), (pairs) => {
        const decoded = decodeQuery(pairs, fields);
        for (const { detail } of faultsIn(schema, decoded)) expect(detail.length).toBeLessThan(500);
      }),
      { numRuns: 500 },
    );
  });
});

/** Neither a query nor JSON knows −0. */
const asJson = (value: unknown): unknown => JSON.parse(JSON.stringify(value));

describe('reading back what was written', () => {
  const input = fc.record(
    {
      aperture: fc.constantFrom('f/5.6', 5.6, 'F8'),
      shutter: fc.constantFrom('1/125', 0.5, '2s', 1e-6),
      stops: fc.double({ min: -1e6, max: 1e6, noNaN: true }).map((n) => n + 0),
      name: fc.string(),
      flag: fc.boolean(),
      way: fc.constantFrom('1', 'up'),
      limits: fc.record({
        isoMax: fc.integer({ min: 1, max: 1e7 }),
        inner: fc.record({ far: fc.integer() }),
      }),
      parts: fc.array(
        fc.record({
          stops: fc.double({ min: -9, max: 9, noNaN: true }).map((n) => n + 0),
          name: fc.string(),
        }),
        {
          minLength: 1,
          maxLength: 20,
        },
      ),
      guides: fc.oneof(fc.integer(), fc.array(fc.integer(), { minLength: 1, maxLength: 3 })),
      lamps: fc.oneof(
        fc.record({ power: fc.integer() }),
        fc.array(fc.record({ power: fc.integer() }), { minLength: 1, maxLength: 3 }),
      ),
    },
    { requiredKeys: [] },
  );

  it('gives the same input, through a real query string too', () => {
    fc.assert(
      fc.property(input, (given) => {
        expect(decodeQuery(encodeQuery(given), fields)).toEqual(given);
        expect(decode(String(new URLSearchParams(encodeQuery(given))))).toEqual(given);
      }),
      { numRuns: 500 },
    );
  });

  it('leaves out what is not given, and what holds nothing', () => {
    expect(encodeQuery({ iso: undefined, limits: {}, parts: [], name: null })).toEqual([]);
  });

  it('is understood alike by every calculator, whatever input it takes', () => {
    let compared = 0;
    for (const calculator of calculators)
      fc.assert(
        fc.property(arbitraryInput(calculator.fields), (body) => {
          const parsed = parseInput(calculator, body);
          if ('faults' in parsed) return;
          const again = parseInput(calculator, decodeQuery(encodeQuery(body), calculator.fields));
          const hasNothing = JSON.stringify(body).match(/\[\]|\{\}/);
          if (!hasNothing) expect(asJson(again), calculator.id).toEqual(asJson(parsed));
          compared += 1;
        }),
        { numRuns: 50 },
      );
    expect(compared).toBeGreaterThan(calculators.length * 5);
  });
});
