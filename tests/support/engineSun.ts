import { AstroTime, Body, Equator, Horizon, Observer, SearchAltitude } from 'astronomy-engine';
import type { SunCrossing } from '../../shared/math/sunCrossings';
import type { Place } from '../../shared/math/sunSite';

const J2000_MS = Date.UTC(2000, 0, 1, 12);
const DAY_MS = 86_400_000;

/** astronomy-engine's own altitude and azimuth of the sun's centre, without refraction. */
export function engineSun({ latitude, longitude }: Place, atMs: number) {
  const observer = new Observer(latitude, longitude, 0);
  const time = new AstroTime((atMs - J2000_MS) / DAY_MS);
  const { ra, dec } = Equator(Body.Sun, time, observer, true, true);
  const { altitude, azimuth } = Horizon(time, observer, ra, dec);
  return { altitudeDeg: altitude, azimuthDeg: azimuth };
}

/** All crossings of an altitude that astronomy-engine's SearchAltitude finds in a span, rising and falling. */
export function engineCrossings(
  place: Place,
  altitudeDeg: number,
  fromMs: number,
  toMs: number,
): SunCrossing[] {
  const found = [1, -1].flatMap((direction) => oneWay(place, altitudeDeg, direction, fromMs, toMs));
  return found.sort((a, b) => a.atMs - b.atMs);
}

function oneWay(
  { latitude, longitude }: Place,
  altitudeDeg: number,
  direction: number,
  fromMs: number,
  toMs: number,
): SunCrossing[] {
  const observer = new Observer(latitude, longitude, 0);
  const found: SunCrossing[] = [];
  let ut = (fromMs - J2000_MS) / DAY_MS;
  const endUt = (toMs - J2000_MS) / DAY_MS;
  while (ut < endUt) {
    const time = SearchAltitude(Body.Sun, observer, direction, new AstroTime(ut), endUt - ut, altitudeDeg);
    if (!time) break;
    found.push({ atMs: J2000_MS + time.ut * DAY_MS, rises: direction > 0 });
    // Far enough not to find the same one again, near enough not to skip a grazing pair.
    ut = time.ut + 2 / 86_400;
  }
  return found;
}
