import { bracketRoot } from '../bracketRoot';
import type { NaturalLight } from './naturalLight';
import { areLampsOn, combinedEv100, type SceneModel } from './sceneModel';

/** A stretch of time without a switch of the lamps, and the scene's light at even steps through it. */
export interface LightStretch {
  readonly fromMs: number;
  readonly toMs: number;
  /** Lamps lit throughout, or out. */
  readonly floorEv100: number | null;
  readonly samples: readonly { readonly atMs: number; readonly ev100: number }[];
}

/** The sun moves the light by 0.4 stop a minute at most. */
const STEP_MS = 60_000;

/** Instants are found to this. */
const ROOT_MS = 1;

/**
 * The scene's light over a span, cut where the lamps are switched.
 *
 * @param light sky and moon
 * @param model offset and lamps
 * @param fromMs start, milliseconds since 1970 (UTC)
 * @param toMs end, after the start
 * @returns stretches in order, without gaps, sampled every minute
 * @example lightTable(light, model, fromMs, toMs)[0]?.samples.length // the minutes of the first stretch, and one
 * @source derivation
 */
export function lightTable(
  light: NaturalLight,
  model: SceneModel,
  fromMs: number,
  toMs: number,
): LightStretch[] {
  const switches = [model.lamps?.onMs, model.lamps?.offMs].filter(
    (atMs): atMs is number => atMs !== undefined && atMs > fromMs && atMs < toMs,
  );
  const cuts = [fromMs, ...switches.sort((a, b) => a - b), toMs];
  return cuts.slice(1).map((endMs, index) => {
    const startMs = cuts[index] ?? fromMs;
    const floorEv100 = areLampsOn(model.lamps, startMs) ? model.floorEv100 : null;
    const count = Math.max(1, Math.ceil((endMs - startMs) / STEP_MS));
    const samples = Array.from({ length: count + 1 }, (_, step) => {
      const atMs = startMs + ((endMs - startMs) * step) / count;
      return { atMs, ev100: combinedEv100(light.ev100At(atMs), model.offsetStops, floorEv100) };
    });
    return { fromMs: startMs, toMs: endMs, floorEv100, samples };
  });
}

/**
 * The instants at which a stretch's light passes a brightness, between two of its samples.
 *
 * @param light sky and moon
 * @param model offset and lamps
 * @param stretch the stretch
 * @param step index of the earlier sample
 * @param ev100 the brightness
 * @returns milliseconds since 1970; null where the two samples lie on the same side
 * @example whenPassing(light, model, stretch, 0, 5)
 * @source derivation
 */
export function whenPassing(
  light: NaturalLight,
  model: SceneModel,
  stretch: LightStretch,
  step: number,
  ev100: number,
): number | null {
  const before = stretch.samples[step];
  const after = stretch.samples[step + 1];
  if (!before || !after || before.ev100 > ev100 === after.ev100 > ev100) return null;
  const over = (atMs: number): number =>
    combinedEv100(light.ev100At(atMs), model.offsetStops, stretch.floorEv100) - ev100;
  return bracketRoot(over, before.atMs, after.atMs, ROOT_MS);
}
