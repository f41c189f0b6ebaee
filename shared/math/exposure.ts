import { ANY, inDomain, SMALLEST } from './domain';

/** Reflected-light meter constant in cd·s·ISO/m², usual value; ISO 2720:1974 recommends 10.6 to 13.4. */
const REFLECTED_K = 12.5;
/** Incident-light meter constant in lx·s·ISO for a flat receptor, usual value; ISO 2720:1974: 240 to 400. */
export const INCIDENT_C = 250;

/** Stops in either direction beyond which no light or setting lies; keeps powers of two finite. */
const MOST_STOPS = 1000;

const positive = (what: string, value: number) => inDomain(what, value, SMALLEST, ANY);
const inStops = (what: string, value: number) => inDomain(what, value, -MOST_STOPS, MOST_STOPS);

/**
 * Exposure value of the settings: Ev = log2(N²/t).
 * @param aperture N, f-number > 0
 * @param shutterS t, seconds > 0
 * @returns stops; f/8 at 1/128 s gives 13. Throws RangeError outside the domain, as all functions here do.
 *   Source: APEX (ASA PH2.5-1960) as given in an encyclopaedia.
 */
export function exposureValue(aperture: number, shutterS: number): number {
  return 2 * Math.log2(positive('aperture', aperture)) - Math.log2(positive('shutter', shutterS));
}

/**
 * Scene exposure value at ISO 100 that these settings render as a middle tone:
 * EV100 = log2(N²/t) − log2(S/100) + nd.
 * @param aperture N, f-number > 0
 * @param shutterS t, seconds > 0
 * @param iso S, arithmetic speed > 0
 * @param ndStops neutral density in front of the lens, stops that take light away, usually ≥ 0
 * @returns stops; f/8, 1/128 s, ISO 100, no filter: 13. Source: APEX; the filter term is a derivation.
 */
export function sceneEv100(aperture: number, shutterS: number, iso: number, ndStops = 0): number {
  return (
    exposureValue(aperture, shutterS) - Math.log2(positive('iso', iso) / 100) + inStops('ndStops', ndStops)
  );
}

/**
 * Luminance of a scene: L = 2^EV100·K/100.
 * @param ev100 stops, −1,000 to 1,000
 * @param k reflected-light constant K, > 0
 * @returns cd/m²; EV100 0 with K 12.5 is 0.125 cd/m². Source: ISO 2720:1974 as quoted by the
 *   colour-science project, L = 2^EV·K/S.
 */
export function luminanceOfEv100(ev100: number, k: number = REFLECTED_K): number {
  return (2 ** inStops('ev100', ev100) * positive('K', k)) / 100;
}

/** Inverse of `luminanceOfEv100`: EV100 = log2(100·L/K), L in cd/m² > 0. 0.125 cd/m² with K 12.5 gives 0. */
export function ev100OfLuminance(luminanceCdM2: number, k: number = REFLECTED_K): number {
  return Math.log2((100 * positive('luminance', luminanceCdM2)) / positive('K', k));
}

/**
 * Illuminance on a scene: E = 2^EV100·C/100.
 * @param ev100 stops, −1,000 to 1,000
 * @param c incident-light constant C, > 0
 * @returns lx; EV100 0 with C 250 is 2.5 lx. Source: as for `luminanceOfEv100`.
 */
export function illuminanceOfEv100(ev100: number, c: number = INCIDENT_C): number {
  return (2 ** inStops('ev100', ev100) * positive('C', c)) / 100;
}

/** Inverse of `illuminanceOfEv100`: EV100 = log2(100·E/C), E in lx > 0. 2.5 lx with C 250 gives 0. */
export function ev100OfIlluminance(illuminanceLux: number, c: number = INCIDENT_C): number {
  return Math.log2((100 * positive('illuminance', illuminanceLux)) / positive('C', c));
}

/** The additive system: all values in stops. */
export interface Apex {
  readonly av: number;
  readonly tv: number;
  readonly sv: number;
  readonly bv: number;
  readonly ev: number;
}

/**
 * APEX values of the settings: Av = log2 N², Tv = −log2 t, Sv = log2(S/3.125), Ev = Av + Tv, and
 * Bv = Ev − Sv + nd of the scene, so that ISO 100 is Sv 5 and, with K 12.5, Bv = log2(L/4).
 * Parameters as for `sceneEv100`. Example: f/8, 1/128 s, ISO 100: 6, 7, 5, 8, 13.
 * Source: APEX; the speed constant 3.125 as in Exif (GNU Units, "N_exif"); others (4.907, 4.894) circulate.
 */
export function apexOf(aperture: number, shutterS: number, iso: number, ndStops = 0): Apex {
  const av = 2 * Math.log2(positive('aperture', aperture));
  // Taken from 0, since a bare minus would make −0 of one second.
  const tv = 0 - Math.log2(positive('shutter', shutterS));
  const sv = Math.log2(positive('iso', iso) / 3.125);
  return { av, tv, sv, bv: av + tv - sv + inStops('ndStops', ndStops), ev: av + tv };
}

/** What a camera is set to; shutter in seconds, filter in stops that take light away. */
export interface ExactSettings {
  readonly aperture: number;
  readonly shutterS: number;
  readonly iso: number;
  readonly ndStops: number;
}

/** How much brighter each part of `to` makes the picture than `from`, in stops, and the sum. */
export interface ExposureDifference {
  readonly stops: number;
  readonly byApertureStops: number;
  readonly byShutterStops: number;
  readonly byIsoStops: number;
  readonly byNdStops: number;
}

/**
 * Difference of two sets of settings in front of the same light: H·S ∝ t·S/(N²·2^nd).
 * @returns stops, positive when `to` comes out brighter; f/8 to f/5.6 (exact): +1 by aperture. Derivation.
 */
export function exposureDifference(from: ExactSettings, to: ExactSettings): ExposureDifference {
  const ratio = (what: string, over: number, under: number) =>
    Math.log2(positive(what, over) / positive(what, under));
  const byApertureStops = 2 * ratio('aperture', from.aperture, to.aperture);
  const byShutterStops = ratio('shutter', to.shutterS, from.shutterS);
  const byIsoStops = ratio('iso', to.iso, from.iso);
  const byNdStops = inStops('ndStops', from.ndStops) - inStops('ndStops', to.ndStops);
  const stops = byApertureStops + byShutterStops + byIsoStops + byNdStops;
  return { stops, byApertureStops, byShutterStops, byIsoStops, byNdStops };
}

/** The setting that is to be found; the other two are known. */
export type UnknownSetting = 'aperture' | 'shutter' | 'iso';

/**
 * The third setting for a wanted exposure value at ISO 100.
 * @param settingsEv100 stops: the EV100 that the finished settings are to suit (filter already taken off)
 * @param known f-number, seconds and ISO; the unknown one is ignored
 * @returns N = √(2^EV·t·S/100), t = 100·N²/(S·2^EV) s, or S = 100·N²/(t·2^EV).
 *   EV100 15 at 1/128 s, ISO 100: f/16. Derivation from `sceneEv100`.
 */
export function solveSetting(
  unknown: UnknownSetting,
  settingsEv100: number,
  known: { aperture: number; shutterS: number; iso: number },
): number {
  const av = () => 2 * Math.log2(positive('aperture', known.aperture));
  const tv = () => -Math.log2(positive('shutter', known.shutterS));
  const isoStops = () => Math.log2(positive('iso', known.iso) / 100);
  const ev100 = inStops('settingsEv100', settingsEv100);
  if (unknown === 'aperture') return 2 ** ((ev100 - tv() + isoStops()) / 2);
  if (unknown === 'shutter') return 2 ** (av() - ev100 - isoStops());
  return 100 * 2 ** (av() + tv() - ev100);
}
