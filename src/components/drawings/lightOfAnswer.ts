import { lightEv100, type LightIn } from '../../../shared/contract/light';
import type { SettingOut } from '../../../shared/contract/settingOut';
import { sceneEv100 } from '../../../shared/math/exposure';
import { sceneMiddleEv100, type SceneCode } from '../../../shared/math/scenes';

/** The light in question, and the light that the settings render as a middle tone where there are settings. */
export interface LightOnScale {
  readonly ev100: number;
  readonly middleEv100?: number;
}

interface Settings {
  readonly aperture: SettingOut;
  readonly shutter: SettingOut;
  readonly iso: SettingOut;
}

/** Light as a question says it: by a meter, or by a scene of the list. */
function lightAsked(input: Partial<LightIn> & { scene?: SceneCode }): number {
  if (input.scene) return sceneMiddleEv100(input.scene);
  return lightEv100({ reflectedK: 12.5, incidentC: 250, ...input });
}

/** Reads the light off an answer that gives it, else off the question. */
export function lightOfAnswer(input: unknown, result: unknown): LightOnScale | null {
  if (typeof result !== 'object' || result === null || typeof input !== 'object' || input === null)
    return null;
  const answer = result as { ev100?: number; settings?: Settings } & Partial<Settings>;
  const settings = answer.settings ?? answer;
  const ev100 = answer.ev100 ?? lightAsked(input);
  const { aperture, shutter, iso } = settings;
  if (!aperture || !shutter || !iso) return { ev100 };
  const { ndStops = 0 } = input as { ndStops?: number };
  return { ev100, middleEv100: sceneEv100(aperture.exact, shutter.exact, iso.exact, ndStops) };
}
