import { ev100OfIlluminance } from '../exposure';
import { lightInRanges, SUN_RANGES } from '../illuminanceRanges';
import { moonLight } from '../moonLight';
import { moonPosition, type MoonPosition } from '../moonPosition';
import { DARKEST_DEG } from '../skyLight';
import { sunPosition } from '../sunPosition';
import type { Place } from '../sunSite';

/** Sky and moon over a span of time, on a horizontal surface under a clear sky. */
export interface NaturalLight {
  /** Incident EV100 at an instant of the span, milliseconds since 1970. */
  ev100At(atMs: number): number;
  sunAltitudeAt(atMs: number): number;
  /** What the moon adds to the sky at an instant, stops. */
  moonStopsAt(atMs: number): number;
}

/** The moon's altitude is so smooth that a parabola over an hour is good to 0.01°. */
const MOON_STEP_MS = 1_800_000;

/** On either side of a join two ranges are mixed, so that the falling light never seems to rise. */
const BLEND_DEG = 0.05;

/**
 * Sky and moon of a place over a span.
 *
 * EV100 = log2(100·(E_sky + E_moon) / 250)
 *
 * @param place latitude and longitude, degrees
 * @param fromMs start, milliseconds since 1970 (UTC)
 * @param toMs end
 * @returns the light, to be asked within the span
 * @throws RangeError when a coordinate is out of range or an instant is not finite
 * @example naturalLight(place, fromMs, toMs).ev100At(fromMs) // 7.5 at sunset
 * @source `skyLight` and `moonLight`: Explanatory Supplement (1992), p. 491
 */
export function naturalLight(place: Place, fromMs: number, toMs: number): NaturalLight {
  const moons = moonTable(place, fromMs, toMs);
  const sunAltitudeAt = (atMs: number): number => sunPosition(place, atMs).altitudeDeg;
  const luxAt = (atMs: number): [sky: number, moon: number] => [
    smoothSkyLux(sunAltitudeAt(atMs)),
    moonLux(moons, atMs / MOON_STEP_MS - Math.floor(fromMs / MOON_STEP_MS) + 1),
  ];
  return {
    sunAltitudeAt,
    ev100At(atMs) {
      const [sky, moon] = luxAt(atMs);
      return ev100OfIlluminance(sky + moon);
    },
    moonStopsAt(atMs) {
      const [sky, moon] = luxAt(atMs);
      return Math.log2(1 + moon / sky);
    },
  };
}

/**
 * The light of the sky without the small steps where the model's ranges meet.
 *
 * As `skyLight`, but within 0.05° of a join the two ranges are mixed in proportion, in logarithms.
 *
 * @param sunAltitudeDeg h without refraction, −90 to 90 degrees
 * @returns lx; that of −18° below it
 * @example smoothSkyLux(-6) // 3.41159
 * @source Explanatory Supplement (1992), p. 491; the mixing is a modelling choice, within 0.014 stop of the model
 */
export function smoothSkyLux(sunAltitudeDeg: number): number {
  const h = Math.max(DARKEST_DEG, sunAltitudeDeg);
  const join = SUN_RANGES.find(({ fromDeg }) => fromDeg > DARKEST_DEG && Math.abs(h - fromDeg) < BLEND_DEG);
  if (!join) return 10 ** lightInRanges(SUN_RANGES, h).log10Lux;
  const above = SUN_RANGES.indexOf(join);
  const upper = lightInRanges(SUN_RANGES.slice(above, above + 1), h).log10Lux;
  const lower = lightInRanges(SUN_RANGES.slice(above + 1, above + 2), h).log10Lux;
  const share = (h - join.fromDeg + BLEND_DEG) / (2 * BLEND_DEG);
  return 10 ** (lower + (upper - lower) * share);
}

/** The moon on every half hour from before the span to after it: the same instants whatever the span. */
function moonTable(place: Place, fromMs: number, toMs: number): MoonPosition[] {
  const first = Math.floor(fromMs / MOON_STEP_MS) - 1;
  const last = Math.ceil(toMs / MOON_STEP_MS) + 1;
  return Array.from({ length: last - first + 1 }, (_, index) =>
    moonPosition(place, (first + index) * MOON_STEP_MS),
  );
}

/** A parabola through the three nearest altitudes, straight lines for phase and distance. */
function moonLux(moons: readonly MoonPosition[], steps: number): number {
  const middle = Math.max(1, Math.min(moons.length - 2, Math.round(steps)));
  const [before, here, after] = [moons[middle - 1], moons[middle], moons[middle + 1]];
  if (!before || !here || !after) return 0;
  const x = steps - middle;
  const along = (name: 'altitudeDeg' | 'phaseAngleDeg' | 'parallaxDeg'): number =>
    here[name] + (x * (after[name] - before[name])) / 2;
  const bend = (after.altitudeDeg + before.altitudeDeg) / 2 - here.altitudeDeg;
  const altitudeDeg = Math.max(-90, Math.min(90, along('altitudeDeg') + x * x * bend));
  const phaseAngleDeg = Math.max(0, Math.min(180, along('phaseAngleDeg')));
  return moonLight(altitudeDeg, phaseAngleDeg, along('parallaxDeg'));
}
