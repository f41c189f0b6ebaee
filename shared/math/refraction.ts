import { RADIANS_PER_DEGREE } from './angles';

/** Refraction of the rising and setting sun in standard air, as in the definition of sunrise at −50′. */
const HORIZON_ARCMIN = 34;

/** Bennett's formula at altitude 0; dividing by it makes a level horizon agree with the definition of sunrise. */
const BENNETT_AT_HORIZON_ARCMIN = bennettArcmin(0);

/** More refraction per degree of dip below the level: 0.37′·√m of it belong to a dip of 1.76′·√m. */
const BELOW_LEVEL_SHARE = (2.12 - 1.76) / 1.76;

/**
 * Refraction from the apparent altitude, at 101.0 kPa and 10 °C.
 *
 * R = cot(h + 7.31 / (h + 4.4)), R in minutes of arc, good to 0.07′
 *
 * @param apparentAltitudeDeg h as seen, degrees, −1 to 90
 * @returns minutes of arc
 * @throws RangeError when the altitude is out of range
 * @example bennettArcmin(0) // 34.478
 * @source Bennett (1982) as quoted from the Nautical Almanac on NavList
 */
export function bennettArcmin(apparentAltitudeDeg: number): number {
  const h = inRange(apparentAltitudeDeg);
  return cotangent(h + 7.31 / (h + 4.4));
}

/**
 * Refraction from the true altitude, at 101.0 kPa and 10 °C.
 *
 * R = 1.02·cot(h + 10.3 / (h + 5.11)), R in minutes of arc, consistent with Bennett's to 0.1′
 *
 * @param trueAltitudeDeg h without refraction, degrees, −1 to 90
 * @returns minutes of arc
 * @throws RangeError when the altitude is out of range
 * @example saemundssonArcmin(0) // 28.982
 * @source Sæmundsson (1986) as given in an encyclopaedia, "Atmospheric refraction"
 */
export function saemundssonArcmin(trueAltitudeDeg: number): number {
  const h = inRange(trueAltitudeDeg);
  return 1.02 * cotangent(h + 10.3 / (h + 5.11));
}

/**
 * Refraction that standard air gives an object seen at an apparent altitude, normalised so that it is 34′ at 0.
 *
 * h ≥ 0: R = 34′·cot(h + 7.31 / (h + 4.4)) / 34.478; h < 0: R = 34′ + |h|·0.36/1.76, as the dip at sunrise has it
 *
 * @param apparentAltitudeDeg h as seen, degrees, −90 to 90
 * @returns degrees
 * @example standardRefractionDeg(0) // 0.566667
 * @source Bennett (1982); the normalisation and the branch below 0 are modelling choices that make sunrise agree
 */
export function standardRefractionDeg(apparentAltitudeDeg: number): number {
  const h = apparentAltitudeDeg;
  if (h < 0) return HORIZON_ARCMIN / 60 - h * BELOW_LEVEL_SHARE;
  return ((bennettArcmin(h) / BENNETT_AT_HORIZON_ARCMIN) * HORIZON_ARCMIN) / 60;
}

function inRange(altitudeDeg: number): number {
  if (!(altitudeDeg >= -1 && altitudeDeg <= 90)) {
    throw new RangeError(`an altitude of −1 to 90 degrees, not ${altitudeDeg}`);
  }
  return altitudeDeg;
}

/** Both formulas pass 90° just below the zenith, where refraction is zero. */
function cotangent(angleDeg: number): number {
  return angleDeg >= 90 ? 0 : 1 / Math.tan(angleDeg * RADIANS_PER_DEGREE);
}
