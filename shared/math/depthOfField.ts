import { inDomain } from './domain';

/** Wavelength of green light, to which eye and sensor answer most. */
const GREEN_NM = 550;

/** The circle of confusion is this part of the sensor's diagonal. Common practice; 1,730 circulates too. */
const DIAGONAL_PARTS = 1500;

/** A focus this close to the hyperfocal distance is on it: rounding must not turn infinity into 1e16 m. */
const NEARLY = 1 - 1e-12;

/** What decides depth of field: millimetres, f-number, metres from the lens, micrometres on the sensor. */
export interface Focus {
  readonly focalLengthMm: number;
  readonly aperture: number;
  readonly distanceM: number;
  readonly circleOfConfusionUm: number;
}

/** Metres from the lens; null is infinity. */
export interface DepthLimits {
  readonly nearM: number;
  readonly farM: number | null;
  readonly totalM: number | null;
}

/**
 * The disc on the sensor that still looks sharp: c = d/1500, d the diagonal.
 * @param sensorWidthMm millimetres, 0.1 to 1,000
 * @param sensorHeightMm millimetres, 0.1 to 1,000
 * @returns micrometres; 36 × 24 mm gives 28.84. Throws RangeError outside the domain.
 * Source: common practice (encyclopaedia, "Circle of confusion", lists d/1500).
 */
export function circleOfConfusionUm(sensorWidthMm: number, sensorHeightMm: number): number {
  inDomain('sensor width in mm', sensorWidthMm, 0.1, 1000);
  inDomain('sensor height in mm', sensorHeightMm, 0.1, 1000);
  return (1000 * Math.hypot(sensorWidthMm, sensorHeightMm)) / DIAGONAL_PARTS;
}

/**
 * The nearest focus that keeps infinity sharp: H = f²/(N·c) + f.
 * @param focalLengthMm f, millimetres, 0.1 to 10,000
 * @param aperture N, f-number, 0.1 to 1,000
 * @param confusionUm c, micrometres, 0.01 to 10,000
 * @returns metres; 50 mm, f/8, 30 µm gives 10.467. Throws RangeError outside the domain.
 * Source: encyclopaedia, "Depth of field"; exact form from memory of Ray, Applied Photographic Optics.
 */
export function hyperfocalM(focalLengthMm: number, aperture: number, confusionUm: number): number {
  return reachM(focalLengthMm, aperture, confusionUm) + focalLengthMm / 1000;
}

/**
 * What looks sharp: near = s(H − f)/(H + s − 2f), far = s(H − f)/(H − s), infinite where s ≥ H.
 * A thin, symmetric lens without diffraction.
 * @param focus f, N and c as for `hyperfocalM`; s = distanceM above f, up to 1e6 m
 * @returns metres; 50 mm, f/8, 5 m, 30 µm gives 3.389 to 9.527, in all 6.138. Throws RangeError outside the domain.
 * Source: as for `hyperfocalM`.
 */
export function depthLimits({ focalLengthMm, aperture, distanceM, circleOfConfusionUm }: Focus): DepthLimits {
  const focalM = focalLengthMm / 1000;
  const spare = aboveFocalLength(distanceM, focalM) - focalM;
  const reach = reachM(focalLengthMm, aperture, circleOfConfusionUm);
  const nearM = (distanceM * reach) / (reach + spare);
  if (spare >= reach * NEARLY) return { nearM, farM: null, totalM: null };
  // far − near in one term: their difference would lose its digits where the depth is shallow.
  const farM = (distanceM * reach) / (reach - spare);
  const totalM = (2 * distanceM * reach * spare) / ((reach - spare) * (reach + spare));
  return { nearM, farM, totalM };
}

/**
 * Disc that a point out of focus makes on the sensor: b = f²/(N(s − f))·|D − s|/D, for D at infinity f²/(N(s − f)).
 * @param focalLengthMm f, millimetres, 0.1 to 10,000
 * @param aperture N, f-number, 0.1 to 1,000
 * @param distanceM s, metres to what is in focus, above f, up to 1e6
 * @param pointM D, metres to the point, 1e-6 or more; Infinity is allowed
 * @returns micrometres, diameter; 85 mm, f/2.8, 3 m, at infinity gives 885. Throws RangeError outside the domain.
 * Source: derivation from the thin lens (project handbook, section 7.2).
 */
export function blurDiscUm(
  focalLengthMm: number,
  aperture: number,
  distanceM: number,
  pointM: number,
): number {
  inDomain('focal length in mm', focalLengthMm, 0.1, 1e4);
  inDomain('aperture', aperture, 0.1, 1000);
  inDomain('distance of the point in m', pointM, 1e-6, Infinity);
  const focalM = focalLengthMm / 1000;
  const spare = aboveFocalLength(distanceM, focalM) - focalM;
  const away = pointM === Infinity ? 1 : Math.abs(pointM - distanceM) / pointM;
  return (focalLengthMm ** 2 / (aperture * spare)) * away;
}

/**
 * Diameter of the Airy disc of a perfect lens focused far away: 2.44·λ·N.
 * @param aperture N, f-number, 0.1 to 1,000
 * @param wavelengthNm λ, nanometres, 100 to 10,000
 * @returns micrometres; f/8 in green light gives 10.74. Throws RangeError outside the domain.
 * Source: encyclopaedia, "Airy disk" (first dark ring at sin θ = 1.22 λ/d).
 */
export function airyDiscUm(aperture: number, wavelengthNm: number = GREEN_NM): number {
  inDomain('aperture', aperture, 0.1, 1000);
  inDomain('wavelength in nm', wavelengthNm, 100, 1e4);
  return (2.44 * wavelengthNm * aperture) / 1000;
}

/** H − f = f²/(N·c), metres: by itself, it keeps its digits where H is hardly longer than f. */
function reachM(focalLengthMm: number, aperture: number, confusionUm: number): number {
  inDomain('focal length in mm', focalLengthMm, 0.1, 1e4);
  inDomain('aperture', aperture, 0.1, 1000);
  inDomain('circle of confusion in µm', confusionUm, 0.01, 1e4);
  return focalLengthMm ** 2 / (aperture * confusionUm);
}

function aboveFocalLength(distanceM: number, focalM: number): number {
  if (distanceM > focalM && distanceM <= 1e6) return distanceM;
  throw new RangeError(`a lens of ${focalM} m focuses on nothing at ${distanceM} m`);
}
