import { getTimes } from 'suncalc';
import { describe, expect, it } from 'vitest';
import { twilightDay } from '../../../shared/calculators/twilight/day';
import usno from '../../reference/usno-rise-set.json';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { eachRow } from '../../support/eachRow';

const london = { latitude: 51.5074, longitude: -0.1278 };
const ask = (body: object) => askCalculator(twilightDay, body);
const places = (body: object) => placesOf(faultsIn(twilightDay, body));
const atOf = (body: object, name: string) =>
  ask(body).result.events.find((event) => event.name === name)?.at ?? null;
const dayAfter = (date: string, days: number) =>
  new Date(Date.parse(date) + days * 86_400_000).toISOString().slice(0, 10);

describe('twilight/day against others', () => {
  it('gives sunrise and sunset as the naval observatory prints them', () => {
    eachRow(usno, 14, ({ latitude, longitude, date, rise, set }, where) => {
      // Printed is what falls on the date by UT; east and west that may belong to the solar day beside it.
      const days = [-1, 0, 1].map((more) => dayAfter(date, more));
      for (const [name, printed] of [
        ['sunrise', rise],
        ['sunset', set],
      ] as const) {
        const own = days
          .map((day) => atOf({ latitude, longitude, date: day, timeZone: 'UTC' }, name) ?? '')
          .find((at) => at.startsWith(date));
        const offS = Math.abs(Date.parse(own ?? '') - Date.parse(`${date}T${printed}:00Z`)) / 1000;
        expect(offS, `${where} ${name}`).toBeLessThanOrEqual(usno.tolerance);
      }
    });
  });

  it('agrees with suncalc within two minutes up to 60° of latitude, at 200 places and dates', () => {
    let compared = 0;
    for (let i = 0; i < 200; i += 1) {
      const latitude = -60 + 120 * ((i * 0.7548776662) % 1);
      const longitude = -170 + 340 * ((i * 0.5698402909) % 1);
      const date = new Date(Date.UTC(2026, 0, 1 + ((i * 37) % 365)));
      const day = { latitude, longitude, date: date.toISOString().slice(0, 10) };
      const noon = Date.parse(atOf(day, 'solarNoon') ?? '');
      const other = getTimes(new Date(noon), latitude, longitude);
      for (const [name, theirs] of [
        ['solarNoon', other.solarNoon],
        ['sunrise', other.sunrise],
        ['sunset', other.sunset],
        ['civilDusk', other.dusk],
        ['nauticalDawn', other.nauticalDawn],
      ] as const) {
        const own = atOf(day, name);
        if (own === null || !theirs || Number.isNaN(theirs.getTime())) continue;
        compared += 1;
        const offS = Math.abs(Date.parse(own) - theirs.getTime()) / 1000;
        expect(offS, `${name} at ${latitude}, ${longitude} on ${day.date}`).toBeLessThan(120);
      }
    }
    expect(compared).toBeGreaterThan(900);
  });
});

describe('twilight/day', () => {
  it('tells times in the place’s zone, also on days of 23 and 25 hours', () => {
    const berlin = { latitude: 52.52, longitude: 13.405 };
    expect(atOf({ ...berlin, date: '2026-03-28' }, 'solarNoon')).toMatch(/^2026-03-28T12:1\d:\d\d\+01:00$/);
    expect(atOf({ ...berlin, date: '2026-03-29' }, 'solarNoon')).toMatch(/^2026-03-29T13:1\d:\d\d\+02:00$/);
    expect(atOf({ ...berlin, date: '2026-10-25' }, 'solarNoon')).toMatch(/^2026-10-25T11:5\d:\d\d\+01:00$/);
  });

  it('takes today at the place where no date is given', () => {
    // The clock stands at 2026-06-21 18:00 UTC, which is the 22nd already in Auckland.
    expect(ask(london).result.date).toBe('2026-06-21');
    expect(ask({ latitude: -36.85, longitude: 174.76 }).result.date).toBe('2026-06-22');
  });

  it('keeps a dusk after midnight with the evening that it ends', () => {
    const { events } = ask({ latitude: 60.17, longitude: 24.94, date: '2026-06-20' }).result;
    const civilDusk = events.find(({ name }) => name === 'civilDusk');
    expect(civilDusk?.at).toMatch(/^2026-06-21T00:/);
  });

  it('joins its bands: the evening goes from golden through blue hour and the three twilights', () => {
    const evening = ask({ ...london, date: '2026-10-04' }).result.bands.filter(
      ({ part }) => part === 'evening',
    );
    const of = (name: string) => evening.find((band) => band.name === name);
    expect(of('goldenHour')?.to).toBe(of('blueHour')?.from);
    expect(of('civilTwilight')?.to).toBe(of('nauticalTwilight')?.from);
    expect(of('nauticalTwilight')?.to).toBe(of('astronomicalTwilight')?.from);
    expect(of('blueHour')?.to).toBe(of('civilTwilight')?.to);
  });

  it('lets the eye’s height move sunrise and sunset, and nothing else', () => {
    const flat = ask({ ...london, date: '2026-10-04' }).result.events;
    const high = ask({ ...london, date: '2026-10-04', eyeHeightM: 100 }).result.events;
    // Dip of 21.2′ at a sun that climbs 9.3′ a minute: some 140 s earlier and later.
    for (const [i, { name, at }] of flat.entries()) {
      const movedS = Math.abs(Date.parse(high[i]?.at ?? '') - Date.parse(at ?? '')) / 1000;
      if (name === 'sunrise' || name === 'sunset') expect(movedS).toBeGreaterThan(100);
      else expect(movedS, name).toBe(0);
    }
  });

  it('lets a skyline cut the sun: a tower in the west takes it for a while', () => {
    const skyline = [
      { azimuthDeg: 200, altitudeDeg: 0 },
      { azimuthDeg: 230, altitudeDeg: 0 },
      { azimuthDeg: 231, altitudeDeg: 40 },
      { azimuthDeg: 240, altitudeDeg: 40 },
      { azimuthDeg: 241, altitudeDeg: 0 },
    ];
    const sun = ask({ ...london, date: '2026-10-04', skyline }).result.directSun;
    expect(sun).toHaveLength(2);
    expect((sun[0]?.to ?? '') < (sun[1]?.from ?? '')).toBe(true);
  });

  it('cautions against the sun only where it shines', () => {
    expect(codesOf(ask({ ...london, date: '2026-10-04' }).cautions)).toContain('sun_and_optics');
    const polarNight = ask({ latitude: 78.2, longitude: 15.6, date: '2026-12-21' });
    expect(codesOf(polarNight.cautions)).not.toContain('sun_and_optics');
    expect(polarNight.result.directSun).toEqual([]);
    expect(polarNight.result.dayLengthS).toBe(0);
  });

  it.each([-90, 90])('answers at %s°, and on both sides of the date line', (latitude) => {
    for (const longitude of [-180, 0, 180]) {
      const { events, bands } = ask({ latitude, longitude, date: '2026-03-20' }).result;
      expect(events).toHaveLength(9);
      expect(Array.isArray(bands)).toBe(true);
    }
  });
});

describe('twilight/day refuses, and says what is allowed', () => {
  const detailOf = (body: object) => faultsIn(twilightDay, body)[0]?.detail;

  it('latitude 91', () => {
    expect(detailOf({ latitude: 91, longitude: 0 })).toBe('Latitude must be from −90 to 90 °, not 91 °.');
  });

  it('30 February', () => {
    const body = { ...london, date: '2026-02-30' };
    expect(places(body)).toEqual(['/date wrong_format']);
    expect(detailOf(body)).toContain('2026-02-30');
  });

  it('a zone that nobody has', () => {
    expect(places({ ...london, timeZone: 'Europe/Londinium' })).toEqual(['/timeZone time_zone_unknown']);
    expect(places({ ...london, timeZone: '+01:00' })).toEqual(['/timeZone time_zone_unknown']);
  });

  it('a date that the zone skipped', () => {
    const samoa = { latitude: -13.83, longitude: -171.77, timeZone: 'Pacific/Apia', date: '2011-12-30' };
    expect(places(samoa)).toEqual(['/date date_skipped']);
  });

  it('a year beyond what is known of the earth’s turning', () => {
    expect(places({ ...london, date: '2400-01-01' })).toEqual(['/date year_out_of_range']);
  });

  it('a band that is upside down, and horizon and skyline at once', () => {
    expect(places({ ...london, blueHour: { fromDeg: -3, toDeg: -5 } })).toEqual([
      '/blueHour/toDeg band_upside_down',
    ]);
    const both = { ...london, horizonDeg: 5, skyline: [{ azimuthDeg: 0, altitudeDeg: 5 }] };
    expect(faultsIn(twilightDay, both)).toHaveLength(1);
  });
});
