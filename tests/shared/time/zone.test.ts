import fc from 'fast-check';
import { DateTime } from 'luxon';
import { describe, expect, it } from 'vitest';
import { isTimeZone, offsetMinutes, timeZoneAt } from '../../../shared/time/zone';
import events from '../../reference/sun-events.json';
import { eachRow } from '../../support/eachRow';

describe('a time zone', () => {
  it('is an IANA name, in any case of letters', () => {
    for (const name of ['Europe/London', 'europe/london', 'UTC', 'Etc/GMT+12', 'America/Argentina/Ushuaia']) {
      expect(isTimeZone(name), name).toBe(true);
    }
  });

  it('is neither an offset nor a name that nobody keeps', () => {
    for (const name of [
      '+01:00',
      '-0930',
      'Europe/Nowhere',
      'BST in summer',
      '',
      ' UTC',
      'x'.repeat(10_000),
    ]) {
      expect(isTimeZone(name), name).toBe(false);
    }
  });

  it('of a place is the one that the cases of ephem are given in, but beside a border its neighbour may come', () => {
    const different: string[] = [];
    eachRow(events, 24, (row, where) => {
      if (row.timeZone === 'UTC') return;
      const found = timeZoneAt(row.latitude, row.longitude);
      if (found !== row.timeZone) different.push(`${row.place}: ${found}`);
      const noonMs = Date.parse(`${row.date}T12:00Z`);
      expect(offsetMinutes(found, noonMs), where).toBe(offsetMinutes(row.timeZone, noonMs));
    });
    // Ten kilometres from Chile; the offset is the same.
    expect(different).toEqual(['Ushuaia: America/Punta_Arenas']);
  });

  it('is found everywhere, at the poles and on longitude 180 as well', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -90, max: 90, noNaN: true }),
        fc.double({ min: -180, max: 180, noNaN: true }),
        (latitude, longitude) => {
          expect(isTimeZone(timeZoneAt(latitude, longitude))).toBe(true);
        },
      ),
      { numRuns: 500 },
    );
    for (const latitude of [-90, 0, 90])
      for (const longitude of [-180, 180]) expect(isTimeZone(timeZoneAt(latitude, longitude))).toBe(true);
  });

  it('is not looked up beyond the earth', () => {
    expect(() => timeZoneAt(90.5, 0)).toThrow(RangeError);
    expect(() => timeZoneAt(0, 181)).toThrow(RangeError);
    expect(() => timeZoneAt(NaN, 0)).toThrow(RangeError);
  });
});

describe('the offset of a zone', () => {
  it('is luxon’s at any instant, around its changes too, whatever was asked before', () => {
    const zones = fc.constantFrom(
      'Europe/London',
      'America/Havana',
      'Asia/Tehran',
      'Pacific/Apia',
      'Africa/Monrovia',
    );
    const changes = fc.constantFrom(
      Date.UTC(2026, 2, 29, 1),
      Date.UTC(2026, 9, 25, 1),
      Date.UTC(2011, 11, 30, 10),
      Date.UTC(1972, 0, 7, 0, 44, 30),
    );
    const instants = fc.oneof(
      fc.integer({ min: Date.UTC(1890, 0, 1), max: Date.UTC(2110, 0, 1) }),
      fc.tuple(changes, fc.integer({ min: -1e8, max: 1e8 })).map(([atMs, offMs]) => atMs + offMs),
      fc.tuple(changes, fc.integer({ min: -2, max: 2 })).map(([atMs, offMs]) => atMs + offMs),
    );
    fc.assert(
      fc.property(zones, instants, (zone, atMs) => {
        expect(offsetMinutes(zone, atMs)).toBe(DateTime.fromMillis(atMs, { zone }).offset);
      }),
      { numRuns: 1000 },
    );
  });

  it('refuses a zone that is none', () => {
    expect(() => offsetMinutes('Nowhere', 0)).toThrow(RangeError);
  });
});
