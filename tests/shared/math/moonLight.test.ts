import { SearchMoonPhase } from 'astronomy-engine';
import fc from 'fast-check';
import { getMoonIllumination, getMoonPosition } from 'suncalc';
import { describe, expect, it } from 'vitest';
import { moonLight } from '../../../shared/math/moonLight';
import { moonPosition } from '../../../shared/math/moonPosition';
import { saemundssonArcmin } from '../../../shared/math/refraction';
import rows from '../../reference/moon-light.json';
import { circular171Moon } from '../../support/circular171';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

describe('the light of the moon', () => {
  it('agrees with the rows of the polynomial', () => {
    eachRow(rows, 24, (row, where) => {
      within(moonLight(row.altitudeDeg, row.phaseAngleDeg, 0.951) / row.lux, 1, rows.tolerance, where);
    });
  });

  it('reaches 0.31 lx at the zenith at perigee, a hundredth under the published maximum of 0.32', () => {
    // Kyba, Mohar and Posch (2017) as cited by an encyclopaedia; 0.3096 computed with CPython doubles.
    within(moonLight(90, 0, 1.02), 0.3096, 5e-5, 'perigee');
  });

  it('is compared with USNO Circular 171 as computed elsewhere: within 0.65 stop at full moon, half a stop at the quarter', () => {
    let compared = 0;
    eachRow(rows, 24, (row, where) => {
      if (row.circular171Lux === null) return;
      // Its full moon is an elongation of 179.9 degrees, by its values: at 180 the opposition surge adds 3.5 % more.
      const own = circular171Moon(row.altitudeDeg, Math.min(179.9, 180 - row.phaseAngleDeg));
      within(own / row.circular171Lux, 1, 0.002, where);
      const stops = Math.log2(row.circular171Lux / moonLight(row.altitudeDeg, row.phaseAngleDeg, 0.951));
      within(stops, 0, row.phaseAngleDeg === 0 ? 0.65 : 0.5, where);
      compared += 1;
    });
    expect(compared).toBe(12);
  });

  it('grows with altitude, with nearness and towards full moon, and is gone below −0.8 degrees', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -90, max: 89, noNaN: true }),
        fc.double({ min: 0, max: 179, noNaN: true }),
        fc.double({ min: 0.9, max: 1.01, noNaN: true }),
        (altitudeDeg, phaseAngleDeg, parallaxDeg) => {
          const here = moonLight(altitudeDeg, phaseAngleDeg, parallaxDeg);
          expect(here >= 0 && here < 0.33).toBe(true);
          expect(here === 0).toBe(altitudeDeg < -0.8);
          // Ranges meet at 5 and 20 degrees with steps of under 0.02 stop.
          expect(moonLight(altitudeDeg + 1, phaseAngleDeg, parallaxDeg)).toBeGreaterThanOrEqual(here * 0.986);
          expect(moonLight(altitudeDeg, phaseAngleDeg + 1, parallaxDeg)).toBeLessThanOrEqual(here);
          expect(moonLight(altitudeDeg, phaseAngleDeg, parallaxDeg + 0.01)).toBeGreaterThanOrEqual(here);
        },
      ),
    );
  });

  it('refuses values that are none', () => {
    expect(() => moonLight(91, 0, 0.95)).toThrow(RangeError);
    expect(() => moonLight(0, -1, 0.95)).toThrow(RangeError);
    expect(() => moonLight(0, 181, 0.95)).toThrow(RangeError);
    expect(() => moonLight(0, 0, 0)).toThrow(RangeError);
    expect(() => moonLight(NaN, 0, 0.95)).toThrow(RangeError);
  });
});

describe('the position of the moon', () => {
  const places = fc.record({
    latitude: fc.double({ min: -90, max: 90, noNaN: true }),
    longitude: fc.double({ min: -180, max: 180, noNaN: true }),
  });
  const instants = fc.integer({ min: Date.UTC(1950, 0, 1), max: Date.UTC(2050, 0, 1) });

  it('agrees with suncalc, an independent library, to three hundredths of a degree', () => {
    fc.assert(
      fc.property(places, instants, (place, atMs) => {
        const own = moonPosition(place, atMs);
        fc.pre(own.altitudeDeg > 0);
        const other = getMoonPosition(new Date(atMs), place.latitude, place.longitude);
        // suncalc adds refraction.
        const seenDeg = own.altitudeDeg + saemundssonArcmin(own.altitudeDeg) / 60;
        within(seenDeg, other.altitude, 0.03, 'altitude');
        const parallaxDeg = (Math.asin(6378.14 / other.distance) * 180) / Math.PI;
        within(own.parallaxDeg, parallaxDeg, 2e-4, 'parallax');
        const lit = (1 + Math.cos((own.phaseAngleDeg * Math.PI) / 180)) / 2;
        within(lit, getMoonIllumination(new Date(atMs)).fraction, 0.005, 'lit share');
      }),
      { numRuns: 100 },
    );
  });

  it('is opposite the sun at full moon and beside it at new moon', () => {
    const full = SearchMoonPhase(180, new Date(Date.UTC(2026, 0, 1)), 40);
    const young = SearchMoonPhase(0, new Date(Date.UTC(2026, 0, 1)), 40);
    const place = { latitude: 0, longitude: 0 };
    // The moon's path is inclined by 5.1 degrees to the sun's.
    expect(moonPosition(place, full?.date.getTime() ?? NaN).phaseAngleDeg).toBeLessThan(5.3);
    expect(moonPosition(place, young?.date.getTime() ?? NaN).phaseAngleDeg).toBeGreaterThan(174.7);
  });

  it('gives light only while it is up, at any place and time', () => {
    fc.assert(
      fc.property(places, instants, (place, atMs) => {
        const { altitudeDeg, azimuthDeg, illuminanceLux } = moonPosition(place, atMs);
        expect(Math.abs(altitudeDeg)).toBeLessThanOrEqual(90);
        expect(azimuthDeg >= 0 && azimuthDeg < 360).toBe(true);
        expect(illuminanceLux > 0).toBe(altitudeDeg >= -0.8);
      }),
      { numRuns: 100 },
    );
  });

  it('refuses places and instants that are none', () => {
    expect(() => moonPosition({ latitude: 91, longitude: 0 }, 0)).toThrow(RangeError);
    expect(() => moonPosition({ latitude: 0, longitude: 0 }, Infinity)).toThrow(RangeError);
  });
});
