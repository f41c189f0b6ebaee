import { z } from 'zod';
import { note } from '../../contract/answer';
import { defineCalculator } from '../../contract/defineCalculator';
import { SCENE_CODES, SCENE_GROUPS, SCENE_SOURCE, SCENES, type SceneCode } from '../../math/scenes';

export const lightScenes = defineCalculator({
  id: 'light/scenes',
  title: 'Scenes and their light',
  summary: 'Usual camera settings for kinds of scene, as EV at ISO 100, by day, at sunset and after dark.',
  units: 1,
  input: z.strictObject({
    group: z
      .enum(SCENE_GROUPS)
      .optional()
      .meta({ title: 'Group', description: 'one group of scenes; all of them where left out' }),
  }),
  output: z.strictObject({
    scenes: z
      .array(
        z.strictObject({
          code: z.enum(SCENE_CODES as [SceneCode, ...SceneCode[]]).meta({ title: 'Code' }),
          group: z.enum(SCENE_GROUPS).meta({ title: 'Group' }),
          title: z.string().meta({ title: 'Scene' }),
          ev100Low: z.number().meta({ title: 'EV at ISO 100, from', unit: 'stops' }),
          ev100High: z.number().meta({ title: 'EV at ISO 100, to', unit: 'stops' }),
          source: z.string().meta({ title: 'Source' }),
        }),
      )
      .meta({ title: 'Scenes' }),
  }),
  sources: [SCENE_SOURCE],
  examples: [
    {
      title: 'The sky around sunset: it loses some three stops within minutes',
      input: { group: 'sky_at_sunset' },
      output: {
        scenes: [
          {
            code: 'sky_before_sunset',
            group: 'sky_at_sunset',
            title: 'Sky or skyline in the last minutes of sun',
            ev100Low: 12,
            ev100High: 14,
            source: SCENE_SOURCE,
          },
          {
            code: 'sky_at_sunset',
            group: 'sky_at_sunset',
            title: 'Sky or skyline as the sun goes down',
            ev100Low: 12,
            ev100High: 12,
            source: SCENE_SOURCE,
          },
          {
            code: 'sky_after_sunset',
            group: 'sky_at_sunset',
            title: 'Sky or skyline in the first minutes after',
            ev100Low: 9,
            ev100High: 11,
            source: SCENE_SOURCE,
          },
        ],
      },
    },
  ],
  compute({ group }) {
    const chosen = SCENES.filter((scene) => group === undefined || scene.group === group);
    const notes = [note('scenes_are_settings')];
    if (group === undefined || group === 'day') notes.push(note('scenes_in_direct_sun'));
    return { result: { scenes: chosen.map((scene) => ({ ...scene, source: SCENE_SOURCE })) }, notes };
  },
});
