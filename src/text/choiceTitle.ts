/** Codes that are written in capitals wherever they stand. */
const CAPITALS = new Set(['iso', 'nd', 'ev']);

/** A code as a person reads it: `sky_at_sunset` and `shallowFocus` become "sky at sunset" and "shallow focus". */
export function choiceTitle(code: string): string {
  return code
    .replaceAll('_', ' ')
    .replace(/([a-z\d])([A-Z])/g, (_, before: string, after: string) => `${before} ${after.toLowerCase()}`)
    .split(' ')
    .map((word) => (CAPITALS.has(word) ? word.toUpperCase() : word))
    .join(' ');
}
