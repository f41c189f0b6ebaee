import { SCENE_GROUPS, SCENES, sceneMiddleEv100, type SceneCode } from '../../../shared/math/scenes';
import { withValueAt, type Body } from '../../form/body';
import { choiceTitle } from '../../text/choiceTitle';

/** How the light of the background is told. */
export type BackgroundWay = 'ev' | 'frame' | 'scene';

export const BACKGROUND_WAYS: readonly { readonly value: BackgroundWay; readonly title: string }[] = [
  { value: 'frame', title: 'Test frame' },
  { value: 'ev', title: 'EV' },
  { value: 'scene', title: 'Scene' },
];

/** A scene as it stands in the list, with its light. */
export interface SceneChoice {
  readonly code: SceneCode;
  readonly title: string;
}

/** The scene list by groups. */
export const SCENE_CHOICES: readonly { readonly title: string; readonly scenes: readonly SceneChoice[] }[] =
  SCENE_GROUPS.map((group) => ({
    title: choiceTitle(group),
    scenes: SCENES.filter((scene) => scene.group === group).map(({ code, title }) => ({ code, title })),
  }));

/** Settings of a first frame, where nothing was typed yet. */
const FIRST_FRAME = { aperture: 'f/4', shutter: '1/60', iso: 400, offsetStops: 0 };

/** The request with the background's light told another way; the light itself stays where it can. */
export function withBackgroundWay(body: Body, way: BackgroundWay, knownEv100: number | null): Body {
  if (way === 'frame') return withValueAt(body, ['background'], { testFrame: FIRST_FRAME });
  return withValueAt(body, ['background'], { ev100: Number((knownEv100 ?? 8).toFixed(2)) });
}

/** The request with the light in the middle of a scene's range. */
export const withScene = (body: Body, code: SceneCode): Body =>
  withValueAt(body, ['background'], { ev100: sceneMiddleEv100(code) });

/** The scene whose middle this light is, if there is one. */
export const sceneOfEv100 = (ev100: unknown): SceneCode | null =>
  SCENES.find(({ code }) => sceneMiddleEv100(code) === ev100)?.code ?? null;
