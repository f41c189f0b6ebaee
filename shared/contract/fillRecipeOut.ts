import { z } from 'zod';
import type { FillCamera, FillRecipe } from '../math/fill/fillTypes';
import { powerLabel } from '../math/fill/powerSteps';
import { tradeOffs } from '../math/fill/tradeOffs';
import { fillTrades } from '../text';
import { fillOutcomeOut, shapeOutcome } from './fillOutcomeOut';
import { chosenMark, settingOut } from './settingOut';
import { settingsOut } from './settings';

const flashOut = z.strictObject({
  name: z.string().meta({ title: 'Flash' }),
  role: z.enum(['key', 'fill', 'rim']).meta({ title: 'Role' }),
  power: settingOut('Flash power'),
  distanceM: z.number().meta({ title: 'Flash to subject', unit: 'm' }),
  onSubjectStops: z
    .number()
    .meta({ title: 'On the subject', unit: 'stops', description: 'this flash alone' }),
});

const whyOut = z.strictObject({
  code: z.string().meta({ description: 'stable, for programs' }),
  stops: z.number().nullable().meta({ title: 'Amount', unit: 'stops', description: 'null without one' }),
  message: z.string().meta({ description: 'a sentence, for people' }),
});

/** One way to take the picture. */
export const fillRecipeOut = z.strictObject({
  settings: settingsOut().meta({ title: 'Settings' }),
  sync: z.enum(['normal', 'highSpeed', 'none']).meta({ title: 'Sync' }),
  flashes: z.array(flashOut).meta({ title: 'Flashes', description: 'those in use' }),
  outcome: fillOutcomeOut.meta({ title: 'Outcome', description: 'of these very settings' }),
  why: z.array(whyOut).meta({ title: 'Why', description: 'what the recipe gains and what it costs' }),
  score: z.number().meta({
    title: 'Score',
    description:
      'less is better: 1,000 for each 1/120 stop of the largest miss, and below that 10 a stop of what is preferred, 4 a stop over the hand-held limit, 3 a level of ghost, 1 a stop of ISO over the lowest, 0.5 each for a filter and for high-speed sync, up to 1 for a flash with less than a stop in reserve, up to 3 for recycling',
  }),
});

export type FillRecipeOut = z.output<typeof fillRecipeOut>;

/** A recipe in the answer's shape. */
export function shapeRecipe(recipe: FillRecipe, camera: FillCamera, first: FillRecipe): FillRecipeOut {
  const { aperture, shutter, iso, ndStops, sync, flashes, outcome, score } = recipe;
  return {
    settings: {
      aperture: chosenMark(aperture),
      shutter: chosenMark(shutter),
      iso: chosenMark(iso),
      ndStops,
    },
    sync,
    flashes: flashes.map(({ flash, power, distanceM }, i) => ({
      name: flash.name,
      role: flash.role,
      power: chosenMark({ label: powerLabel(power), exact: power }),
      distanceM,
      onSubjectStops: outcome.onSubjectStops[i] ?? 0,
    })),
    outcome: shapeOutcome(outcome, camera.scale),
    why: tradeOffs(recipe, camera, first).map(({ code, stops }) => ({
      code,
      stops,
      message: fillTrades[code](stops ?? 0),
    })),
    score,
  };
}
