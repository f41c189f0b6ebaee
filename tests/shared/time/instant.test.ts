import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatInstant, parseInstant } from '../../../shared/time/instant';

const zones = fc.constantFrom(
  'UTC',
  'Europe/London',
  'America/New_York',
  'Asia/Kathmandu',
  'Pacific/Kiritimati',
  'America/St_Johns',
  'Africa/Monrovia',
  'Europe/Amsterdam',
);
const instants = fc.integer({ min: Date.UTC(1890, 0, 1), max: Date.UTC(2110, 0, 1) });

describe('an instant', () => {
  it('is written with seconds and the offset in force', () => {
    expect(formatInstant(Date.UTC(2026, 5, 21, 3, 43, 5, 752), 'Europe/London')).toBe(
      '2026-06-21T04:43:06+01:00',
    );
    expect(formatInstant(Date.UTC(2026, 11, 21, 21, 31, 48), 'America/New_York')).toBe(
      '2026-12-21T16:31:48-05:00',
    );
    expect(formatInstant(Date.UTC(2026, 0, 15), 'Asia/Kathmandu')).toBe('2026-01-15T05:45:00+05:45');
    expect(formatInstant(Date.UTC(2026, 0, 15), 'America/St_Johns')).toBe('2026-01-14T20:30:00-03:30');
    expect(formatInstant(0, 'UTC')).toBe('1970-01-01T00:00:00+00:00');
  });

  it('is written with London’s offsets on the days on which the clocks change', () => {
    // ephem 4.1.4: rise 05:42:52 UTC on 29 March 2026, set 16:46:45 UTC on 25 October 2026.
    expect(formatInstant(Date.UTC(2026, 2, 29, 5, 42, 52), 'Europe/London')).toBe(
      '2026-03-29T06:42:52+01:00',
    );
    expect(formatInstant(Date.UTC(2026, 9, 25, 16, 46, 45), 'Europe/London')).toBe(
      '2026-10-25T16:46:45+00:00',
    );
  });

  it('is the same, to the second, when it is read again, in every zone and before standard time', () => {
    fc.assert(
      fc.property(instants, zones, (atMs, zone) => {
        const text = formatInstant(atMs, zone);
        expect(text).toMatch(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d[+-]\d\d:\d\d$/);
        expect(parseInstant(text)).toBe(Math.round(atMs / 1000) * 1000 + 0);
        expect(Date.parse(text)).toBe(Math.round(atMs / 1000) * 1000 + 0);
      }),
      { numRuns: 500 },
    );
  });

  it('is read as the runtime reads it, wherever both do', () => {
    for (const text of [
      '2026-06-21T04:43:06+01:00',
      '2026-06-21T04:43:06.5Z',
      '2026-06-21T04:43-09:30',
      '2026-06-21T04:43:06.123456789+14:00',
      '0999-12-31T23:59:59Z',
    ]) {
      expect(parseInstant(text), text).toBe(Date.parse(text));
    }
    expect(parseInstant('2026-06-21t04:43:06z')).toBe(Date.UTC(2026, 5, 21, 4, 43, 6));
    expect(parseInstant('2026-06-21T04:43:06+0100')).toBe(Date.UTC(2026, 5, 21, 3, 43, 6));
  });

  it('is none without an offset, or when the calendar or the clock has no such reading', () => {
    for (const text of [
      '2026-06-21T04:43:06',
      '2026-06-21',
      '2026-02-30T00:00:00Z',
      '2026-06-31T00:00:00Z',
      '2026-13-01T00:00:00Z',
      '2026-06-21T24:00:00Z',
      '2026-06-21T23:60:00Z',
      '2026-06-30T23:59:60Z',
      '2026-06-21T04:43:06+24:00',
      '2026-06-21 04:43:06Z',
      '+002026-06-21T04:43:06Z',
      'noon',
      '',
    ]) {
      expect(parseInstant(text), text).toBeNull();
    }
  });

  it('refuses a zone that is none', () => {
    expect(() => formatInstant(0, 'Europe/Nowhere')).toThrow(RangeError);
    expect(() => formatInstant(NaN, 'UTC')).toThrow(RangeError);
  });
});
