import { z } from 'zod';
import { rolesWithTooManyWays } from '../math/fill/countWays';
import { isFasterThanSync } from '../math/highSpeedSync';
import { contradictionAt, type FoundContradiction } from './contradictionAt';
import { exactlyOne } from './exactlyOne';
import { fillWish } from './fillExact';
import {
  cameraIn,
  flashFields,
  looseCameraIn,
  MOST_FLASHES,
  motionFields,
  powerRangeFields,
  preferIn,
  sceneFields,
} from './fillFields';
import { flashPowerIn } from './flashIn';
import { curtainFaults } from './highSpeedSyncIn';
import { placeFaults, placeIn, spanFields } from './placeIn';
import { distanceM, integer } from './quantities';
import { exactOf, readingFields, settingsIn, type Reading } from './settings';
import type { SettingIn } from './settingIn';
import { together } from './together';

const movableFlash = () => {
  const fields = z.strictObject({
    ...flashFields,
    ...powerRangeFields,
    distanceM: placeIn().optional(),
    ...spanFields,
  });
  return together<typeof fields>('minM', 'maxM')(exactlyOne('distanceM', 'minM')(fields));
};

const setFlash = () =>
  z.strictObject({
    ...flashFields,
    minPower: powerRangeFields.minPower.optional(),
    powerStep: powerRangeFields.powerStep,
    power: flashPowerIn(),
    distanceM: distanceM({ title: 'Flash to subject' }),
  });

const recipesFields = z.strictObject({
  ...sceneFields,
  camera: cameraIn(),
  flashes: z
    .array(movableFlash())
    .max(MOST_FLASHES)
    .meta({ title: 'Flashes', description: 'any of them may be left out of a recipe' }),
  ...motionFields,
  prefer: preferIn(),
  count: integer({ title: 'Recipes', min: 1, max: 10 }).default(5),
  ...readingFields,
});
export type FillRecipesIn = z.output<typeof recipesFields>;

const checkFields = z.strictObject({
  ...sceneFields,
  camera: looseCameraIn(),
  settings: settingsIn().meta({ title: 'Settings' }),
  sync: z
    .enum(['normal', 'highSpeed', 'none'])
    .meta({ title: 'Sync', description: 'how the flashes are fired; none goes without flashes' }),
  flashes: z.array(setFlash()).max(MOST_FLASHES).meta({ title: 'Flashes' }),
  ...motionFields,
  ...readingFields,
});
export type FillCheckIn = z.output<typeof checkFields>;

const LIMIT_PAIRS = [
  ['aperture', 'apertureMin', 'apertureMax'],
  ['shutter', 'shutterFastest', 'shutterSlowest'],
  ['iso', 'isoMin', 'isoMax'],
] as const;

type Camera = Partial<Record<(typeof LIMIT_PAIRS)[number][1 | 2], SettingIn>> & {
  readonly syncSpeed: SettingIn;
  readonly highSpeedSync?: { readonly curtainS?: number };
};

interface Given extends Reading {
  readonly camera: Camera;
}

function cameraFaults({ camera, ...reading }: Given): FoundContradiction[] {
  const crossed = LIMIT_PAIRS.flatMap(([kind, low, high]) => {
    const [from, to] = [camera[low], camera[high]];
    if (from === undefined || to === undefined) return [];
    if (exactOf(kind, from, reading) <= exactOf(kind, to, reading)) return [];
    return [{ code: 'limits_crossed' as const, path: ['camera', high], params: { low, high, from, to } }];
  });
  const path = ['camera', 'highSpeedSync', 'curtainS'];
  return [...crossed, ...curtainFaults(camera.highSpeedSync, camera.syncSpeed, reading, path)];
}

interface Flash {
  readonly name: string;
}

function namesTwice(flashes: readonly Flash[]): FoundContradiction[] {
  return flashes.flatMap(({ name }, i) =>
    flashes.findIndex((other) => other.name === name) < i
      ? [{ code: 'name_twice' as const, path: ['flashes', i, 'name'], params: { name } }]
      : [],
  );
}

function focusFaults(view?: { distanceM: number; focalLengthMm: number }): FoundContradiction[] {
  if (view === undefined || view.distanceM * 1000 > view.focalLengthMm) return [];
  return [{ code: 'focus_inside_lens', path: ['view', 'distanceM'], params: { ...view } }];
}

/** Sync and shutter that don't go together. */
function syncFaults(given: FillCheckIn): FoundContradiction[] {
  const { sync, flashes, camera } = given;
  const shutterS = exactOf('shutter', given.settings.shutter, given);
  const syncSpeedS = exactOf('shutter', camera.syncSpeed, given);
  const isFaster = isFasterThanSync(shutterS, syncSpeedS);
  const params = { shutterS, syncSpeedS };
  if (sync === 'none')
    return flashes.length > 0 ? [{ code: 'flashes_without_sync', path: ['flashes'], params: {} }] : [];
  if (sync === 'normal')
    return isFaster ? [{ code: 'shutter_too_fast_for_sync', path: ['sync'], params }] : [];
  if (camera.highSpeedSync === undefined)
    return [{ code: 'high_speed_sync_missing', path: ['camera', 'highSpeedSync'], params }];
  return isFaster ? [] : [{ code: 'high_speed_sync_for_faster', path: ['sync'], params }];
}

/** Flashes of one role that together can be set in more ways than are gone through. */
function wayFaults(given: FillRecipesIn): FoundContradiction[] {
  return rolesWithTooManyWays(fillWish(given)).map((params) => ({
    code: 'too_many_power_settings' as const,
    path: ['flashes'],
    params: { ...params },
  }));
}

/** Light, aim, camera and flashes, for which recipes are wanted. */
export const fillRecipesIn = contradictionAt<typeof recipesFields>((given) => [
  ...cameraFaults(given),
  ...namesTwice(given.flashes),
  ...given.flashes.flatMap((flash, i) => placeFaults(flash, ['flashes', i])),
  ...focusFaults(given.view),
  ...wayFaults(given),
])(recipesFields);

/** The same with settings, which are to be worked out forward. */
export const fillCheckIn = contradictionAt<typeof checkFields>((given) => [
  ...cameraFaults(given),
  ...namesTwice(given.flashes),
  ...syncFaults(given),
  ...focusFaults(given.view),
])(checkFields);
