import { listed, quoted, readable } from './format';

interface Named {
  readonly title: string;
}

const withUnit = (text: string, unit?: string) => (unit ? `${text} ${unit}` : text);

/** What is allowed, in units: "0.5 to 256", "above 0 up to 1", "at least 1 m". */
function allowed(range: { minimum?: number; maximum?: number; isAbove?: boolean; unit?: string }): string {
  const { minimum, maximum, isAbove, unit } = range;
  if (minimum !== undefined && maximum !== undefined) {
    const span = isAbove
      ? `above ${readable(minimum)} up to ${readable(maximum)}`
      : `${readable(minimum)} to ${readable(maximum)}`;
    return withUnit(span, unit);
  }
  if (minimum !== undefined)
    return withUnit(`${isAbove ? 'more than' : 'at least'} ${readable(minimum)}`, unit);
  return maximum === undefined ? 'any number' : withUnit(`at most ${readable(maximum)}`, unit);
}

/** Sentences for faults in a request, by code. They say what was given and what is allowed. */
export const faults = {
  missing: (p: Named & { allowed?: string }) =>
    `${p.title} is missing${p.allowed ? `; give ${p.allowed}` : ''}.`,
  wrong_type: (p: Named & { given: unknown; wanted: string }) =>
    `${p.title} takes ${p.wanted}; ${quoted(p.given)} was given.`,
  not_a_setting: (p: Named & { given: unknown; wanted: string }) =>
    `${p.title} takes ${p.wanted}; ${quoted(p.given)} can’t be read as that.`,
  out_of_range: (
    p: Named & { given: unknown; minimum?: number; maximum?: number; isAbove?: boolean; unit?: string },
  ) => `${p.title} must be ${allowed(p)}; ${withUnit(quoted(p.given), p.unit)} was given.`,
  not_a_choice: (p: Named & { given: unknown; choices: readonly string[] }) =>
    `${p.title} is one of ${listed(p.choices)}; ${quoted(p.given)} was given.`,
  unknown_field: (p: { field: string; suggestion?: string; known: readonly string[] }) =>
    p.suggestion
      ? `"${p.field}" is not a field here; did you mean "${p.suggestion}"?`
      : `"${p.field}" is not a field here; there ${p.known.length === 1 ? 'is' : 'are'} ${listed(p.known, 'and')}.`,
  exactly: (p: { fields: readonly string[]; count: number; given: readonly string[] }) =>
    `Give exactly ${p.count === 1 ? 'one' : p.count === 2 ? 'two' : p.count} of ${listed(p.fields, 'and')}; ${
      p.given.length
        ? `${listed(p.given, 'and')} ${p.given.length === 1 ? 'was' : 'were'} given`
        : 'none was given'
    }.`,
  at_most_one: (p: { fields: readonly string[]; given: readonly string[] }) =>
    `Give at most one of ${listed(p.fields, 'and')}; ${listed(p.given, 'and')} were given.`,
  too_few_items: (p: Named & { minimum: number; given: number }) =>
    `${p.title} takes at least ${p.minimum} ${p.minimum === 1 ? 'item' : 'items'}; ${p.given} ${p.given === 1 ? 'was' : 'were'} given.`,
  too_many_items: (p: Named & { maximum: number; given: number }) =>
    `${p.title} takes at most ${readable(p.maximum)} items; ${readable(p.given)} were given.`,
  not_valid: (p: Named & { given: unknown }) => `${p.title} is not valid: ${quoted(p.given)} was given.`,
} as const;

/** Words for what a field takes, by its kind. */
export const wanted = {
  number: (p: { unit?: string; isInteger?: boolean }) =>
    withUnit(p.isInteger ? 'a whole number' : 'a number', p.unit && `in ${p.unit}`),
  aperture: () => 'a number such as 5.6, or text such as "f/5.6"',
  shutter: () => 'seconds as a number such as 0.5, or text such as "1/125" or "2s"',
  iso: () => 'a number such as 400',
  power: () => 'a fraction such as 0.25, or text such as "1/16" or "1/16+1/3"',
  text: () => 'text',
  boolean: () => 'true or false',
  choice: (p: { choices: readonly string[] }) => `one of ${listed(p.choices)}`,
  group: () => 'an object with named fields',
  list: () => 'a list',
} as const;
