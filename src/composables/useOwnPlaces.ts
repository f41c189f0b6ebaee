import { useKept } from './useKept';

/** A place that the reader has named; it stays in this browser. */
export interface OwnPlace {
  readonly name: string;
  readonly latitude: number;
  readonly longitude: number;
}

const MOST_PLACES = 50;

const isPlace = (value: unknown): value is OwnPlace =>
  typeof value === 'object' &&
  value !== null &&
  typeof (value as OwnPlace).name === 'string' &&
  Number.isFinite((value as OwnPlace).latitude) &&
  Number.isFinite((value as OwnPlace).longitude);

const readPlaces = (value: unknown): OwnPlace[] =>
  Array.isArray(value) ? value.filter(isPlace).slice(0, MOST_PLACES) : [];

/** Places kept in this browser, in the order of their names; a name that comes again moves its place. */
export function useOwnPlaces() {
  const places = useKept<OwnPlace[]>('evenfall.places', readPlaces);
  const others = (name: string) => places.value.filter((place) => place.name !== name);

  function add(place: OwnPlace): void {
    if (!isPlace(place)) return;
    places.value = [...others(place.name), place].sort((a, b) => a.name.localeCompare(b.name));
  }

  function remove(name: string): void {
    places.value = others(name);
  }

  return { places, add, remove };
}
