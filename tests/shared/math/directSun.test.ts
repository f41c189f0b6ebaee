import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { centreAtHorizonDeg, directSun, type Span } from '../../../shared/math/directSun';
import { dipOfHorizonDeg } from '../../../shared/math/dip';
import { skylineAltitudeDeg, skylineFrom } from '../../../shared/math/skyline';
import { instantOf, solarDay, type SolarDay } from '../../../shared/math/solarDay';
import { SUNRISE_DEG, sunriseAltitudeDeg } from '../../../shared/math/sunAltitudes';
import { sunEvents } from '../../../shared/math/sunEvents';
import { sunPosition } from '../../../shared/math/sunPosition';
import { within } from '../../support/within';

const london = { latitude: 51.5074, longitude: -0.1278 };
const midsummer = solarDay(london, Date.UTC(2026, 5, 21, 12));

const places = fc.record({
  latitude: fc.oneof(
    fc.double({ min: -90, max: 90, noNaN: true }),
    fc.constantFrom(-90, -23.44, 0, 23.44, 89.97),
  ),
  longitude: fc.double({ min: -180, max: 180, noNaN: true }),
});
const instants = fc.integer({ min: Date.UTC(1900, 0, 1), max: Date.UTC(2100, 11, 31) });
const corners = fc.record({
  azimuthDeg: fc.oneof(
    fc.double({ min: 0, max: 360, noNaN: true }),
    fc.constantFrom(0, 90, 180, 180, 270, 360),
  ),
  altitudeDeg: fc.oneof(fc.double({ min: -5, max: 60, noNaN: true }), fc.constantFrom(0, 0, 30)),
});
const skylines = fc.array(corners, { minLength: 1, maxLength: 40 });

function isIn(spans: readonly Span[], atMs: number): boolean {
  return spans.some(({ fromMs, toMs }) => fromMs <= atMs && atMs <= toMs);
}

function isNearEdge(spans: readonly Span[], atMs: number, roomMs: number): boolean {
  return spans.some(({ fromMs, toMs }) => Math.abs(fromMs - atMs) < roomMs || Math.abs(toMs - atMs) < roomMs);
}

describe('direct sun', () => {
  it('with nothing in the way is sunrise to sunset, the eye’s height included', () => {
    fc.assert(
      fc.property(
        places,
        instants,
        fc.double({ min: 0, max: 5000, noNaN: true }),
        (place, nearMs, height) => {
          const day = solarDay(place, nearMs);
          fc.pre(day.turns);
          const found = directSun(day, { horizonDeg: 0 }, height);
          const events = sunEvents(day, height);
          const [rise, set] = [events[3], events[5]];
          if (rise?.reason === 'sun_stays_below' || set?.reason === 'sun_stays_below') {
            expect(found).toEqual([]);
            return;
          }
          expect(found.length).toBe(1);
          const fromMs = rise?.atMs ?? instantOf(day, day.lowBefore.u);
          const toMs = set?.atMs ?? instantOf(day, day.lowAfter.u);
          within(found[0]?.fromMs ?? NaN, fromMs, 1, 'from');
          within(found[0]?.toMs ?? NaN, toMs, 1, 'to');
        },
      ),
    );
  });

  it('touches a horizon with the limb at −50′, lowered by 2.12′ a root metre, and higher ones with less air', () => {
    expect(centreAtHorizonDeg(0)).toBeCloseTo(SUNRISE_DEG, 12);
    expect(centreAtHorizonDeg(-dipOfHorizonDeg(100))).toBeCloseTo(sunriseAltitudeDeg(100), 12);
    // By hand: at 10° Bennett's 5.392′ scaled by 34/34.478, and 16′ of semidiameter.
    within(centreAtHorizonDeg(10), 10 - (5.392 * 34) / 34.478 / 60 - 16 / 60, 1e-5, 'at 10 degrees');
  });

  it('comes and goes behind a tower, at the instants at which the sun’s azimuth passes its edges', () => {
    const tower = [
      { azimuthDeg: 170, altitudeDeg: 0 },
      { azimuthDeg: 170, altitudeDeg: 80 },
      { azimuthDeg: 190, altitudeDeg: 80 },
      { azimuthDeg: 190, altitudeDeg: 0 },
    ];
    const found = directSun(midsummer, { skyline: tower }, 0);
    expect(found.length).toBe(2);
    within(sunPosition(london, found[0]?.toMs ?? NaN).azimuthDeg, 170, 1e-4, 'it goes at');
    within(sunPosition(london, found[1]?.fromMs ?? NaN).azimuthDeg, 190, 1e-4, 'it comes back at');
    const [open] = directSun(midsummer, { horizonDeg: 0 }, 0);
    within(found[0]?.fromMs ?? NaN, open?.fromMs ?? NaN, 2, 'sunrise');
    within(found[1]?.toMs ?? NaN, open?.toMs ?? NaN, 2, 'sunset');
  });

  it('is seen through a gap a tenth of a degree wide', () => {
    const wall = [
      { azimuthDeg: 0, altitudeDeg: 80 },
      { azimuthDeg: 180, altitudeDeg: 80 },
      { azimuthDeg: 180, altitudeDeg: 0 },
      { azimuthDeg: 180.1, altitudeDeg: 0 },
      { azimuthDeg: 180.1, altitudeDeg: 80 },
    ];
    const found = directSun(midsummer, { skyline: wall }, 0);
    expect(found.length).toBe(1);
    within(sunPosition(london, found[0]?.fromMs ?? NaN).azimuthDeg, 180, 1e-4, 'from');
    within(sunPosition(london, found[0]?.toMs ?? NaN).azimuthDeg, 180.1, 1e-4, 'to');
  });

  it('is exactly when the limb stands over the skyline, seen every two minutes, whatever the skyline', () => {
    fc.assert(
      fc.property(places, instants, skylines, (place, nearMs, skyline) => {
        const day: SolarDay = solarDay(place, nearMs);
        const found = directSun(day, { skyline }, 0);
        const sorted = skylineFrom(skyline, 0);
        const toMs = instantOf(day, day.lowAfter.u);
        const wrong: string[] = [];
        for (let atMs = instantOf(day, day.lowBefore.u) + 1000; atMs < toMs; atMs += 120_000) {
          if (isNearEdge(found, atMs, 100)) continue;
          const { altitudeDeg, azimuthDeg } = sunPosition(place, atMs);
          const clearDeg = altitudeDeg - centreAtHorizonDeg(skylineAltitudeDeg(sorted, azimuthDeg));
          if (Math.abs(clearDeg) < 1e-4) continue;
          if (isIn(found, atMs) !== clearDeg > 0) wrong.push(`${clearDeg} at ${atMs}`);
        }
        expect(wrong).toEqual([]);
      }),
      { numRuns: 150 },
    );
  });

  it('never grows where the skyline does', () => {
    fc.assert(
      fc.property(places, instants, skylines, (place, nearMs, skyline) => {
        const day = solarDay(place, nearMs);
        const length = (spans: readonly Span[]) => spans.reduce((sum, s) => sum + s.toMs - s.fromMs, 0);
        const higher = skyline.map((corner) => ({ ...corner, altitudeDeg: corner.altitudeDeg + 7 }));
        expect(length(directSun(day, { skyline: higher }, 0))).toBeLessThanOrEqual(
          length(directSun(day, { skyline }, 0)) + 10,
        );
      }),
      { numRuns: 100 },
    );
  });

  it('comes in spans that are in order and apart', () => {
    fc.assert(
      fc.property(places, instants, skylines, (place, nearMs, skyline) => {
        const found = directSun(solarDay(place, nearMs), { skyline }, 20);
        found.forEach(({ fromMs, toMs }, index) => {
          expect(toMs).toBeGreaterThan(fromMs);
          expect(fromMs).toBeGreaterThan(found[index - 1]?.toMs ?? -Infinity);
        });
      }),
      { numRuns: 150 },
    );
  });

  it('refuses skylines that are none', () => {
    expect(() => directSun(midsummer, { skyline: [] }, 0)).toThrow(RangeError);
    expect(() => directSun(midsummer, { horizonDeg: 91 }, 0)).toThrow(RangeError);
    expect(() => directSun(midsummer, { skyline: [{ azimuthDeg: NaN, altitudeDeg: 0 }] }, 0)).toThrow(
      RangeError,
    );
    expect(() => directSun(midsummer, { horizonDeg: 0 }, -1)).toThrow(RangeError);
  });
});

describe('a skyline', () => {
  it('runs straight from corner to corner, around north too', () => {
    const skyline = skylineFrom(
      [
        { azimuthDeg: 350, altitudeDeg: 10 },
        { azimuthDeg: 10, altitudeDeg: 20 },
        { azimuthDeg: 180, altitudeDeg: 3 },
      ],
      0,
    );
    expect(skylineAltitudeDeg(skyline, 0)).toBeCloseTo(15, 12);
    expect(skylineAltitudeDeg(skyline, 355)).toBeCloseTo(12.5, 12);
    expect(skylineAltitudeDeg(skyline, 5)).toBeCloseTo(17.5, 12);
    expect(skylineAltitudeDeg(skyline, 95)).toBeCloseTo(11.5, 12);
    expect(skylineAltitudeDeg(skyline, 265)).toBeCloseTo(6.5, 12);
  });

  it('lets the visible horizon show where nothing stands, and only there', () => {
    const skyline = skylineFrom(
      [
        { azimuthDeg: 0, altitudeDeg: 0 },
        { azimuthDeg: 90, altitudeDeg: 5 },
      ],
      0.5,
    );
    expect(skylineAltitudeDeg(skyline, 0)).toBe(-0.5);
    expect(skylineAltitudeDeg(skyline, 90)).toBe(5);
  });

  it('stays between its lowest and highest corner', () => {
    fc.assert(
      fc.property(skylines, fc.double({ min: 0, max: 359.999, noNaN: true }), (points, azimuthDeg) => {
        const altitude = skylineAltitudeDeg(skylineFrom(points, 0), azimuthDeg);
        const altitudes = points.map((point) => point.altitudeDeg);
        expect(altitude).toBeGreaterThanOrEqual(Math.min(...altitudes) - 1e-9);
        expect(altitude).toBeLessThanOrEqual(Math.max(...altitudes) + 1e-9);
      }),
    );
  });
});
