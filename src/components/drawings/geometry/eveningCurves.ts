import { ev100OfIlluminance } from '../../../../shared/math/exposure';
import { combinedEv100 } from '../../../../shared/math/ladder/sceneModel';
import { naturalLight } from '../../../../shared/math/ladder/naturalLight';
import { skyLight } from '../../../../shared/math/skyLight';
import { sunPosition } from '../../../../shared/math/sunPosition';
import type { Place } from '../../../../shared/math/sunSite';
import type { LadderAnswer, Rung } from '../../../text/eveningAnswers';
import { pointsOf, type PlotPoint, type PlotTick, type Range } from './plotFrame';

const MINUTE_MS = 60_000;
const TICK_MINUTES = [5, 10, 15, 30, 60, 120, 180];
/** By incident light, as the ladder counts it. */
const INCIDENT_C = 250;

/** The sun's altitude over a span of milliseconds since 1970. */
export function sunCurve(place: Place, across: Range): PlotPoint[] {
  return pointsOf((ms) => sunPosition(place, ms).altitudeDeg, across, 144);
}

/** EV100 of level ground under a clear sky over the same span. */
export function skyCurve(place: Place, across: Range): PlotPoint[] {
  const lightAt = (ms: number) => skyLight(sunPosition(place, ms).altitudeDeg).illuminanceLux;
  return pointsOf((ms) => ev100OfIlluminance(lightAt(ms), INCIDENT_C), across, 288);
}

/** When lamps are lit, where the request says so. */
export interface LampSpan {
  readonly onMs: number;
  readonly offMs?: number;
}

/** The scene's EV100 by the ladder's model: sky, moon and lamps. */
export function sceneCurve(
  place: Place,
  model: LadderAnswer['model'],
  lamps: LampSpan | null,
  across: Range,
): PlotPoint[] {
  const light = naturalLight(place, ...across);
  const areLit = (ms: number) => !lamps || (ms >= lamps.onMs && ms < (lamps.offMs ?? Infinity));
  return pointsOf(
    (ms) => combinedEv100(light.ev100At(ms), model.skyOffsetStops, areLit(ms) ? model.lampFloorEv100 : null),
    across,
    240,
  );
}

/** A rung as a tread: the light that its settings render as wished. */
export interface Tread {
  readonly fromMs: number;
  readonly toMs: number;
  readonly ev100: number;
}

/** Rungs as treads on the scale of the scene's light. */
export function treadsOf(rungs: readonly Rung[]): Tread[] {
  return rungs.map(({ at, until, sceneEv100, errorStops }) => ({
    fromMs: Date.parse(at),
    toMs: Date.parse(until),
    ev100: sceneEv100 - errorStops,
  }));
}

/** The steps of a ladder in a drawing's own pixels: along each tread, then straight to the next. */
export function stepPath(
  treads: readonly Tread[],
  place: { readonly x: (value: number) => number; readonly y: (value: number) => number },
): string {
  return treads
    .map(({ fromMs, toMs, ev100 }, i) => {
      const y = place.y(ev100).toFixed(1);
      return `${i === 0 ? 'M' : 'L'}${place.x(fromMs).toFixed(1)} ${y}H${place.x(toMs).toFixed(1)}`;
    })
    .join('');
}

/** Whole stops around what a drawing shows. */
export function stopsRange(values: readonly number[]): Range {
  return [Math.floor(Math.min(...values) - 0.4), Math.ceil(Math.max(...values) + 0.4)];
}

/** Round clock times along a span, as the place's clock shows them; a reading that comes twice stands once. */
export function clockTicks([fromMs, toMs]: Range, read: (ms: number) => string): PlotTick[] {
  const minutes = TICK_MINUTES.find((size) => (toMs - fromMs) / MINUTE_MS / size <= 9) ?? 180;
  // Zones are whole quarters of an hour from UTC, so every round reading lies on such a grid.
  const everyMs = (minutes < 15 ? 5 : 15) * MINUTE_MS;
  const ticks = new Map<string, PlotTick>();
  for (let ms = Math.ceil(fromMs / everyMs) * everyMs; ms <= toMs; ms += everyMs) {
    const label = read(ms);
    const [hour = 0, minute = 0] = label.split(':').map(Number);
    const isRound = (hour * 60 + minute) % minutes === 0;
    if (isRound && !ticks.has(label)) ticks.set(label, { value: ms, label });
  }
  return [...ticks.values()];
}
