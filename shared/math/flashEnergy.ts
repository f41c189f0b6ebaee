import { ANY, inDomain, SMALLEST } from './domain';
import { INCIDENT_C } from './exposure';
import { GUIDE_NUMBER_ISO } from './guideNumber';

/**
 * From the energy in a flash's capacitors to its guide number. Energy alone does not say it: makers' systems give
 * 15 to 50 lumen seconds for a watt second, a spread of 1.7 stops, before any reflector.
 */

/**
 * Light that a flash gives off, all directions together.
 *
 * Q = η·W
 *
 * @param energyWs W: electrical energy, W·s (J), > 0
 * @param efficacyLmSPerWs η: lumen seconds for each watt second, > 0; 15 to 50 as read for studio systems
 * @returns Q, lm·s
 * @throws RangeError when a value is outside its domain
 * @example lightOutputLmS(400, 40) // 16000
 * @source definition of luminous efficacy; the range from makers' and trade pages
 */
export function lightOutputLmS(energyWs: number, efficacyLmSPerWs: number): number {
  inDomain('energyWs', energyWs, SMALLEST, ANY);
  inDomain('efficacyLmSPerWs', efficacyLmSPerWs, SMALLEST, ANY);
  return energyWs * efficacyLmSPerWs;
}

/**
 * Beam candela seconds on the axis: how much of that light goes where the flash points.
 *
 * B = M·Q / (4·π)
 *
 * @param lightLmS Q: lm·s, > 0
 * @param reflectorFactor M: how many times brighter on the axis than a bare tube that shines alike in all
 *   directions, > 0; measured for real reflectors
 * @returns B, cd·s
 * @throws RangeError when a value is outside its domain
 * @example beamCandelaSeconds(16000, 1) // 1273.2
 * @source derivation: 4·π steradians around a bare tube
 */
export function beamCandelaSeconds(lightLmS: number, reflectorFactor: number): number {
  inDomain('lightLmS', lightLmS, SMALLEST, ANY);
  inDomain('reflectorFactor', reflectorFactor, SMALLEST, ANY);
  return (reflectorFactor * lightLmS) / (4 * Math.PI);
}

/**
 * The reflector factor of a reflector that spreads all light evenly in a cone.
 *
 * M = 2 / (1 − cos(θ)), the whole sphere over the cone's solid angle 2·π·(1 − cos(θ))
 *
 * @param halfAngleDeg θ: from the axis to the edge of the cone, degrees, 0.001 to 180
 * @returns M, dimensionless, 1 or more
 * @throws RangeError when the angle is outside its domain
 * @example coneReflectorFactor(90) // 2: a hemisphere
 * @source derivation
 */
export function coneReflectorFactor(halfAngleDeg: number): number {
  inDomain('halfAngleDeg', halfAngleDeg, 1e-3, 180);
  // 1 - cos(theta) = 2 * sin^2(theta/2) keeps its digits in narrow cones.
  return 1 / Math.sin((halfAngleDeg * Math.PI) / 360) ** 2;
}

/**
 * The guide number of a beam.
 *
 * GN = √(B·S / C), from H = B/d² on the subject and N² = H·S / C
 *
 * @param beamCdS B: beam candela seconds on the axis, cd·s, > 0
 * @param incidentC C: incident-light meter constant, lx·s·ISO, > 0; 250 unless another is wanted
 * @param iso S: arithmetic speed, > 0
 * @returns GN, f-number times metres at that speed
 * @throws RangeError when a value is outside its domain
 * @example guideNumberOfBeam(4000) // 40
 * @source derivation; C = 250 after ISO 2720:1974. The feet formula √(0.05·B·S) that is often printed
 *   presumes C = 215 (0.21 stop more)
 */
export function guideNumberOfBeam(beamCdS: number, incidentC = INCIDENT_C, iso = GUIDE_NUMBER_ISO): number {
  inDomain('beamCdS', beamCdS, SMALLEST, ANY);
  inDomain('incidentC', incidentC, SMALLEST, ANY);
  inDomain('iso', iso, SMALLEST, ANY);
  return Math.sqrt((beamCdS * iso) / incidentC);
}

/**
 * The beam behind a guide number. The other way round of {@link guideNumberOfBeam}: B = C·GN² / S.
 *
 * @param guideNumberM GN: f-number times metres, ≥ 0
 * @param incidentC C: lx·s·ISO, > 0
 * @param iso S: the speed that GN is stated for, > 0
 * @returns B, cd·s
 * @throws RangeError when a value is outside its domain
 * @example beamOfGuideNumber(58) // 8410
 * @source derivation
 */
export function beamOfGuideNumber(
  guideNumberM: number,
  incidentC = INCIDENT_C,
  iso = GUIDE_NUMBER_ISO,
): number {
  inDomain('guideNumberM', guideNumberM, 0, ANY);
  inDomain('incidentC', incidentC, SMALLEST, ANY);
  inDomain('iso', iso, SMALLEST, ANY);
  return (incidentC * guideNumberM ** 2) / iso;
}

/** A flash described by its energy. */
export interface FlashEnergy {
  /** W: W·s, > 0 */
  readonly energyWs: number;
  /** η: lm·s per W·s, > 0 */
  readonly efficacyLmSPerWs: number;
  /** M: dimensionless, > 0; 1 for a bare tube */
  readonly reflectorFactor: number;
  /** C: lx·s·ISO, > 0; 250 by default */
  readonly incidentC?: number;
}

/**
 * The guide number of a flash from its energy: {@link lightOutputLmS}, {@link beamCandelaSeconds} and
 * {@link guideNumberOfBeam} one after the other.
 *
 * GN = √(M·η·W·100 / (4·π·C))
 *
 * @param flash W, η, M and C
 * @returns GN, f-number times metres at ISO 100 and full power
 * @throws RangeError when a value is outside its domain
 * @example guideNumberOfEnergy({ energyWs: 400, efficacyLmSPerWs: 40, reflectorFactor: 1 }) // 22.57
 * @source derivation
 */
export function guideNumberOfEnergy(flash: FlashEnergy): number {
  const lightLmS = lightOutputLmS(flash.energyWs, flash.efficacyLmSPerWs);
  return guideNumberOfBeam(beamCandelaSeconds(lightLmS, flash.reflectorFactor), flash.incidentC);
}
