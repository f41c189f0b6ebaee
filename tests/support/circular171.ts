/**
 * The closed form of USNO Circular 171 (Janiczek and DeYoung, 1987) for a clear sky, from several independent
 * transcriptions that cite its page 22. An independent fit to the same light: tests only, the service doesn't use it.
 */
const RADIAN = 180 / Math.PI;

/** Optical depth and sky term common to sun and moon. */
function transmission(apparentDeg: number): number {
  const x = 753.66156;
  const u = Math.sin(apparentDeg / RADIAN);
  const s = Math.asin((x * Math.cos(apparentDeg / RADIAN)) / (x + 1));
  const m = x * (Math.cos(s) - u) + Math.cos(s);
  return Math.exp(-0.21 * m) * u + 0.0289 * Math.exp(-0.042 * m) * (1 + ((apparentDeg + 90) * u) / RADIAN);
}

/** Its own refraction, which it switches off below −5/6 degree. */
export function refractedByCircular171(trueDeg: number): number {
  if (trueDeg < -5 / 6) return trueDeg;
  return trueDeg + 1 / (60 * Math.tan((trueDeg + 8.6 / (trueDeg + 4.42)) / RADIAN));
}

/** Illuminance by sun and sky from the apparent altitude, lx. */
export function circular171Sun(apparentDeg: number): number {
  return 133_775 * transmission(apparentDeg);
}

/** Illuminance by the moon from its geocentric altitude and its elongation from the sun, lx. */
export function circular171Moon(geocentricDeg: number, elongationDeg: number): number {
  const loweredDeg = geocentricDeg - 0.95 * Math.cos(geocentricDeg / RADIAN);
  const e = elongationDeg / RADIAN;
  const phase =
    0.892 * Math.exp(-3.343 / Math.tan(e / 2) ** 0.632) + 0.0344 * (Math.sin(e) - e * Math.cos(e));
  const surge = 1 - 0.005 * Math.cos(e) - 0.03 * Math.sin(geocentricDeg / RADIAN);
  return ((0.418 * phase) / surge) * transmission(refractedByCircular171(loweredDeg));
}
