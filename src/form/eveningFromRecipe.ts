import type { FillRecipeOut } from '../../shared/contract/fillRecipeOut';
import { valueAt, type Body } from './body';

const picked = (from: unknown, names: readonly string[]): Body =>
  Object.fromEntries(
    names.flatMap((name) => {
      const value = valueAt(from, [name]);
      return value === undefined ? [] : [[name, value]];
    }),
  );

/** The key of a recipe as the ladder takes it, where it stands in the recipe. */
function keyOf(body: Body, { flashes }: FillRecipeOut): Body | null {
  const used = flashes.find(({ role }) => role === 'key');
  const asked: unknown = valueAt(body, ['flashes']);
  const guns = Array.isArray(asked) ? (asked as unknown[]) : [];
  const gun = guns.find((flash) => valueAt(flash, ['name']) === used?.name);
  if (!used || !gun) return null;
  const syncSpeed = valueAt(body, ['camera', 'syncSpeed']);
  return {
    ...picked(gun, ['guideNumberM', 'lossStops', 'minPower', 'powerStep']),
    distanceM: Number(used.distanceM.toFixed(2)),
    ...(syncSpeed !== undefined && { syncSpeed }),
  };
}

/** How far the subject's own ambient light lies under the background's, both as the recipe renders them. */
const belowOf = ({ outcome }: FillRecipeOut) =>
  Number((outcome.backgroundStops - outcome.subjectAmbientStops).toFixed(3));

/**
 * The evening that goes on from a recipe: its picture is the first test frame, its settings are held, the camera's
 * limits hold, and its key keeps the subject at the aim.
 */
export function eveningFromRecipe(body: Body, recipe: FillRecipeOut): Body {
  const { aperture, shutter, iso, ndStops } = recipe.settings;
  const filter = ndStops > 0 ? { ndStops } : {};
  const held = { aperture: aperture.mark, iso: Number(iso.mark), ...filter };
  const flash = keyOf(body, recipe);
  return {
    testFrame: {
      ...held,
      shutter: shutter.mark,
      offsetStops: Number(recipe.outcome.backgroundStops.toFixed(3)),
    },
    aim: picked(valueAt(body, ['aim']), ['backgroundStops', 'subjectStops']),
    hold: held,
    limits: picked(valueAt(body, ['camera']), ['shutterSlowest', 'isoMax', 'apertureMin']),
    ...picked(body, ['scale', 'readAs']),
    ...(flash && { flash, subjectBelowBackgroundStops: belowOf(recipe) }),
  };
}
