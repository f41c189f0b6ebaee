import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dayLengthS } from '../../../shared/math/dayLength';
import { dipOfSunriseDeg } from '../../../shared/math/dip';
import { instantOf, solarDay } from '../../../shared/math/solarDay';
import { SUNRISE_DEG } from '../../../shared/math/sunAltitudes';
import { sunEvents, type SunEvent, type SunEventName } from '../../../shared/math/sunEvents';
import { sunPosition } from '../../../shared/math/sunPosition';
import { civilDay, parseCivilDate } from '../../../shared/time/civilDate';
import events from '../../reference/sun-events.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const DAY_MS = 86_400_000;

function eventsOn(place: { latitude: number; longitude: number }, date: string, timeZone: string) {
  const civil = parseCivilDate(date);
  const day = civil && civilDay(civil, timeZone);
  if (!day) throw new Error(`no date: ${date}`);
  return sunEvents(solarDay(place, (day.startMs + day.endMs) / 2), 0);
}

function named(list: readonly SunEvent[], name: SunEventName): SunEvent {
  const event = list.find((candidate) => candidate.name === name);
  if (!event) throw new Error(`no event ${name}`);
  return event;
}

const places = fc.record({
  latitude: fc.oneof(
    fc.double({ min: -90, max: 90, noNaN: true }),
    fc.constantFrom(-90, -89.999, -66.56, 0, 66.56, 89.95, 90),
  ),
  longitude: fc.double({ min: -180, max: 180, noNaN: true }),
});
const instants = fc.integer({ min: Date.UTC(1900, 0, 1), max: Date.UTC(2100, 11, 31) });

describe('the events of a day', () => {
  it('of sunset by NREL’s example are those of its own evening, not the one printed for the next date', () => {
    // NREL spa_tester.c prints sunrise 06:12:43 and sunset 17:20:19 for 17 October 2003 at UTC−7; the sunset is the one
    // that the UTC date begins with, of the evening before. Recomputed with ephem 4.1.4: 17:20:18 and 17:18:51.
    const place = { latitude: 39.742476, longitude: -105.1786 };
    const before = eventsOn(place, '2003-10-16', 'Etc/GMT+7');
    const own = eventsOn(place, '2003-10-17', 'Etc/GMT+7');
    const seconds = (event: SunEvent) => ((event.atMs ?? NaN) - Date.UTC(2003, 9, 17, 7)) / 1000;
    within(seconds(named(own, 'sunrise')), (6 * 60 + 12) * 60 + 43, 2, 'sunrise');
    within(seconds(named(own, 'sunset')), (17 * 60 + 18) * 60 + 51, 2, 'sunset of the 17th');
    within(seconds(named(before, 'sunset')), (17 * 60 + 20) * 60 + 18.5 - 86_400, 2, 'sunset of the 16th');
  });

  it('agree with ephem 4.1.4 wherever its case falls in the same morning or evening', () => {
    const columns = [
      ['astronomicalDawn', 'dawn18'],
      ['nauticalDawn', 'dawn12'],
      ['civilDawn', 'dawn6'],
      ['sunrise', 'rise'],
      ['sunset', 'set'],
      ['civilDusk', 'dusk6'],
      ['nauticalDusk', 'dusk12'],
      ['astronomicalDusk', 'dusk18'],
    ] as const;
    let compared = 0;
    eachRow(events, 24, (row, where) => {
      const found = eventsOn(row, row.date, row.timeZone);
      const tolerance = Math.abs(row.latitude) <= 66 ? events.tolerance : events.grazingTolerance;
      for (const [name, column] of columns) {
        const printed = row[column];
        const { atMs } = named(found, name);
        // Ten of the 158 belong to a neighbouring solar day: case 12's sunset and case 22's nautical dusk, of the evening
        // before, and the dawns and sunrises of cases 23 and 24, whose solar noon is the one just after midnight UTC.
        if (printed === null || atMs === null) continue;
        if (Math.abs(atMs - Date.parse(printed)) > DAY_MS / 2) continue;
        within(atMs / 1000, Date.parse(printed) / 1000, tolerance, `${where} ${name}`);
        compared += 1;
      }
    });
    expect(compared).toBe(148);
  });

  it('give Reykjavik’s midsummer date the sunset after its midnight, which ends that date’s evening', () => {
    const found = eventsOn({ latitude: 64.1466, longitude: -21.9426 }, '2026-06-21', 'Atlantic/Reykjavik');
    expect(named(found, 'sunset').atMs).toBeGreaterThan(Date.UTC(2026, 5, 22));
    expect(named(found, 'civilDusk')).toMatchObject({ atMs: null, reason: 'sun_stays_above' });
  });

  it('say why there is none under the midnight sun and in the polar night', () => {
    const tromso = { latitude: 69.6492, longitude: 18.9553 };
    const summer = eventsOn(tromso, '2026-06-21', 'Europe/Oslo');
    expect(named(summer, 'sunrise')).toMatchObject({
      atMs: null,
      azimuthDeg: null,
      reason: 'sun_stays_above',
    });
    expect(named(summer, 'solarNoon').atMs).not.toBeNull();
    const winter = eventsOn(tromso, '2026-12-21', 'Europe/Oslo');
    expect(named(winter, 'sunset')).toMatchObject({ atMs: null, reason: 'sun_stays_below' });
    expect(named(winter, 'civilDusk').reason).toBeUndefined();
  });

  it('lower the horizon of sunrise and sunset by the dip, and nothing else', () => {
    fc.assert(
      fc.property(
        places,
        instants,
        fc.double({ min: 0, max: 9000, noNaN: true }),
        (place, nearMs, height) => {
          const day = solarDay(place, nearMs);
          const level = sunEvents(day, 0);
          const high = sunEvents(day, height);
          high.forEach((event, index) => {
            if (event.name !== 'sunrise' && event.name !== 'sunset') expect(event).toEqual(level[index]);
            else expect(event.sunAltitudeDeg).toBeCloseTo(SUNRISE_DEG - dipOfSunriseDeg(height), 12);
          });
        },
      ),
    );
  });

  it('are in order, at their altitude, morning before noon and evening after, all over the earth for 200 years', () => {
    fc.assert(
      fc.property(places, instants, (place, nearMs) => {
        const day = solarDay(place, nearMs);
        const found = sunEvents(day, 0);
        expect(found.length).toBe(9);
        const happening = found.filter(({ atMs }) => atMs !== null);
        happening.forEach(({ name, atMs, sunAltitudeDeg, azimuthDeg }, index) => {
          const position = sunPosition(place, atMs ?? NaN);
          within(position.altitudeDeg, sunAltitudeDeg, 1e-6, 'altitude');
          const turn = Math.abs(position.azimuthDeg - (azimuthDeg ?? NaN));
          const level = Math.cos((sunAltitudeDeg * Math.PI) / 180);
          within(Math.min(turn, 360 - turn) * level, 0, 1e-6, 'azimuth');
          const before = happening[index - 1];
          // Near a pole the highest altitude may come minutes before or after the transit, or not at all.
          const isByNoon = before?.name === 'solarNoon' || name === 'solarNoon';
          if (!before || !day.turns || (isByNoon && Math.abs(place.latitude) > 60)) return;
          expect(atMs ?? NaN).toBeGreaterThan(before.atMs ?? NaN);
        });
        for (const { atMs, reason } of found) expect(reason === undefined).toBe(atMs !== null);
        expect(instantOf(day, day.lowAfter.u) - instantOf(day, day.lowBefore.u)).toBeLessThan(1.6 * DAY_MS);
      }),
      { numRuns: 500 },
    );
  });

  it('fit the days together: each day ends at the lowest altitude at which the next begins', () => {
    fc.assert(
      fc.property(places, instants, (place, nearMs) => {
        const today = solarDay(place, nearMs);
        const noonMs = instantOf(today, today.noonU);
        const next = solarDay(place, noonMs + DAY_MS);
        const gapS = (instantOf(next, next.lowBefore.u) - instantOf(today, today.lowAfter.u)) / 1000;
        // Where the sun hardly turns, so close to a pole, the instant is soft though its altitude is not.
        within(gapS, 0, Math.abs(place.latitude) > 89 ? 5 : 0.05, 'gap');
        within(today.lowAfter.sine, next.lowBefore.sine, 2e-8, 'altitude');
      }),
      { numRuns: 500 },
    );
  });

  it('change by four seconds a hundredth of a degree across longitude 180, one and the same meridian', () => {
    fc.assert(
      fc.property(fc.double({ min: -65, max: 65, noNaN: true }), instants, (latitude, nearMs) => {
        const east = solarDay({ latitude, longitude: 180 }, nearMs);
        const noonMs = instantOf(east, east.noonU);
        const west = solarDay({ latitude, longitude: -180 }, noonMs);
        const beyond = solarDay({ latitude, longitude: -179.99 }, noonMs);
        const rows = [sunEvents(east, 0), sunEvents(west, 0), sunEvents(beyond, 0)];
        rows[0]?.forEach((event, index) => {
          const same = rows[1]?.[index];
          const near = rows[2]?.[index];
          expect(same?.reason).toBe(event.reason);
          if (event.atMs === null || same?.atMs === null || !near || near.atMs === null) return;
          within(same?.atMs ?? NaN, event.atMs, 1, 'same meridian');
          if (Math.abs(sunPosition({ latitude, longitude: 180 }, event.atMs).climbDegPerMinute) < 0.02)
            return;
          within((event.atMs - near.atMs) / 1000, 2.4, 0.1, 'a hundredth of a degree');
        });
      }),
    );
  });

  it('mirror each other in the year: the northern winter is the southern summer', () => {
    // At the equator's two sides the day's length differs from twelve hours by opposite amounts, but for the
    // refraction that lengthens both, up to the day's own drift in declination.
    fc.assert(
      fc.property(fc.double({ min: 0, max: 55, noNaN: true }), instants, (latitude, nearMs) => {
        const lengths = [latitude, -latitude].map((side) => {
          const day = solarDay({ latitude: side, longitude: 0 }, nearMs);
          const [rise, set] = [named(sunEvents(day, 0), 'civilDawn'), named(sunEvents(day, 0), 'civilDusk')];
          return rise.atMs === null || set.atMs === null ? null : (set.atMs - rise.atMs) / 60_000;
        });
        const [north, south] = lengths;
        if (north === null || south === null || north === undefined || south === undefined) return;
        expect(north + south).toBeGreaterThan(1440);
        expect(north + south).toBeLessThan(1440 + 4 * 4 * 6 * 3);
      }),
    );
  });
});

describe('the length of the day', () => {
  it('is sunset less sunrise, nothing in polar night, and 86,400 s under the midnight sun', () => {
    const tromso = { latitude: 69.6492, longitude: 18.9553 };
    expect(dayLengthS(solarDay(tromso, Date.UTC(2026, 5, 21, 11)), 0)).toBe(86_400);
    expect(dayLengthS(solarDay(tromso, Date.UTC(2026, 11, 21, 11)), 0)).toBe(0);
    const london = solarDay({ latitude: 51.5074, longitude: -0.1278 }, Date.UTC(2026, 5, 21, 12));
    // ephem 4.1.4: 03:43:06 to 20:21:33.
    within(dayLengthS(london, 0), (16 * 60 + 38) * 60 + 27, 2, 'London');
  });

  it('is never more than a day nor less than nothing', () => {
    fc.assert(
      fc.property(
        places,
        instants,
        fc.double({ min: 0, max: 9000, noNaN: true }),
        (place, nearMs, height) => {
          const length = dayLengthS(solarDay(place, nearMs), height);
          expect(length).toBeGreaterThanOrEqual(0);
          expect(length).toBeLessThanOrEqual(86_400);
        },
      ),
      { numRuns: 300 },
    );
  });
});
