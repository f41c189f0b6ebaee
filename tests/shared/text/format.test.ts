import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  amount,
  counted,
  listed,
  quoted,
  readable,
  seconds,
  shortened,
  signedStops,
} from '../../../shared/text/en/format';

describe('numbers for people', () => {
  it('have six digits at most, thousands apart, and a true minus', () => {
    const cases: [number, string][] = [
      [0, '0'],
      [-0, '0'],
      [5.6, '5.6'],
      [1 / 3, '0.333333'],
      [86_400, '86,400'],
      [10_000_000, '10,000,000'],
      [1e10, '10,000,000,000'],
      [1234567, '1,234,570'],
      [-0.5, '−0.5'],
      [1e-6, '0.000001'],
      [2.5e-7, '2.5e-7'],
      [1 / 3e7, '3.33333e-8'],
      [1e12, '1e12'],
      [Infinity, 'infinity'],
      [-Infinity, '−infinity'],
    ];
    for (const [value, text] of cases) expect(readable(value), String(value)).toBe(text);
  });

  it('read back to six digits', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const again = Number(readable(value).replaceAll(',', '').replace('−', '-'));
        expect(Math.abs(again - value)).toBeLessThanOrEqual(Math.abs(value) * 5.001e-6);
      }),
    );
  });

  it('carry their unit, singular after one', () => {
    expect(amount(1, 'stops')).toBe('1 stop');
    expect(amount(-1, 'stops')).toBe('−1 stop');
    expect(amount(1.5, 'stops')).toBe('1.5 stops');
    expect(amount(0, 'stops')).toBe('0 stops');
    expect(amount(1, 'm')).toBe('1 m');
    expect(amount(7)).toBe('7');
    expect(counted(1, 'item')).toBe('1 item');
    expect(counted(1000, 'item')).toBe('1,000 items');
  });

  it('as times are fractions where a person would say so', () => {
    const cases: [number, string][] = [
      [0.004, '1/250 s'],
      [1 / 256, '1/256 s'],
      [1 / 300, '1/300 s'],
      [0.0043, '0.0043 s'],
      [0.5, '0.5 s'],
      [2, '2 s'],
      [0, '0 s'],
      [-0.004, '−0.004 s'],
    ];
    for (const [value, text] of cases) expect(seconds(value), String(value)).toBe(text);
  });

  it('as stops have a sign, and none where nothing is left', () => {
    expect([1.5, -1 / 3, 0, -0.001, 0.004, 12].map(signedStops)).toEqual([
      '+1.5',
      '−0.33',
      '0',
      '0',
      '0',
      '+12',
    ]);
  });
});

describe('what was given', () => {
  it('is told with every digit that was given', () => {
    expect(quoted(256.0000001)).toBe('256.0000001');
    expect(quoted(-61)).toBe('−61');
    expect(quoted(1e21)).toBe('1e21');
    expect(quoted(Number.NaN)).toBe('not a number');
  });

  it('is named where spelling it out would help nobody', () => {
    expect([null, true, [], [1], {}].map(quoted)).toEqual([
      'null',
      'true',
      'an empty list',
      'a list',
      'an object',
    ]);
    expect(quoted('a"b')).toBe('"a\\"b"');
  });

  it('is never long', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 300 }), fc.integer({ min: 1, max: 80 }), (text, most) => {
        expect(shortened(text, most).length).toBeLessThanOrEqual(Math.max(most, 1));
        if (text.length <= most) expect(shortened(text, most)).toBe(text);
      }),
    );
  });
});

it('lists read as lists', () => {
  expect(listed([])).toBe('');
  expect(listed(['a'])).toBe('a');
  expect(listed(['a', 'b'])).toBe('a or b');
  expect(listed(['a', 'b', 'c'], 'and')).toBe('a, b and c');
});
