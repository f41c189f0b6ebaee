import { slopeOfQuartic, valueOfQuartic } from './quartic';
import { hourAngleRad } from './sunCurve';
import type { SunFit } from './sunFit';
import type { SunSite } from './sunSite';

/** Within 8 km of a pole the season outruns the day and the sun may not turn at all. */
const STEEPEST = 0.9;

/** Where the sine stays under this, one step is enough: it leaves 1e-5″ of altitude. */
const SHALLOW = 0.01;

/** Close enough that the altitude there is the turning altitude to 1e-12. */
const STEP_DAYS = 1e-6;

/**
 * The instant of the highest or lowest altitude beside a transit.
 *
 * (sin h)′ = 0: sin H = ±x, x = (sin δ)′·(sin φ − cos φ·tan δ·cos H) / (cos φ·cos δ·H′). The declination's drift puts
 * it seconds from the transit in middle latitudes, many minutes near a pole.
 *
 * @param fit polynomials of a day
 * @param site the place
 * @param transitU the transit, days since the fit's noon
 * @param isUpper whether the transit is the upper one
 * @returns days since the fit's noon; null within some 8 km of a pole, where there may be none
 * @example turningBeside(fit, siteOf({ latitude: 60, longitude: 0 }), 0, true) // 26 s after noon at the March equinox
 * @source derivation
 */
export function turningBeside(fit: SunFit, site: SunSite, transitU: number, isUpper: boolean): number | null {
  let u = transitU;
  for (let step = 0; step < 12; step += 1) {
    const sinDec = valueOfQuartic(fit.sinDeclination, u);
    const cosDec = Math.sqrt(1 - sinDec * sinDec);
    const drift = slopeOfQuartic(fit.sinDeclination, u);
    const hourSlope = 2 * Math.PI + slopeOfQuartic(fit.hourAngleRad, u);
    const tilt =
      site.sinLatitude - (site.cosLatitude * sinDec * Math.cos(hourAngleRad(fit, site, u))) / cosDec;
    const sine = (drift * tilt) / (site.cosLatitude * cosDec * hourSlope);
    if (!(Math.abs(sine) < STEEPEST)) return null;
    const next = transitU + (isUpper ? Math.asin(sine) : -Math.asin(sine)) / hourSlope;
    if (Math.abs(sine) < SHALLOW || Math.abs(next - u) < STEP_DAYS) return next;
    u = next;
  }
  return u;
}
