import { valueAt, withValueAt, type Body, type Path } from '../../form/body';
import type { FillRecipeOut, LimitOut } from './fillAnswer';

/** What a number in a request is rounded to, so that addresses stay short; finer than any meter. */
const rounded = (value: number) => Number(value.toFixed(4));

type Change = (body: Body, recipe: FillRecipeOut, limit: LimitOut) => Body;

const camera =
  (name: string, valueOf: (recipe: FillRecipeOut) => unknown): Change =>
  (body, recipe) =>
    withValueAt(body, ['camera', name], valueOf(recipe));

const addFilter: Change = (body, { settings }) => {
  const before = valueAt(body, ['camera', 'ndStops']);
  const filters = Array.isArray(before) ? (before as unknown[]) : [];
  return withValueAt(body, ['camera', 'ndStops'], [...filters, rounded(settings.ndStops)]);
};

/** Lets each of these flashes stand where the recipe has it, beside where it could stand already. */
const moveFlashes =
  (roles: readonly string[], isNearer: boolean): Change =>
  (body, recipe) =>
    recipe.flashes
      .filter(({ role }) => roles.includes(role))
      .reduce((changed, { name, distanceM }) => {
        const flashes = (valueAt(changed, ['flashes']) ?? []) as readonly Body[];
        const place = flashes.findIndex((flash) => flash.name === name);
        const path: Path = ['flashes', place];
        // Rounded to the side of more light, or of less, so that the recipe stays within reach.
        const held = (isNearer ? Math.floor : Math.ceil)(distanceM * 1000) / 1000;
        if (valueAt(changed, [...path, 'minM']) === undefined)
          return withValueAt(changed, [...path, 'distanceM'], held);
        return withValueAt(changed, [...path, isNearer ? 'minM' : 'maxM'], held);
      }, body);

/** Takes so many stops of ambient light from the subject. */
const shade: Change = (body, _, { shortByStops }) => {
  const stops = shortByStops ?? 0;
  const ev100 = valueAt(body, ['subjectAmbient', 'ev100']);
  if (typeof ev100 === 'number')
    return withValueAt(body, ['subjectAmbient', 'ev100'], rounded(ev100 - stops));
  const below = Number(valueAt(body, ['subjectAmbient', 'belowBackgroundStops']) ?? 0);
  return withValueAt(body, ['subjectAmbient', 'belowBackgroundStops'], rounded(below + stops));
};

const aim =
  (name: string, valueOf: (recipe: FillRecipeOut) => number | undefined): Change =>
  (body, recipe) => {
    const value = valueOf(recipe);
    return withValueAt(body, ['aim', name], value === undefined ? undefined : rounded(value));
  };

const CHANGES: Readonly<Record<string, Change>> = {
  aperture_min: camera('apertureMin', ({ settings }) => settings.aperture.mark),
  aperture_max: camera('apertureMax', ({ settings }) => settings.aperture.mark),
  iso_min: camera('isoMin', ({ settings }) => Number(settings.iso.mark)),
  iso_max: camera('isoMax', ({ settings }) => Number(settings.iso.mark)),
  shutter_slowest: camera('shutterSlowest', ({ settings }) => settings.shutter.mark),
  shutter_fastest: camera('shutterFastest', ({ settings }) => settings.shutter.mark),
  sync_speed: camera('syncSpeed', ({ settings }) => settings.shutter.mark),
  high_speed_sync: camera('highSpeedSync', () => ({})),
  nd_stops: addFilter,
  key_power: moveFlashes(['key'], true),
  fill_power: moveFlashes(['fill'], true),
  front_power: moveFlashes(['key', 'fill'], true),
  rim_power: moveFlashes(['rim'], true),
  key_least: moveFlashes(['key'], false),
  fill_least: moveFlashes(['fill'], false),
  rim_least: moveFlashes(['rim'], false),
  ambient_too_bright: shade,
  aim_background: aim('backgroundStops', ({ outcome }) => outcome.backgroundStops),
  aim_subject: aim('subjectStops', ({ outcome }) => outcome.subjectStops),
  aim_ratio: aim('ratio', () => undefined),
  aim_rim: aim('rimStops', () => undefined),
};

/** The request with a limit given up as the answer proposes; null where that needs gear that nobody described yet. */
export function givenUp(body: Body, limit: LimitOut): Body | null {
  const change = CHANGES[limit.limit];
  return change && limit.recipe ? change(body, limit.recipe, limit) : null;
}
