import { exactAt, markAt, positionOf, stepsPerStop, type Mark, type Scale } from './marks';
import { SLOWEST_MARKED_S } from './markTables';

/** What the gear offers: f-numbers, seconds, ISO speeds; all > 0. */
export interface SettingLimits {
  readonly apertureMin: number;
  readonly apertureMax: number;
  readonly shutterFastestS: number;
  readonly shutterSlowestS: number;
  readonly isoMin: number;
  readonly isoMax: number;
}

export interface EquivalentRow {
  readonly aperture: Mark;
  readonly shutter: Mark;
  readonly iso: Mark;
}

/** Allows a limit that stands on a mark to count as reached in spite of rounding. */
const EDGE = 1e-9;

function positionsWithin(kind: 'aperture' | 'iso', scale: Scale, low: number, high: number): number[] {
  const first = Math.ceil(positionOf(kind, scale, low) - EDGE);
  const last = Math.floor(positionOf(kind, scale, high) + EDGE);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => first + i);
}

/** Slower than the slowest marking only whole seconds can be set, so only those count. */
function isSettable(scale: Scale, position: number): boolean {
  const exact = exactAt('shutter', scale, position);
  return exact <= SLOWEST_MARKED_S || Number.isInteger(exact);
}

/**
 * Position of an exposure on a scale: Av + Tv − log2(S/100) in steps, whole when the settings are on marks.
 * @param ev100 stops, without any filter. Example: EV100 13 in thirds is 39.
 */
export function exposurePosition(ev100: number, scale: Scale): number {
  return ev100 * stepsPerStop(scale);
}

/**
 * All combinations on marks that give one exposure, in order of aperture, then speed.
 * Positions add: a − s + t = e, so a whole e leaves every row exactly equal in exposure.
 * @param exposure whole steps, from `exposurePosition` rounded
 * @param limits what may be used
 * @param keep a kind that stays at its mark, with that mark's position
 * @returns rows; empty when the limits leave none. Example: EV 15 at ISO 100 kept, f/8 to f/16 in full
 *   stops: f/8 1/500, f/11 1/250, f/16 1/125. Derivation from the additive system (APEX).
 */
export function equivalentRows(
  exposure: number,
  scale: Scale,
  limits: SettingLimits,
  keep: { kind: 'aperture' | 'shutter' | 'iso'; position: number } | null,
): EquivalentRow[] {
  const apertures = positionsWithin('aperture', scale, limits.apertureMin, limits.apertureMax);
  const isos = positionsWithin('iso', scale, limits.isoMin, limits.isoMax);
  const fastest = positionOf('shutter', scale, limits.shutterFastestS) + EDGE;
  const slowest = positionOf('shutter', scale, limits.shutterSlowestS) - EDGE;
  const rows: EquivalentRow[] = [];
  for (const a of apertures) {
    if (keep?.kind === 'aperture' && a !== keep.position) continue;
    for (const s of isos) {
      if (keep?.kind === 'iso' && s !== keep.position) continue;
      const t = exposure - a + s;
      if (t > fastest || t < slowest || !isSettable(scale, t)) continue;
      if (keep?.kind === 'shutter' && t !== keep.position) continue;
      rows.push({
        aperture: markAt('aperture', scale, a),
        shutter: markAt('shutter', scale, t),
        iso: markAt('iso', scale, s),
      });
    }
  }
  return rows;
}
