import type { Field } from '../../shared/contract/field';
import { SCENES } from '../../shared/math/scenes';

/** A place on the ruler of a number in stops; it clicks in thirds. */
export interface StopsPlace {
  readonly thirds: number;
  readonly label: string;
  readonly isFullStop: boolean;
}

/** What light there is in the scene list, in whole stops. */
function sceneSpan(): readonly [number, number] {
  const values = SCENES.flatMap(({ ev100Low, ev100High }) => [ev100Low, ev100High]);
  return [Math.floor(Math.min(...values)), Math.ceil(Math.max(...values))];
}

/**
 * The stretch that a slider covers, a choice of this form: the scene list's for light, ten stops for a loss, five
 * to each side for anything else. Every other value that the field takes can be typed.
 */
function spanOf(field: Field): readonly [number, number] {
  const isNeverNegative = (field.minimum ?? -1) >= 0;
  const [low, high] = /ev100/i.test(field.name) ? sceneSpan() : isNeverNegative ? [0, 10] : [-5, 5];
  return [Math.max(low, Math.ceil(field.minimum ?? low)), Math.min(high, Math.floor(field.maximum ?? high))];
}

/** The places of a field's ruler in thirds of a stop; none where the field is not in stops. */
export function stopsPlaces(field: Field): StopsPlace[] {
  if (field.kind !== 'number' || field.unit !== 'stops') return [];
  const [low, high] = spanOf(field);
  return Array.from({ length: Math.max(0, (high - low) * 3 + 1) }, (_, i) => {
    const thirds = low * 3 + i;
    const label = String(Math.round(thirds / 3)).replace('-', '−');
    return { thirds, label, isFullStop: thirds % 3 === 0 };
  });
}

/** The ruler's place for a value: the nearest, an end where it lies beyond, null where there is no number. */
export function placeOfStops(places: readonly StopsPlace[], value: unknown): number | null {
  const first = places[0];
  if (!first || typeof value !== 'number') return null;
  return Math.min(places.length - 1, Math.max(0, Math.round(value * 3) - first.thirds));
}

/** Thirds of a stop as they go into a request: four decimals, so that addresses stay short. */
export function thirdsAsStops(thirds: number): number {
  return Number((thirds / 3).toFixed(4));
}
