import { valueAt, type Body } from '../../form/body';
import { formatNumber } from '../../text/formatQuantity';

const text = (body: Body, name: string) => {
  const value = valueAt(body, ['camera', name]);
  return typeof value === 'string' || typeof value === 'number' ? String(value) : '?';
};

/** What the camera allows, on one line. */
export function cameraLine(body: Body): string {
  const filters = valueAt(body, ['camera', 'ndStops']);
  const sync = valueAt(body, ['camera', 'highSpeedSync']) === undefined ? '' : ' and high-speed sync';
  const list = Array.isArray(filters) && filters.length > 0 ? `, filters ${filters.join(', ')} stops` : '';
  return (
    `${text(body, 'apertureMin')} to ${text(body, 'apertureMax')}, ` +
    `${text(body, 'shutterFastest')} to ${text(body, 'shutterSlowest')}, ` +
    `ISO ${text(body, 'isoMin')} to ${text(body, 'isoMax')}, sync ${text(body, 'syncSpeed')}${sync}${list}`
  );
}

interface LooseFlash {
  readonly name?: unknown;
  readonly role?: unknown;
  readonly guideNumberM?: unknown;
  readonly distanceM?: unknown;
  readonly minM?: unknown;
  readonly maxM?: unknown;
}

const metres = (value: unknown) =>
  typeof value === 'number' ? formatNumber(value) : typeof value === 'string' ? value : '?';

/** The flashes at hand, on one line. */
export function flashesLine(body: Body): string {
  const flashes = valueAt(body, ['flashes']);
  if (!Array.isArray(flashes) || flashes.length === 0) return 'none';
  return (flashes as LooseFlash[])
    .map(({ name, role, minM, maxM, distanceM }) => {
      const place = minM === undefined ? metres(distanceM) : `${metres(minM)} to ${metres(maxM)}`;
      return `${String(name)} as ${String(role)} at ${place} m`;
    })
    .join('; ');
}

const given = (body: Body, name: string) => valueAt(body, [name]) !== undefined;

/** What is told of the picture beside its light, on one line. */
export function pictureLine(body: Body): string {
  const told = [
    ...(given(body, 'view') ? ['view'] : []),
    ...(given(body, 'subject') ? ['movement'] : []),
    ...(given(body, 'support') ? ['support'] : []),
    ...(given(body, 'prefer') ? ['preference'] : []),
  ];
  return told.length > 0 ? `${told.join(', ')} given` : 'for hand-held limit, ghost and blur';
}
