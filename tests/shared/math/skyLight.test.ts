import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dayCrossings } from '../../../shared/math/dayCrossings';
import { ev100OfIlluminance } from '../../../shared/math/exposure';
import { fallStopsPerMinute, skyLight } from '../../../shared/math/skyLight';
import { instantOf, solarDay } from '../../../shared/math/solarDay';
import { SUNRISE_DEG } from '../../../shared/math/sunAltitudes';
import { sunPosition } from '../../../shared/math/sunPosition';
import apparent from '../../reference/circular-171.json';
import rates from '../../reference/rate-of-fall.json';
import joins from '../../reference/sky-joins.json';
import rows from '../../reference/sky-light.json';
import anchors from '../../reference/twilight-anchors.json';
import { circular171Sun, refractedByCircular171 } from '../../support/circular171';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const JOINS_DEG = joins.rows.map((row) => row.altitudeDeg);

describe('the light of the sky', () => {
  it('agrees with the rows of the polynomial: lux, logarithm, EV and slope', () => {
    eachRow(rows, 22, (row, where) => {
      const { illuminanceLux, slopeStopsPerDegree, isClamped } = skyLight(row.altitudeDeg);
      within(illuminanceLux / row.lux, 1, rows.tolerance, where);
      within(Math.log10(illuminanceLux), row.log10Lux, 6e-6, where);
      within(ev100OfIlluminance(illuminanceLux), row.ev100, 0.0051, where);
      within(slopeStopsPerDegree, row.slopeStopsPerDegree, 0.00051, where);
      expect(isClamped, where).toBe(false);
    });
  });

  it('lies within the bounds of the AMS glossary at sunset and at the limits of twilight', () => {
    eachRow(anchors, 4, (row, where) => {
      const { illuminanceLux } = skyLight(row.altitudeDeg);
      expect(illuminanceLux, where).toBeGreaterThan(row.fromLux);
      expect(illuminanceLux, where).toBeLessThan(row.toLux);
    });
  });

  it('steps where ranges meet by what the coefficients leave, under 0.02 stop', () => {
    eachRow(joins, 5, (row, where) => {
      const above = skyLight(row.altitudeDeg).illuminanceLux;
      const below = skyLight(row.altitudeDeg - 1e-9).illuminanceLux;
      within(Math.log2(above / below), row.stepStops, joins.tolerance, where);
    });
  });

  it('lies near the closed form of USNO Circular 171, an independent fit, down to −10 degrees', () => {
    const seen = rows.rows.filter((row) => row.altitudeDeg >= -10 && Math.abs(row.altitudeDeg + 0.4) > 0.5);
    for (const { altitudeDeg } of seen) {
      const other = circular171Sun(refractedByCircular171(altitudeDeg));
      within(Math.log2(other / skyLight(altitudeDeg).illuminanceLux), 0, 0.3, `${altitudeDeg}`);
    }
    expect(seen.length).toBe(16);
  });

  it('is compared with the circular as it was computed elsewhere, on both sides of its step at −50′', () => {
    let compared = 0;
    eachRow(rows, 22, (row, where) => {
      if (!row.circular171Lux) return;
      const [upper, lower] = row.circular171Lux;
      const own = circular171Sun(refractedByCircular171(row.altitudeDeg));
      within(own / (upper ?? NaN), 1, 5e-4, where);
      if (lower !== undefined) within(circular171Sun(row.altitudeDeg) / lower, 1, 5e-5, where);
      compared += 1;
    });
    expect(compared).toBe(20);
    eachRow(apparent, 10, (row, where) =>
      within(circular171Sun(row.apparentAltitudeDeg) / row.lux, 1, apparent.tolerance, where),
    );
  });

  it('grows with altitude, but for the joins, where it may step back by less than 0.02 stop', () => {
    const altitudes = fc.double({ min: -18, max: 89, noNaN: true });
    fc.assert(
      fc.property(altitudes, fc.double({ min: 1e-6, max: 1, noNaN: true }), (low, step) => {
        const stops = Math.log2(skyLight(low + step).illuminanceLux / skyLight(low).illuminanceLux);
        const crosses = JOINS_DEG.some((join) => low < join && join <= low + step);
        expect(stops).toBeGreaterThan(crosses ? -0.02 : 0);
      }),
    );
  });

  it('has the slope of its own curve', () => {
    fc.assert(
      fc.property(fc.double({ min: -17.99, max: 89.99, noNaN: true }), (altitudeDeg) => {
        fc.pre(JOINS_DEG.every((join) => Math.abs(join - altitudeDeg) > 1e-3));
        const above = skyLight(altitudeDeg + 5e-4).illuminanceLux;
        const below = skyLight(altitudeDeg - 5e-4).illuminanceLux;
        within(skyLight(altitudeDeg).slopeStopsPerDegree, Math.log2(above / below) / 1e-3, 1e-5, 'slope');
      }),
    );
  });

  it('stays at its end below −18 degrees, says so, and no longer falls', () => {
    fc.assert(
      fc.property(fc.double({ min: -90, max: -18, maxExcluded: true, noNaN: true }), (altitudeDeg) => {
        const { illuminanceLux } = skyLight(-18);
        expect(skyLight(altitudeDeg)).toEqual({ illuminanceLux, slopeStopsPerDegree: 0, isClamped: true });
        expect(fallStopsPerMinute(altitudeDeg, -0.25)).toBe(0);
      }),
    );
    expect(skyLight(-18).isClamped).toBe(false);
  });

  it('refuses altitudes that are none', () => {
    for (const bad of [90.01, -90.01, NaN]) expect(() => skyLight(bad)).toThrow(RangeError);
  });
});

describe('the fall of the light after sunset', () => {
  it('takes the minutes and the rates computed elsewhere, at twelve latitudes and dates', () => {
    eachRow(rates, 12, (row, where) => {
      const place = { latitude: row.latitude, longitude: 0 };
      const day = solarDay(place, Date.UTC(2026, row.month - 1, row.day, 12));
      const atMs = (altitudeDeg: number): number => {
        const { evening } = dayCrossings(day, altitudeDeg);
        return typeof evening === 'number' ? instantOf(day, evening) : NaN;
      };
      const minutesAfterSunset = (altitudeDeg: number): number =>
        (atMs(altitudeDeg) - atMs(SUNRISE_DEG)) / 60_000;
      const rateAt = (altitudeDeg: number): number => {
        const { climbDegPerMinute } = sunPosition(place, atMs(altitudeDeg));
        return fallStopsPerMinute(altitudeDeg, climbDegPerMinute);
      };
      within((atMs(-4) - atMs(6)) / 60_000, row.goldenMin, rates.tolerance, where);
      within((atMs(-6) - atMs(-4)) / 60_000, row.blueMin, rates.tolerance, where);
      within(minutesAfterSunset(-4), row.at4Min, rates.tolerance, where);
      within(minutesAfterSunset(-6), row.at6Min, rates.tolerance, where);
      within(minutesAfterSunset(-12), row.at12Min, rates.tolerance, where);
      within(rateAt(-4), row.at4Rate, rates.rateTolerance, where);
      within(rateAt(-6), row.at6Rate, rates.rateTolerance, where);
      within(rateAt(-8), row.at8Rate, rates.rateTolerance, where);
      within(rateAt(-12), row.at12Rate, rates.rateTolerance, where);
    });
  });

  it('is what the light loses from one instant to the next, and a gain while the sun climbs', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -70, max: 70, noNaN: true }),
        fc.integer({ min: Date.UTC(1900, 0, 1), max: Date.UTC(2100, 0, 1) }),
        (latitude, atMs) => {
          const place = { latitude, longitude: 0 };
          const { altitudeDeg, climbDegPerMinute } = sunPosition(place, atMs);
          fc.pre(JOINS_DEG.concat(-18).every((join) => Math.abs(join - altitudeDeg) > 0.01));
          const lux = (ms: number) => skyLight(sunPosition(place, ms).altitudeDeg).illuminanceLux;
          const lost = Math.log2(lux(atMs - 1000) / lux(atMs + 1000)) * 30;
          within(fallStopsPerMinute(altitudeDeg, climbDegPerMinute), lost, 1e-4, 'rate');
        },
      ),
    );
  });
});
