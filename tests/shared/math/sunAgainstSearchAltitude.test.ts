import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { instantOf, solarDay } from '../../../shared/math/solarDay';
import { dayCrossings } from '../../../shared/math/dayCrossings';
import { sunCrossings, type SunCrossing } from '../../../shared/math/sunCrossings';
import { sunPosition } from '../../../shared/math/sunPosition';
import { engineCrossings, engineSun } from '../../support/engineSun';
import { within } from '../../support/within';

const DAY_MS = 86_400_000;

/** The search itself stops within 0.1 s of its root; a millisecond of room for the rounding of its last step. */
const SEARCH_TOLERANCE_S = 0.101;

const instants = fc.integer({ min: Date.UTC(1900, 0, 1), max: Date.UTC(2100, 11, 31) });
const altitudes = fc.oneof(
  fc.constantFrom(-18, -12, -6, -4, -50 / 60, 0, 6),
  fc.double({ min: -40, max: 60, noNaN: true }),
);
const longitudes = fc.double({ min: -180, max: 180, noNaN: true });
const under60 = fc.double({ min: -60, max: 60, noNaN: true });

/** The root of astronomy-engine's own altitude beside an instant, by one step of Newton's method. */
function engineRootMs(
  place: { latitude: number; longitude: number },
  altitudeDeg: number,
  atMs: number,
): number {
  const offDeg = engineSun(place, atMs).altitudeDeg - altitudeDeg;
  return atMs - (offDeg / sunPosition(place, atMs).climbDegPerMinute) * 60_000;
}

/** Two searches may differ on a touch that lasts a few seconds; neither misses or invents it. */
function withoutTouches(crossings: readonly SunCrossing[]): SunCrossing[] {
  return crossings.filter(({ atMs }, index) => {
    const before = atMs - (crossings[index - 1]?.atMs ?? -Infinity);
    const after = (crossings[index + 1]?.atMs ?? Infinity) - atMs;
    return before > 4000 && after > 4000;
  });
}

describe('crossings against astronomy-engine’s SearchAltitude', () => {
  it('below 60 degrees are the same ones, within the 0.1 second to which it searches', () => {
    fc.assert(
      fc.property(under60, longitudes, altitudes, instants, (latitude, longitude, altitudeDeg, fromMs) => {
        const place = { latitude, longitude };
        const engine = withoutTouches(engineCrossings(place, altitudeDeg, fromMs, fromMs + DAY_MS));
        const own = withoutTouches(sunCrossings(place, altitudeDeg, fromMs, fromMs + DAY_MS));
        expect(own.length).toBe(engine.length);
        own.forEach(({ atMs, rises }, index) => {
          expect(engine[index]?.rises).toBe(rises);
          within(atMs / 1000, (engine[index]?.atMs ?? NaN) / 1000, SEARCH_TOLERANCE_S, 'seconds');
        });
      }),
      { numRuns: 300 },
    );
  });

  it('below 60 degrees lie within 0.02 second of the roots of its altitude, unless the sun only grazes it', () => {
    fc.assert(
      fc.property(under60, longitudes, altitudes, instants, (latitude, longitude, altitudeDeg, fromMs) => {
        const place = { latitude, longitude };
        for (const { atMs } of sunCrossings(place, altitudeDeg, fromMs, fromMs + DAY_MS)) {
          if (Math.abs(sunPosition(place, atMs).climbDegPerMinute) < 0.02) continue;
          within(atMs / 1000, engineRootMs(place, altitudeDeg, atMs) / 1000, 0.02, 'seconds');
        }
      }),
      { numRuns: 300 },
    );
  });

  it('above 60 degrees and at the poles are neither missed nor invented, day by day through a year', () => {
    const fromMs = Date.UTC(2026, 0, 1);
    const toMs = Date.UTC(2027, 0, 1);
    let compared = 0;
    for (const latitude of [60, 66.2, 67.4, -72, 78.2232, -84.3, 88, 89.9, -89.96, 90]) {
      for (const altitudeDeg of [-18, -50 / 60, 6]) {
        const place = { latitude, longitude: 15.6267 };
        const engine = withoutTouches(engineCrossings(place, altitudeDeg, fromMs, toMs));
        const own = withoutTouches(sunCrossings(place, altitudeDeg, fromMs, toMs));
        expect(own.length, `${latitude} ${altitudeDeg}`).toBe(engine.length);
        own.forEach(({ atMs, rises }, index) => {
          expect(engine[index]?.rises, `${latitude} ${altitudeDeg}`).toBe(rises);
          // Grazing, the sun may spend seconds inside the 0.01″ to which the two positions agree.
          within(atMs / 1000, (engine[index]?.atMs ?? NaN) / 1000, 1, `${latitude} ${altitudeDeg}`);
          compared += 1;
        });
      }
    }
    expect(compared).toBeGreaterThan(7000);
  }, 60_000);

  it('hold for the halves of the solar day too, which find them in their own way', () => {
    const anywhere = fc.double({ min: -90, max: 90, noNaN: true });
    fc.assert(
      fc.property(anywhere, longitudes, altitudes, instants, (latitude, longitude, altitudeDeg, nearMs) => {
        const place = { latitude, longitude };
        const day = solarDay(place, nearMs);
        const fromMs = instantOf(day, day.lowBefore.u);
        const toMs = instantOf(day, day.lowAfter.u);
        const own = Object.values(dayCrossings(day, altitudeDeg)).filter(
          (found) => typeof found === 'number',
        );
        const all = sunCrossings(place, altitudeDeg, fromMs, toMs);
        if (day.turns) expect(own.length).toBe(all.length);
        for (const u of own) {
          const nearest = Math.min(...all.map(({ atMs }) => Math.abs(atMs - instantOf(day, u))));
          // Milliseconds: within some 50 km of a pole a grazing sun takes long over the last 1e-5″.
          expect(nearest).toBeLessThan(200);
        }
      }),
      { numRuns: 1000 },
    );
  });
});
