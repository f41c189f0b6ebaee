import { z } from 'zod';
import { SCENE_CODES, type SceneCode } from '../math/scenes';

/** A code of the scene list. */
export const sceneIn = () =>
  z.enum(SCENE_CODES as [SceneCode, ...SceneCode[]]).meta({
    title: 'Scene',
    description: 'a code of the scene list (light/scenes); the middle of its range is used',
  });
