import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sunCrossings } from '../../../shared/math/sunCrossings';
import { sunPosition } from '../../../shared/math/sunPosition';
import { SUNRISE_DEG } from '../../../shared/math/sunAltitudes';
import { civilDay, parseCivilDate } from '../../../shared/time/civilDate';
import poles from '../../reference/usno-poles.json';
import spans from '../../reference/usno-polar-spans.json';
import switches from '../../reference/usno-polar-switches.json';
import annual from '../../reference/usno-rise-set.json';
import events from '../../reference/sun-events.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const DAY_MS = 86_400_000;

function onUtcDate(latitude: number, longitude: number, date: string) {
  const fromMs = Date.parse(`${date}T00:00Z`);
  return sunCrossings({ latitude, longitude }, SUNRISE_DEG, fromMs, fromMs + DAY_MS);
}

describe('rise and set by the tables of the US Naval Observatory', () => {
  it('agree with the printed minutes of 28 events in middle latitudes', () => {
    eachRow(annual, 14, (row, where) => {
      const found = onUtcDate(row.latitude, row.longitude, row.date);
      expect(found.filter(({ rises }) => rises).length, where).toBe(1);
      expect(found.filter(({ rises }) => !rises).length, where).toBe(1);
      for (const { atMs, rises } of found) {
        const printedMs = Date.parse(`${row.date}T${rises ? row.rise : row.set}Z`);
        within(atMs / 1000, printedMs / 1000, annual.tolerance, where);
      }
    });
  });

  it('agree at 80 degrees on the days on which the polar seasons change, two sets in a day included', () => {
    let seen = 0;
    eachRow(switches, 18, (row, where) => {
      const found = onUtcDate(row.latitude, row.longitude, row.date);
      for (const [printed, rises] of [
        [row.rises, true],
        [row.sets, false],
      ] as const) {
        if (printed === null) continue;
        const own = found.filter((crossing) => crossing.rises === rises);
        expect(own.length, where).toBe(printed.length);
        printed.forEach((minute, index) => {
          const printedMs = Date.parse(`${row.date}T${minute}Z`);
          within((own[index]?.atMs ?? NaN) / 1000, printedMs / 1000, switches.tolerance, where);
          seen += 1;
        });
      }
    });
    expect(seen).toBe(18);
  });

  it('agree that there is no event in the polar nights and under the midnight suns', () => {
    eachRow(spans, 6, (row, where) => {
      const fromMs = Date.parse(`${row.from}T00:00Z`);
      const toMs = Date.parse(`${row.to}T00:00Z`) + DAY_MS;
      const place = { latitude: row.latitude, longitude: row.longitude };
      expect(sunCrossings(place, SUNRISE_DEG, fromMs, toMs), where).toEqual([]);
      expect(sunPosition(place, fromMs).altitudeDeg > SUNRISE_DEG, where).toBe(row.isUp);
    });
  });

  it('agree at the poles, where the sun rises and sets once a year', () => {
    eachRow(poles, 4, (row, where) => {
      const place = { latitude: row.latitude, longitude: 0 };
      const year = sunCrossings(place, SUNRISE_DEG, Date.UTC(2022, 0, 1), Date.UTC(2023, 0, 1));
      expect(year.length, where).toBe(2);
      const own = year.find(({ rises }) => rises === (row.event === 'rise'));
      within((own?.atMs ?? NaN) / 1000, Date.parse(row.at) / 1000, poles.tolerance, where);
    });
  });
});

describe('every crossing of a civil date', () => {
  const columns = [
    ['dawn18', -18, true],
    ['dawn12', -12, true],
    ['dawn6', -6, true],
    ['dawn4', -4, true],
    ['rise', SUNRISE_DEG, true],
    ['above6', 6, true],
    ['below6', 6, false],
    ['set', SUNRISE_DEG, false],
    ['dusk4', -4, false],
    ['dusk6', -6, false],
    ['dusk12', -12, false],
    ['dusk18', -18, false],
  ] as const;

  it('agrees with ephem 4.1.4 in 24 cases, 244 of 288 events happening, none missed or invented', () => {
    let happening = 0;
    eachRow(events, 24, (row, where) => {
      const date = parseCivilDate(row.date);
      const day = date && civilDay(date, row.timeZone);
      if (!day) throw new Error(`no civil date: ${where}`);
      expect((day.endMs - day.startMs) / 3_600_000, where).toBe(row.hours);
      const tolerance = Math.abs(row.latitude) <= 66 ? events.tolerance : events.grazingTolerance;
      for (const [column, altitudeDeg, rises] of columns) {
        const found = sunCrossings(row, altitudeDeg, day.startMs, day.endMs);
        const own = found.filter((crossing) => crossing.rises === rises);
        const printed = row[column];
        expect(own.length, `${where} ${column}`).toBe(printed === null ? 0 : 1);
        if (printed === null) continue;
        within((own[0]?.atMs ?? NaN) / 1000, Date.parse(printed) / 1000, tolerance, `${where} ${column}`);
        happening += 1;
      }
    });
    expect(happening).toBe(244);
  });

  it('lies between the lowest and the highest altitude that ephem 4.1.4 gives for eleven of the dates', () => {
    let checked = 0;
    eachRow(events, 24, (row, where) => {
      const date = parseCivilDate(row.date);
      const day = date && civilDay(date, row.timeZone);
      if (row.lowestDeg === null || row.highestDeg === null || !day) return;
      const altitudes: number[] = [];
      for (let atMs = day.startMs; atMs <= day.endMs; atMs += 60_000) {
        altitudes.push(sunPosition(row, atMs).altitudeDeg);
      }
      within(Math.min(...altitudes), row.lowestDeg, events.altitudeToleranceDeg, where);
      within(Math.max(...altitudes), row.highestDeg, events.altitudeToleranceDeg, where);
      checked += 1;
    });
    expect(checked).toBe(11);
  });
});

describe('crossings', () => {
  const places = fc.record({
    latitude: fc.oneof(
      fc.double({ min: -90, max: 90, noNaN: true }),
      fc.double({ min: 89.5, max: 90, noNaN: true }),
      fc.double({ min: -90, max: -89.5, noNaN: true }),
    ),
    longitude: fc.double({ min: -180, max: 180, noNaN: true }),
  });
  const altitudes = fc.double({ min: -90, max: 90, noNaN: true });
  const starts = fc.integer({ min: Date.UTC(1900, 0, 1), max: Date.UTC(2100, 11, 31) });

  it('are exactly where the altitude changes sides, seen minute by minute', () => {
    fc.assert(
      fc.property(places, altitudes, starts, (place, altitudeDeg, fromMs) => {
        const found = sunCrossings(place, altitudeDeg, fromMs, fromMs + DAY_MS);
        let isAbove = sunPosition(place, fromMs).altitudeDeg > altitudeDeg;
        let next = 0;
        for (let minute = 1; minute <= 1440; minute += 1) {
          const atMs = fromMs + minute * 60_000;
          const was = isAbove;
          isAbove = sunPosition(place, atMs).altitudeDeg > altitudeDeg;
          const within = [];
          while ((found[next]?.atMs ?? Infinity) <= atMs) within.push(found[next++]);
          if (was !== isAbove) expect(within.length % 2).toBe(1);
          else expect(within.length % 2).toBe(0);
          if (within.length > 0) expect(within.at(-1)?.rises).toBe(isAbove);
        }
        expect(next).toBe(found.length);
      }),
      { numRuns: 60 },
    );
  });

  it('are at the altitude, in order, and change direction from one to the next', () => {
    fc.assert(
      fc.property(places, altitudes, starts, (place, altitudeDeg, fromMs) => {
        const found = sunCrossings(place, altitudeDeg, fromMs, fromMs + 3 * DAY_MS);
        found.forEach(({ atMs, rises }, index) => {
          within(sunPosition(place, atMs).altitudeDeg, altitudeDeg, 1e-6, 'altitude');
          const before = found[index - 1];
          if (!before) return;
          expect(atMs).toBeGreaterThan(before.atMs);
          expect(rises).toBe(!before.rises);
        });
      }),
      { numRuns: 300 },
    );
  });

  it('do not depend on how a span is cut', () => {
    fc.assert(
      fc.property(
        places,
        altitudes,
        starts,
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        (place, deg, fromMs, share) => {
          const toMs = fromMs + DAY_MS;
          const cutMs = Math.floor(fromMs + share * DAY_MS);
          const whole = sunCrossings(place, deg, fromMs, toMs);
          const parts = [
            ...sunCrossings(place, deg, fromMs, cutMs),
            ...sunCrossings(place, deg, cutMs, toMs),
          ];
          expect(parts.length).toBe(whole.length);
          parts.forEach(({ atMs }, index) => within(atMs, whole[index]?.atMs ?? NaN, 50, 'instant'));
        },
      ),
      { numRuns: 200 },
    );
  });

  it('of an empty span are none', () => {
    expect(sunCrossings({ latitude: 0, longitude: 0 }, 0, 5, 5)).toEqual([]);
    expect(sunCrossings({ latitude: 0, longitude: 0 }, 0, 5, 0)).toEqual([]);
  });

  it('refuse an instant that is none', () => {
    expect(() => sunCrossings({ latitude: 0, longitude: 0 }, 0, NaN, 5)).toThrow(RangeError);
    expect(() => sunCrossings({ latitude: 0, longitude: 0 }, 0, 5, Infinity)).toThrow(RangeError);
  });
});
