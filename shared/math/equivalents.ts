import { ANY, inDomain, SMALLEST } from './domain';
import { exactAt, markAt, nearestMark, positionOf, stepsPerStop, type Mark, type Scale } from './marks';
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

/** The setting that every row shares: its kind and the position of its mark. */
export interface KeptSetting {
  readonly kind: 'aperture' | 'shutter' | 'iso';
  readonly position: number;
}

/**
 * Position of an exposure on a scale: Av + Tv − log2(S/100) in steps, whole when the settings are on marks.
 * @param ev100 stops, without any filter. Example: EV100 13 in thirds is 39.
 */
export function exposurePosition(ev100: number, scale: Scale): number {
  return ev100 * stepsPerStop(scale);
}

/**
 * The position nearest to an exposure that marks can give: whole steps, counted from a kept setting, whose own
 * position is not whole where it is a time of whole seconds beyond the slowest marking.
 * Example: exposure 38.6 with nothing kept is 39. Derivation: positions add.
 */
export function reachablePosition(exposure: number, keep: KeptSetting | null): number {
  const from = keep?.position ?? 0;
  return from + Math.round(exposure - from);
}

/** The mark of a time at a position, if there is one. */
function timeAt(scale: Scale, position: number, keep: KeptSetting | null): Mark | null {
  if (keep?.kind === 'shutter') {
    if (Math.abs(position - keep.position) > EDGE) return null;
    return nearestMark('shutter', scale, exactAt('shutter', scale, position));
  }
  return isSettable(scale, position) ? markAt('shutter', scale, position) : null;
}

/**
 * All combinations on marks that give one exposure, in order of aperture, then speed.
 * Positions add: a − s + t = e, so a reachable e leaves every row exactly equal in exposure.
 * @param exposure steps, from `reachablePosition`
 * @param limits what may be used
 * @param keep the setting that stays at its mark, if any
 * @returns rows; empty when the limits leave none. Example: EV 15 at ISO 100 kept, f/8 to f/16 in full
 *   stops: f/8 1/500, f/11 1/250, f/16 1/125. Throws RangeError when a limit is not over 0 or not finite.
 *   Derivation from the additive system (APEX).
 */
export function equivalentRows(
  exposure: number,
  scale: Scale,
  limits: SettingLimits,
  keep: KeptSetting | null,
): EquivalentRow[] {
  for (const [name, limit] of Object.entries<number>({ ...limits })) inDomain(name, limit, SMALLEST, ANY);
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
      if (t > fastest || t < slowest) continue;
      const shutter = timeAt(scale, t, keep);
      if (shutter)
        rows.push({ aperture: markAt('aperture', scale, a), shutter, iso: markAt('iso', scale, s) });
    }
  }
  return rows;
}
