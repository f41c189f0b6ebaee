import vsop87Earth from 'astronomia/data/vsop87Bearth';
import { deltaT } from 'astronomia/deltat';
import { Planet } from 'astronomia/planetposition';
import { apparent } from 'astronomia/sidereal';
import { apparentEquatorialVSOP87 } from 'astronomia/solar';
import type { Place } from '../../shared/math/sunSite';

const earth = new Planet(vsop87Earth);
const DEGREE = Math.PI / 180;

/**
 * Altitude of the sun's centre by the independent library astronomia (Meeus's methods on the full VSOP87), without
 * refraction, with a parallax of 8.794″ on a round earth.
 */
export function meeusAltitudeDeg({ latitude, longitude }: Place, atMs: number): number {
  const jd = atMs / 86_400_000 + 2_440_587.5;
  const year = 2000 + (jd - 2_451_545) / 365.25;
  const { ra, dec } = apparentEquatorialVSOP87(earth, jd + deltaT(year) / 86_400);
  const hour = (apparent(jd) / 240 + longitude) * DEGREE - ra;
  const latitudeRad = latitude * DEGREE;
  const sine = Math.sin(latitudeRad) * Math.sin(dec) + Math.cos(latitudeRad) * Math.cos(dec) * Math.cos(hour);
  const geocentricRad = Math.asin(sine);
  return geocentricRad / DEGREE - (8.794 / 3600) * Math.cos(geocentricRad);
}
